/**
 * Fills a typed table from the rows of any reader: first the header, then each row's cells as text.
 * What a row lacks or has too much of becomes a finding; the row itself is kept, so that all its mistakes are told at once.
 */
import { tableOf } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';
import type { FindingLog } from '../finding-log.ts';
import type { ReadLimits } from '../limits.ts';
import type { AsciiText } from '../reading/ascii-text.ts';
import { UnreadableFile } from '../reading/unreadable-file.ts';
import { faultOfKind } from './cell-kind.ts';
import type { CellKind } from './cell-kind.ts';
import type { CellReader } from './cell-reader.ts';
import { CodeReader } from './code-reader.ts';
import { ColumnStore } from './column-store.ts';
import type { DoubtfulRow } from './column-store.ts';
import { isFormulaLike } from './formula-like.ts';
import type { UnitFactor } from './header-names.ts';
import { columnLetters, columnName, lastFilled, readHeaderRow } from './header-row.ts';
import type { HeaderColumn } from './header-row.ts';
import { MeasuredReader } from './measured-reader.ts';
import { NumberReader } from './number-reader.ts';
import type { DecimalManner } from './number-reader.ts';
import { PlainRows } from './plain-rows.ts';
import { ParticipantReader } from './participant-reader.ts';
import type { TableOptions } from './table-options.ts';
import { TypedTable } from './typed-table.ts';

const firstCapacity = 1_024;

const isNumber = ({ type }: Variable): boolean => type === 'integer' || type === 'decimal';

const isBlank = (cells: readonly string[], count: number): boolean => {
  for (let index = 0; index < count; index += 1) if (cells[index]?.trim()) return false;
  return true;
};

export class TableBuilder {
  private readonly variables: readonly Variable[];
  private readonly stores: ColumnStore[];
  private readonly doubtful: DoubtfulRow = { row: -1 };
  private readonly present = new Set<string>();
  private manner: DecimalManner = { commaMayMarkThousands: true, mark: 0 };
  /** Per position in the file the reader of its column, in the order in which a row's cells must be read. */
  private readers: { readonly position: number; readonly store: ColumnStore; readonly reader: CellReader }[] = [];
  private plainRows: PlainRows | null = null;
  private width = 0;
  private watchesEveryRow = false;
  private capacity = firstCapacity;
  private rows = 0;
  private rowsInAll = 0;
  private lines: Uint32Array = new Uint32Array(firstCapacity);

  constructor(
    readonly table: TableKey,
    readonly findings: FindingLog,
    readonly limits: ReadLimits,
    private readonly options: TableOptions = {},
  ) {
    this.variables = tableOf(table).variables;
    this.stores = this.variables.map((variable) => new ColumnStore(variable, firstCapacity, this.doubtful));
  }

  /** Rows not handed over yet. */
  get length(): number {
    return this.rows;
  }

  get hasHeader(): boolean {
    return this.width > 0;
  }

  /**
   * The first row that is not blank names the columns.
   * @param manner Whether a comma in a number could mark thousands: where commas separate cells, or nothing tells.
   * @throws UnreadableFile when it names none of the table's columns: the file is another table, or has no header.
   */
  header(cells: readonly string[], count: number, line: number, manner: { readonly commaMayMarkThousands: boolean }): void {
    if (isBlank(cells, count)) return;
    this.manner = { ...manner, mark: 0 };
    const { watch } = this.options;
    const columns = readHeaderRow(this.table, cells, count, watch && ((header) => watch.mayShowHeader(header)));
    if (!columns.some(({ meaning }) => meaning.kind === 'column')) {
      throw new UnreadableFile(
        'F05',
        'The first row names no column of this table.',
        'Begin with the header row of the template, and check that the file belongs to this table.',
        line,
      );
    }
    this.width = columns.length;
    columns.forEach((column, position) => this.takeColumn(column, position, line));
    // A number column without limits of its own allows nothing by itself, and one that the dictionary has not allows nothing at all.
    this.watchesEveryRow =
      this.readers.length < columns.length ||
      this.readers.some(({ store: { variable } }) => variable.hard === undefined && isNumber(variable));
    watch?.header(
      columns.map(({ meaning }, position) => (meaning.kind === 'undeclared' ? (cells[position] ?? '') : meaning.variable.key)),
      columns.map(columnName),
    );
    this.addMendedColumns();
    this.readers.sort((a, b) => Number(a.reader instanceof MeasuredReader) - Number(b.reader instanceof MeasuredReader));
    this.reportMissing(line);
  }

