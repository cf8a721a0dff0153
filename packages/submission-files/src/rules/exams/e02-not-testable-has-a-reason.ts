import type { Rule } from '../../checking/rule.ts';

export const notTestableHasAReason: Rule = {
  id: 'E02',
  evaluate: ({ exams }, report) => {
    const { table, scoreColumns } = exams;
    const reason = table.column('nt_reason');
    const answers = [table.column('vac'), table.column('dap')];
    for (let row = 0; row < table.fileRows; row += 1) {
      if (reason.isEmpty(row) && [...scoreColumns, ...answers].some((column) => column.word(row)?.startsWith('NT'))) {
        report.add(table, row, 'nt_reason', 'A cell marked NT without a reason.');
      }
    }
  },
};
