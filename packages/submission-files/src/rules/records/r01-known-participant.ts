import { tableKeys } from '@cairnstep/dictionary';
import type { Rule } from '../../checking/rule.ts';

export const knownParticipant: Rule = {
  id: 'R01',
  evaluate: (submission, report) => {
    const known = submission.rowsByPerson('participants');
    for (const key of tableKeys) {
      const table = submission.table(key);
      if (key === 'participants') continue;
      for (let row = 0; row < table.fileRows; row += 1) {
        const person = table.personOf(row);
        if (person >= 0 && !known.has(person))
          report.add(table, row, 'participant', 'A code that is neither in the file of participants nor in the registry.');
      }
    }
  },
};
