import type { Rule } from '../../checking/rule.ts';

export const stepsAndDistance: Rule = {
  id: 'T03',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const distance = bouts.column('distance_m');
    const duration = bouts.column('duration_s');
    const steps = bouts.column('steps');
    const surface = bouts.column('surface');
    for (let row = 0; row < bouts.fileRows; row += 1) {
      const metres = distance.number(row);
      if (metres === null) continue;
      if (metres > 0 && !(Number(duration.number(row)) > 0)) report.add(bouts, row, 'duration_s', 'A distance without a duration.');
      const walkedOn = surface.word(row);
      if (metres === 0 && Number(steps.number(row)) > 0 && walkedOn !== null && walkedOn !== 'treadmill') {
        report.add(bouts, row, 'distance_m', 'Steps overground without any distance.');
      }
    }
  },
};
