import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const systolicDrop = limitOf('T14', 'systolicDropMmHg');
const diastolicDrop = limitOf('T14', 'diastolicDropMmHg');
const withinMinutes = limitOf('T14', 'withinMinutes');
const upright = new Set(['standing', 'in_device']);

export const pressureDropDecided: Rule = {
  id: 'T14',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const posture = sessions.column('bp_min_posture');
    const minute = sessions.column('bp_min_minute');
    const decision = sessions.column('hypotension_decision');
    const drops = [
      { before: sessions.column('sbp_pre'), lowest: sessions.column('sbp_min'), limit: systolicDrop },
      { before: sessions.column('dbp_pre'), lowest: sessions.column('dbp_min'), limit: diastolicDrop },
    ];
    for (let row = 0; row < sessions.fileRows; row += 1) {
      if (!decision.isEmpty(row) || !upright.has(posture.word(row) ?? '')) continue;
      // A drop at an unknown minute may have been within three, and asking costs little.
      if ((minute.number(row) ?? 0) > withinMinutes) continue;
      const dropped = drops.some(({ before, lowest, limit }) => {
        const pre = before.number(row);
        const min = lowest.number(row);
        return pre !== null && min !== null && pre - min >= limit;
      });
      if (dropped)
        report.add(sessions, row, 'hypotension_decision', 'A drop of pressure on standing without a decision on orthostatic hypotension.');
    }
  },
};
