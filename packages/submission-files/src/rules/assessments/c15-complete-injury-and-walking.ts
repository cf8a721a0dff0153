import type { Rule } from '../../checking/rule.ts';

const motorComplete = new Set<string>(['A', 'B']);

export const completeInjuryAndWalking: Rule = {
  id: 'C15',
  evaluate: ({ visits, exams }, report) => {
    for (const visit of visits) {
      const walks = visit.of('tmwt_ss', 'tmwt_fast').filter(({ inDevice, status }) => !inDevice && status === 'done');
      if (walks.length === 0) continue;
      const exam = exams.lastBetween(visit.person, -Infinity, visit.day);
      const grades = exam === null ? [] : (exams.classification(exam)?.ais.values ?? []);
      if (grades.length === 0 || !grades.every((grade) => motorComplete.has(grade))) continue;
      for (const { row } of walks)
        report.add(visit.table, row, 'in_device', 'A walk without the device by a person whose last exam is motor complete.');
    }
  },
};
