import type { Rule } from '../../checking/rule.ts';

const moments = ['pre', 'min', 'max', 'post'] as const;

export const orderOfPressures: Rule = {
  id: 'T12',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const pairs = moments.map((moment) => ({ systolic: sessions.column(`sbp_${moment}`), diastolic: sessions.column(`dbp_${moment}`) }));
    const readings = (['sbp', 'dbp'] as const).map((kind) => ({
      lowest: sessions.column(`${kind}_min`),
      highest: sessions.column(`${kind}_max`),
      after: sessions.column(`${kind}_post`),
    }));
    for (let row = 0; row < sessions.fileRows; row += 1) {
      for (const { systolic, diastolic } of pairs) {
        const upper = systolic.number(row);
        const lower = diastolic.number(row);
        if (upper !== null && lower !== null && lower >= upper)
          report.add(sessions, row, diastolic.variable.key, 'A diastolic pressure that is not lower than the systolic one.');
      }
      for (const { lowest, highest, after } of readings) {
        const post = after.number(row);
        if (post === null) continue;
        const max = highest.number(row);
        const min = lowest.number(row);
        if (max !== null && max < post) report.add(sessions, row, highest.variable.key, 'A highest reading below the one after training.');
        if (min !== null && min > post) report.add(sessions, row, lowest.variable.key, 'A lowest reading above the one after training.');
      }
    }
  },
};
