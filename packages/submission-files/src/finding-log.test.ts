import { tableKeys } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { FindingLog } from './finding-log.ts';

const place = { table: 'bouts', column: 'steps', found: 'x' } as const;

describe('FindingLog', () => {
  it('counts every finding and keeps as many of a rule as it may', () => {
    const log = new FindingLog({ perRule: 3, inAll: 5 });
    for (let line = 1; line <= 10; line += 1) log.add({ ...place, rule: 'F10', line });
    for (let line = 1; line <= 10; line += 1) log.add({ ...place, rule: 'F22', line });
    expect(log.byRule().map(({ id, count, kept }) => [id, count, kept.length])).toEqual([
      ['F10', 10, 3],
      ['F22', 10, 2],
    ]);
    expect(log.counts).toEqual({ errors: 10, warnings: 10 });
  });

  it('keeps 40,000 findings of one rule by default', () => {
    const log = new FindingLog();
    for (let line = 1; line <= 40_000; line += 1) log.add({ ...place, rule: 'T04', line });
    expect(log.byRule()[0]?.kept).toHaveLength(40_000);
  });

  it('gives errors before warnings, and the findings of a rule by table, line and column', () => {
    const log = new FindingLog();
    log.add({ ...place, rule: 'T04', line: 2 });
    log.add({ ...place, rule: 'F21', line: 9 });
    log.add({ ...place, rule: 'F21', line: 3, column: 'rpe_end' });
    log.add({ ...place, rule: 'F21', line: 3, column: 'hr_end' });
    log.add({ ...place, rule: 'F21', line: 4, table: 'sessions' });
    log.add({ ...place, rule: 'F21', line: null });
    const found = log.byRule();
    expect(found.map(({ id }) => id)).toEqual(['F21', 'T04']);
    expect(found[0]?.kept.map(({ table, line, column }) => `${table} ${line} ${column}`)).toEqual([
      'sessions 4 steps',
      'bouts null steps',
      'bouts 3 hr_end',
      'bouts 3 rpe_end',
      'bouts 9 steps',
    ]);
  });

  it('takes severity and mend from the rule, and another mend where one is given', () => {
    const log = new FindingLog();
    log.add({ ...place, rule: 'F22', line: 1 });
    log.add({ ...place, rule: 'F22', line: 2, mend: 'other' });
    expect(log.byRule()[0]?.kept).toMatchObject([
      { severity: 'warning', mend: 'Check the value; if it is right, say so.' },
      { mend: 'other' },
    ]);
  });

  it('puts findings about a whole workbook before those of its tables, and takes all tables for incomplete after one that stops', () => {
    const log = new FindingLog();
    log.add({ ...place, rule: 'F42', table: 'participants', line: 1 });
    log.add({ ...place, rule: 'F42', table: null, line: null });
    expect(log.byRule()[0]?.kept.map(({ table }) => table)).toEqual([null, 'participants']);
    expect(log.incomplete.size).toBe(0);
    log.addStopping({ ...place, rule: 'F41', table: null, line: null });
    expect([...log.incomplete]).toEqual(tableKeys);
  });

  it('refuses a rule that nobody has stated', () => {
    expect(() => new FindingLog().add({ ...place, rule: 'X99', line: 1 })).toThrow(RangeError);
  });
});
