import { jointControls } from '../../checking/joint-controls.ts';
import type { Rule } from '../../checking/rule.ts';

/** Both follow the person's own muscle signal, which can fade. */
const followsSignal = new Set(['volitional', 'volitional_threshold']);

export const fadingSignal: Rule = {
  id: 'T09',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const reason = bouts.column('stop_reason');
    const controls = jointControls(bouts);
    for (let row = 0; row < bouts.fileRows; row += 1) {
      if (reason.word(row) !== 'signal_fading') continue;
      if (!controls.some((control) => followsSignal.has(control.word(row) ?? '')))
        report.add(bouts, row, 'stop_reason', 'A fading signal although no joint followed one.');
    }
  },
};
