import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const minM = limitOf('T04', 'minM');
const maxM = limitOf('T04', 'maxM');

export const stepLength: Rule = {
  id: 'T04',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const distance = bouts.column('distance_m');
    const steps = bouts.column('steps');
    for (let row = 0; row < bouts.fileRows; row += 1) {
      const metres = distance.number(row);
      const count = steps.number(row);
      if (!metres || !count) continue;
      const length = metres / count;
      if (length < minM) report.add(bouts, row, 'steps', `A step length below ${minM} m.`);
      if (length > maxM) report.add(bouts, row, 'steps', `A step length above ${maxM} m.`);
    }
  },
};
