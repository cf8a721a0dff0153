import { tableKeys } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { FindingLog, checkSubmission, readTable, tableFromRows, writeCsv } from '@cairnstep/submission-files';
import type { RegistryContext, TypedTable } from '@cairnstep/submission-files';
import type { MonthRows } from './a-month.ts';

export const encode = (text: string): Uint8Array => new TextEncoder().encode(text);

/** Where a finding stands: `bouts 2 steps`. Line 2 is the first row of a file. */
export type Place = string;

const emptyRegistry: RegistryContext = { held: {}, withdrawn: new Set(), year: 2026 };

export function registry(held: MonthRows = {}, rest: Partial<RegistryContext> = {}): RegistryContext {
  const tables = Object.fromEntries(tableKeys.flatMap((key) => (held[key] ? [[key, tableFromRows(key, held[key])]] : [])));
  return { ...emptyRegistry, held: tables, ...rest };
}

/** Writes the rows as files, reads and checks them as a submission. */
export async function checkMonth(rows: MonthRows, context: RegistryContext = emptyRegistry): Promise<FindingLog> {
  const findings = new FindingLog();
  const tables: Partial<Record<TableKey, TypedTable>> = {};
  for (const key of tableKeys) {
    const own = rows[key];
    if (own) tables[key] = await readTable(key, encode(writeCsv(tableFromRows(key, own))), findings);
  }
  return checkSubmission(tables, context, findings);
}

/** The places of one rule's findings. */
export function placesOf(findings: FindingLog, rule: string): Place[] {
  const kept = findings.byRule().find(({ id }) => id === rule)?.kept ?? [];
  return kept.map(({ table, line, column }) => `${table} ${line} ${column ?? 'row'}`);
}
