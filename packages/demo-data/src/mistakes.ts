/**
 * Mistakes that clinics make, put into one month's files: a unit mistaken, a digit too many, a row forgotten or doubled, cells
 * swapped or left empty. Each breaks one rule at a known place; what else the same mistake can break is named with it.
 */
import { tableKeys } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { FileDraft } from './file-draft.ts';
import type { CellText } from './file-draft.ts';
import type { DemoFiles, PlantedMistake } from './types.ts';

interface Mistake extends Pick<PlantedMistake, 'what' | 'table' | 'column' | 'rule'> {
  readonly also?: readonly string[];
  readonly suits: (cell: CellText) => boolean;
  /** Changes the row; returns the row of the finding when it is another one. */
  readonly make: (file: FileDraft, row: number) => number | void;
}

const metresInAFoot = 0.3048;

const isFilled = (cell: CellText, ...columns: readonly string[]): boolean => columns.every((column) => cell(column) !== '');
const isEmpty = (cell: CellText, ...columns: readonly string[]): boolean => columns.every((column) => cell(column) === '');
const isDriven = (cell: CellText): boolean => cell('device_class') === 'treadmill_driven_orthosis' && isFilled(cell, 'steps', 'distance_m');
const isCompleted = (cell: CellText): boolean =>
  cell('status') === 'completed' && isFilled(cell, 'distance_total_m', 'sbp_post', 'dbp_post');

function swap(file: FileDraft, row: number, one: string, other: string): void {
  const [first, second] = [file.cell(row, one), file.cell(row, other)];
  file.write(row, one, second);
  file.write(row, other, first);
}

/** A wrong grade in place of the right one, chosen so that it contradicts nothing but the cells as a whole. */
const takenFor: Readonly<Record<string, string>> = { A: 'C', C: 'D', D: 'C' };

