import { useAccount } from '../lib/account.ts';
import { Notice } from './notice.tsx';

/** Shown in place of what the signed-in person may not see. */
export function NoPermission({ detail }: { readonly detail?: string }) {
  const account = useAccount();
  return (
    <Notice kind="information" title="Your role does not include this.">
      <p>{detail ?? 'Nothing was changed.'}</p>
      <p className="mt-1">
        {account === undefined
          ? 'If your work needs it, ask an administrator of the registry.'
          : `If your work needs it, ask ${account.contact}.`}
      </p>
    </Notice>
  );
}
