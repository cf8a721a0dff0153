/** One submission from files to commit. Where it stands is read from the registry, so leaving and coming back loses nothing. */
import type { Submission } from '@cairnstep/contract';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useAccount } from '../../lib/account.ts';
import { formatInstant, formatMonth } from '../../lib/format.ts';
import { LinkButton } from '../../ui/button.tsx';
import { StackProgress } from '../../ui/mark.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Page, Section } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { CheckSection } from './check-section.tsx';
import { maySubmit } from './chosen-site.tsx';
import { CommitSection } from './commit-section.tsx';
import { FilesSection } from './files-section.tsx';
import { FindingsSection } from './findings-section.tsx';
import { useMendDrafts } from './mend-drafts.ts';
import { useOutgoingFiles } from './outgoing-files.ts';
import { ReviewSection } from './review-section.tsx';
import { stackSteps } from './stack-steps.ts';
import { monthsQuery } from './submissions.queries.ts';
import { WithSubmission } from './with-submission.tsx';

export default function SubmitPage() {
  return (
    <WithSubmission title="Submission">{(submission, isCutOff) => <Submit submission={submission} isCutOff={isCutOff} />}</WithSubmission>
  );
}

function Submit({ submission, isCutOff }: { readonly submission: Submission; readonly isCutOff: boolean }) {
  const { status, site } = submission;
  const account = useAccount();
  const isCoordinator = maySubmit(account, site);
  const outgoing = useOutgoingFiles(submission);
  const [isStale, setStale] = useState(false);
  const drafts = useReasonDrafts();
  const mends = useMendDrafts(submission);
  const unsent = outgoing.files.length;
  const month = formatMonth(submission.month);
  const { data: known } = useQuery(monthsQuery(site.id));
  const isCorrection = known?.months.find((one) => one.month === submission.month)?.acceptedAt != null;
  const isSettled = status === 'accepted' || status === 'superseded' || status === 'discarded';
  return (
    <Page
      title={isSettled ? `Submission of ${month}` : `${isCorrection ? 'Correct' : 'Submit'} ${month}`}
      kicker={
        <>
          {site.name} ({site.code}), <TextLink to={`/month?site=${site.code}`}>all months</TextLink>
        </>
      }
      lead={
        <>
          {isCorrection && !isSettled && (
            <p>
              {month} has been accepted before. This corrects it: what is committed here takes its place, and until then the accepted month
              stands.
            </p>
          )}
          <p>{leadOf(submission, isCoordinator)}</p>
        </>
      }
      note={
        <p>
          Begun by {submission.createdBy} on {formatInstant(submission.createdAt)}.
        </p>
      }
    >
      {status !== 'discarded' && (
        <Section note={<p>Nothing enters the registry before the last stone. Until then files can be replaced and the check repeated.</p>}>
          <StackProgress label="Steps of the submission" steps={stackSteps(submission, unsent, isStale)} />
        </Section>
      )}
      {isCutOff && (
        <Section>
          <Notice kind="warning" title="The registry does not answer just now.">
            <p>What you see may be a little old; nothing is lost. If this stays, load the page again.</p>
          </Notice>
        </Section>
      )}
      {isSettled ? (
        <Settled submission={submission} />
      ) : (
        <>
          <FilesSection submission={submission} outgoing={outgoing} isOpen={isCoordinator && status !== 'checking'} />
          <CheckSection
            submission={submission}
            isCoordinator={isCoordinator}
            unsent={unsent}
            isStale={isStale}
            onBegun={() => setStale(false)}
          />
          {status === 'checked' && (
            <>
              <FindingsSection submission={submission} isCoordinator={isCoordinator} drafts={drafts} mends={mends} />
              <ReviewSection submission={submission} />
            </>
          )}
          {isCoordinator && status !== 'checking' && (
            <CommitSection submission={submission} unsent={unsent} isStale={isStale} onStale={() => setStale(true)} />
          )}
        </>
      )}
    </Page>
  );
}

function leadOf({ status }: Submission, isCoordinator: boolean): string {
  switch (status) {
    case 'accepted':
      return 'This submission is in the registry.';
    case 'superseded':
      return 'This submission was accepted, and a later submission has corrected its month.';
    case 'discarded':
      return 'This submission was given up. The registry was not touched.';
    default:
      return isCoordinator
        ? 'From the clinic’s files to a receipt, in five steps.'
        : 'The site coordinator is working on this submission. You can follow it here.';
  }
}

function Settled({ submission }: { readonly submission: Submission }) {
  const { id, site, status } = submission;
  return (
    <Section>
      <div className="flex flex-wrap gap-3">
        {status !== 'discarded' && (
          <LinkButton variant="primary" to={`/submissions/${id}/receipt`}>
            Open the receipt
          </LinkButton>
        )}
        <LinkButton to={`/month?site=${site.code}`}>Go to the months of the site</LinkButton>
      </div>
    </Section>
  );
}

function useReasonDrafts() {
  const [drafts, setDrafts] = useState<Readonly<Record<string, string>>>({});
  return {
    of: (rule: string) => drafts[rule],
    write: (rule: string, reason: string) => setDrafts((before) => ({ ...before, [rule]: reason })),
  };
}
