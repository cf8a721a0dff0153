import type { Rule } from '../../checking/rule.ts';

/** What the clinic wrote agrees when it is among the results the exam allows; "not determined" agrees only when there are several. */
function agrees(recorded: string, possible: readonly string[]): boolean {
  return recorded === 'ND' ? possible.length > 1 : possible.includes(recorded);
}

export const recordedEqualsComputed: Rule = {
  id: 'E09',
  evaluate: ({ exams }, report) => {
    const { table } = exams;
    const grade = table.column('recorded_ais');
    const level = table.column('recorded_nli');
    for (let row = 0; row < table.fileRows; row += 1) {
      const recordedGrade = grade.word(row);
      const recordedLevel = level.word(row);
      if (recordedGrade === null && recordedLevel === null) continue;
      const computed = exams.classification(row);
      if (!computed) continue;
      if (recordedGrade !== null && !agrees(recordedGrade, computed.ais.values)) {
        report.add(table, row, 'recorded_ais', 'A recorded grade that differs from the one computed from the cells.');
      }
      if (recordedLevel !== null && !agrees(recordedLevel, computed.nli.values)) {
        report.add(table, row, 'recorded_nli', 'A recorded level that differs from the one computed from the cells.');
      }
    }
  },
};
