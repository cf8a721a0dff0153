/** Which table a file is of, by its name. */
import type { TableKey } from './submissions.queries.ts';

const words: readonly (readonly [TableKey, RegExp])[] = [
  ['participants', /\bparticipants?\b/],
  ['consents', /\bconsents?\b/],
  ['exams', /\b(exams?|examinations?|isncsci)\b/],
  ['assessments', /\bassessments?\b/],
  ['sessions', /\bsessions?\b/],
  ['bouts', /\bbouts?\b/],
  ['adverse_events', /\b(adverse )?events?\b/],
];

/** `S01_2026-11_Adverse-Events.csv` is of adverse events; `null` when the name fits no table, or more than one. */
export function recogniseTable(fileName: string): TableKey | null {
  const name = fileName
    .replace(/\.[^.]*$/, '')
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase()
    .replace(/[^a-z]+/g, ' ');
  const [first, ...others] = words.filter(([, word]) => word.test(name));
  return first === undefined || others.length > 0 ? null : first[0];
}
