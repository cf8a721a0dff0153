import { createHash } from 'node:crypto';
import { dictionary, rowProblems, tableKeys, tableOf } from '@cairnstep/dictionary';
import type { Row, TableKey } from '@cairnstep/dictionary';
import { aisGrades, classify, examFromCells, levelGroups, validateExam } from '@cairnstep/scoring';
import type { Classification } from '@cairnstep/scoring';
import { describe, expect, it } from 'vitest';
import { addMonths, monthOf } from './calendar.ts';
import { drawCohort } from './cohort.ts';
import { typedRows } from './csv.ts';
import { demoRegistry, demoSeed } from './registry.ts';
import type { DemoMonth, DemoRegistry } from './types.ts';

const lastMonth = '2026-10';
const registry = demoRegistry({ seed: demoSeed, lastMonth });
const months = [...registry.months()];

interface SiteRow {
  readonly site: string;
  readonly month: string;
  readonly row: Row;
}

const typed = new Map<TableKey, readonly SiteRow[]>();

function rowsOf(table: TableKey): readonly SiteRow[] {
  let rows = typed.get(table);
  if (!rows) {
    rows = months.flatMap(({ site, month, tables }) => typedRows(table, tables[table] ?? []).map((row) => ({ site, month, row })));
    typed.set(table, rows);
  }
  return rows;
}

/** Everything that leaves the generator, as one fingerprint. */
function fingerprint({ sites, months: all, next }: DemoRegistry): string {
  const hash = createHash('sha256').update(JSON.stringify(sites));
  for (const month of all()) hash.update(JSON.stringify(month));
  for (const files of [next.clean, next.mistakes]) for (const table of tableKeys) hash.update(files[table] ?? '');
  return hash.update(JSON.stringify(next.planted)).digest('hex');
}

function classification(row: Row): Classification {
  const checked = validateExam(examFromCells((key) => row[key]?.toString()));
  if (!('exam' in checked)) throw new Error('An exam was refused.');
  return classify(checked.exam);
}

describe('the demonstration registry', () => {
  it('is the same for the same seed and month, byte for byte', () => {
    expect(fingerprint(demoRegistry({ seed: demoSeed, lastMonth }))).toBe(fingerprint(registry));
  });

  it('differs for another seed', () => {
    const other = demoRegistry({ seed: demoSeed + 1, lastMonth });
    expect(fingerprint(other)).not.toBe(fingerprint(registry));
    expect(other.sites).toEqual(registry.sites);
  });

  it('gives its months once more when asked once more', () => {
    expect([...registry.months()].length).toBe(months.length);
  });

  it('refuses what is no seed or no month', () => {
    for (const seed of [-1, 1.5, 2 ** 32, Number.NaN]) expect(() => demoRegistry({ seed, lastMonth })).toThrow(RangeError);
    for (const month of ['2026-13', 'October 2026', '2000-05', '2099-12'])
      expect(() => demoRegistry({ seed: 1, lastMonth: month })).toThrow(RangeError);
  });

  it('holds 24 months of 12 sites, in calendar order, each site from its first month on', () => {
    expect(registry.sites.map(({ code }) => code)).toEqual(
      Array.from({ length: 12 }, (_, index) => `S${String(index + 1).padStart(2, '0')}`),
    );
    expect(new Set(registry.sites.map(({ name }) => name)).size).toBe(12);
    const order = months.map(({ month, site }) => `${month} ${site}`);
    expect(order).toEqual([...order].sort());
    const submitted = (code: string): string[] => months.filter(({ site }) => site === code).map(({ month }) => month);
    for (const { code, firstMonth } of registry.sites) {
      const expected = Array.from({ length: 24 }, (_, back) => addMonths(lastMonth, back - 23)).filter((month) => month >= firstMonth);
      expect(submitted(code)).toEqual(expected);
    }
  });

  it('has about as many people, sessions and bouts as it promises', () => {
    const count = (table: TableKey): number => months.reduce((sum, { tables }) => sum + (tables[table]?.length ?? 0), 0);
    expect(count('participants')).toBe(600);
    expect(count('sessions')).toBeGreaterThan(16_500);
    expect(count('sessions')).toBeLessThan(19_500);
    expect(count('bouts')).toBeGreaterThan(74_000);
    expect(count('bouts')).toBeLessThan(88_000);
    expect(count('exams')).toBeGreaterThan(950);
    expect(count('adverse_events')).toBeGreaterThan(300);
  });

  it('knows every participant, once and at one site, before or with the first other row', () => {
    const known = new Map<string, string>();
    for (const { site, tables } of months) {
      for (const [participant] of tables.participants ?? []) {
        expect(known.has(String(participant))).toBe(false);
        known.set(String(participant), site);
      }
      for (const rows of Object.values(tables)) expect(rows.every(([participant]) => known.get(String(participant)) === site)).toBe(true);
    }
  });

  it('contradicts itself in no row', () => {
    for (const table of dictionary.tables) {
      const problems = rowsOf(table.key).flatMap(({ row }) => rowProblems(table, row));
      expect(problems).toEqual([]);
    }
  });

  it('uses only codes of the dictionary and holds no date', () => {
    for (const { key, variables } of dictionary.tables) {
      const allowed = variables.map(
        ({ codes, missingCodes }) => codes && new Set([...codes, ...(missingCodes ?? [])].map(({ code }) => code)),
      );
      for (const { tables } of months) {
        for (const row of tables[key] ?? []) {
          row.forEach((cell, column) => {
            if (typeof cell !== 'string' || column === 0) return;
            if (!allowed[column]?.has(cell)) throw new Error(`${key}.${variables[column]?.key ?? ''} holds something that is no code`);
          });
        }
      }
    }
  });
});

