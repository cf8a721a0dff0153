import type { Rule } from '../../checking/rule.ts';

export const walkingWithinUpright: Rule = {
  id: 'T11',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const upright = sessions.column('upright_min');
    for (let row = 0; row < sessions.fileRows; row += 1) {
      const uprightMin = upright.number(row);
      if (uprightMin === null) continue;
      const sums = submission.boutSums(row);
      if (sums && sums.walkingMin > uprightMin + 1e-9) report.add(sessions, row, 'upright_min', 'More time walking than upright.');
    }
  },
};
