import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const fromLying = { systolic: limitOf('A04', 'systolicDropMmHg'), diastolic: limitOf('A04', 'diastolicDropMmHg') };
const fromSitting = { systolic: limitOf('A04', 'systolicDropFromSittingMmHg'), diastolic: limitOf('A04', 'diastolicDropFromSittingMmHg') };

export const hypotensionDrop: Rule = {
  id: 'A04',
  evaluate: (submission, report) => {
    const events = submission.table('adverse_events');
    const kind = events.column('kind');
    const systolic = events.column('sbp_drop');
    const diastolic = events.column('dbp_drop');
    const before = events.column('start_posture');
    for (let row = 0; row < events.fileRows; row += 1) {
      if (kind.word(row) !== 'orthostatic_hypotension') continue;
      const upper = systolic.number(row);
      const lower = diastolic.number(row);
      if (upper === null && lower === null) continue;
      const limits = before.word(row) === 'sitting' ? fromSitting : fromLying;
      if ((upper ?? 0) >= limits.systolic || (lower ?? 0) >= limits.diastolic) continue;
      report.add(
        events,
        row,
        upper === null ? 'dbp_drop' : 'sbp_drop',
        `A drop below ${limits.systolic} mmHg systolic and ${limits.diastolic} diastolic.`,
      );
    }
  },
};
