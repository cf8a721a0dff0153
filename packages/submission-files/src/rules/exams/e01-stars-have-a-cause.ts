import type { Rule } from '../../checking/rule.ts';

export const starsHaveACause: Rule = {
  id: 'E01',
  evaluate: ({ exams }, report) => {
    const { table, scoreColumns } = exams;
    const cause = table.column('tag_cause');
    for (let row = 0; row < table.fileRows; row += 1) {
      if (cause.isEmpty(row) && scoreColumns.some((column) => column.word(row)?.endsWith('*'))) {
        report.add(table, row, 'tag_cause', 'A starred cell without the condition behind it.');
      }
    }
  },
};
