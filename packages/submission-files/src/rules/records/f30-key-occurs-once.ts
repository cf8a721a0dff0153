import { tableKeys, tableOf } from '@cairnstep/dictionary';
import { RowGroups } from '../../checking/row-groups.ts';
import type { Rule } from '../../checking/rule.ts';

export const keyOccursOnce: Rule = {
  id: 'F30',
  evaluate: (submission, report) => {
    for (const key of tableKeys) {
      const table = submission.table(key);
      const columns = tableOf(key).rowKey;
      const keyOf = submission.keyNumbers(table, columns.slice(1));
      const groups = new RowGroups(table.fileRows, keyOf);
      for (let row = 0; row < table.fileRows; row += 1) {
        const first = groups.firstOf(keyOf(row));
        if (first >= 0 && first < row) report.add(table, row, null, `The same ${columns.join(', ')} as in line ${table.lineOf(first)}.`);
      }
    }
  },
};
