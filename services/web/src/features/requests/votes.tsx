import type { AccessRequest } from '@cairnstep/contract';
import { formatInstant } from '../../lib/format.ts';

/** Each steward's decision with its reason, as far as the reader may see them. */
export function Votes({ votes }: Pick<AccessRequest, 'votes'>) {
  return (
    <ol className="grid max-w-2xl gap-4">
      {votes.map(({ steward, vote, reason, at }) => (
        <li key={`${steward} ${at}`} className="border-l-4 border-hairline pl-4">
          <p>
            <strong className="font-semibold">{vote === 'approve' ? 'Approved' : 'Declined'}</strong> by {steward}, {formatInstant(at)}
          </p>
          <p className="whitespace-pre-line">{reason}</p>
        </li>
      ))}
    </ol>
  );
}
