/** A workbook as a clinic keeps it: every sheet as text, whatever it is called, for the preparation of a month at the site. */
import type { TableKey } from '@cairnstep/dictionary';
import { defaultWorkbookLimits } from '../../limits.ts';
import type { WorkbookLimits } from '../../limits.ts';
import type { CellKind } from '../../table/cell-kind.ts';
import { TextRows } from '../../table/text-rows.ts';
import type { ByteSource } from '../byte-source.ts';
import { unreadable } from '../unreadable.ts';
import type { Unreadable } from '../unreadable.ts';
import { UnreadableFile } from '../unreadable-file.ts';
import { openWorkbook } from './open-workbook.ts';
import { scanPart } from './scan-part.ts';
import { meaningOfSheet } from './sheet-names.ts';
import { SheetReader } from './sheet-reader.ts';
import type { SheetEvents } from './sheet-reader.ts';
import { wholeFile } from './whole-file.ts';

export interface TextSheet {
  readonly name: string;
  /** The table it is named after; null when its name is none of a table. */
  readonly table: TableKey | null;
  readonly headers: readonly string[];
  /** Calendar dates read `2026-03-05`, with a time `2026-03-05T09:30:00`. */
  readonly rows: readonly (readonly string[])[];
  /** Row of the sheet that each row came from. */
  readonly lines: readonly number[];
  /** Rows above the column names, which were passed over. */
  readonly rowsAbove: number;
  readonly isHidden: boolean;
  /** Positions of hidden columns that have a header, 1 for the first. */
  readonly hiddenColumns: readonly number[];
  readonly hiddenRows: number;
  readonly hasMergedCells: boolean;
  /** Cells that hold a failed or unfinished calculation, which were left empty. */
  readonly cellsWithoutValue: number;
}

export interface SheetsOfWorkbook {
  readonly ok: true;
  /** Sheets that have a header row, in their order; without those that the template brings besides its tables. */
  readonly sheets: readonly TextSheet[];
}

export async function readWorkbookSheets(
  source: ByteSource,
  limits: WorkbookLimits = defaultWorkbookLimits,
): Promise<SheetsOfWorkbook | Unreadable> {
  try {
    const { sheets, surroundings } = openWorkbook(await wholeFile(source, limits), limits);
    const read = sheets.flatMap(({ name, isHidden, entry }): TextSheet[] => {
      const table = meaningOfSheet(name);
      if (table === 'other') return [];
      const rows = new SheetRows(limits);
      scanPart(entry, new SheetReader(surroundings, limits, rows));
      const sheet = rows.result();
      return sheet.headers.length === 0 ? [] : [{ name, table, isHidden, ...sheet }];
    });
    if (read.length === 0)
      throw new UnreadableFile('F05', 'No sheet of the workbook holds a table.', 'Begin each sheet with a row of column names.', null);
    return { ok: true, sheets: read };
  } catch (error) {
    return unreadable(error);
  }
}

/** Gathers the rows of one sheet, and what a spreadsheet program does not show of it. */
class SheetRows implements SheetEvents {
  private readonly table: TextRows;
  private readonly hidden = new Set<number>();
  private hiddenRows = 0;
  private hasMergedCells = false;
  private cellsWithoutValue = 0;

  constructor(limits: WorkbookLimits) {
    this.table = new TextRows(limits.rows, 'sheet');
  }

  row(cells: string[], kinds: CellKind[], count: number, line: number, isHidden: boolean): void {
    for (let position = 0; position < count; position += 1) {
      if (kinds[position] !== 'error' && kinds[position] !== 'uncalculated') continue;
      cells[position] = '';
      this.cellsWithoutValue += 1;
    }
    if (this.table.add(cells, count, line) !== null && isHidden) this.hiddenRows += 1;
  }

  hiddenColumns(first: number, last: number): void {
    for (let position = first; position <= last; position += 1) this.hidden.add(position);
  }

  merged(): void {
    this.hasMergedCells = true;
  }

  /** A picture beside the cells is not read. */
  image(): void {}

  result(): Omit<TextSheet, 'name' | 'table' | 'isHidden'> {
    this.table.end();
    const { hidden, hiddenRows, hasMergedCells, cellsWithoutValue } = this;
    const { headers, rows, lines, rowsAbove } = this.table;
    const hiddenColumns = headers.flatMap((header, position) => (header.trim() !== '' && hidden.has(position) ? [position + 1] : []));
    return { headers, rows, lines, rowsAbove, hiddenColumns, hiddenRows, hasMergedCells, cellsWithoutValue };
  }
}
