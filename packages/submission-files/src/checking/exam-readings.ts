/** Neurological exams of the submission and the registry, classified once and found by participant and day. */
import { classify, keyMuscles, sensorySegments } from '@cairnstep/scoring';
import type { Classification, Exam, KeyMuscle, Observation, SensorySegment, SideExam } from '@cairnstep/scoring';
import type { TypedColumn } from '../table/typed-table.ts';
import type { CheckedTable } from './checked-table.ts';
import type { RowGroups } from './row-groups.ts';
import type { Submission } from './submission.ts';

type SideLetter = 'r' | 'l';
type CellColumns<Segment extends string> = readonly (readonly [Segment, TypedColumn])[];

interface SideColumns {
  readonly lightTouch: CellColumns<SensorySegment>;
  readonly pinPrick: CellColumns<SensorySegment>;
  readonly motor: CellColumns<KeyMuscle>;
  readonly nonKey: TypedColumn;
}

/** The exam days of one participant in order, and the row of each. */
interface ExamDays {
  readonly days: readonly number[];
  readonly rows: readonly number[];
}

/** How many of the sorted whole days are not after this one. */
function countUpTo(days: readonly number[], day: number): number {
  let low = 0;
  let high = days.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((days[middle] ?? Infinity) <= day) low = middle + 1;
    else high = middle;
  }
  return low;
}

const observed: Readonly<Record<string, Observation>> = { yes: 'Yes', no: 'No', NT: 'NT' };

function cells<Segment extends string>(columns: CellColumns<Segment>, row: number): Record<Segment, string> | null {
  const written = columns.map(([segment, column]) => [segment, column.word(row)] as const);
  return written.every(([, word]) => word !== null) ? (Object.fromEntries(written) as Record<Segment, string>) : null;
}

export class ExamReadings {
  readonly table: CheckedTable;
  private readonly sides: Readonly<Record<SideLetter, SideColumns>>;
  private readonly byPerson: RowGroups;
  private readonly days = new Map<number, ExamDays>();
  private readonly classified = new Map<number, Classification | null>();

  constructor(submission: Submission) {
    this.table = submission.table('exams');
    this.byPerson = submission.rowsByPerson('exams');
    this.sides = { r: this.sideColumns('r'), l: this.sideColumns('l') };
  }

  private sideColumns(side: SideLetter): SideColumns {
    const column = (prefix: string, segment: string): TypedColumn => this.table.column(`${prefix}_${side}_${segment.toLowerCase()}`);
    return {
      lightTouch: sensorySegments.map((segment) => [segment, column('lt', segment)]),
      pinPrick: sensorySegments.map((segment) => [segment, column('pp', segment)]),
      motor: keyMuscles.map((segment) => [segment, column('m', segment)]),
      nonKey: this.table.column(`non_key_${side}`),
    };
  }

  /** Every column of scores, sensory and motor, both sides. */
  get scoreColumns(): readonly TypedColumn[] {
    return Object.values(this.sides).flatMap(({ lightTouch, pinPrick, motor }) =>
      [...lightTouch, ...pinPrick, ...motor].map(([, column]) => column),
    );
  }

  /** The exam in a row, or null when a cell of it is empty. */
  exam(row: number): Exam | null {
    const right = this.side('r', row);
    const left = this.side('l', row);
    const vac = observed[this.table.column('vac').word(row) ?? ''];
    const dap = observed[this.table.column('dap').word(row) ?? ''];
    if (!right || !left || !vac || !dap) return null;
    return { right, left, vac, dap, earlierDeficit: this.table.column('earlier_deficit').word(row) === 'yes' };
  }

  private side(letter: SideLetter, row: number): SideExam | null {
    const columns = this.sides[letter];
    const lightTouch = cells(columns.lightTouch, row);
    const pinPrick = cells(columns.pinPrick, row);
    const motor = cells(columns.motor, row);
    if (!lightTouch || !pinPrick || !motor) return null;
    const nonKey = columns.nonKey.word(row) as KeyMuscle | null;
    return { lightTouch, pinPrick, motor, ...(nonKey === null ? {} : { nonKey }) };
  }

  /** The classification of the exam in a row, or null when a cell of it is empty. */
  classification(row: number): Classification | null {
    let known = this.classified.get(row);
    if (known === undefined) {
      const exam = this.exam(row);
      this.classified.set(row, (known = exam && classify(exam)));
    }
    return known;
  }

  dayOf(row: number): number | null {
    return this.table.column('exam_day').number(row);
  }

  /** Rows of a participant's exams whose day lies between the two, both included, by day; of several on a day the last. */
  between(person: number, from: number, to: number): number[] {
    const { days, rows } = this.ofPerson(person);
    return rows.slice(countUpTo(days, from - 1), countUpTo(days, to));
  }

  /** The last exam of a participant between the two days, or null. */
  lastBetween(person: number, from: number, to: number): number | null {
    const { days, rows } = this.ofPerson(person);
    const last = countUpTo(days, to) - 1;
    return last >= 0 && (days[last] ?? -Infinity) >= from ? (rows[last] ?? null) : null;
  }

  private ofPerson(person: number): ExamDays {
    let known = this.days.get(person);
    if (!known) {
      const rowOfDay = new Map<number, number>();
      for (const row of this.byPerson.rowsOf(person)) {
        const day = this.dayOf(row);
        if (day !== null) rowOfDay.set(day, row);
      }
      const sorted = [...rowOfDay].sort(([a], [b]) => a - b);
      this.days.set(person, (known = { days: sorted.map(([day]) => day), rows: sorted.map(([, row]) => row) }));
    }
    return known;
  }
}
