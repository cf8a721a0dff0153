/** Everything the rules look at: the tables of the files joined with what the registry holds, and the views that several rules share. */
import { tableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import type { RegistryContext, TypedTables } from '../registry-context.ts';
import { tableFromRows } from '../table/table-from-rows.ts';
import type { TypedTable } from '../table/typed-table.ts';
import { boutSums } from './bout-sums.ts';
import type { BoutSums } from './bout-sums.ts';
import { CheckedTable } from './checked-table.ts';
import { ExamReadings } from './exam-readings.ts';
import { Persons, keyNumbers } from './key-numbers.ts';
import { RowGroups } from './row-groups.ts';
import { visitsOf } from './visits.ts';
import type { Visit } from './visits.ts';

export class Submission {
  readonly persons = new Persons();
  private readonly joined = new Map<TableKey, CheckedTable>();
  private readonly byPerson = new Map<TableKey, RowGroups>();
  private readonly sessionKeys = new Map<TableKey, Float64Array>();
  private sessionGroups: RowGroups | null = null;
  private sessionRows: Int32Array | null = null;
  private sums: ((session: number) => BoutSums | null) | null = null;
  private visitList: readonly Visit[] | null = null;
  private examReadings: ExamReadings | null = null;

  constructor(
    private readonly files: TypedTables,
    readonly context: RegistryContext,
  ) {}

  table(key: TableKey): CheckedTable {
    let table = this.joined.get(key);
    if (!table) this.joined.set(key, (table = this.join(key)));
    return table;
  }

  private join(key: TableKey): CheckedTable {
    const file = this.files[key] ?? tableFromRows(key, []);
    const held = this.context.held[key];
    const table = held ? file.followedBy(held, this.notOverridden(file, held)) : file;
    const participant = table.column('participant');
    const persons = new Int32Array(table.length).fill(-1);
    for (let row = 0; row < table.length; row += 1) {
      const code = participant.word(row);
      if (code !== null) persons[row] = this.persons.number(code);
    }
    return new CheckedTable(table, file.length, persons);
  }

  private notOverridden(file: TypedTable, held: TypedTable): number[] {
    const columns = tableOf(file.key).rowKey.slice(1);
    const inFile = new RowGroups(keyNumbers(file, this.persons, columns));
    const keysOfHeld = keyNumbers(held, this.persons, columns);
    return Array.from(keysOfHeld.keys()).filter((row) => !inFile.has(keysOfHeld[row] ?? -1));
  }

  /** Per row the number of its key over its participant and these columns. */
  keyNumbers(table: CheckedTable, columns: readonly string[]): Float64Array {
    return keyNumbers(table, this.persons, columns);
  }

  /** Rows of a table by participant. */
  rowsByPerson(key: TableKey): RowGroups {
    let groups = this.byPerson.get(key);
    if (!groups) {
      this.byPerson.set(key, (groups = new RowGroups(this.table(key).persons)));
    }
    return groups;
  }

  /** For sessions, bouts and events: per row the number of the session it belongs to, -1 for none. */
  sessionNumbers(key: 'sessions' | 'bouts' | 'adverse_events'): Float64Array {
    let numbers = this.sessionKeys.get(key);
    if (!numbers) this.sessionKeys.set(key, (numbers = this.keyNumbers(this.table(key), ['session_day', 'session_no'])));
    return numbers;
  }

  /** Sessions by the numbers of `sessionNumbers`. */
  get sessionsByNumber(): RowGroups {
    return (this.sessionGroups ??= new RowGroups(this.sessionNumbers('sessions')));
  }

  /** Per bout the row of its session; -1 when no session has its number. */
  get sessionOfBout(): Int32Array {
    return (this.sessionRows ??= Int32Array.from(this.sessionNumbers('bouts'), (number) => this.sessionsByNumber.firstOf(number)));
  }

  /** What the bouts of a session add up to; null when none of its bouts is known. */
  get boutSums(): (session: number) => BoutSums | null {
    return (this.sums ??= boutSums(this));
  }

  /** Study day of a participant's injury; null when it is not known. */
  injuryDay(person: number): number | null {
    const row = this.rowsByPerson('participants').firstOf(person);
    const days = row < 0 ? null : this.table('participants').column('days_injury_to_index').number(row);
    return days === null ? null : -days;
  }

  /** Assessments by participant and day. */
  get visits(): readonly Visit[] {
    return (this.visitList ??= visitsOf(this));
  }

  get exams(): ExamReadings {
    return (this.examReadings ??= new ExamReadings(this));
  }
}
