/** The states of a site's month in words, as several features write them. */
import type { MonthState } from '@cairnstep/contract';

export const monthStateWords: Readonly<Record<MonthState, string>> = {
  accepted: 'accepted',
  'nothing-to-report': 'nothing to report',
  checking: 'checking',
  'in-progress': 'begun',
  due: 'due',
  overdue: 'overdue',
  'not-yet-due': 'not over yet',
};
