import type { Keeping } from './draft-keeper.ts';
import { formatTime } from '../../lib/format.ts';
import { ErrorNotice } from '../../ui/error-notice.tsx';

/** Whether what was typed is safe. */
export function KeptLine({ keeping }: { readonly keeping: Keeping }) {
  switch (keeping.state) {
    case 'kept':
      return <p role="status">{keeping.at === null ? 'Kept in the registry.' : `Kept at ${formatTime(keeping.at)}.`}</p>;
    case 'waiting':
    case 'keeping':
      return <p role="status">Keeping what you typed …</p>;
    case 'failed':
      return keeping.willTryAgain ? (
        <p role="status" className="font-semibold text-amber">
          Not kept: the registry cannot be reached. What you typed is still here, and is sent again by itself. Leave this page open.
        </p>
      ) : (
        <ErrorNotice error={keeping.error} />
      );
  }
}
