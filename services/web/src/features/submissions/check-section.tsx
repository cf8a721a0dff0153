/** The check: begun by a press, carried out elsewhere, and found again by whoever comes back. */
import type { Submission } from '@cairnstep/contract';
import { useEffect, useRef, useState } from 'react';
import { formatCount, formatMonth } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorNotice } from '../../ui/error-notice.tsx';
import { Notice } from '../../ui/notice.tsx';
import { Section } from '../../ui/page.tsx';
import { Progress } from '../../ui/progress.tsx';
import { placesOf, progressWords } from './stack-steps.ts';
import { useCheck } from './submissions.queries.ts';

/** The button that comes after the files have arrived. */
export const beginCheckId = 'begin-check';

export interface CheckSectionProps {
  readonly submission: Submission;
  readonly isCoordinator: boolean;
  readonly unsent: number;
  /** A commit was refused because the registry has changed. */
  readonly isStale: boolean;
  readonly onBegun: () => void;
}

export function CheckSection({ submission, isCoordinator, unsent, isStale, onBegun }: CheckSectionProps) {
  const { status, files } = submission;
  const check = useCheck(submission.id);
  const begin = () => check.mutate(undefined, { onSuccess: onBegun });
  const month = formatMonth(submission.month);
  useAnnouncedEnd(submission);
  return (
    <Section
      title="Check"
      id="check"
      note={
        <p>
          Every row is read and held against the rules of the dictionary, and compared with what the registry has. You may leave; the check
          goes on.
        </p>
      }
    >
      <div className="grid justify-items-start gap-4">
        {status === 'checking' && <Running submission={submission} isCoordinator={isCoordinator} onAgain={begin} />}
        {status === 'open' && (
          <p>{files.length === 0 ? 'Add at least one file, then check it.' : `${formatCount(files.length, 'file')} can be checked.`}</p>
        )}
        {status === 'checked' && <p>{outcomeWords(submission)}</p>}
        {isStale && status === 'checked' && (
          <Notice kind="error" title="The registry changed since this preview was made." urgent>
            <p>
              Nothing was committed, and your files and reasons are kept. Another submission of your site was committed meanwhile. Check
              again to see what would change now.
            </p>
          </Notice>
        )}
        {unsent > 0 && status !== 'checking' && (
          <p className="font-semibold text-amber">{formatCount(unsent, 'file is', 'files are')} not sent yet and would not be checked.</p>
        )}
        {isCoordinator && (
          <Button
            id={beginCheckId}
            variant={status === 'open' || isStale ? 'primary' : 'secondary'}
            isDisabled={files.length === 0}
            isPending={check.isPending || status === 'checking'}
            onPress={begin}
          >
            {status === 'checked' ? `Check ${month} again` : `Check ${month}`}
          </Button>
        )}
        {check.isError && <ErrorNotice error={check.error} />}
      </div>
    </Section>
  );
}

function outcomeWords(submission: Submission): string {
  const errors = placesOf(submission, 'error');
  const warnings = placesOf(submission, 'warning');
  if (errors > 0) {
    const also = warnings > 0 ? ` and ${formatCount(warnings, 'warning')}` : '';
    return `${formatCount(errors, 'error')}${also} found. Mend the cells below or the rows in your files, and check once more.`;
  }
  if (warnings > 0) return `No errors. ${formatCount(warnings, 'warning')} to look at before you can commit.`;
  return 'Nothing was found. Look at what would change, then commit.';
}

interface RunningProps {
  readonly submission: Submission;
  readonly isCoordinator: boolean;
  readonly onAgain: () => void;
}

/** The registry gives a check up after five minutes without an end. */
const standsStillMs = 2 * 60_000;

function Running({ submission, isCoordinator, onAgain }: RunningProps) {
  const words = progressWords(submission);
  const standsStill = useUnchangedFor(words, standsStillMs);
  return (
    <>
      <Progress label="Checking" part={partOf(submission.progress)} words={words} />
      {standsStill && isCoordinator && (
        <div className="grid justify-items-start gap-2">
          <p>The check has not moved for two minutes. After five it can be begun again; your files are kept.</p>
          <Button onPress={onAgain}>Begin the check again</Button>
        </div>
      )}
    </>
  );
}

/** Reading takes the first half, checking and comparing a quarter each. */
function partOf(progress: Submission['progress']): number | null {
  switch (progress?.step) {
    case 'read':
      return progress.of === 0 ? 0 : (progress.done / progress.of) * 0.5;
    case 'check':
      return 0.5;
    case 'compare':
      return 0.75;
    default:
      return null;
  }
}

function useUnchangedFor(value: string, ms: number): boolean {
  const [old, setOld] = useState<string | null>(null);
  useEffect(() => {
    const timer = setTimeout(() => setOld(value), ms);
    return () => clearTimeout(timer);
  }, [value, ms]);
  return old === value;
}

/** Says once what a check found, when it ends while the page is open. */
function useAnnouncedEnd(submission: Submission): void {
  const { status } = submission;
  const before = useRef(status);
  const words = status === 'checked' ? outcomeWords(submission) : '';
  useEffect(() => {
    if (before.current === 'checking' && status === 'checked') announce(`The check has finished. ${words}`);
    before.current = status;
  }, [status, words]);
}
