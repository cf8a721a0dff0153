import type { Rule } from '../../checking/rule.ts';
import { firstTrainingDays } from '../../checking/first-training-days.ts';

export const orderOfAssessments: Rule = {
  id: 'C18',
  evaluate: (submission, report) => {
    const assessments = submission.table('assessments');
    const day = assessments.column('assessment_day');
    const timepoint = assessments.column('timepoint');
    const course = assessments.column('course_no');
    const firstDay = firstTrainingDays(submission);
    for (let row = 0; row < assessments.fileRows; row += 1) {
      const assessed = day.number(row);
      const person = assessments.personOf(row);
      if (assessed === null || person < 0) continue;
      const injured = submission.injuryDay(person);
      if (injured !== null && assessed < injured) report.add(assessments, row, 'assessment_day', 'An assessment before the injury.');
      const first = firstDay(person, course.number(row));
      if (first === null) continue;
      const point = timepoint.word(row);
      if (point === 'baseline' && assessed > first)
        report.add(assessments, row, 'timepoint', 'A baseline after the first session of its course.');
      if (point === 'end_of_course' && assessed < first)
        report.add(assessments, row, 'timepoint', 'An end-of-course assessment before the first session of its course.');
    }
  },
};
