/** The rows of submitted files as they were sent, cell by cell, for showing them again with what was found. */
import type { TableKey } from '@cairnstep/dictionary';
import type { WorkbookLimits } from '../../limits.ts';
import type { ByteSource } from '../../reading/byte-source.ts';
import { scanCsv } from '../../reading/scan-csv.ts';
import { UnreadableFile } from '../../reading/unreadable-file.ts';
import { openWorkbook } from '../../reading/workbook/open-workbook.ts';
import { scanPieces } from '../../reading/workbook/scan-part.ts';
import { meaningOfSheet } from '../../reading/workbook/sheet-names.ts';
import { SheetReader } from '../../reading/workbook/sheet-reader.ts';
import type { SheetSurroundings } from '../../reading/workbook/sheet-reader.ts';
import { wholeFile } from '../../reading/workbook/whole-file.ts';
import type { CellKind } from '../../table/cell-kind.ts';
import type { Mends } from '../../table/table-options.ts';
import type { ZipEntry } from '../../zip/zip-directory.ts';
import { mendedRows } from './mended-rows.ts';

/** A file of a submission, the CSV file of one table or a workbook of several, with what was mended in it on screen. */
export type SubmittedFile =
  | { readonly table: TableKey; readonly csv: ByteSource; readonly mends?: Mends }
  | { readonly workbook: ByteSource; readonly mendsOf?: (table: TableKey) => Mends | undefined };

export interface SubmittedRow {
  readonly line: number;
  readonly cells: readonly string[];
  /** Of the cells of a workbook; those of a CSV file are all text. */
  readonly kinds: readonly CellKind[] | null;
}

export interface SubmittedTable {
  readonly table: TableKey;
  /** Rows with at least one filled cell, up to where the file cannot be read any further. To be gone through once. */
  readonly rows: AsyncIterable<SubmittedRow>;
}

/** The tables of the files, in the order of the files and sheets; a workbook that cannot be opened has none. */
export async function submittedTables(files: readonly SubmittedFile[], limits: WorkbookLimits): Promise<readonly SubmittedTable[]> {
  const tables: SubmittedTable[] = [];
  for (const file of files) {
    if ('csv' in file) tables.push(mended({ table: file.table, rows: csvRows(file.table, file.csv, limits) }, file.mends));
    else for (const table of await workbookTables(file.workbook, limits)) tables.push(mended(table, file.mendsOf?.(table.table)));
  }
  return tables.filter(({ table }, index) => tables.findIndex((other) => other.table === table) === index);
}

const mended = ({ table, rows }: SubmittedTable, mends: Mends | undefined): SubmittedTable => ({
  table,
  rows: mends ? mendedRows(table, rows, mends) : rows,
});

/** What cannot be read is among the findings already. */
function refuseOthers(error: unknown): void {
  if (!(error instanceof UnreadableFile)) throw error;
}

const isFilled = (cell: string): boolean => cell.trim() !== '';

async function* csvRows(table: TableKey, source: ByteSource, limits: WorkbookLimits): AsyncGenerator<SubmittedRow> {
  let ready: SubmittedRow[] = [];
  const scan = scanCsv(table, source, limits, (cells, count, line) => {
    const own = cells.slice(0, count);
    if (own.some(isFilled)) ready.push({ line, cells: own, kinds: null });
  });
  try {
    for await (const _ of scan) {
      yield* ready;
      ready = [];
    }
  } catch (error) {
    refuseOthers(error);
  }
  yield* ready;
}

async function* sheetRows(entry: ZipEntry, surroundings: SheetSurroundings, limits: WorkbookLimits): AsyncGenerator<SubmittedRow> {
  let ready: SubmittedRow[] = [];
  const reader = new SheetReader(surroundings, limits, {
    row(cells, kinds, count, line) {
      const own = cells.slice(0, count);
      if (own.some(isFilled)) ready.push({ line, cells: own, kinds: kinds.slice(0, count) });
    },
    hiddenColumns() {},
    merged() {},
    image() {},
  });
  try {
    for (const _ of scanPieces(entry, reader)) {
      yield* ready;
      ready = [];
    }
  } catch (error) {
    refuseOthers(error);
  }
  yield* ready;
}

async function workbookTables(source: ByteSource, limits: WorkbookLimits): Promise<SubmittedTable[]> {
  try {
    const { sheets, surroundings } = openWorkbook(await wholeFile(source, limits), limits);
    return sheets.flatMap(({ name, entry }) => {
      const table = meaningOfSheet(name);
      return table === null || table === 'other' ? [] : [{ table, rows: sheetRows(entry, surroundings, limits) }];
    });
  } catch (error) {
    refuseOthers(error);
    return [];
  }
}
