/** A table as text while it is read row by row: its column names, then its rows with their places. */
import { UnreadableFile } from '../reading/unreadable-file.ts';
import { lastFilled } from './header-row.ts';

/** Titles, dates and the like that people write above the names of the columns. */
export const mostRowsAbove = 10;

interface PlacedRow {
  readonly cells: string[];
  readonly line: number;
}

export class TextRows {
  headers: readonly string[] = [];
  readonly rows: (readonly string[])[] = [];
  readonly lines: number[] = [];
  /** Rows above the column names, which were passed over. */
  rowsAbove = 0;
  private above: PlacedRow[] = [];

  /** @param what "file" or "sheet", for the words of a refusal */
  constructor(
    private readonly mostRows: number,
    private readonly what: string,
  ) {}

  /**
   * Takes the next row; one without a filled cell is passed over. The first with two filled cells names the columns, because a title has
   * one; in a table of one column the first names it.
   *
   * @param cells Used again by the reader; only the first `count` are of this row.
   * @returns the row as it was kept; null when it is none of the table's
   * @throws UnreadableFile when there are more rows than allowed
   */
  add(cells: readonly string[], count: number, line: number): string[] | null {
    const last = lastFilled(cells, count);
    if (last < 0) return null;
    if (this.headers.length === 0) {
      const row = cells.slice(0, last + 1);
      const isTitle = row.filter((cell) => cell.trim() !== '').length === 1;
      if (!isTitle) this.nameColumns(row);
      else if (this.above.push({ cells: row, line }) > mostRowsAbove) this.end();
      return null;
    }
    return this.keep(rowOf(cells, count, last, this.headers.length), line);
  }

  /** To be called behind the last row: a table of one column has no row with two cells. */
  end(): void {
    if (this.headers.length > 0) return;
    const [first, ...others] = this.above;
    this.above = [];
    if (first === undefined) return;
    this.headers = first.cells;
    for (const { cells, line } of others) this.keep(rowOf(cells, cells.length, cells.length - 1, this.headers.length), line);
  }

  private nameColumns(row: readonly string[]): void {
    this.headers = row;
    this.rowsAbove = this.above.length;
    this.above = [];
  }

  private keep(row: string[], line: number): string[] {
    if (this.rows.length >= this.mostRows) {
      const most = this.mostRows.toLocaleString('en');
      throw new UnreadableFile('F03', `The ${this.what} has more than ${most} rows.`, 'Prepare the month in smaller parts.', line);
    }
    this.rows.push(row);
    this.lines.push(line);
    return row;
  }
}

/** The cells of one row as their own list: as many as the header has, or up to the last one that is filled. */
function rowOf(cells: readonly string[], count: number, last: number, columns: number): string[] {
  const row = cells.slice(0, Math.min(count, Math.max(last + 1, columns)));
  while (row.length < columns) row.push('');
  return row;
}
