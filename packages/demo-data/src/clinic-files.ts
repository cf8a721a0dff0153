/**
 * A month as the invented clinic has it in its own files: record numbers, names, dates, remarks and serial numbers beside what the registry
 * asks for. Prepared, it is the month of the other files.
 */
import { tableKeys, tableOf } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';
import type { Participant } from './people/participant.ts';
import type { Person } from './people/person.ts';
import type { ClinicMonth, DemoCell, DemoFiles, DemoRow } from './types.ts';

const dayLength = 86_400_000;

/** Headers of the columns that hold a date where the registry keeps a study day. */
export const dateHeaders: Readonly<Record<string, string>> = {
  session_day: 'Session date',
  exam_day: 'Exam date',
  assessment_day: 'Assessment date',
  event_day: 'Event date',
  resolved_day: 'Resolved date',
  signed_day: 'Signing date',
  valid_until_day: 'Valid until date',
};
/** What the clinic keeps as dates of birth and injury. */
const keptAsDates = ['participant', 'age_at_index', 'injury_year', 'days_injury_to_index'];

const givenNames = [
  'Ada',
  'Bela',
  'Corin',
  'Dilys',
  'Eamon',
  'Freya',
  'Goran',
  'Hanne',
  'Idris',
  'Jorun',
  'Keir',
  'Linnea',
  'Milan',
  'Nesta',
];
const surnames = [
  'Ashdown',
  'Birkholm',
  'Castellan',
  'Draycott',
  'Ellerby',
  'Fairhurst',
  'Grimsdal',
  'Hollis',
  'Ironside',
  'Jessop',
  'Kestrel',
];
const therapists = ['M. Okafor', 'J. Lindqvist', 'P. Tarn'];
const pick = (from: readonly string[], number: number): string => from[number % from.length] ?? '';

const isoOf = (day: number): string => new Date(day * dayLength).toISOString().slice(0, 10);
/** 26.03.2026, as the clinic writes dates. */
const written = (day: number): string => isoOf(day).split('-').reverse().join('.');

interface Known {
  readonly person: Person;
  readonly number: number;
}

const recordNumberOf = (number: number): string => `AR-${String(104_200 + number * 37)}`;

function ofPerson({ person, number }: Known): string[] {
  const { indexDay, age, daysSinceInjury } = person;
  return [
    pick(surnames, number * 7),
    pick(givenNames, number * 5),
    written(indexDay - Math.floor((age + 0.4) * 365.25)),
    written(indexDay - daysSinceInjury),
    written(indexDay),
    number % 3 === 0 ? 'Brought by a neighbour' : '',
  ];
}
const headersOfPerson = ['Surname', 'Given name', 'Date of birth', 'Date of injury', 'First training date', 'Remarks'];

const ofTraining = (line: number): string[] => [pick(therapists, line), `SN-${7_310 + (line % 4)}`];
const headersOfTraining = ['Therapist', 'Device serial no'];

const textOf = (value: DemoCell | undefined): string => (value === null || value === undefined ? '' : String(value));
const quoted = (cell: string): string => (/[",\r\n]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell);
const csvOf = (lines: readonly (readonly string[])[]): Uint8Array =>
  new TextEncoder().encode(lines.map((cells) => `${cells.map(quoted).join(',')}\r\n`).join(''));

function fileOf(table: TableKey, rows: readonly { readonly known: Known; readonly row: DemoRow }[]): Uint8Array {
  const { variables } = tableOf(table);
  const columns = variables.flatMap((variable, at) => (keptAsDates.includes(variable.key) ? [] : [{ variable, at }]));
  const header = ({ key, name }: Variable): string => dateHeaders[key] ?? name;
  const isOfPeople = table === 'participants';
  const lines = rows.map(({ known, row }, line) => {
    const cells = columns.map(({ variable, at }) => {
      const text = textOf(row[at]);
      return text === '' || dateHeaders[variable.key] === undefined ? text : written(known.person.indexDay + Number(text));
    });
    return [recordNumberOf(known.number), ...cells, ...(isOfPeople ? ofPerson(known) : ofTraining(line))];
  });
  return csvOf([
    ['Record number', ...columns.map(({ variable }) => header(variable)), ...(isOfPeople ? headersOfPerson : headersOfTraining)],
    ...lines,
  ]);
}

/** @param cohort Everybody of one site, in a lasting order. */
export function clinicFiles(cohort: readonly Participant[], month: string): ClinicMonth {
  const rows = new Map<TableKey, { known: Known; row: DemoRow }[]>();
  const people = [];
  for (const [number, { person, rows: own }] of cohort.entries()) {
    const known = { person, number };
    if (own.some((each) => each.month < month))
      people.push({ recordNumber: recordNumberOf(number), code: person.code, indexDate: isoOf(person.indexDay), age: person.age });
    for (const { table, row } of own.filter((each) => each.month === month)) rows.set(table, [...(rows.get(table) ?? []), { known, row }]);
  }
  const files: DemoFiles = Object.fromEntries(
    tableKeys.flatMap((table) => {
      const found = rows.get(table);
      return found ? [[table, fileOf(table, found)]] : [];
    }),
  );
  return { files, people };
}
