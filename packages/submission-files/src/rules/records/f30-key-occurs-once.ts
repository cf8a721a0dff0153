import { tableKeys, tableOf } from '@cairnstep/dictionary';
import { repeatedNumbers } from '../../checking/repeated-numbers.ts';
import { RowGroups } from '../../checking/row-groups.ts';
import type { Rule } from '../../checking/rule.ts';

export const keyOccursOnce: Rule = {
  id: 'F30',
  evaluate: (submission, report) => {
    for (const key of tableKeys) {
      const table = submission.table(key);
      const columns = tableOf(key).rowKey;
      const keys = submission.keyNumbers(table, columns.slice(1)).subarray(0, table.fileRows);
      if (repeatedNumbers(keys, 2).size === 0) continue;
      const groups = new RowGroups(keys);
      for (let row = 0; row < table.fileRows; row += 1) {
        const first = groups.firstOf(keys[row] ?? -1);
        if (first >= 0 && first < row) report.add(table, row, null, `The same ${columns.join(', ')} as in line ${table.lineOf(first)}.`);
      }
    }
  },
};
