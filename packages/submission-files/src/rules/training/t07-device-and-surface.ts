import type { Rule } from '../../checking/rule.ts';

/** Devices that exist only on a treadmill, and devices that exist only off it; the classes not named may be used on either. */
const onTreadmill = new Set(['treadmill_driven_orthosis']);
const overground = new Set(['overground_powered_exoskeleton', 'overground_bws', 'conventional_overground']);

export const deviceAndSurface: Rule = {
  id: 'T07',
  evaluate: (submission, report) => {
    const bouts = submission.table('bouts');
    const device = bouts.column('device_class');
    const surface = bouts.column('surface');
    for (let row = 0; row < bouts.fileRows; row += 1) {
      const walkedOn = surface.word(row);
      const used = device.word(row);
      if (walkedOn === null || used === null) continue;
      if (onTreadmill.has(used) && walkedOn !== 'treadmill') report.add(bouts, row, 'surface', 'A treadmill device on another surface.');
      if (overground.has(used) && walkedOn === 'treadmill') report.add(bouts, row, 'surface', 'An overground device on a treadmill.');
    }
  },
};
