/**
 * Fills a typed table from the rows of any reader: first the header, then each row's cells as text.
 * What a row lacks or has too much of becomes a finding; the row itself is kept, so that all its mistakes are told at once.
 */
import { tableOf } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';
import type { FindingLog } from '../finding-log.ts';
import type { ReadLimits } from '../limits.ts';
import { UnreadableFile } from '../reading/unreadable-file.ts';
import type { CellReader } from './cell-reader.ts';
import { CodeReader } from './code-reader.ts';
import { ColumnStore } from './column-store.ts';
import { isFormulaLike } from './formula-like.ts';
import { HeaderNames } from './header-names.ts';
import type { HeaderMeaning, UnitFactor } from './header-names.ts';
import { MeasuredReader } from './measured-reader.ts';
import { NumberReader } from './number-reader.ts';
import type { DecimalManner } from './number-reader.ts';
import { ParticipantReader } from './participant-reader.ts';
import { TypedTable } from './typed-table.ts';

const firstCapacity = 1_024;
const longestShownHeader = 60;

const isBlank = (cells: readonly string[], count: number): boolean => {
  for (let index = 0; index < count; index += 1) if (cells[index]?.trim()) return false;
  return true;
};

/** The column as a spreadsheet names it: A to Z, AA, AB, … */
function columnLetters(position: number): string {
  const letter = String.fromCharCode(65 + (position % 26));
  return position < 26 ? letter : columnLetters(Math.floor(position / 26) - 1) + letter;
}

export class TableBuilder {
  private readonly variables: readonly Variable[];
  private readonly stores: ColumnStore[];
  private readonly present = new Set<string>();
  private manner: DecimalManner = { commaSeparated: true, mark: 0 };
  /** Per position in the file the reader of its column, in the order in which a row's cells must be read. */
  private readers: { readonly position: number; readonly reader: CellReader }[] = [];
  private width = 0;
  private capacity = firstCapacity;
  private rows = 0;
  private rowsInAll = 0;
  private lines: Uint32Array = new Uint32Array(firstCapacity);

  constructor(
    readonly table: TableKey,
    readonly findings: FindingLog,
    readonly limits: ReadLimits,
  ) {
    this.variables = tableOf(table).variables;
    this.stores = this.variables.map((variable) => new ColumnStore(variable, firstCapacity));
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
   * @param manner Whether the cells were separated by commas.
   * @throws UnreadableFile when it names none of the table's columns: the file is another table, or has no header.
   */
  header(cells: readonly string[], count: number, line: number, manner: { readonly commaSeparated: boolean }): void {
    if (isBlank(cells, count)) return;
    this.manner = { ...manner, mark: 0 };
    const names = new HeaderNames(this.table);
    const headers = cells.slice(0, lastFilled(cells, count) + 1);
    const meanings = headers.map((header) => names.meaning(header));
    const recognised = meanings.filter((meaning) => meaning.kind === 'column').length;
    if (recognised === 0) {
      throw new UnreadableFile(
        'F05',
        'The first row names no column of this table.',
        'Begin with the header row of the template, and check that the file belongs to this table.',
        line,
      );
    }
    this.width = headers.length;
    // Where most of the row is not a header, its cells may be somebody's data and are not repeated.
    const mayShow = recognised * 2 >= headers.length;
    meanings.forEach((meaning, position) =>
      this.takeColumn(meaning, position, line, shownHeader(headers[position] ?? '', position, mayShow)),
    );
    this.readers.sort((a, b) => Number(a.reader instanceof MeasuredReader) - Number(b.reader instanceof MeasuredReader));
    this.reportMissing(line);
  }

  private takeColumn(meaning: HeaderMeaning, position: number, line: number, shown: string): void {
    const { table, findings } = this;
    if (meaning.kind === 'undeclared') {
      if (shown === '') findings.add({ rule: 'F06', table, line, column: columnLetters(position), found: 'A column without a header.' });
      else if (isFormulaLike(shown))
        findings.add({
          rule: 'F13',
          table,
          line,
          column: columnLetters(position),
          found: 'A header that begins like a spreadsheet formula.',
        });
      else findings.add({ rule: 'F06', table, line, column: shown, found: 'A column that the dictionary does not have.' });
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
    this.readers.push({ position, reader: this.readerFor(meaning.position, meaning.factor) });
  }

  private readerFor(column: number, factor: UnitFactor): CellReader {
    const { table, findings, stores, manner } = this;
    const store = stores[column] as ColumnStore;
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

  /** @throws UnreadableFile beyond the limit of rows. */
  row(cells: readonly string[], count: number, line: number): void {
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
    for (const { position, reader } of this.readers) {
      const cell = position < count ? cells[position] : '';
      if (cell) reader.read(cell, row, line);
    }
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
    return taken;
  }
}

function lastFilled(cells: readonly string[], count: number): number {
  let last = count - 1;
  while (last >= 0 && !cells[last]?.trim()) last -= 1;
  return last;
}

/** The header as a finding may show it: without control and direction marks, cut to a readable length; or the column's letters. */
function shownHeader(header: string, position: number, mayShow: boolean): string {
  if (header.trim() === '') return '';
  if (!mayShow) return columnLetters(position);
  const plain = header.replace(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]+/gu, ' ').trim();
  return plain.length > longestShownHeader ? `${plain.slice(0, longestShownHeader)}…` : plain;
}
