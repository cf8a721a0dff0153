import { attendedSessions } from '../../checking/attended-sessions.ts';
import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const maxSessions = limitOf('T16', 'maxSessions');
const inDays = limitOf('T16', 'inDays');
const minHoursApart = limitOf('T16', 'minHoursApart');
const maxGapDays = limitOf('T16', 'maxGapDays');

export const spacingOfSessions: Rule = {
  id: 'T16',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const day = sessions.column('session_day');
    const hour = sessions.column('start_hour');
    const course = sessions.column('course_no');
    for (const attended of attendedSessions(submission)) {
      const dayAt = (index: number): number => day.number(attended[index] ?? -1) ?? 0;
      const lastOfCourse = new Map<number, number>();
      attended.forEach((row, index) => {
        const today = dayAt(index);
        if (index >= maxSessions && today - dayAt(index - maxSessions) < inDays) {
          report.add(sessions, row, 'session_day', `More than ${maxSessions} sessions in ${inDays} days.`);
        }

        const before = attended[index - 1];
        const hours = [row, before ?? -1].map((each) => hour.number(each));
        const [startHour, earlierHour] = hours;
        if (before !== undefined && startHour != null && earlierHour != null) {
          const apart = (today - dayAt(index - 1)) * 24 + startHour - earlierHour;
          if (apart < minHoursApart)
            report.addToOneOf(sessions, [row, before], 'start_hour', `Two sessions less than ${minHoursApart} hours apart.`);
        }

        const number = course.number(row);
        if (number === null) return;
        const previous = lastOfCourse.get(number);
        if (previous !== undefined && today - dayAt(previous) > maxGapDays) {
          report.addToOneOf(
            sessions,
            [row, attended[previous] ?? row],
            'session_day',
            `More than ${maxGapDays} days without a session within a course.`,
          );
        }
        lastOfCourse.set(number, index);
      });
    }
  },
};
