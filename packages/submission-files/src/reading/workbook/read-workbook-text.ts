import type { TableKey } from '@cairnstep/dictionary';
import type { FindingLog } from '../../finding-log.ts';
import { defaultWorkbookLimits } from '../../limits.ts';
import type { WorkbookLimits } from '../../limits.ts';
import { faultOfKind } from '../../table/cell-kind.ts';
import { columnLetters, columnName } from '../../table/header-row.ts';
import type { HeaderColumn } from '../../table/header-row.ts';
import type { ByteSource } from '../byte-source.ts';
import { UnreadableFile } from '../unreadable-file.ts';
import { readSheets } from './read-sheets.ts';

/** A table before anything is known about its columns: every cell is text. */
export interface TextTable {
  readonly table: TableKey;
  readonly headers: readonly string[];
  readonly rows: readonly (readonly string[])[];
  /** Row of the sheet that each row came from. */
  readonly lines: readonly number[];
}

/**
 * Reads the tables of a workbook as text, for the preparation of a month at the site, where cells still hold the site's
 * own numbers and calendar dates: those read `2026-03-05`, with a time `2026-03-05T09:30:00`. Headers are not judged.
 * Otherwise like `readWorkbook`.
 */
export async function readWorkbookText(
  source: ByteSource,
  findings: FindingLog,
  limits: WorkbookLimits = defaultWorkbookLimits,
): Promise<readonly TextTable[]> {
  const tables: TextTable[] = [];
  await readSheets(source, findings, limits, (table) => {
    const rows: string[][] = [];
    const lines: number[] = [];
    let columns: readonly HeaderColumn[] = [];
    return {
      header(headers, found) {
        columns = found;
        tables.push({ table, headers, rows, lines });
      },
      row(cells, kinds, count, line) {
        if (rows.length >= limits.rows)
          throw new UnreadableFile(
            'F03',
            `The sheet has more than ${limits.rows.toLocaleString('en')} rows.`,
            'Send the month in smaller parts.',
            line,
          );
        const row = cells.slice(0, count);
        kinds.slice(0, count).forEach((kind, position) => {
          const fault = kind === 'date' ? undefined : faultOfKind(kind);
          if (!fault) return;
          const column = columns[position];
          row[position] = '';
          findings.add({ ...fault, table, line, column: column ? columnName(column, position) : columnLetters(position) });
        });
        rows.push(row);
        lines.push(line);
      },
    };
  });
  return tables;
}
