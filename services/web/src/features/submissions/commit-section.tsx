/** The last step: commit just what was reviewed, or give the submission up. Both ask once. */
import type { Submission } from '@cairnstep/contract';
import { useNavigate } from 'react-router-dom';
import { formatCount, formatMonth } from '../../lib/format.ts';
import { ProblemError } from '../../lib/problem-error.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { Section } from '../../ui/page.tsx';
import { changeWords, isReady, openWarnings, totalOf } from './stack-steps.ts';
import { useCommit, useDiscard } from './submissions.queries.ts';

export interface CommitSectionProps {
  readonly submission: Submission;
  readonly unsent: number;
  readonly isStale: boolean;
  /** The registry changed since the preview: nothing was committed. */
  readonly onStale: () => void;
}

export function CommitSection({ submission, unsent, isStale, onStale }: CommitSectionProps) {
  const obstacle = obstacleOf(submission, unsent, isStale);
  return (
    <Section
      title="Commit"
      id="commit"
      note={<p>All rows of the month enter the registry together, or none. A receipt follows, here and by e-mail.</p>}
    >
      <div className="grid justify-items-start gap-4">
        {obstacle === null ? <p>{changeSentence(submission)}</p> : <p className="text-quiet">{obstacle}</p>}
        <div className="flex flex-wrap gap-3">
          {obstacle === null && <Commit submission={submission} onStale={onStale} />}
          <Discard submission={submission} />
        </div>
      </div>
    </Section>
  );
}

function obstacleOf(submission: Submission, unsent: number, isStale: boolean): string | null {
  if (submission.status !== 'checked') return 'A month can be committed once it has been checked.';
  if (submission.preview === null) return 'The errors above keep the month out. Nothing has entered the registry.';
  if (isStale) return 'Check the month again first: the registry changed since this preview was made.';
  if (unsent > 0) return `${formatCount(unsent, 'file is', 'files are')} not sent yet. Send or leave out, then check again.`;
  const open = openWarnings(submission).length;
  return isReady(submission) ? null : `${formatCount(open, 'warning still needs', 'warnings still need')} a reason.`;
}

const changeSentence = ({ preview }: Submission): string => {
  const words = changeWords(preview?.tables ?? []);
  return `Checked and ready: ${words}.`;
};

function Commit({ submission, onStale }: { readonly submission: Submission; readonly onStale: () => void }) {
  const commit = useCommit(submission.id);
  const navigate = useNavigate();
  const { site, preview } = submission;
  const month = formatMonth(submission.month);
  const { removed } = totalOf(preview?.tables ?? []);

  async function act(): Promise<void> {
    if (preview === null) return;
    try {
      await commit.mutateAsync(preview.digest);
    } catch (error) {
      if (!(error instanceof ProblemError && error.code === 'submission-stale')) throw error;
      onStale();
      return;
    }
    announce(`${month} is accepted.`);
    void navigate(`/submissions/${submission.id}/receipt`);
  }

  return (
    <ConfirmDialog
      trigger={<Button variant="primary">Commit {month}</Button>}
      title={`Commit ${month} of ${site.name} (${site.code})?`}
      consequence={
        <>
          <p>The registry takes in just what you reviewed: {changeWords(preview?.tables ?? [])}.</p>
          {removed > 0 && (
            <p className="mt-2 font-semibold text-oxide">{formatCount(removed, 'row is', 'rows are')} removed from the registry.</p>
          )}
          <p className="mt-2">You can correct the month later with another submission.</p>
        </>
      }
      confirm={`Commit ${month}`}
      cancel="Not yet"
      onConfirm={act}
    />
  );
}

function Discard({ submission }: { readonly submission: Submission }) {
  const discard = useDiscard(submission.id);
  const navigate = useNavigate();
  const month = formatMonth(submission.month);
  return (
    <ConfirmDialog
      trigger={<Button variant="danger">Give up this submission</Button>}
      title={`Give up this submission of ${month}?`}
      consequence={
        <p>
          Its {formatCount(submission.files.length, 'file')} and what the check found are deleted. The registry is not touched, and the
          month can be submitted anew.
        </p>
      }
      confirm="Give it up"
      danger
      onConfirm={async () => {
        await discard.mutateAsync();
        announce(`The submission of ${month} was given up.`);
        void navigate(`/month?site=${submission.site.code}`);
      }}
    />
  );
}
