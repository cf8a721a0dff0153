import { FindingLog, readWorkbook } from '@cairnstep/submission-files';
import type { ByteSource, Finding, TypedTables, WorkbookLimits } from '@cairnstep/submission-files';

export interface WorkbookRead {
  readonly tables: TypedTables;
  readonly findings: readonly Finding[];
  /** `F47 bouts 3 steps`, other than the columns that short test sheets leave out. */
  readonly places: readonly string[];
}

/** Reads a workbook and lists where something was found. */
export async function readPlaces(source: ByteSource, limits?: WorkbookLimits): Promise<WorkbookRead> {
  const log = new FindingLog();
  const tables = await readWorkbook(source, log, limits);
  const findings = log.byRule().flatMap(({ kept }) => kept);
  const places = findings
    .filter(({ rule }) => rule !== 'F08')
    .map(({ rule, table, line, column }) => `${rule} ${table ?? 'workbook'} ${line ?? '-'} ${column ?? '-'}`);
  return { tables, findings, places };
}
