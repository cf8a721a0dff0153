import type { Submission } from './submission.ts';

/** The row of a participant's consent that counts: the one with the highest number; -1 when there is none. */
export function latestConsents(submission: Submission): (person: number) => number {
  const number = submission.table('consents').column('consent_no');
  const known = new Map<number, number>();
  return (person) => {
    let latest = known.get(person);
    if (latest === undefined) {
      latest = submission
        .rowsByPerson('consents')
        .rowsOf(person)
        .reduce((kept, row) => (kept < 0 || Number(number.number(row)) >= Number(number.number(kept)) ? row : kept), -1);
      known.set(person, latest);
    }
    return latest;
  };
}

/** Tables whose rows are data about a person's training and health; participants and consents are what they rest on. */
export const dataTables = ['exams', 'assessments', 'sessions', 'bouts', 'adverse_events'] as const;
