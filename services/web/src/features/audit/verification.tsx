/** Recomputes the chain of the log and says whether it holds. */
import type { ResponseOf, verifyAudit } from '@cairnstep/contract';
import { formatCount, formatNumber } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Notice } from '../../ui/notice.tsx';
import { useVerifyAudit } from './audit.queries.ts';

type Verdict = ResponseOf<typeof verifyAudit>;

export function Verification() {
  const verify = useVerifyAudit();
  return (
    <div className="grid justify-items-start gap-4">
      <Button
        variant="primary"
        isPending={verify.isPending}
        onPress={() => verify.mutate(undefined, { onSuccess: (verdict) => announce(headlineOf(verdict)) })}
      >
        Verify the log
      </Button>
      {verify.data !== undefined && <VerdictNotice verdict={verify.data} />}
      {verify.isError && <ErrorNotice error={verify.error} />}
    </div>
  );
}

const headlineOf = ({ holds, entries, firstBrokenSeq }: Verdict): string =>
  holds
    ? `The log holds: all ${formatCount(entries, 'entry', 'entries')} fit.`
    : firstBrokenSeq === null
      ? 'The log does not hold.'
      : `The log does not hold: entry ${formatNumber(firstBrokenSeq)} was changed, or one before it is missing.`;

function VerdictNotice({ verdict }: { readonly verdict: Verdict }) {
  return (
    <Notice kind={verdict.holds ? 'success' : 'error'} title={headlineOf(verdict)}>
      {verdict.holds ? (
        verdict.head !== null && (
          <p>
            Digest of the last entry: <code className="break-all">{verdict.head}</code>. Keep it elsewhere to prove later that nothing
            before it was changed.
          </p>
        )
      ) : (
        <p>Stop, keep the database as it is, and tell those who run the registry. Entries before it can still be relied on.</p>
      )}
    </Notice>
  );
}
