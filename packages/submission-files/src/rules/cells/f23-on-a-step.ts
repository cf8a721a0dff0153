import { describeRange, fitsRange, tableKeys } from '@cairnstep/dictionary';
import { isWithin, judgeNumbers } from '../../checking/numbers-with-limits.ts';
import type { Rule } from '../../checking/rule.ts';

/** Whole numbers are a matter of reading; here are the columns and measures with a step of their own, and grades. */
export const onAStep: Rule = {
  id: 'F23',
  evaluate: (submission, report) => {
    for (const key of tableKeys) {
      const table = submission.table(key);
      judgeNumbers(
        table,
        (_, { hard }) => hard?.step === undefined,
        (value, { hard, unit, grades }) => {
          if (!hard || !isWithin(value, hard) || (grades ? grades.has(value) : fitsRange(value, hard))) return null;
          return `A number between those that are possible: ${describeRange(hard, unit)}.`;
        },
        (row, column, found) => report.add(table, row, column.variable.key, found),
      );
    }
  },
};
