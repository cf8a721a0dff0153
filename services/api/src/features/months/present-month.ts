import type { MonthState, SiteMonth } from '@cairnstep/contract';
import { dueOn, monthOf } from './months.ts';
import type { MonthLine } from './months.repository.ts';

/** What has come counts before what is expected: work under way, then what was accepted, then "nothing to report". */
function stateOf(month: string, line: MonthLine | undefined, now: Date): MonthState {
  if (line?.isChecking) return 'checking';
  if (line?.unsettled) return 'in-progress';
  if (line?.accepted) return 'accepted';
  if (line?.closedAt) return 'nothing-to-report';
  if (month >= monthOf(now)) return 'not-yet-due';
  return now.toISOString().slice(0, 10) > dueOn(month) ? 'overdue' : 'due';
}

export const presentMonth = (month: string, line: MonthLine | undefined, now: Date): SiteMonth => ({
  month,
  state: stateOf(month, line, now),
  dueOn: dueOn(month),
  submissionId: line?.unsettled ?? line?.accepted ?? null,
  acceptedAt: line?.acceptedAt?.toISOString() ?? null,
  rows: line?.rows ?? null,
  closed: line?.closedAt ? { at: line.closedAt.toISOString(), by: line.closedBy ?? '' } : null,
});