const mistakes: readonly Mistake[] = [
  {
    what: 'a code that is not in the list',
    table: 'participants',
    column: 'sex',
    rule: 'F11',
    suits: () => true,
    make: (file, row) => file.write(row, 'sex', 'm'),
  },
  {
    what: 'a recorded grade that the cells do not give',
    table: 'exams',
    column: 'recorded_ais',
    rule: 'E09',
    suits: (cell) => cell('recorded_ais') in takenFor,
    make: (file, row) => file.write(row, 'recorded_ais', takenFor[file.cell(row, 'recorded_ais')] ?? ''),
  },
  {
    what: 'a cell of the neurological exam left empty',
    table: 'exams',
    column: 'pp_l_l3',
    rule: 'F20',
    suits: (cell) => Number(cell('exam_day')) < 0,
    make: (file, row) => file.write(row, 'pp_l_l3', ''),
  },
  {
    what: 'a total that is not the sum of its parts',
    table: 'assessments',
    column: 'value',
    rule: 'C01',
    suits: (cell) => cell('measure') === 'scim3_total' && isFilled(cell, 'value') && Number(cell('value')) <= 90,
    make: (file, row) => file.write(row, 'value', String(Number(file.cell(row, 'value')) + 9)),
  },
  {
    what: 'an assessment before the course marked as its end',
    table: 'assessments',
    column: 'timepoint',
    rule: 'C18',
    suits: (cell) => cell('measure') === 'pain_nrs' && cell('timepoint') === 'baseline' && Number(cell('assessment_day')) < 0,
    make: (file, row) => file.write(row, 'timepoint', 'end_of_course'),
  },
  {
    what: 'a value that cannot exist',
    table: 'sessions',
    column: 'pain_post',
    rule: 'F21',
    suits: isCompleted,
    make: (file, row) => file.write(row, 'pain_post', '12'),
  },
  {
    what: 'a shortened session without a reason',
    table: 'sessions',
    column: 'not_trained_reason',
    rule: 'F20',
    suits: isCompleted,
    make: (file, row) => file.write(row, 'status', 'shortened'),
  },
  {
    what: 'systolic and diastolic pressure swapped',
    table: 'sessions',
    column: 'dbp_post',
    rule: 'T12',
    also: ['F22'],
    suits: (cell) => isCompleted(cell) && isEmpty(cell, 'sbp_min', 'sbp_max'),
    make: (file, row) => swap(file, row, 'sbp_post', 'dbp_post'),
  },
  {
    what: 'a decimal comma among decimal points',
    table: 'sessions',
    column: 'distance_total_m',
    rule: 'F14',
    suits: isCompleted,
    make: (file, row) => {
      const metres = Math.floor(Number(file.cell(row, 'distance_total_m')));
      file.write(row, 'distance_total_m', `${metres},5`);
    },
  },
  {
    what: 'a session entered twice',
    table: 'sessions',
    column: null,
    rule: 'F30',
    suits: isCompleted,
    make: (file, row) => file.repeat(row),
  },
  {
    what: 'a distance in feet in the column for metres',
    table: 'bouts',
    column: 'treadmill_speed_mps',
    rule: 'T02',
    also: ['T04', 'F35'],
    suits: isDriven,
    make: (file, row) => file.write(row, 'distance_m', (Number(file.cell(row, 'distance_m')) / metresInAFoot).toFixed(1)),
  },
  {
    what: 'a duration in minutes in the column for seconds',
    table: 'bouts',
    column: 'distance_m',
    rule: 'T01',
    also: ['F22', 'T02', 'T05'],
    suits: (cell) => isDriven(cell) && Number(cell('duration_s')) > 120,
    make: (file, row) => file.write(row, 'duration_s', String(Math.round(Number(file.cell(row, 'duration_s')) / 60))),
  },
  {
    what: 'a bout of a session that nobody entered',
    table: 'bouts',
    column: 'session_no',
    rule: 'R02',
    also: ['F35'],
    suits: isDriven,
    make: (file, row) => file.write(row, 'session_no', String(Number(file.cell(row, 'session_no')) + 60)),
  },
  {
    what: 'control by the own muscle signal in a device that reads none',
    table: 'bouts',
    column: 'hip_r_control',
    rule: 'T08',
    also: ['T17'],
    suits: isDriven,
    make: (file, row) => file.write(row, 'hip_r_control', 'volitional'),
  },
];

/** The first row has the decimal mark that the rest of the file is held to, so it stays as it is. */
const keepsTheMark: ReadonlySet<TableKey> = new Set<TableKey>(['sessions', 'bouts']);

const undeclared = {
  what: 'a column of remarks, which no table has',
  table: 'assessments',
  line: 1,
  column: 'remarks',
  rule: 'F06',
  also: [],
} as const satisfies PlantedMistake;

/**
 * @returns the files with the mistakes in them, and a list of what is where. A mistake that no row suits is left out of both.
 * @throws Error when there is no file of assessments, sessions or bouts
 */
export function plantMistakes(files: DemoFiles): { readonly mistakes: DemoFiles; readonly planted: readonly PlantedMistake[] } {
  const drafts = new Map(tableKeys.flatMap((key) => (files[key] ? [[key, new FileDraft(key, files[key])] as const] : [])));
  const draftOf = (table: TableKey): FileDraft => {
    const draft = drafts.get(table);
    if (!draft) throw new Error(`There is no file of ${table}.`);
    return draft;
  };
  for (const table of keepsTheMark) draftOf(table).choose(() => true);

  const planted = mistakes.flatMap(({ suits, make, also = [], ...mistake }): PlantedMistake[] => {
    const file = drafts.get(mistake.table);
    const row = file?.choose(suits);
    if (!file || row === undefined) return [];
    return [{ ...mistake, also, line: file.lineOf(make(file, row) ?? row) }];
  });
  draftOf(undeclared.table).addColumn(undeclared.column, (row) => (row === 0 ? 'new shoes' : ''));
  return {
    mistakes: Object.fromEntries([...drafts].map(([key, draft]) => [key, draft.bytes()])),
    planted: [...planted, undeclared],
  };
}
