/** CSV files to typed tables, in batches of rows and in memory that does not grow with the file. */
import type { TableKey } from '@cairnstep/dictionary';
import type { FindingLog } from '../finding-log.ts';
import { defaultLimits } from '../limits.ts';
import type { ReadLimits } from '../limits.ts';
import { TableBuilder } from '../table/table-builder.ts';
import type { TableOptions } from '../table/table-options.ts';
import type { TypedTable } from '../table/typed-table.ts';
import type { ByteSource } from './byte-source.ts';
import { scanCsv } from './scan-csv.ts';
import type { OnCsvRecord } from './scan-csv.ts';
import { UnreadableFile } from './unreadable-file.ts';

const batchRows = 10_000;

/**
 * Reads the CSV file of one table.
 *
 * Yields the rows in batches, in the order of the file. Everything that is wrong goes to `findings`; where a file cannot
 * be read any further, what was read so far is still yielded and the findings say why (rules F01 to F05).
 */
export async function* readCsv(
  table: TableKey,
  source: ByteSource,
  findings: FindingLog,
  limits: ReadLimits = defaultLimits,
): AsyncGenerator<TypedTable> {
  const builder = new TableBuilder(table, findings, limits);
  for await (const { ended } of fillFromCsv(builder, source)) {
    if (builder.length >= batchRows || (ended && builder.length > 0)) yield builder.take();
  }
}

/** Reads the CSV file of one table as a whole; the same as `readCsv` with all batches in one. */
export async function readTable(
  table: TableKey,
  source: ByteSource,
  findings: FindingLog,
  limits: ReadLimits = defaultLimits,
  options: TableOptions = {},
): Promise<TypedTable> {
  const builder = new TableBuilder(table, findings, limits, options);
  for await (const _ of fillFromCsv(builder, source));
  return builder.take();
}

/** Fills the builder; stops at each piece of the file, so that rows can be taken, and a last time at its end. */
async function* fillFromCsv(builder: TableBuilder, source: ByteSource): AsyncGenerator<{ readonly ended: boolean }> {
  const { table, findings, limits } = builder;
  const onRecord: OnCsvRecord = (cells, count, line, strayQuote, commaSeparated) => {
    if (builder.hasHeader) builder.row(cells, count, line);
    else builder.header(cells, count, line, { commaMayMarkThousands: commaSeparated });
    if (strayQuote) findings.add({ rule: 'F04', table, line, column: null, found: 'Text follows a closing quotation mark.' });
  };

  try {
    const readPlain = builder.plainRow.bind(builder);
    for await (const _ of scanCsv(table, source, limits, onRecord, readPlain)) yield { ended: false };
    if (!builder.hasHeader) throw new UnreadableFile('F05', 'The file is empty.', 'Begin with the header row of the template.', null);
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
    findings.addStopping({ rule: error.rule, table, line: error.line, column: null, found: error.found, mend: error.mend });
  }
  yield { ended: true };
}
