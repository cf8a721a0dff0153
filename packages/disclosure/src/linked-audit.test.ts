import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { bothSlicesHidden, oneSliceHidden, slices } from '../reference/linked-slices.ts';
import type { CountTable, HiddenPattern, LinearSolver, LinkedTables, SlicePlace } from './index.ts';
import { intervalAudit, linkedIntervalAudit, linkSlices, loadLinearSolver } from './index.ts';

let solver: LinearSolver;
beforeAll(async () => {
  solver = await loadLinearSolver();
});

const pattern = ({ counts }: CountTable, hidden: boolean): HiddenPattern => ({
  cells: counts.map((row) => row.map(() => hidden)),
  rowTotals: counts.map(() => false),
  columnTotals: (counts[0] ?? []).map(() => false),
  grandTotal: false,
});

const possiblyEmpty = { knowledge: () => ({ least: 0, most: Number.POSITIVE_INFINITY }) };

function linked(hidden: { male: boolean; female: boolean }): LinkedTables<SlicePlace> {
  const male = { counts: slices.male };
  const female = { counts: slices.female };
  return linkSlices(
    [
      { name: 'male', table: male, hidden: pattern(male, hidden.male) },
      { name: 'female', table: female, hidden: pattern(female, hidden.female) },
    ],
    pattern(male, false),
  );
}

describe('linkedIntervalAudit', () => {
  it('finds that one hidden slice is given back by the other and the table of all', () => {
    const intervals = linkedIntervalAudit(solver, linked({ male: true, female: false }), possiblyEmpty);
    expect(intervals).toEqual(oneSliceHidden.map(([slice, row, column, low, high]) => ({ label: { slice, row, column }, low, high })));
  });

  it('finds the known intervals when both slices are hidden', () => {
    const intervals = linkedIntervalAudit(solver, linked({ male: true, female: true }), possiblyEmpty);
    expect(intervals).toEqual(bothSlicesHidden.map(([slice, row, column, low, high]) => ({ label: { slice, row, column }, low, high })));
  });

  it('narrows the intervals when the reader knows that zeros are shown', () => {
    const [first, second] = linkedIntervalAudit(solver, linked({ male: true, female: true }));
    expect(second).toEqual({ label: { slice: 'male', row: 0, column: 1 }, low: 1, high: 20 });
    expect(first).toEqual({ label: { slice: 'male', row: 0, column: 0 }, low: 13, high: 32 });
  });

  it('agrees with the flow audit on single tables', () => {
    const table = fc
      .array(fc.array(fc.record({ count: fc.integer({ min: 0, max: 30 }), flag: fc.boolean() }), { minLength: 3, maxLength: 3 }), {
        minLength: 2,
        maxLength: 4,
      })
      .map((cells) => ({
        counts: cells.map((row) => row.map(({ count }) => count)),
        hidden: {
          ...pattern({ counts: cells.map((row) => row.map(() => 0)) }, false),
          cells: cells.map((row) => row.map(({ count, flag }) => flag && count > 0)),
        },
      }));
    fc.assert(
      fc.property(table, ({ counts, hidden }) => {
        const everything = linkSlices([{ name: 'one', table: { counts }, hidden }], hidden);
        const byProgramme = linkedIntervalAudit(solver, everything).filter(({ label }) => label.slice === 'one');
        const byFlow = intervalAudit({ counts }, hidden);
        expect(byProgramme.map(({ low, high }) => [low, high])).toEqual(byFlow.map(({ low, high }) => [low, high]));
      }),
      { seed: 31, numRuns: 60 },
    );
  });

  it('equals enumeration in whole people on random sums, also where fractions of people would fit better', () => {
    const random = fc.record({
      atoms: fc.array(fc.integer({ min: 0, max: 3 }), { minLength: 5, maxLength: 5 }),
      groups: fc.array(fc.record({ members: fc.integer({ min: 1, max: 31 }), hidden: fc.boolean() }), { minLength: 3, maxLength: 7 }),
    });
    fc.assert(
      fc.property(random, ({ atoms, groups }) => {
        const everybody = { label: -1, atoms: [0, 1, 2, 3, 4], hidden: false };
        const figures = groups.map(({ members, hidden }, label) => ({
          label,
          atoms: everybody.atoms.filter((atom) => ((members >> atom) & 1) === 1),
          hidden,
        }));
        const tables = { atoms, figures: [everybody, ...figures] };
        expect(linkedIntervalAudit(solver, tables, possiblyEmpty)).toEqual(byEnumeration(tables));
      }),
      { seed: 32, numRuns: 150 },
    );
  });

  it('solves in whole people where fractions would reach further', () => {
    // Three pairs, each known to hold one person at least: 0.5 + 0.5 + 0.5 would do with 1.5 people, whole people need two.
    const tables: LinkedTables<string> = {
      atoms: [1, 1, 0],
      figures: [
        { label: 'all', atoms: [0, 1, 2], hidden: true },
        { label: 'a+b', atoms: [0, 1], hidden: true },
        { label: 'b+c', atoms: [1, 2], hidden: true },
        { label: 'a+c', atoms: [0, 2], hidden: true },
      ],
    };
    expect(linkedIntervalAudit(solver, tables)[0]).toEqual({ label: 'all', low: 2, high: Number.POSITIVE_INFINITY });
  });

  it('refuses malformed input', () => {
    const tables = { atoms: [3, 4], figures: [{ label: 'x', atoms: [0, 1], hidden: true }] };
    expect(linkedIntervalAudit(solver, tables)).toHaveLength(1);
    expect(() => linkedIntervalAudit(solver, { ...tables, atoms: [3] })).toThrow(RangeError);
    expect(() => linkedIntervalAudit(solver, { ...tables, atoms: [3, 0.5] })).toThrow(RangeError);
    expect(() => linkedIntervalAudit(solver, { ...tables, figures: [{ label: 'x', atoms: [0, 0], hidden: true }] })).toThrow(RangeError);
    expect(() => linkedIntervalAudit(solver, tables, { knowledge: () => ({ least: 0, most: 6 }) })).toThrow(RangeError);
    expect(() => linkSlices([], pattern({ counts: [[1]] }, false))).toThrow(RangeError);
  });
});

function byEnumeration(tables: LinkedTables<number>) {
  const value = (atoms: readonly number[], members: readonly number[]) => members.reduce((sum, atom) => sum + (atoms[atom] ?? 0), 0);
  const total = value(tables.atoms, [0, 1, 2, 3, 4]);
  const low = tables.figures.map(() => Number.POSITIVE_INFINITY);
  const high = tables.figures.map(() => Number.NEGATIVE_INFINITY);
  const trial = [0, 0, 0, 0, 0];
  const fill = (at: number, left: number): void => {
    if (at === 4) {
      trial[4] = left;
      const fits = tables.figures.every(({ atoms, hidden }) => hidden || value(trial, atoms) === value(tables.atoms, atoms));
      if (!fits) return;
      tables.figures.forEach(({ atoms }, index) => {
        low[index] = Math.min(low[index] ?? 0, value(trial, atoms));
        high[index] = Math.max(high[index] ?? 0, value(trial, atoms));
      });
      return;
    }
    for (let people = 0; people <= left; people++) {
      trial[at] = people;
      fill(at + 1, left - people);
    }
  };
  fill(0, total);
  return tables.figures.flatMap(({ label, hidden }, index) => (hidden ? [{ label, low: low[index], high: high[index] }] : []));
}