  private takeColumn({ meaning, shown }: HeaderColumn, position: number, line: number): void {
    const { table, findings } = this;
    if (meaning.kind === 'undeclared') {
      const where = { table, line, column: columnName({ meaning, shown }, position) };
      if (shown === '') findings.add({ rule: 'F06', ...where, found: 'A column without a header.' });
      else if (isFormulaLike(shown)) findings.add({ rule: 'F13', ...where, found: 'A header that begins like a spreadsheet formula.' });
      else findings.add({ rule: 'F06', ...where, found: 'A column that the dictionary does not have.' });
      return;
    }
    const { key } = meaning.variable;
    if (meaning.kind === 'other-unit') {
      const mend =
        meaning.allowed.length > 0 ? `Use one of these units: ${meaning.allowed.join(', ')}.` : 'Leave the unit out of the header.';
      findings.add({ rule: 'F15', table, line, column: key, found: 'A unit that this column does not take.', mend });
      return;
    }
    if (this.present.has(key)) {
      findings.add({ rule: 'F07', table, line, column: key, found: `The same column again, in column ${columnLetters(position)}.` });
      return;
    }
    this.present.add(key);
    const store = this.stores[meaning.position] as ColumnStore;
    this.readers.push({ position, store, reader: this.readerFor(store, meaning.factor) });
  }

  /** Columns that the file lacks and somebody has filled in for some rows stand behind those it has. */
  private addMendedColumns(): void {
    const mended = new Set([...(this.options.mends?.values() ?? [])].flatMap((row) => [...row.keys()]));
    let position = this.width;
    for (const store of this.stores) {
      if (!mended.has(store.variable.key) || this.present.has(store.variable.key)) continue;
      this.readers.push({ position, store, reader: this.readerFor(store, { times: 1, dividedBy: 1 }) });
      position += 1;
    }
  }

  private readerFor(store: ColumnStore, factor: UnitFactor): CellReader {
    const { table, findings, stores, manner } = this;
    const place = { table, findings, store };
    const { type, measuredBy } = store.variable;
    if (type === 'pseudonym') return new ParticipantReader(place);
    if (type === 'code' || type === 'flag') return new CodeReader(place);
    const numbers = new NumberReader(place, factor, manner);
    const naming = measuredBy && stores.find(({ variable }) => variable.key === measuredBy.column);
    return naming ? new MeasuredReader(place, { store: naming, prefix: measuredBy.prefix }, numbers) : numbers;
  }

  private reportMissing(line: number): void {
    const { table, findings } = this;
    for (const { key, required } of this.variables) {
      if (required.when !== 'always' || this.present.has(key)) continue;
      findings.add({ rule: 'F08', table, line, column: key, found: 'A column that every file of this table must have is not there.' });
    }
  }

  /**
   * @param kinds What a workbook says of each cell; left out where a file has nothing but text.
   * @throws UnreadableFile beyond the limit of rows.
   */
  row(cells: readonly string[], count: number, line: number, kinds?: readonly CellKind[]): void {
    if (isBlank(cells, count)) return;
    if (this.rowsInAll >= this.limits.rows) {
      throw new UnreadableFile(
        'F03',
        `The file has more than ${this.limits.rows.toLocaleString('en')} rows.`,
        'Send the month in smaller parts.',
        line,
      );
    }
    if (this.rows === this.capacity) this.grow();
    const row = this.rows;
    this.rows += 1;
    this.rowsInAll += 1;
    this.lines[row] = line;
    if (count !== this.width) this.reportWidth(cells, count, line);
    const mends = this.options.mends?.get(line);
    if (mends) this.readCells(...this.mended(cells, kinds, count, mends), row, line);
    else this.readCells(cells, kinds, count, row, line);
  }

