import { jointControls } from '../../checking/joint-controls.ts';
import type { Rule } from '../../checking/rule.ts';

export const controlAndDevice: Rule = {
  id: 'T08',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const device = bouts.column('device_class');
    const stimulation = bouts.column('stim_on');
    const controls = jointControls(bouts);
    for (let row = 0; row < bouts.fileRows; row += 1) {
      const used = device.word(row);
      for (const control of controls) {
        const followed = control.word(row);
        if (followed === 'volitional' && used !== 'signal_driven_exoskeleton') {
          report.add(bouts, row, control.variable.key, 'Volitional control in a device that reads no muscle signal.');
        }
        if (followed === 'stimulated' && used !== 'fes_walking' && stimulation.word(row) !== 'yes') {
          report.add(bouts, row, control.variable.key, 'Stimulated control without stimulation.');
        }
      }
    }
  },
};
