/** One sheet as a table: its first row that is not empty names the columns; what is hidden, merged or the example is told. */
import type { TableKey } from '@cairnstep/dictionary';
import type { FindingLog } from '../../finding-log.ts';
import type { CellKind } from '../../table/cell-kind.ts';
import { columnName, readHeaderRow } from '../../table/header-row.ts';
import type { HeaderColumn } from '../../table/header-row.ts';
import type { SheetRange } from './cell-reference.ts';
import { ExampleRow } from './example-row.ts';
import type { SheetEvents } from './sheet-reader.ts';

/** Takes the rows of a table's sheet. The arrays are used again for the next row. */
export interface RowSink {
  /** Whether findings may repeat a header that the dictionary does not have; any when left out. */
  mayShowHeader?(header: string): boolean;
  header(cells: readonly string[], columns: readonly HeaderColumn[], line: number): void;
  /** @param count As many cells as the header has, or more where more are filled. */
  row(cells: readonly string[], kinds: readonly CellKind[], count: number, line: number): void;
}

export class TableSheet implements SheetEvents {
  hasImage = false;
  private columns: readonly HeaderColumn[] = [];
  private example: ExampleRow | null = null;
  private headerLine = 0;
  private lastLine = 0;
  private readonly hidden = new Set<number>();
  private hiddenRows = 0;
  private firstHiddenRow = 0;

  constructor(
    private readonly table: TableKey,
    private readonly findings: FindingLog,
    private readonly sink: RowSink,
  ) {}

  get hasHeader(): boolean {
    return this.example !== null;
  }

  row(cells: string[], kinds: CellKind[], count: number, line: number, isHidden: boolean): void {
    if (!this.example) return this.takeHeader(cells, count, line);
    const { table, columns } = this;
    for (let position = count; position < columns.length; position += 1) {
      cells[position] = '';
      kinds[position] = 'text';
    }
    const example = this.example.compare(cells);
    if (example === 'changed')
      this.findings.add({
        rule: 'F48',
        table,
        line,
        column: this.example.markColumn,
        found: 'A row that is marked as the example and holds other values.',
      });
    if (example !== 'not-marked') return;
    this.lastLine = line;
    if (isHidden) {
      this.firstHiddenRow ||= line;
      this.hiddenRows += 1;
    }
    this.sink.row(cells, kinds, Math.max(count, columns.length), line);
  }

  private takeHeader(cells: readonly string[], count: number, line: number): void {
    const columns = readHeaderRow(this.table, cells, count, (header) => this.sink.mayShowHeader?.(header) ?? true);
    if (columns.length === 0) return;
    this.sink.header(cells.slice(0, columns.length), columns, line);
    this.columns = columns;
    this.example = new ExampleRow(this.table, columns);
    this.headerLine = line;
    this.lastLine = line;
    this.reportHiddenColumns();
  }

  hiddenColumns(first: number, last: number): void {
    for (let position = first; position <= last; position += 1) this.hidden.add(position);
  }

  private reportHiddenColumns(): void {
    this.columns.forEach((column, position) => {
      if (!this.hidden.has(position)) return;
      this.findings.add({
        rule: 'F45',
        table: this.table,
        line: null,
        column: columnName(column, position),
        found: 'The column is hidden.',
      });
    });
  }

  merged({ firstColumn, firstRow, lastRow }: SheetRange): void {
    const column = this.columns[firstColumn];
    if (!column || lastRow < this.headerLine || firstRow > this.lastLine) return;
    this.findings.add({
      rule: 'F44',
      table: this.table,
      line: firstRow,
      column: columnName(column, firstColumn),
      found: 'Cells that are merged into one from here on.',
    });
  }

  image(): void {
    this.hasImage = true;
  }

  /** To be called behind the last row. */
  end(): void {
    if (this.hiddenRows === 0) return;
    const found =
      this.hiddenRows === 1 ? 'A hidden row.' : `Hidden rows, ${this.hiddenRows.toLocaleString('en')} in all, of which this is the first.`;
    this.findings.add({ rule: 'F45', table: this.table, line: this.firstHiddenRow, column: null, found });
  }
}
