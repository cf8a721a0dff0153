/** The preparation of a month: what would be sent, and how it came about, as far as it may be told. */
import { cleanCsv, normaliseLocalId, parseDate, prepareMonth } from '@cairnstep/deidentification';
import type { IsoDate, PreparedMonth, RawTable, SiteKey } from '@cairnstep/deidentification';
import { variableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { exampleMark } from '@cairnstep/submission-files';
import type { PreparedTable } from '../messages.ts';
import { columnsOf } from './column-pictures.ts';
import { hexadecimal } from './hexadecimal.ts';
import type { Circumstances, FindingPicture, FirstDayPlace, PreparedPicture, PreparedTablePicture, ProblemPicture } from './protocol.ts';
import { Refusal } from './refusal.ts';
import { rowsInMonth } from './rows-in-month.ts';
import type { AssignedSource, Source } from './source-shelf.ts';

interface StatedDay {
  readonly recordNumber: string;
  readonly table: TableKey;
  readonly line: number;
  readonly date: IsoDate;
}

interface WorkedOut {
  readonly sources: readonly AssignedSource[];
  readonly raw: readonly RawTable[];
  readonly key: SiteKey;
  readonly month: PreparedMonth;
  readonly files: readonly PreparedTable[];
  readonly wasMetHere: (code: string) => boolean;
}

const peopleShown = 50;

export class MonthDesk {
  private stated: readonly StatedDay[] = [];
  private prepared: { readonly month: PreparedMonth; readonly files: readonly PreparedTable[] } | null = null;

  constructor(private readonly circumstances: () => Circumstances) {}

  /** @param line of the clinic's file, on which the participant stands */
  state(sources: readonly AssignedSource[], key: SiteKey, place: Omit<StatedDay, 'recordNumber' | 'date'>, date: IsoDate | null): void {
    const source = sources.find(({ table }) => table === place.table);
    const recordNumber = source && recordNumberOn(source, place.line, key);
    if (recordNumber === undefined || recordNumber === '')
      throw new Refusal('no-such-place', 'There is no participant on this line any more.');
    if (date !== null && !parseDate(date, 'iso').ok) throw new Refusal('no-such-place', 'There is no such day. Write it as 2026-03-28.');
    const others = this.stated.filter((each) => each.recordNumber !== recordNumber);
    this.stated = date === null ? others : [...others, { ...place, recordNumber, date }];
  }

  /**
   * Works out what would be sent. The result's key is to be saved before anything is.
   *
   * @param wasMetHere whether a person of the key was not in its file when that was opened
   */
  async prepare(
    sources: readonly AssignedSource[],
    key: SiteKey,
    wasMetHere: (code: string) => boolean,
  ): Promise<{ picture: PreparedPicture; month: PreparedMonth }> {
    const raw = sources.map(rawTableOf);
    const month = await prepareMonth({
      tables: raw,
      key,
      indexDates: new Map(this.stated.map(({ recordNumber, date }) => [recordNumber, date])),
      safeHeaders: new Set(this.circumstances().safeHeaders),
    });
    const files = month.clean
      .filter(({ rows }) => rows.length > 0)
      .map((clean) => ({ table: clean.table, rows: clean.rows.length, csv: new TextEncoder().encode(cleanCsv(clean)).buffer }));
    this.prepared = { month, files };
    return { picture: await this.picture({ sources, raw, key, month, files, wasMetHere }), month };
  }

  /** Something it follows from has changed. */
  forget(): void {
    this.prepared = null;
  }

  /** Copies, so that a sending that failed can be tried again. */
  tablesToSend(): PreparedTable[] {
    if (this.prepared === null) throw new Refusal('failed', 'Look at the preview first.');
    return this.prepared.files.map((file) => ({ ...file, csv: file.csv.slice(0) }));
  }

  private async picture({ sources, raw, key, month, files, wasMetHere }: WorkedOut): Promise<PreparedPicture> {
    const { clean, problems, findings, agesTopCoded, lengthChange, newParticipants } = month;
    const sourceOf = (table: string | null) => sources.find((source) => source.table === table);
    const people = new Set(clean.flatMap(({ rows }) => rows.map(([code = '']) => code)));
    const { knownParticipants: held, month: calendarMonth } = this.circumstances();
    const heldCodes = new Set(held);
    const metFirst = new Set(newParticipants.map(({ code }) => code));
    const earlierCodes = new Map(month.replacedCodes.map(({ from, to }) => [to, from]));
    const isNewToKey = (code: string) => metFirst.has(code) || wasMetHere(earlierCodes.get(code) ?? code);
    const newToKey = held === null ? [...people].filter(isNewToKey).length : null;
    const rowsInFiles = raw.reduce((sum, { rows }) => sum + rows.length, 0);
    const rowsOf = (table: TableKey) => raw.find((each) => each.table === table)?.rows.length ?? 0;
    return {
      tables: await Promise.all(files.map((file) => tablePicture(file, month, rowsOf(file.table)))),
      columns: sources.map((source) => columnsOf(source, key)),
      problems: problems.map((problem): ProblemPicture => ({
        ...problem,
        header: headerAt(sourceOf(problem.table), problem.columnNumber),
      })),
      findings: findings.flatMap((finding): FindingPicture[] => {
        const source = sourceOf(finding.table);
        if (source === undefined) return [];
        const { class: name, strength, line, count } = finding;
        return [{ class: name, strength, line, count, table: source.table, header: headerAt(source, finding.columnNumber) ?? '' }];
      }),
      firstDays: this.firstDays(sources, key, month),
      emptyTables: clean.filter(({ rows, table }) => rows.length === 0 && rowsOf(table) > 0).map(({ table }) => table),
      rowsLeftBehind: rowsInFiles - clean.reduce((sum, { rows }) => sum + rows.length, 0),
      people: people.size,
      newPeople: newToKey ?? [...people].filter((code) => !heldCodes.has(code)).length,
      newToKey,
      agesTopCoded,
      lengthChange,
      rowsInMonth: calendarMonth === null ? null : rowsInMonth(sources, calendarMonth),
    };
  }

  /** People whose first training day is wanted, each once, and those for whom it was stated. */
  private firstDays(sources: readonly AssignedSource[], key: SiteKey, { problems, newParticipants }: PreparedMonth): FirstDayPlace[] {
    const wanted = problems.filter(({ kind }) => kind === 'index-date-unknown' || kind === 'index-date-differs');
    const places = [
      ...wanted.flatMap(({ table, lines }) => lines.map((line) => ({ table, line }))),
      ...newParticipants.filter(({ indexDate }) => indexDate === 'unknown'),
    ];
    const met = new Set(this.stated.map(({ recordNumber }) => recordNumber));
    const unknown = places.flatMap(({ table, line }): FirstDayPlace[] => {
      const source = sources.find((each) => each.table === table);
      const recordNumber = source && recordNumberOn(source, line, key);
      if (recordNumber === undefined || recordNumber === '' || met.has(recordNumber)) return [];
      met.add(recordNumber);
      return [{ table, line, stated: null }];
    });
    return [...this.stated.map(({ table, line, date }) => ({ table, line, stated: date })), ...unknown.slice(0, peopleShown)];
  }
}

const participantColumn = ({ headers, matches }: AssignedSource): number =>
  headers.indexOf(matches.find(({ as }) => as === 'participant')?.header ?? '\u0000');

/** The record number on a line, in the key's spelling; undefined when there is no such line or nobody said where record numbers are. */
function recordNumberOn(source: AssignedSource, line: number, { normalisation }: SiteKey): string | undefined {
  const cell = source.rows[source.lines.indexOf(line)]?.[participantColumn(source)];
  return cell === undefined ? undefined : normaliseLocalId(cell, normalisation);
}

/** Without the example row that the registry's template brings. */
function rawTableOf(source: AssignedSource): RawTable {
  const { table, headers, rows, lines, matches, decimalMark } = source;
  const position = participantColumn(source);
  const isExample = (row: readonly string[]) => row[position]?.trim().toUpperCase() === exampleMark;
  if (!rows.some(isExample)) return { table, headers, rows, lines, matches, decimalMark };
  const kept = rows.flatMap((row, at) => (isExample(row) ? [] : [at]));
  return {
    table,
    headers,
    rows: kept.map((at) => rows[at] ?? []),
    lines: kept.map((at) => lines[at] ?? 0),
    matches,
    decimalMark,
  };
}

const headerAt = (source: Source | undefined, columnNumber: number | null): string | null =>
  columnNumber === null ? null : (source?.headers[columnNumber - 1] ?? null);

async function tablePicture({ table, rows, csv }: PreparedTable, month: PreparedMonth, rowsInFile: number): Promise<PreparedTablePicture> {
  const preview = month.preview.find((each) => each.table === table);
  const clean = month.clean.find((each) => each.table === table);
  return {
    table,
    rows,
    rowsInFile,
    people: new Set(clean?.rows.map(([code]) => code)).size,
    bytes: csv.byteLength,
    digest: hexadecimal(await crypto.subtle.digest('SHA-256', csv)),
    headers: preview?.headers ?? [],
    firstRows: preview?.rows ?? [],
    words: (preview?.distinct ?? []).map(({ column, values }) => {
      const { type } = variableOf(table, column);
      const isNumber = ({ value }: { readonly value: string }) =>
        (type === 'integer' || type === 'decimal') && !Number.isNaN(Number(value));
      return {
        column,
        values: values.filter((value) => !isNumber(value)),
        numbers: values.filter(isNumber).reduce((sum, { count }) => sum + count, 0),
      };
    }),
  };
}
