import { tableKeys } from '@cairnstep/dictionary';
import { limitsOfRow } from '../../checking/limits-of-row.ts';
import type { Rule } from '../../checking/rule.ts';

export const withinPlausibleLimits: Rule = {
  id: 'F22',
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
          const { hard, plausible, unit } = limitsOf(row);
          // Beyond the hard limits it is an error already.
          if (!plausible || (hard && (value < hard.min || value > hard.max))) continue;
          if (value >= plausible.min && value <= plausible.max) continue;
          const [side, limit] = value < plausible.min ? ['below', plausible.min] : ['above', plausible.max];
          report.add(table, row, variable.key, `A number ${side} the plausible limit of ${limit}${unit === undefined ? '' : ` ${unit}`}.`);
        }
      }
    }
  },
};
