import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const risePoints = limitOf('A06', 'risePoints');
const longerThanHours = limitOf('A06', 'longerThanHours');

export const painThatCounts: Rule = {
  id: 'A06',
  evaluate: (submission, report) => {
    const events = submission.table('adverse_events');
    const kind = events.column('kind');
    const rise = events.column('pain_rise');
    const lasted = events.column('pain_over_24h');
    for (let row = 0; row < events.fileRows; row += 1) {
      if (kind.word(row) !== 'pain_increase') continue;
      const rose = rise.number(row);
      if (rose !== null && rose < risePoints) report.add(events, row, 'pain_rise', `A rise of less than ${risePoints} points.`);
      if (lasted.word(row) === 'no')
        report.add(events, row, 'pain_over_24h', `A rise that did not last longer than ${longerThanHours} hours.`);
    }
  },
};
