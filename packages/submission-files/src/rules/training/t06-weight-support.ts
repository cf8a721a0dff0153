import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const tolerancePoints = limitOf('T06', 'tolerancePoints') + 1e-9;
const maxPercent = limitOf('T06', 'maxPercent');

export const weightSupport: Rule = {
  id: 'T06',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const kilograms = bouts.column('bws_kg');
    const percent = bouts.column('bws_pct');
    const mass = submission.table('sessions').column('body_mass_kg');
    const { sessionOfBout } = submission;
    for (let row = 0; row < bouts.fileRows; row += 1) {
      const support = kilograms.number(row);
      if (support === null) continue;
      const session = sessionOfBout[row] ?? -1;
      const body = session < 0 ? null : mass.number(session);
      if (!body) continue;
      const computed = (100 * support) / body;
      const given = percent.number(row);
      if (computed > maxPercent) report.add(bouts, row, 'bws_kg', 'More weight support than the person weighs.');
      else if (given !== null && Math.abs(given - computed) > tolerancePoints)
        report.add(bouts, row, 'bws_pct', 'Weight support in per cent that does not fit kilograms and body mass.');
    }
  },
};
