/** An error where something was asked for: what happened, what was kept, what to do next. */
import { useLocation } from 'react-router-dom';
import { ProblemError, UnreachableError } from '../lib/problem-error.ts';
import { signInAddress } from '../lib/account.ts';
import { Button } from './button.tsx';
import { NoPermission } from './no-permission.tsx';
import { Notice } from './notice.tsx';
import { TextLink } from './text-link.tsx';

export interface ErrorNoticeProps {
  readonly error: unknown;
  readonly retry?: () => void;
}

export function ErrorNotice({ error, retry }: ErrorNoticeProps) {
  const { pathname, search } = useLocation();
  if (error instanceof ProblemError) {
    if (error.code === 'not-permitted' || error.code === 'no-grant') return <NoPermission detail={error.detail} />;
    return (
      <Notice kind="error" title={`${error.title}.`} urgent>
        <p>{error.detail}</p>
        {error.errors.length > 0 && (
          <ul className="mt-2 list-disc pl-5">
            {error.errors.map(({ pointer, detail }) => (
              <li key={`${pointer} ${detail}`}>{detail}</li>
            ))}
          </ul>
        )}
        <p className="mt-2 flex flex-wrap gap-x-6 gap-y-2">
          {error.code === 'not-signed-in' && <TextLink to={signInAddress(pathname + search)}>Sign in and come back here</TextLink>}
          <TextLink to={`/problems/${error.code}`}>What this means</TextLink>
        </p>
        <Retry retry={error.status >= 500 || error.status === 429 ? retry : undefined} />
      </Notice>
    );
  }
  if (error instanceof UnreachableError) {
    return (
      <Notice kind="error" title="The registry cannot be reached." urgent>
        <p>Nothing was changed. Look at your connection, then try again.</p>
        <Retry retry={retry} />
      </Notice>
    );
  }
  return (
    <Notice kind="error" title="This page met something it does not understand." urgent>
      <p>A newer version of the registry may be in service. Load the page again; what was sent before is kept.</p>
      <div className="mt-3">
        <Button onPress={() => window.location.reload()}>Load the page again</Button>
      </div>
    </Notice>
  );
}

function Retry({ retry }: { readonly retry: (() => void) | undefined }) {
  if (retry === undefined) return null;
  return (
    <div className="mt-3">
      <Button onPress={retry}>Try again</Button>
    </div>
  );
}
