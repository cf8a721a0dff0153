import { tableKeys } from '@cairnstep/dictionary';
import { conditionTest } from '../../checking/conditions.ts';
import { measureOfRow } from '../../checking/measure-of-row.ts';
import type { Rule } from '../../checking/rule.ts';

export const emptyWhereNotApplicable: Rule = {
  id: 'F24',
  evaluate: (submission, report) => {
    for (const key of tableKeys) {
      const table = submission.table(key);
      for (const column of table.columns) {
        const { emptyUnless, key: name } = column.variable;
        if (!emptyUnless) continue;
        const applies = conditionTest(table, emptyUnless);
        const naming = table.column(emptyUnless.column);
        for (let row = 0; row < table.fileRows; row += 1) {
          if (column.cell(row) === null || applies(row) || naming.isUnreadable(row)) continue;
          report.add(table, row, name, `A value although ${emptyUnless.column} says that there is none.`);
        }
      }
    }

    const assessments = submission.table('assessments');
    const value = assessments.column('value');
    const status = assessments.column('attempt_status');
    const measure = measureOfRow(assessments, value.variable);
    for (let row = 0; row < assessments.fileRows; row += 1) {
      if (value.number(row) === null || status.word(row) !== 'stopped_early' || measure?.(row)?.scoredWhenStoppedEarly !== false) continue;
      report.add(assessments, row, 'value', 'A result of a test that was stopped early and has none then.');
    }
  },
};