  /**
   * Reads a record where it stands in the text of a file, when it is plain (see `PlainRows`).
   * @returns where the next record begins, or -1 when `row` has to read this one.
   */
  plainRow(text: AsciiText, start: number, separator: number, line: number): number {
    if (!this.hasHeader || this.rowsInAll >= this.limits.rows || this.options.mends?.has(line)) return -1;
    const { watch } = this.options;
    if (watch && this.watchesEveryRow) return -1;
    if (this.rows === this.capacity) this.grow();
    const row = this.rows;
    this.plainRows ??= new PlainRows(this.readers, this.width, separator, this.limits.cellLength);
    const next = this.plainRows.read(text, start, row);
    if (next < 0 || (watch && this.doubtful.row === row)) return -1;
    this.rows += 1;
    this.rowsInAll += 1;
    this.lines[row] = line;
    return next;
  }

  private readCells(cells: readonly string[], kinds: readonly CellKind[] | undefined, count: number, row: number, line: number): void {
    for (const { position, reader, store } of this.readers) {
      const cell = position < count ? cells[position] : '';
      if (!cell) continue;
      const kind = kinds?.[position] ?? 'text';
      const fault = kinds && faultOfKind(kind);
      if (!fault) reader.read(cell, row, line, kind);
      else {
        store.setUnreadable(row);
        this.findings.add({ ...fault, table: this.table, line, column: store.variable.key });
      }
    }
    const { watch } = this.options;
    if (watch && (this.watchesEveryRow || count > this.width || this.doubtful.row === row)) watch.row(cells.slice(0, count), line);
  }

  /** The row with what was typed in place of its cells. */
  private mended(
    cells: readonly string[],
    kinds: readonly CellKind[] | undefined,
    count: number,
    mends: ReadonlyMap<string, string>,
  ): [cells: readonly string[], kinds: readonly CellKind[] | undefined, count: number] {
    const length = Math.max(count, ...this.readers.map(({ position }) => position + 1));
    const texts = Array.from({ length }, (_, position) => (position < count ? (cells[position] ?? '') : ''));
    const newKinds = kinds && Array.from({ length }, (_, position): CellKind => (position < count ? (kinds[position] ?? 'text') : 'text'));
    for (const { position, store } of this.readers) {
      const text = mends.get(store.variable.key);
      if (text === undefined) continue;
      texts[position] = text;
      if (newKinds) newKinds[position] = 'text';
    }
    return [texts, newKinds, length];
  }

  private reportWidth(cells: readonly string[], count: number, line: number): void {
    const { table, findings, width } = this;
    if (count < width) findings.add({ rule: 'F09', table, line, column: null, found: `The row ends after ${count} of ${width} columns.` });
    else if (lastFilled(cells, count) >= width)
      findings.add({ rule: 'F09', table, line, column: null, found: `The row has more cells than the header's ${width} columns.` });
  }

  private grow(): void {
    this.capacity *= 2;
    const lines = new Uint32Array(this.capacity);
    lines.set(this.lines);
    this.lines = lines;
    for (const store of this.stores) store.grow(this.capacity);
  }

  /** Hands over the rows so far; the builder goes on with the next ones. */
  take(): TypedTable {
    const columns = this.stores.map((store) => store.take(this.rows));
    const taken = new TypedTable(this.table, this.rows, this.lines.subarray(0, this.rows), columns, new Set(this.present));
    this.lines = new Uint32Array(this.capacity);
    this.rows = 0;
    this.doubtful.row = -1;
    return taken;
  }
}
