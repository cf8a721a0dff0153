/** Which table a file is of, by its name. */
import type { FileKey, TableKey } from './submissions.queries.ts';

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

export const isWorkbook = (fileName: string): boolean => /\.xlsx$/i.test(fileName);

/** The workbook by its ending, else the table by its name. */
export const recogniseFile = (fileName: string): FileKey | null => (isWorkbook(fileName) ? 'workbook' : recogniseTable(fileName));
