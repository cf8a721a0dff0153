import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

// The last digit of a speed such as 0.505 is not exact in binary.
const tolerance = limitOf('C06', 'toleranceMps') + 1e-9;

export const speedFromTime: Rule = {
  id: 'C06',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      const distance = visit.table.column('timed_distance_m');
      const time = visit.table.column('time_s');
      for (const { row, value } of [...visit.scored('tmwt_ss'), ...visit.scored('tmwt_fast')]) {
        const metres = distance.number(row);
        const seconds = time.number(row);
        if (metres === null || seconds === null || seconds <= 0) continue;
        if (Math.abs(value - metres / seconds) > tolerance)
          report.add(visit.table, row, 'value', 'A speed that differs from distance divided by time.');
      }
    }
  },
};
