import type { Submission } from './submission.ts';

const trained = new Set(['completed', 'shortened']);

/** The day of a participant's first session that took place in a course; null when no such session is known. */
export function firstTrainingDays(submission: Submission): (person: number, course: number | null) => number | null {
  const sessions = submission.table('sessions');
  const day = sessions.column('session_day');
  const course = sessions.column('course_no');
  const status = sessions.column('status');
  const first = new Map<string, number>();
  const keyOf = (person: number, number: number | null): string => `${person} ${number ?? ''}`;
  for (let row = 0; row < sessions.length; row += 1) {
    const trainedOn = day.number(row);
    if (trainedOn === null || !trained.has(status.word(row) ?? '')) continue;
    const key = keyOf(sessions.personOf(row), course.number(row));
    first.set(key, Math.min(trainedOn, first.get(key) ?? Infinity));
  }
  return (person, number) => first.get(keyOf(person, number)) ?? null;
}
