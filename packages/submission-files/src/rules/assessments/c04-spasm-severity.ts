import type { Rule } from '../../checking/rule.ts';

export const spasmSeverity: Rule = {
  id: 'C04',
  evaluate: ({ visits }, report) => {
    for (const visit of visits) {
      for (const frequency of visit.scored('psfs_freq')) {
        const severity = visit.scored('psfs_severity').find(({ trial }) => trial === frequency.trial);
        if (frequency.value === 0 && severity) {
          report.addToOneOf(visit.table, [severity.row, frequency.row], 'value', 'A severity of spasms although there are none.');
        }
        if (frequency.value > 0 && !severity)
          report.add(visit.table, frequency.row, 'value', 'A frequency of spasms without their severity.');
      }
    }
  },
};
