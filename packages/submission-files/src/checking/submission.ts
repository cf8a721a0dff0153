/** Everything the rules look at: the tables of the files joined with what the registry holds, and the views that several rules share. */
import { tableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import type { RegistryContext, TypedTables } from '../registry-context.ts';
import { tableFromRows } from '../table/table-from-rows.ts';
import type { TypedTable } from '../table/typed-table.ts';
import { CheckedTable } from './checked-table.ts';
import { ExamReadings } from './exam-readings.ts';
import { Persons, keyNumbers } from './key-numbers.ts';
import { RowGroups } from './row-groups.ts';
import { visitsOf } from './visits.ts';
import type { Visit } from './visits.ts';

const sessionKey = ['session_day', 'session_no'];

export class Submission {
  readonly persons = new Persons();
  private readonly joined = new Map<TableKey, CheckedTable>();
  private readonly byPerson = new Map<TableKey, RowGroups>();
  private boutGroups: RowGroups | null = null;
  private sessionGroups: RowGroups | null = null;
  private visitList: readonly Visit[] | null = null;
  private examReadings: ExamReadings | null = null;

  constructor(
    private readonly files: TypedTables,
    readonly context: RegistryContext,
  ) {}

  /** Whether a file of this table was sent. */
  hasFile(key: TableKey): boolean {
    return this.files[key] !== undefined;
  }

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
    const persons = Int32Array.from({ length: table.length }, (_, row) => {
      const code = participant.word(row);
      return code === null ? -1 : this.persons.number(code);
    });
    return new CheckedTable(table, file.length, persons);
  }

  private notOverridden(file: TypedTable, held: TypedTable): number[] {
    const columns = tableOf(file.key).rowKey.slice(1);
    const inFile = new RowGroups(file.length, keyNumbers(file, this.persons, columns));
    const keyOfHeld = keyNumbers(held, this.persons, columns);
    return Array.from({ length: held.length }, (_, row) => row).filter((row) => !inFile.has(keyOfHeld(row)));
  }

  /** The key number of a row, over its participant and these columns. */
  keyNumbers(table: CheckedTable, columns: readonly string[]): (row: number) => number {
    return keyNumbers(table, this.persons, columns);
  }

  /** Rows of a table by participant. */
  rowsByPerson(key: TableKey): RowGroups {
    let groups = this.byPerson.get(key);
    if (!groups) {
      const table = this.table(key);
      this.byPerson.set(key, (groups = new RowGroups(table.length, (row) => table.personOf(row))));
    }
    return groups;
  }

  /** The session that a bout or an event names, by the numbers of `sessionNumbers`. */
  get sessionsByKey(): RowGroups {
    const sessions = this.table('sessions');
    return (this.sessionGroups ??= new RowGroups(sessions.length, this.sessionNumbers(sessions)));
  }

  get boutsBySession(): RowGroups {
    const bouts = this.table('bouts');
    return (this.boutGroups ??= new RowGroups(bouts.length, this.sessionNumbers(bouts)));
  }

  /** For sessions, bouts and events: the number of the session a row belongs to, -1 for none. */
  sessionNumbers(table: CheckedTable): (row: number) => number {
    return this.keyNumbers(table, sessionKey);
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
