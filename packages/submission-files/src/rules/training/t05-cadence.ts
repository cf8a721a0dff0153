import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const minPerMinute = limitOf('T05', 'minPerMinute');
const maxPerMinute = limitOf('T05', 'maxPerMinute');

export const cadence: Rule = {
  id: 'T05',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const duration = bouts.column('duration_s');
    const steps = bouts.column('steps');
    for (let row = 0; row < bouts.fileRows; row += 1) {
      const seconds = duration.number(row);
      const count = steps.number(row);
      if (!count || seconds === null || seconds <= 0) continue;
      const perMinute = (count * 60) / seconds;
      if (perMinute < minPerMinute) report.add(bouts, row, 'steps', `Fewer than ${minPerMinute} steps in a minute.`);
      if (perMinute > maxPerMinute) report.add(bouts, row, 'steps', `More than ${maxPerMinute} steps in a minute.`);
    }
  },
};
