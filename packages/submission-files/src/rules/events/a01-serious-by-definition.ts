import type { Rule } from '../../checking/rule.ts';

const seriousGrades = new Set(['4', '5']);

export const seriousByDefinition: Rule = {
  id: 'A01',
  evaluate: (submission, report) => {
    const events = submission.table('adverse_events');
    const serious = events.column('serious');
    const severity = events.column('severity');
    const kind = events.column('kind');
    for (let row = 0; row < events.fileRows; row += 1) {
      if (serious.word(row) !== 'no') continue;
      if (seriousGrades.has(severity.word(row) ?? ''))
        report.add(events, row, 'serious', 'An event of severity 4 or 5 marked as not serious.');
      else if (kind.word(row) === 'fracture') report.add(events, row, 'serious', 'A fracture marked as not serious.');
    }
  },
};
