import { dataTables, latestConsents } from '../../checking/consents-in-force.ts';
import type { Rule } from '../../checking/rule.ts';

/** One finding for each participant, at the first row of data. A participant without any data may be sent before the consent. */
export const consentInForce: Rule = {
  id: 'F31',
  evaluate: (submission, report) => {
    const status = submission.table('consents').column('status');
    const latest = latestConsents(submission);
    const told = new Set<number>();
    for (const key of dataTables) {
      const table = submission.table(key);
      for (let row = 0; row < table.fileRows; row += 1) {
        const person = table.personOf(row);
        if (person < 0 || told.has(person)) continue;
        told.add(person);
        const consent = latest(person);
        const found =
          consent < 0 ? 'Data of a participant without any consent.' : 'Data of a participant whose last consent is not in force.';
        if (consent < 0 || status.word(consent) !== 'active') report.add(table, row, 'participant', found);
      }
    }
  },
};
