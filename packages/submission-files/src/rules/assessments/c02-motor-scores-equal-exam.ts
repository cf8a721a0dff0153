import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const withinDays = limitOf('C02', 'examWithinDays');

export const motorScoresEqualExam: Rule = {
  id: 'C02',
  evaluate: ({ visits, exams }, report) => {
    for (const visit of visits) {
      for (const measure of ['lems', 'uems'] as const) {
        for (const { row, value } of visit.scored(measure)) {
          const sums = exams
            .between(visit.person, visit.day - withinDays, visit.day + withinDays)
            .map((exam) => exams.classification(exam)?.totals[measure])
            .filter((sum) => typeof sum === 'number');
          // Of two exams in the window either may be the one the score was taken from.
          if (sums.length > 0 && !sums.includes(value))
            report.add(visit.table, row, 'value', 'A motor score that differs from the key muscles of the exam.');
        }
      }
    }
  },
};