describe('its months', () => {
  const cohort = drawCohort({ seed: demoSeed, lastMonth });

  it('hold the sessions of their calendar days, counted from the hidden first training day', () => {
    const indexDay = new Map(cohort.map(({ person }) => [person.code, person.indexDay]));
    for (const { month, row } of rowsOf('sessions')) {
      expect(monthOf((indexDay.get(String(row['participant'])) ?? 0) + Number(row['session_day']))).toBe(month);
    }
  });

  it('bring what lies before the first training day with the first one', () => {
    const begun = new Map(rowsOf('participants').map(({ month, row }) => [row['participant'], month]));
    const early = rowsOf('exams').filter(({ row }) => Number(row['exam_day']) < 0 && Number(row['exam_day']) > -30);
    expect(early.length).toBeGreaterThanOrEqual(590);
    expect(early.every(({ month, row }) => begun.get(row['participant']) === month)).toBe(true);
  });

  it('show in every exam the level and grade that was meant', () => {
    let open = 0;
    for (const { exams } of cohort) {
      for (const { finding, open: left, row } of exams) {
        const [cells] = typedRows('exams', [row.row]);
        const { nli, ais } = classification(cells ?? {});
        if (left === undefined) expect([nli.values, ais.values]).toEqual([[finding.nli], [finding.grade]]);
        else {
          open += 1;
          expect(nli.values).toContain(finding.nli);
          expect(ais.values).toContain(finding.grade);
        }
      }
    }
    expect(open).toBeGreaterThan(3);
  });

  it('keep bouts within the session they belong to', () => {
    const walked = new Map<string, number>();
    const key = (row: Row): string => [row['participant'], row['session_day'], row['session_no']].join(' ');
    for (const { row } of rowsOf('bouts')) {
      if (row['activity'] === 'walking') walked.set(key(row), (walked.get(key(row)) ?? 0) + Number(row['duration_s']) / 60);
    }
    let compared = 0;
    for (const { row } of rowsOf('sessions')) {
      const minutes = walked.get(key(row));
      if (minutes === undefined) continue;
      expect(minutes).toBeLessThanOrEqual(Number(row['planned_min']));
      if (row['upright_min'] === undefined) continue;
      compared += 1;
      expect(minutes).toBeLessThanOrEqual(Number(row['upright_min']));
    }
    expect(compared).toBeGreaterThan(14_000);
  });
});

