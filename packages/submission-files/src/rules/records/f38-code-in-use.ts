import { tableKeys } from '@cairnstep/dictionary';
import type { Rule } from '../../checking/rule.ts';

/** One finding for each participant and table. A code that was replaced would make a second person of the one it belonged to. */
export const codeInUse: Rule = {
  id: 'F38',
  evaluate: (submission, report) => {
    const replaced = new Set([...(submission.context.replaced ?? [])].map((code) => submission.persons.number(code)));
    if (replaced.size === 0) return;
    for (const key of tableKeys) {
      const table = submission.table(key);
      const told = new Set<number>();
      for (let row = 0; row < table.fileRows; row += 1) {
        const person = table.personOf(row);
        if (!replaced.has(person) || told.has(person)) continue;
        told.add(person);
        report.add(table, row, 'participant', 'A participant code that was replaced by another one.');
      }
    }
  },
};
