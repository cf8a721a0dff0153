import { tableKeys } from '@cairnstep/dictionary';
import { limitsOfRow } from '../../checking/limits-of-row.ts';
import type { Rule } from '../../checking/rule.ts';

export const withinHardLimits: Rule = {
  id: 'F21',
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
          const { hard, unit } = limitsOf(row);
          if (!hard || (value >= hard.min && value <= hard.max)) continue;
          const [side, limit] = value < hard.min ? ['below', hard.min] : ['above', hard.max];
          report.add(table, row, variable.key, `A number ${side} the hard limit of ${limit}${unit === undefined ? '' : ` ${unit}`}.`);
        }
      }
    }
  },
};
