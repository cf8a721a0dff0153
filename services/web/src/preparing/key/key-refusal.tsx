import { Notice } from '../../ui/notice.tsx';
import type { WorkRefused } from '../worker-client.ts';
import type { RefusalCode } from '../worker/protocol.ts';

/** What to do after each refusal, where its own words do not say it. */
const advice: Partial<Record<RefusalCode, string>> = {
  'not-a-key-file':
    'Choose the file whose name has “site-key” in it. If that is the one you chose, this copy is damaged: take the second copy that your site keeps.',
  'unknown-version': 'Load this page again to get its newest version, or take the newest offline file.',
  'too-few-iterations': 'Do not use this copy. Open the other one that your site keeps, and tell the data steward.',
  'too-many-iterations': 'Do not use this copy. Open the other one that your site keeps, and tell the data steward.',
  'other-site': 'Choose the key file of the site named above. If you work for several sites, change the site first.',
  'cannot-be-opened':
    'Type the six words again, in their order. “Show what I type” lets you read them. If they are right, this copy was altered or damaged: take the second copy that your site keeps. Nobody can recover a passphrase, neither we nor the registry.',
  'different-keys': 'Only two copies of the same key file can become one. Check that both are of this site and of its present key.',
};

/** Why a key file was not opened, saved or merged, and what to do. Nothing was changed. */
export function KeyRefusal({ refusal }: { readonly refusal: WorkRefused | null }) {
  if (refusal === null) return null;
  const more = advice[refusal.code];
  return (
    <Notice kind="error" title={refusal.message} urgent>
      {more !== undefined && <p>{more}</p>}
    </Notice>
  );
}
