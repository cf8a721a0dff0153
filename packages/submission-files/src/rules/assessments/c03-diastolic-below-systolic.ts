import type { Rule } from '../../checking/rule.ts';

export const diastolicBelowSystolic: Rule = {
  id: 'C03',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      const posture = visit.table.column('posture');
      for (const diastolic of visit.scored('dbp')) {
        const isSameReading = (row: number, trial: number | null): boolean =>
          trial === diastolic.trial && posture.word(row) === posture.word(diastolic.row);
        const systolic = visit.scored('sbp').find(({ row, trial }) => isSameReading(row, trial));
        if (systolic && diastolic.value >= systolic.value) {
          report.addToOneOf(
            visit.table,
            [diastolic.row, systolic.row],
            'value',
            'A diastolic pressure that is not lower than the systolic one.',
          );
        }
      }
    }
  },
};
