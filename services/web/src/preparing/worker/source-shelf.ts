/** The files of a month as the worker holds them: each file, or sheet of a workbook, with its table and the matches of its columns. */
import { matchColumns } from '@cairnstep/deidentification';
import type { ColumnMatch, StoredMatches } from '@cairnstep/deidentification';
import type { TableKey } from '@cairnstep/dictionary';
import type { CsvText, Delimiter, TextSheet } from '@cairnstep/submission-files';
import { recogniseTable } from '../../features/submissions/recognise-table.ts';
import { decimalMarkOf } from './decimal-mark.ts';
import type { RefusedFile, SourceChange, SourcePicture } from './protocol.ts';
import { readFile } from './read-file.ts';
import { recogniseColumns } from './recognise-columns.ts';
import { Refusal } from './refusal.ts';
import type { Watch } from './serve.ts';

export interface Source {
  readonly id: number;
  readonly file: File;
  readonly sheet: string | null;
  readonly table: TableKey | null;
  readonly headers: readonly string[];
  readonly rows: readonly (readonly string[])[];
  readonly lines: readonly number[];
  readonly encoding: string | null;
  readonly delimiter: Delimiter | null;
  readonly fittingDelimiters: readonly Delimiter[];
  readonly decimalMark: '.' | ',';
  readonly hasBothMarks: boolean;
  readonly notes: readonly string[];
  /** One or more for each column that has a header of its own. */
  readonly matches: readonly ColumnMatch[];
}

export type AssignedSource = Source & { readonly table: TableKey };

export class SourceShelf {
  sources: readonly Source[] = [];
  private refused: readonly RefusedFile[] = [];
  private lastId = 0;

  /** A file takes the place of an earlier one of its name. */
  async add(files: readonly File[], remembered: StoredMatches, watch: Watch): Promise<void> {
    for (const file of files) {
      const read = await readFile(file, watch);
      await watch.pause();
      this.sources = this.sources.filter((source) => source.file.name !== file.name);
      this.refused = this.refused.filter(({ fileName }) => fileName !== file.name);
      if (!read.ok) this.refused = [...this.refused, { fileName: file.name, found: read.found, mend: read.mend, line: read.line }];
      else if (read.kind === 'csv') this.put(this.ofCsv(this.nextId(), file, read.csv, recogniseTable(file.name), remembered));
      else for (const sheet of read.sheets) this.put(this.ofSheet(file, sheet, remembered));
    }
  }

  async change({ id, table, delimiter, decimalMark }: SourceChange, remembered: StoredMatches, watch: Watch): Promise<void> {
    const source = this.get(id);
    if (delimiter !== undefined) {
      const read = await readFile(source.file, watch, delimiter);
      if (!read.ok || read.kind !== 'csv')
        throw new Refusal('file-cannot-be-read', read.ok ? 'The file has changed. Choose it again.' : read.found);
      this.replace(this.ofCsv(id, source.file, read.csv, source.table, remembered));
    }
    if (decimalMark !== undefined) this.replace({ ...this.get(id), decimalMark });
    if (table !== undefined) this.replace(withTable(this.get(id), table, remembered));
  }

  /** Matches the columns anew, as another key remembers them. */
  matchAgain(remembered: StoredMatches): void {
    this.sources = this.sources.map((source) => withTable(source, source.table, remembered));
  }

  leaveOut(id: number): void {
    this.sources = this.sources.filter((source) => source.id !== id);
  }

  /** What becomes of one column, in place of what was said of it before. */
  match(id: number, match: ColumnMatch): void {
    const source = this.get(id);
    const matches = source.headers.flatMap((header) =>
      header === match.header ? match : source.matches.filter((each) => each.header === header),
    );
    this.replace({ ...source, matches });
  }

  /** Files to be prepared. @throws Refusal when two are for the same table */
  get assigned(): readonly AssignedSource[] {
    const assigned = this.sources.flatMap((source) => (source.table === null ? [] : [{ ...source, table: source.table }]));
    if (new Set(assigned.map(({ table }) => table)).size < assigned.length)
      throw new Refusal('failed', 'Two files are for the same table. Give one of them another table, or leave it out.');
    return assigned;
  }

