import type { Rule } from '../../checking/rule.ts';

export const normalButForTheAnus: Rule = {
  id: 'E04',
  evaluate: ({ exams }, report) => {
    const { table } = exams;
    const fields = [
      { code: 'normal-without-contraction', column: 'vac' },
      { code: 'normal-without-pressure', column: 'dap' },
    ] as const;
    for (let row = 0; row < table.fileRows; row += 1) {
      const warnings = exams.classification(row)?.warnings ?? [];
      for (const { code, column } of fields) {
        if (warnings.some((warning) => warning.code === code))
          report.add(table, row, column, 'No for this answer although every other cell is normal.');
      }
    }
  },
};
