import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const toleranceMps = limitOf('T02', 'toleranceMps');
const toleranceShare = limitOf('T02', 'tolerancePercent') / 100;

export const treadmillSpeed: Rule = {
  id: 'T02',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const distance = bouts.column('distance_m');
    const duration = bouts.column('duration_s');
    const belt = bouts.column('treadmill_speed_mps');
    for (let row = 0; row < bouts.fileRows; row += 1) {
      const speed = belt.number(row);
      const metres = distance.number(row);
      const seconds = duration.number(row);
      if (speed === null || metres === null || seconds === null || seconds <= 0) continue;
      const allowed = Math.max(toleranceMps, toleranceShare * speed) + 1e-9;
      if (Math.abs(metres / seconds - speed) > allowed)
        report.add(bouts, row, 'treadmill_speed_mps', 'A treadmill speed that does not fit distance and duration.');
    }
  },
};
