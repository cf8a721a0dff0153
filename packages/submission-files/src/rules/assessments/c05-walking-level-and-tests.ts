import type { Rule } from '../../checking/rule.ts';
import { wasAttempted } from '../../checking/visits.ts';

const allTests = ['tmwt_ss', 'tmwt_fast', 'six_mwt', 'tug'];
const tenMetres = ['tmwt_ss', 'tmwt_fast'];

export const walkingLevelAndTests: Rule = {
  id: 'C05',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      for (const level of visit.scored('wisci2')) {
        if (level.inDevice || level.value > 1) continue;
        const impossible = visit
          .of(...(level.value === 0 ? allTests : tenMetres))
          .filter((test) => !test.inDevice && (level.value === 0 ? wasAttempted(test) : test.status === 'done'));
        for (const test of impossible) {
          report.addToOneOf(
            visit.table,
            [test.row, level.row],
            'attempt_status',
            `A walking test done at a walking level of ${level.value}.`,
          );
        }
      }
    }
  },
};
