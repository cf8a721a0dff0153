import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const riseMmHg = limitOf('A03', 'riseMmHg');

export const dysreflexiaRise: Rule = {
  id: 'A03',
  evaluate: (submission, report) => {
    const events = submission.table('adverse_events');
    const kind = events.column('kind');
    const rise = events.column('sbp_rise');
    for (let row = 0; row < events.fileRows; row += 1) {
      const rose = rise.number(row);
      if (kind.word(row) === 'autonomic_dysreflexia' && rose !== null && rose < riseMmHg)
        report.add(events, row, 'sbp_rise', `A rise below ${riseMmHg} mmHg.`);
    }
  },
};
