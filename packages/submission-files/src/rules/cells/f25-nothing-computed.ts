import { findMeasure } from '@cairnstep/dictionary';
import type { Rule } from '../../checking/rule.ts';

export const nothingComputed: Rule = {
  id: 'F25',
  evaluate: (submission, report) => {
    const assessments = submission.table('assessments');
    const measure = assessments.column('measure');
    for (let row = 0; row < assessments.fileRows; row += 1) {
      const named = measure.word(row);
      if (named !== null && findMeasure(named)?.entered === false)
        report.add(assessments, row, 'measure', 'A result that the registry computes.');
    }
  },
};
