/** Where a request stands, in sentences; once decided, the decision letter. */
import type { AccessRequest } from '@cairnstep/contract';
import { formatDate } from '../../lib/format.ts';
import { Notice } from '../../ui/notice.tsx';

export function Standing({ request }: { readonly request: AccessRequest }) {
  const { status, submittedAt, decidedAt, accessEndsOn, votesNeeded, votesNeededBecause } = request;
  const decided = decidedAt === null ? '' : ` on ${formatDate(decidedAt)}`;
  switch (status) {
    case 'draft':
      return <Notice title="The lead is still writing this request." />;
    case 'submitted':
    case 'in_review':
      return (
        <Notice title={status === 'submitted' ? 'Waiting for a decision.' : 'Under review: a first decision has been given.'}>
          <p>
            Handed in{submittedAt !== null && ` on ${formatDate(submittedAt)}`}.{' '}
            {votesNeeded === 1 ? 'One steward decides.' : `${votesNeeded} stewards have to agree.`}
          </p>
          <Because reasons={votesNeededBecause} />
        </Notice>
      );
    case 'approved':
      return (
        <Notice kind="success" title={`Approved${decided}.`}>
          {accessEndsOn !== null && <p>Access ends on {formatDate(accessEndsOn)}. Until then exports can be built and downloaded.</p>}
          <p>Re-identification of participants is forbidden. Destroy the files when access ends.</p>
        </Notice>
      );
    case 'declined':
      return (
        <Notice kind="warning" title={`Declined${decided}.`}>
          <p>A new request can be written, for example with a narrower purpose or fewer tables.</p>
        </Notice>
      );
    case 'withdrawn':
      return <Notice title="Taken back by its lead. It is not decided any more." />;
    case 'ended':
      return (
        <Notice kind="warning" title={`Access ended${accessEndsOn === null ? '' : ` on ${formatDate(accessEndsOn)}`}.`}>
          <p>Destroy every copy of its exports. A new request can be written.</p>
        </Notice>
      );
  }
}

export function Because({ reasons }: { readonly reasons: readonly string[] }) {
  if (reasons.length === 0) return null;
  return (
    <ul className="list-disc pl-5">
      {reasons.map((reason) => (
        <li key={reason}>{reason}</li>
      ))}
    </ul>
  );
}
