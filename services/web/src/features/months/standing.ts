/** How the sites stand with their months: the sentence above the calendar. */
import type { MonthState } from '@cairnstep/contract';
import { formatCount } from '../../lib/format.ts';
import type { SiteLine } from './calendar.queries.ts';

const has = (state: MonthState) => (line: SiteLine) => line.months.some((month) => month.state === state);

export const isOverdue: (line: SiteLine) => boolean = has('overdue');

function phrase(sites: readonly SiteLine[], state: MonthState, words: string): string | null {
  const months = sites.reduce((sum, line) => sum + line.months.filter((month) => month.state === state).length, 0);
  if (months === 0) return null;
  return `${formatCount(months, 'month')} ${words} at ${formatCount(sites.filter(has(state)).length, 'site')}`;
}

/** "3 months overdue at 2 sites; 9 months due at 9 sites." */
export function standingOf(sites: readonly SiteLine[]): string {
  const found = [
    phrase(sites, 'overdue', 'overdue'),
    phrase(sites, 'due', 'due'),
    phrase(sites, 'in-progress', 'begun'),
    phrase(sites, 'checking', 'being checked'),
  ].filter((words) => words !== null);
  return found.length === 0 ? 'Every month that is over is accepted or had nothing to report.' : `${found.join('; ')}.`;
}
