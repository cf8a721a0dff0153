/**
 * Walking bouts fit into the time upright; bouts and the rests between them into the time upright and resting; and a
 * shortened session was not longer upright than it was planned to last. No file says how long a completed session lasted.
 */
import type { Rule } from '../../checking/rule.ts';

/** Times are often noted in whole minutes. */
const roundingMin = 0.5;

export const partsWithinTheSession: Rule = {
  id: 'T10',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const upright = sessions.column('upright_min');
    const resting = sessions.column('rest_min');
    const planned = sessions.column('planned_min');
    const status = sessions.column('status');
    for (let row = 0; row < sessions.fileRows; row += 1) {
      const uprightMin = upright.number(row);
      if (uprightMin === null) continue;
      const plannedMin = planned.number(row);
      if (status.word(row) === 'shortened' && plannedMin !== null && uprightMin > plannedMin) {
        report.add(sessions, row, 'upright_min', 'A shortened session with more time upright than was planned in all.');
      }
      const sums = submission.boutSums(row);
      if (!sums) continue;
      const restMin = resting.number(row);
      if (sums.walkingMin > uprightMin + roundingMin)
        report.add(sessions, row, 'upright_min', 'Bouts that together last longer than the time upright.');
      else if (restMin !== null && sums.walkingMin + sums.restsBetweenMin > uprightMin + restMin + 2 * roundingMin) {
        report.add(sessions, row, 'rest_min', 'Bouts and rests that overlap: together they last longer than the time upright and resting.');
      }
    }
  },
};
