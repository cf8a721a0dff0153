import { tableKeys } from '@cairnstep/dictionary';
import { requirementTest } from '../../checking/conditions.ts';
import type { Rule } from '../../checking/rule.ts';

export const filledWhereRequired: Rule = {
  id: 'F20',
  evaluate: (submission, report) => {
    for (const key of tableKeys) {
      const table = submission.table(key);
      for (const column of table.columns) {
        const { variable } = column;
        const isRequired = requirementTest(table, variable);
        // A column that is missing as a whole has been told once; every row would only repeat it.
        if (!isRequired || (variable.required.when === 'always' && !table.present.has(variable.key))) continue;
        for (let row = 0; row < table.fileRows; row += 1) {
          if (column.isEmpty(row) && isRequired(row)) report.add(table, row, variable.key, 'An empty cell that must be filled.');
        }
      }
    }
  },
};
