/** The files as the registry would judge them when they arrive. */
import type { Row, TableKey } from '@cairnstep/dictionary';
import { tableKeys } from '@cairnstep/dictionary';
import { checkSubmission, FindingLog, readTable, tableFromRows } from '@cairnstep/submission-files';
import type { Finding, TypedTable } from '@cairnstep/submission-files';
import { describe, expect, it } from 'vitest';
import { demoCsv, typedRows } from './csv.ts';
import { demoRegistry, demoSeed } from './registry.ts';
import type { DemoFiles } from './types.ts';

const lastMonth = '2026-10';
const registry = demoRegistry({ seed: demoSeed, lastMonth });
const months = [...registry.months()];

type Held = Map<TableKey, Row[]>;

/** What the registry holds when a file arrives. Bouts of other sessions are never looked at. */
function heldTables(held: Held, tables: Partial<Record<TableKey, TypedTable>>): Partial<Record<TableKey, TypedTable>> {
  const people = new Set<unknown>();
  for (const table of Object.values(tables))
    for (let row = 0; row < table.length; row += 1) people.add(table.column('participant').word(row));
  const kept = tableKeys.filter((table) => table !== 'bouts' && held.has(table));
  return Object.fromEntries(
    kept.map((table) => [
      table,
      tableFromRows(
        table,
        (held.get(table) ?? []).filter(({ participant }) => people.has(participant)),
      ),
    ]),
  );
}

async function judge(files: DemoFiles, held: Held, year: number): Promise<{ log: FindingLog; findings: Finding[]; rows: number }> {
  const log = new FindingLog();
  const tables: Partial<Record<TableKey, TypedTable>> = {};
  for (const table of tableKeys) if (files[table]) tables[table] = await readTable(table, files[table], log);
  checkSubmission(tables, { held: heldTables(held, tables), withdrawn: new Set(), year }, log);
  const rows = Object.values(tables).reduce((sum, table) => sum + table.length, 0);
  return { log, findings: log.byRule().flatMap(({ kept }) => kept), rows };
}

function hold(held: Held, table: TableKey, rows: readonly Row[]): void {
  held.set(table, [...(held.get(table) ?? []), ...rows]);
}

function allHeld(code: string): Held {
  const held: Held = new Map();
  for (const { site, tables } of months) {
    if (site !== code) continue;
    for (const table of tableKeys) if (tables[table]) hold(held, table, typedRows(table, tables[table]));
  }
  return held;
}

describe.each(['S02', 'S05', 'S12'])('every month of site %s', (code) => {
  it('is free of errors, with hardly a warning', async () => {
    const held: Held = new Map();
    let warnings = 0;
    let rows = 0;
    for (const { site, month, tables } of months) {
      if (site !== code) continue;
      const files = Object.fromEntries(tableKeys.flatMap((table) => (tables[table] ? [[table, demoCsv(table, tables[table])]] : [])));
      const judged = await judge(files, held, Number(month.slice(0, 4)));
      expect(judged.findings.filter(({ severity }) => severity === 'error')).toEqual([]);
      warnings += judged.log.counts.warnings;
      rows += judged.rows;
      for (const table of tableKeys) if (tables[table]) hold(held, table, typedRows(table, tables[table]));
    }
    expect(warnings).toBeLessThan(rows / 200);
  });
});

describe('the files of the next month', () => {
  const year = 2026;

  it('are free of errors at the first site', async () => {
    const { log, rows } = await judge(registry.next.clean, allHeld('S01'), year);
    expect(rows).toBeGreaterThan(300);
    expect(log.counts.errors).toBe(0);
    expect(log.counts.warnings).toBeLessThan(5);
  });

  it('hold at the second site every planted mistake just where the list says, and no error beside them', async () => {
    const { planted, mistakes } = registry.next;
    const { findings } = await judge(mistakes, allHeld('S02'), year);
    const place = ({ rule, table, line, column }: Omit<Finding, 'severity' | 'found' | 'mend'>): string =>
      JSON.stringify([rule, table, line, column]);
    const found = new Set(findings.map(place));
    expect(planted.filter((mistake) => !found.has(place(mistake)))).toEqual([]);
    expect(planted.length).toBe(15);

    const expected = new Set(planted.map(place));
    const errors = findings.filter(({ severity }) => severity === 'error');
    expect(errors.filter((finding) => !expected.has(place(finding)))).toEqual([]);
  });

  it('break beside the planted rules only those named with them', async () => {
    const { findings } = await judge(registry.next.mistakes, allHeld('S02'), year);
    const named = new Set(registry.next.planted.flatMap(({ rule, also }) => [rule, ...also]));
    // Warnings that the month has without any mistake.
    const usual = new Set(['E02', 'F22']);
    expect(findings.filter(({ rule }) => !named.has(rule) && !usual.has(rule))).toEqual([]);
  });
});
