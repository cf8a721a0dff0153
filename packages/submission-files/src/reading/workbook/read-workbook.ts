/**
 * XLSX workbooks (ECMA-376) to the tables of a submission, the same in browser and server.
 *
 * Own reader over fflate's inflater (MIT, 8 kB, no dependencies). The one well-known alternative, exceljs 4.4.0, streams
 * only through Node's streams: its build for browsers weighs 930 kB and holds the whole workbook as objects (680 MB for the
 * 50,000 bouts of `bench/workbook.bench.ts`). It checks none of the sizes, names and places that a hostile archive lies
 * about, and streaming in Node it takes half as long again without typing a cell as this reader does with it (2.7 and 1.8 s).
 *
 * The packed bytes are held, up to the limit; parts are unpacked, scanned and typed piece by piece, so that beyond them
 * memory grows only with the typed rows and the texts that cells share.
 */
import type { TableKey } from '@cairnstep/dictionary';
import type { FindingLog } from '../../finding-log.ts';
import { defaultWorkbookLimits } from '../../limits.ts';
import type { WorkbookLimits } from '../../limits.ts';
import type { TypedTables } from '../../registry-context.ts';
import { TableBuilder } from '../../table/table-builder.ts';
import type { TableOptions } from '../../table/table-options.ts';
import type { TypedTable } from '../../table/typed-table.ts';
import type { ByteSource } from '../byte-source.ts';
import { readSheets } from './read-sheets.ts';

/**
 * Reads the tables of a workbook: one sheet each, named after the table; sheets that the template brings besides them
 * and its example rows are passed over.
 *
 * A sheet with a header and no rows gives a table of length 0, an empty sheet none. Everything that is wrong goes to
 * `findings`, with the sheet's table, row and column; where a sheet cannot be read any further, its rows so far are kept,
 * and the others are still read. What is wrong with the workbook as a whole (rules F03, F05, F40, F41) has no table.
 */
export async function readWorkbook(
  source: ByteSource,
  findings: FindingLog,
  limits: WorkbookLimits = defaultWorkbookLimits,
  optionsOf: (table: TableKey) => TableOptions = () => ({}),
): Promise<TypedTables> {
  const builders = new Map<TableKey, TableBuilder>();
  await readSheets(source, findings, limits, (table) => {
    const options = optionsOf(table);
    const builder = new TableBuilder(table, findings, limits, options);
    const { watch } = options;
    return {
      ...(watch ? { mayShowHeader: (header: string) => watch.mayShowHeader(header) } : {}),
      header(cells, _, line) {
        builder.header(cells, cells.length, line, { commaMayMarkThousands: true });
        builders.set(table, builder);
      },
      row: (cells, kinds, count, line) => builder.row(cells, count, line, kinds),
    };
  });
  const tables: Partial<Record<TableKey, TypedTable>> = {};
  for (const [table, builder] of builders) tables[table] = builder.take();
  return tables;
}
