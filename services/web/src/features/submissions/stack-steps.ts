/** A submission's way as five stones, with a word on where each stands. */
import type { Submission } from '@cairnstep/contract';
import { formatCount, formatNumber } from '../../lib/format.ts';
import type { Step, StepState } from '../../ui/mark.tsx';

const labels = { read: 'Read', prepare: 'Prepare', check: 'Check', review: 'Review', commit: 'Commit' };
type Key = keyof typeof labels;

const step = (key: Key, state: StepState, remark?: string): Step => ({
  key,
  label: labels[key],
  state,
  ...(remark !== undefined && { remark }),
});

/** `unsent`: files chosen in this browser that the registry does not have yet. `isStale`: the preview no longer holds. */
export function stackSteps(submission: Submission, unsent: number, isStale = false): readonly Step[] {
  const { files, status } = submission;
  const settled = status === 'accepted' || status === 'superseded';
  const begun = files.length + unsent > 0 || settled;
  const prepared = files.length > 0 && unsent === 0;
  return [
    step(
      'read',
      begun ? 'done' : 'current',
      !begun ? 'choose the files of the month' : formatCount(unsent > 0 ? unsent : files.length, 'file'),
    ),
    step(
      'prepare',
      !begun ? 'waiting' : prepared || settled ? 'done' : 'current',
      unsent > 0 ? `${formatCount(unsent, 'file')} not sent yet` : begun ? 'each with its table, sent' : undefined,
    ),
    ...(isStale && submission.status === 'checked'
      ? [step('check', 'current', 'has to be repeated'), step('review', 'waiting'), step('commit', 'waiting')]
      : [checkStep(submission, prepared), reviewStep(submission, prepared), commitStep(submission, prepared)]),
  ];
}

function checkStep(submission: Submission, prepared: boolean): Step {
  switch (submission.status) {
    case 'open':
    case 'discarded':
      return prepared ? step('check', 'current', 'not begun yet') : step('check', 'waiting');
    case 'checking':
      return step('check', 'current', progressWords(submission));
    case 'checked':
    case 'accepted':
    case 'superseded': {
      const errors = placesOf(submission, 'error');
      if (errors > 0) return step('check', 'failed', `${formatCount(errors, 'error')} to mend`);
      const warnings = placesOf(submission, 'warning');
      return step('check', 'done', warnings === 0 ? 'nothing found' : `no errors, ${formatCount(warnings, 'warning')}`);
    }
  }
}

function reviewStep(submission: Submission, prepared: boolean): Step {
  const { status, preview } = submission;
  if (status === 'accepted' || status === 'superseded') return step('review', 'done');
  if (status !== 'checked' || preview === null) return step('review', 'waiting');
  const open = openWarnings(submission).length;
  if (open > 0) return step('review', prepared ? 'current' : 'waiting', `${formatCount(open, 'warning')} without a reason`);
  return step('review', prepared ? 'done' : 'waiting', changeWords(preview.tables));
}

function commitStep(submission: Submission, prepared: boolean): Step {
  if (submission.status === 'accepted' || submission.status === 'superseded') return step('commit', 'done');
  return isReady(submission) && prepared ? step('commit', 'current', 'ready') : step('commit', 'waiting');
}

/** Checked without errors, and every warning has its reason. */
export const isReady = (submission: Submission): boolean =>
  submission.status === 'checked' && submission.preview !== null && openWarnings(submission).length === 0;

export const openWarnings = ({ findings }: Submission) =>
  findings.filter(({ severity, acknowledgedReason }) => severity === 'warning' && acknowledgedReason === null);

/** How many places of the files the findings of a severity name. */
export const placesOf = ({ findings }: Submission, severity: 'error' | 'warning'): number =>
  findings.reduce((sum, group) => sum + (group.severity === severity ? group.count : 0), 0);

export function progressWords({ progress, files }: Submission): string {
  switch (progress?.step) {
    case 'read':
      // Until the work is taken up nobody has counted the files.
      if (progress.of !== files.length) return 'waiting to be taken up';
      return `reading file ${formatNumber(Math.min(progress.done + 1, progress.of))} of ${formatNumber(progress.of)}`;
    case 'check':
      return 'checking every row against the rules';
    case 'compare':
      return 'comparing with what the registry holds';
    default:
      return 'waiting to be taken up';
  }
}

type Counts = Readonly<Record<'added' | 'changed' | 'unchanged' | 'removed', number>>;

export function totalOf(tables: readonly Counts[]): Counts {
  const sum = (kind: keyof Counts) => tables.reduce((total, table) => total + table[kind], 0);
  return { added: sum('added'), changed: sum('changed'), unchanged: sum('unchanged'), removed: sum('removed') };
}

/** "812 new, 3 changed, 1 removed", or that nothing would change. */
export function changeWords(tables: readonly Counts[]): string {
  const { added, changed, removed } = totalOf(tables);
  const parts = [
    added > 0 && `${formatNumber(added)} new`,
    changed > 0 && `${formatNumber(changed)} changed`,
    removed > 0 && `${formatNumber(removed)} removed`,
  ].filter((part) => part !== false);
  return parts.length === 0 ? 'no row would change' : parts.join(', ');
}
