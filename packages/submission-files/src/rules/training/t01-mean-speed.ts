import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const maxMps = limitOf('T01', 'maxMps');

export const meanSpeed: Rule = {
  id: 'T01',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const distance = bouts.column('distance_m');
    const duration = bouts.column('duration_s');
    for (let row = 0; row < bouts.fileRows; row += 1) {
      const metres = distance.number(row);
      const seconds = duration.number(row);
      if (metres === null || seconds === null || seconds <= 0) continue;
      if (metres / seconds > maxMps) report.add(bouts, row, 'distance_m', `A mean speed above ${maxMps} m/s.`);
    }
  },
};