describe('its consents', () => {
  const rows = rowsOf('consents');
  const count = (key: string, value: string): number => rows.filter(({ row }) => row[key] === value).length;

  it('range from wide to narrow', () => {
    expect(new Set(rows.map(({ row }) => row['participant'])).size).toBe(600);
    for (const permission of ['NRES', 'GRU', 'HMB', 'DS']) expect(count('permission', permission)).toBeGreaterThan(5);
    for (const { key } of tableOf('consents').variables.filter(({ key: name }) => /^duo_[a-z]+$/.test(name)))
      expect(count(key, 'yes')).toBeGreaterThan(0);
    expect(count('no_aggregates', 'yes')).toBeGreaterThan(5);
    expect(count('no_controls', 'yes')).toBeGreaterThan(5);
    const conditions = new Set(rows.map(({ row }) => row['condition']));
    expect(conditions.size).toBeGreaterThan(6);
  });

  it('are withdrawn by twelve people, of whom nothing follows', () => {
    const withdrawn = rows.filter(({ row }) => row['status'] === 'withdrawn');
    expect(withdrawn.length).toBe(12);
    for (const { month, row } of withdrawn) {
      const { participant } = row;
      const later = months.filter((each) => each.month >= month).flatMap(({ tables }) => Object.values({ ...tables, consents: [] }).flat());
      expect(later.some(([code]) => code === participant)).toBe(false);
      const numbers = rows.filter((each) => each.row['participant'] === participant).map((each) => Number(each.row['consent_no']));
      expect(Math.max(...numbers)).toBe(row['consent_no']);
    }
  });
});

describe('change of the self-selected speed by level and grade', () => {
  const isStart = (month: DemoMonth['month'], row: Row): boolean =>
    Number(row['exam_day']) <= 0 && monthOfStart.get(row['participant']) === month;
  const monthOfStart = new Map(rowsOf('participants').map(({ month, row }) => [row['participant'], month]));
  const cellOf = new Map(
    rowsOf('exams')
      .filter(({ month, row }) => isStart(month, row))
      .map(({ site, row }) => {
        const { nli, ais } = classification(row);
        return [
          row['participant'],
          { site, cell: `${levelGroups.assign(nli.values)} ${ais.values.length === 1 ? ais.values[0] : 'ND'}` },
        ] as const;
      }),
  );
  const speeds = rowsOf('assessments').filter(
    ({ row }) => row['measure'] === 'tmwt_ss' && row['in_device'] === 'no' && row['course_no'] === 1 && row['value'] !== undefined,
  );
  const at = (timepoint: string): Map<Row[string], number> =>
    new Map(speeds.filter(({ row }) => row['timepoint'] === timepoint).map(({ row }) => [row['participant'], Number(row['value'])]));
  const before = at('baseline');
  const after = at('end_of_course');

  interface Group {
    readonly sites: Set<string>;
    readonly changes: number[];
  }
  const groups = new Map<string, Group>();
  for (const [participant, { site, cell }] of cellOf) {
    const [from, to] = [before.get(participant), after.get(participant)];
    if (from === undefined || to === undefined) continue;
    const group = groups.get(cell) ?? { sites: new Set<string>(), changes: [] };
    group.sites.add(site);
    group.changes.push(to - from);
    groups.set(cell, group);
  }
  const sizes = [...groups.values()].map(({ changes }) => changes.length);

  it('has large, small and empty cells', () => {
    expect(sizes.filter((size) => size >= 15).length).toBeGreaterThanOrEqual(5);
    expect(sizes.filter((size) => size <= 10).length).toBeGreaterThanOrEqual(3);
    const cells = levelGroups.groups.length * aisGrades.length;
    expect(cells - sizes.length).toBeGreaterThanOrEqual(15);
  });

  it('rests on at least three sites wherever the cell is large enough to be shown', () => {
    // Figures of fewer than 11 people are hidden by the registry's policy.
    for (const { sites, changes } of groups.values()) if (changes.length >= 11) expect(sites.size).toBeGreaterThanOrEqual(3);
  });

  it('is of a plausible size: small gains on average, losses among them', () => {
    for (const { changes } of groups.values()) {
      if (changes.length < 11) continue;
      const mean = changes.reduce((sum, change) => sum + change, 0) / changes.length;
      expect(mean).toBeGreaterThan(0.03);
      expect(mean).toBeLessThan(0.3);
    }
    const all = [...groups.values()].flatMap(({ changes }) => changes);
    expect(all.some((change) => change < 0)).toBe(true);
  });
});
