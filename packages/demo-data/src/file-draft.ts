/** A CSV file as text cells, to be changed in single places and written again. */
import type { TableKey } from '@cairnstep/dictionary';
import { stringify } from 'csv-stringify/browser/esm/sync';

const lineEnd = '\r\n';

/** The text of a cell of one row by its column. */
export type CellText = (column: string) => string;

export class FileDraft {
  private readonly header: string[];
  private readonly rows: string[][];
  /** Rows that were chosen already, so that no two changes meet. */
  private readonly chosen = new Set<number>();

  /** @throws Error when the file has quoted cells, which the files of the demonstration never need. */
  constructor(
    readonly table: TableKey,
    file: Uint8Array,
  ) {
    const text = new TextDecoder().decode(file);
    if (text.includes('"')) throw new Error(`The file of ${table} has quoted cells.`);
    const [header = '', ...rows] = text.trimEnd().split(lineEnd);
    this.header = header.split(',');
    this.rows = rows.map((row) => row.split(','));
  }

  private place(column: string): number {
    const place = this.header.indexOf(column);
    if (place < 0) throw new Error(`The file of ${this.table} has no column ${column}.`);
    return place;
  }

  cell(row: number, column: string): string {
    return this.rows[row]?.[this.place(column)] ?? '';
  }

  write(row: number, column: string, text: string): void {
    const cells = this.rows[row];
    if (cells) cells[this.place(column)] = text;
  }

  /** The first row, not chosen before, whose cells suit; undefined when there is none. */
  choose(suits: (cell: CellText) => boolean): number | undefined {
    const row = this.rows.findIndex((_, index) => !this.chosen.has(index) && suits((column) => this.cell(index, column)));
    if (row < 0) return undefined;
    this.chosen.add(row);
    return row;
  }

  /** Puts a copy of a row at the end and returns its number. */
  repeat(row: number): number {
    this.chosen.add(this.rows.length);
    return this.rows.push([...(this.rows[row] ?? [])]) - 1;
  }

  addColumn(name: string, text: (row: number) => string): void {
    this.header.push(name);
    this.rows.forEach((cells, row) => cells.push(text(row)));
  }

  /** Line of a row as an editor counts it; the header is line 1. */
  lineOf(row: number): number {
    return row + 2;
  }

  bytes(): Uint8Array {
    return new TextEncoder().encode(stringify([this.header, ...this.rows], { record_delimiter: lineEnd }));
  }
}
