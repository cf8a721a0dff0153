import type { Rule } from '../../checking/rule.ts';

export const perianalAboveS3: Rule = {
  id: 'E05',
  evaluate: ({ exams }, report) => {
    const { table } = exams;
    const pairs = ['lt_r', 'lt_l', 'pp_r', 'pp_l'].map((prefix) => ({
      s3: table.column(`${prefix}_s3`),
      s45: table.column(`${prefix}_s4_5`),
    }));
    for (let row = 0; row < table.fileRows; row += 1) {
      for (const { s3, s45 } of pairs) {
        if (s45.word(row) === '2' && s3.word(row) === '0') report.add(table, row, s45.variable.key, 'Normal at S4-5 and absent at S3.');
      }
    }
  },
};
