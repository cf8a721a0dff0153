import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const fullMotor = limitOf('C13', 'fullMotor');
const fullSensory = limitOf('C13', 'fullSensory');

export const gradeEIsFull: Rule = {
  id: 'C13',
  evaluate: ({ exams }, report) => {
    const { table } = exams;
    const recorded = table.column('recorded_ais');
    for (let row = 0; row < table.fileRows; row += 1) {
      if (recorded.word(row) !== 'E') continue;
      // A cell with two stars counts as normal whatever was examined, so that the totals say nothing then.
      if (exams.scoreColumns.some((column) => column.word(row)?.endsWith('**'))) continue;
      const totals = exams.classification(row)?.totals;
      if (!totals) continue;
      const expected = [
        [totals.uems, fullMotor],
        [totals.lems, fullMotor],
        [totals.lt, fullSensory],
        [totals.pp, fullSensory],
      ] as const;
      if (expected.some(([total, full]) => total !== full))
        report.add(table, row, 'recorded_ais', 'Grade E with scores that are not full.');
    }
  },
};
