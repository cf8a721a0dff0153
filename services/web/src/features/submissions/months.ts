/** What a site's months ask for next. */
import type { SiteMonth } from '@cairnstep/contract';

export type Month = SiteMonth;

export interface NextStep {
  readonly month: Month;
  /** Opened before, with or without files. */
  readonly begun: boolean;
  /** A month accepted or closed before is being corrected. */
  readonly correction: boolean;
  /** The day it was due on has passed. */
  readonly late: boolean;
  /** Months that ask for something after this one. */
  readonly others: number;
}

const isSettled = ({ acceptedAt, closed }: Month): boolean => acceptedAt !== null || closed !== null;
const isBegun = ({ state }: Month): boolean => state === 'in-progress' || state === 'checking';

/** Accepted, or closed as having nothing to report; also while a correction is under way. */
export const settledMonths = (months: readonly Month[]): readonly Month[] => months.filter(isSettled);

/** The oldest month that nothing has settled yet; else a correction that was begun; else nothing. `today`: `2026-12-01`. */
export function nextStep(months: readonly Month[], today: string): NextStep | null {
  const oldestFirst = [...months].sort((a, b) => a.month.localeCompare(b.month));
  const waiting = oldestFirst.filter((month) => month.state !== 'not-yet-due' && !isSettled(month));
  const corrections = oldestFirst.filter((month) => isBegun(month) && isSettled(month));
  const [month, ...others] = [...waiting, ...corrections];
  if (month === undefined) return null;
  const correction = isSettled(month);
  return { month, begun: isBegun(month), correction, late: !correction && month.dueOn < today, others: others.length };
}
