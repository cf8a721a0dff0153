import type { Rule } from '../../checking/rule.ts';

export const consentEndsAfterItBegins: Rule = {
  id: 'F37',
  evaluate: (submission, report) => {
    const consents = submission.table('consents');
    const signed = consents.column('signed_day');
    const until = consents.column('valid_until_day');
    for (let row = 0; row < consents.fileRows; row += 1) {
      const from = signed.number(row);
      const to = until.number(row);
      if (from !== null && to !== null && to < from)
        report.add(consents, row, 'valid_until_day', 'A consent that ends before it was signed.');
    }
  },
};
