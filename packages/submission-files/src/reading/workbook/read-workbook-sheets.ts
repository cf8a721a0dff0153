/** A workbook as a clinic keeps it: every sheet as text, whatever it is called, for the preparation of a month at the site. */
import type { TableKey } from '@cairnstep/dictionary';
import { defaultWorkbookLimits } from '../../limits.ts';
import type { WorkbookLimits } from '../../limits.ts';
import type { CellKind } from '../../table/cell-kind.ts';
import { lastFilled } from '../../table/header-row.ts';
import { rowOf } from '../../table/row-of.ts';
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
      return rows.headers.length === 0 ? [] : [{ name, table, isHidden, ...rows.result() }];
    });
    if (read.length === 0)
      throw new UnreadableFile('F05', 'No sheet of the workbook holds a table.', 'Begin each sheet with a row of column names.', null);
    return { ok: true, sheets: read };
  } catch (error) {
    return unreadable(error);
  }
}

/** Gathers the rows of one sheet; its first row that is not empty names the columns. */
class SheetRows implements SheetEvents {
  headers: readonly string[] = [];
  private readonly rows: string[][] = [];
  private readonly lines: number[] = [];
  private readonly hidden = new Set<number>();
  private hiddenRows = 0;
  private hasMergedCells = false;
  private cellsWithoutValue = 0;

  constructor(private readonly limits: WorkbookLimits) {}

  row(cells: string[], kinds: CellKind[], count: number, line: number, isHidden: boolean): void {
    const last = lastFilled(cells, count);
    if (last < 0) return;
    if (this.headers.length === 0) {
      this.headers = cells.slice(0, last + 1);
      return;
    }
    if (this.rows.length >= this.limits.rows) {
      const most = this.limits.rows.toLocaleString('en');
      throw new UnreadableFile('F03', `A sheet has more than ${most} rows.`, 'Prepare the month in smaller parts.', line);
    }
    const row = rowOf(cells, count, last, this.headers.length);
    row.forEach((_, position) => {
      if (kinds[position] !== 'error' && kinds[position] !== 'uncalculated') return;
      row[position] = '';
      this.cellsWithoutValue += 1;
    });
    if (isHidden) this.hiddenRows += 1;
    this.rows.push(row);
    this.lines.push(line);
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
    const { headers, rows, lines, hidden, hiddenRows, hasMergedCells, cellsWithoutValue } = this;
    const hiddenColumns = headers.flatMap((header, position) => (header.trim() !== '' && hidden.has(position) ? [position + 1] : []));
    return { headers, rows, lines, hiddenColumns, hiddenRows, hasMergedCells, cellsWithoutValue };
  }
}