  picture(): { readonly sources: readonly SourcePicture[]; readonly refused: readonly RefusedFile[] } {
    const sources = this.sources.map(
      ({ id, file, sheet, table, headers, rows, encoding, delimiter, fittingDelimiters, decimalMark, hasBothMarks, notes }) => ({
        id,
        fileName: file.name,
        sheet,
        table,
        rows: rows.length,
        columns: headers.length,
        encoding,
        delimiter,
        fittingDelimiters,
        decimalMark,
        hasBothMarks,
        notes,
      }),
    );
    return { sources, refused: this.refused };
  }

  private get(id: number): Source {
    const source = this.sources.find((each) => each.id === id);
    if (source === undefined) throw new Refusal('no-such-place', 'The file was left out.');
    return source;
  }

  private put(source: Source): void {
    this.sources = [...this.sources, source];
  }

  private replace(source: Source): void {
    this.sources = this.sources.map((each) => (each.id === source.id ? source : each));
  }

  private nextId(): number {
    this.lastId += 1;
    return this.lastId;
  }

  private ofCsv(id: number, file: File, csv: CsvText, named: TableKey | null, remembered: StoredMatches): Source {
    const { headers, rows, lines, encoding, delimiter, fittingDelimiters } = csv;
    const { mark, hasBoth } = decimalMarkOf(rows);
    const table = named ?? recogniseColumns(csv, remembered);
    const known = { id, file, sheet: null, headers, rows, lines, encoding, delimiter, fittingDelimiters, notes: notesOf(csv) };
    return withTable({ ...known, table, decimalMark: mark, hasBothMarks: hasBoth, matches: [] }, table, remembered);
  }

  private ofSheet(file: File, sheet: TextSheet, remembered: StoredMatches): Source {
    const { name, headers, rows, lines } = sheet;
    const { mark, hasBoth } = decimalMarkOf(rows);
    const table = sheet.table ?? recogniseTable(name) ?? recogniseColumns(sheet, remembered);
    const known = { id: this.nextId(), file, sheet: name, headers, rows, lines, encoding: null, delimiter: null, fittingDelimiters: [] };
    return withTable({ ...known, table, decimalMark: mark, hasBothMarks: hasBoth, notes: notesOf(sheet), matches: [] }, table, remembered);
  }
}

/** The columns are matched anew, because another table has other variables. A column without a match stays behind, and that is remembered. */
function withTable(source: Source, table: TableKey | null, remembered: StoredMatches): Source {
  if (table === null) return { ...source, table, matches: [] };
  const { headers, rows } = source;
  const proposed = matchColumns(table, { headers, rows }, remembered.get(table));
  const matches = headers.flatMap((header, position): ColumnMatch[] => {
    if (header.trim() === '' || headers.indexOf(header) !== position || headers.lastIndexOf(header) !== position) return [];
    const found = proposed.filter((match) => match.header === header);
    return found.length > 0 ? found : [{ header, as: 'left-out' }];
  });
  return { ...source, table, matches };
}

/** What is not seen of a file, or not read, in sentences. */
function notesOf(read: Pick<CsvText, 'rowsAbove'> & Partial<TextSheet>): string[] {
  const { rowsAbove, isHidden = false, hiddenColumns = [], hiddenRows = 0, hasMergedCells = false, cellsWithoutValue = 0 } = read;
  const notes: string[] = [];
  if (rowsAbove > 0) notes.push(`Rows above the names of the columns, which were passed over: ${rowsAbove}.`);
  if (isHidden) notes.push('The sheet is hidden in the workbook.');
  if (hiddenColumns.length > 0) notes.push(`Hidden columns, read like the others: column ${hiddenColumns.join(', ')}.`);
  if (hiddenRows > 0) notes.push(`Hidden rows, read like the others: ${hiddenRows}.`);
  if (hasMergedCells) notes.push('Some cells are merged: only the first of them has the value.');
  if (cellsWithoutValue > 0) notes.push(`Cells with a formula that has no result, taken as empty: ${cellsWithoutValue}.`);
  return notes;
}
