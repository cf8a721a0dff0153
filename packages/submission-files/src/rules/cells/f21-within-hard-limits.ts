import { tableKeys } from '@cairnstep/dictionary';
import { beyond, isWithin, judgeNumbers } from '../../checking/numbers-with-limits.ts';
import type { Rule } from '../../checking/rule.ts';

export const withinHardLimits: Rule = {
  id: 'F21',
  evaluate: (submission, report) => {
    for (const key of tableKeys) {
      const table = submission.table(key);
      judgeNumbers(
        table,
        ({ min, max }, { hard }) => isWithin(min, hard) && isWithin(max, hard),
        (value, { hard, unit }) => (!hard || isWithin(value, hard) ? null : beyond(value, 'hard', hard, unit)),
        (row, column, found) => report.add(table, row, column.variable.key, found),
      );
    }
  },
};
