import { describeRange, fitsRange, tableKeys } from '@cairnstep/dictionary';
import { limitsOfRow } from '../../checking/limits-of-row.ts';
import type { Rule } from '../../checking/rule.ts';

export const onAStep: Rule = {
  id: 'F23',
  evaluate: (submission, report) => {
    for (const key of tableKeys) {
      const table = submission.table(key);
      for (const column of table.columns) {
        const { variable } = column;
        const limitsOf = limitsOfRow(table, variable);
        if (!limitsOf) continue;
        for (let row = 0; row < table.fileRows; row += 1) {
          const value = column.number(row);
          if (value === null) continue;
          const { hard, unit, grades } = limitsOf(row);
          if (!hard || value < hard.min || value > hard.max) continue;
          if (grades ? grades.has(value) : fitsRange(value, hard)) continue;
          report.add(table, row, variable.key, `A number between those that are possible: ${describeRange(hard, unit)}.`);
        }
      }
    }
  },
};
