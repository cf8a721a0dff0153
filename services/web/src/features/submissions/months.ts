/** What a site's months ask for next. */
import type { listMonths, ResponseOf } from '@cairnstep/contract';

export type Month = ResponseOf<typeof listMonths>['months'][number];

export const monthStates: Readonly<Record<Month['state'], string>> = {
  accepted: 'accepted',
  'in-progress': 'begun',
  due: 'due',
  overdue: 'overdue',
  'not-yet-due': 'not over yet',
};

export interface NextStep {
  readonly month: Month;
  /** Opened before, with or without files. */
  readonly begun: boolean;
  /** A month accepted before is being replaced. */
  readonly correction: boolean;
  /** The day it was due on has passed. */
  readonly late: boolean;
  /** Months that ask for something after this one. */
  readonly others: number;
}

/** The oldest month that waits for its first acceptance; else a correction that was begun; else nothing. `today`: `2026-12-01`. */
export function nextStep(months: readonly Month[], today: string): NextStep | null {
  const oldestFirst = [...months].sort((a, b) => a.month.localeCompare(b.month));
  const waiting = oldestFirst.filter(({ state, acceptedAt }) => state !== 'not-yet-due' && acceptedAt === null);
  const corrections = oldestFirst.filter(({ state, acceptedAt }) => state === 'in-progress' && acceptedAt !== null);
  const [month, ...others] = [...waiting, ...corrections];
  if (month === undefined) return null;
  const correction = month.acceptedAt !== null;
  return { month, begun: month.state === 'in-progress', correction, late: !correction && month.dueOn < today, others: others.length };
}
