import { tableKeys } from '@cairnstep/dictionary';
import { beyond, isWithin, judgeNumbers } from '../../checking/numbers-with-limits.ts';
import type { Rule } from '../../checking/rule.ts';

/** A number beyond the hard limits is an error already and is not doubted as well. */
export const withinPlausibleLimits: Rule = {
  id: 'F22',
  evaluate: (submission, report) => {
    for (const key of tableKeys) {
      const table = submission.table(key);
      judgeNumbers(
        table,
        ({ min, max }, { plausible }) => isWithin(min, plausible) && isWithin(max, plausible),
        (value, { hard, plausible, unit }) =>
          !plausible || isWithin(value, plausible) || !isWithin(value, hard) ? null : beyond(value, 'plausible', plausible, unit),
        (row, column, found) => report.add(table, row, column.variable.key, found),
      );
    }
  },
};
