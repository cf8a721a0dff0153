import { dataTables, latestConsents } from '../../checking/consents-in-force.ts';
import type { Rule } from '../../checking/rule.ts';

/** One finding for each participant and table. A new consent in force, sent with the data, lifts the withdrawal. */
export const noDataAfterWithdrawal: Rule = {
  id: 'F32',
  evaluate: (submission, report) => {
    const consents = submission.table('consents');
    const status = consents.column('status');
    const latest = latestConsents(submission);
    const withdrawn = new Set([...submission.context.withdrawn].map((code) => submission.persons.number(code)));
    if (withdrawn.size === 0) return;
    for (const key of dataTables) {
      const table = submission.table(key);
      const told = new Set<number>();
      for (let row = 0; row < table.fileRows; row += 1) {
        const person = table.personOf(row);
        if (!withdrawn.has(person) || told.has(person)) continue;
        told.add(person);
        const consent = latest(person);
        const isRenewed = consent >= 0 && consents.isInFile(consent) && status.word(consent) === 'active';
        if (!isRenewed) report.add(table, row, 'participant', 'Data of a participant who has withdrawn.');
      }
    }
  },
};
