import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';
import type { Result } from '../../checking/visits.ts';
import { wasAttempted } from '../../checking/visits.ts';

const topLevel = limitOf('C10', 'topLevel');

/** Whether the test was done with nothing and nobody; null when the row does not say. */
function isUnaided({ aid, brace, persons }: Result): boolean | null {
  if (aid === null || brace === null || persons === null) return null;
  return aid === 'none' && brace === 'no' && persons === 0;
}

export const walkingLevelAndAids: Rule = {
  id: 'C10',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      for (const test of visit.of('tmwt_ss', 'tmwt_fast', 'six_mwt', 'tug')) {
        const unaided = isUnaided(test);
        if (unaided === null || !wasAttempted(test)) continue;
        const levels = visit.scored('wisci2').filter(({ inDevice }) => inDevice === test.inDevice);
        // A day may have two levels, self-selected and maximum; the test may have been done at either.
        if (levels.length === 0 || levels.some(({ value }) => (value === topLevel) === unaided)) continue;
        const found = unaided
          ? 'A test without aid, brace or help at a walking level that names one.'
          : 'A test with aid, brace or help at the walking level that needs none.';
        report.addToOneOf(visit.table, [test.row, ...levels.map(({ row }) => row)], 'aid', found);
      }
    }
  },
};
