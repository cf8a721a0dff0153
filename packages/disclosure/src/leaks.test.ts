import { describe, expect, it } from 'vitest';
import {
  allSites,
  estimates,
  fewestForQuantile,
  meansOnePersonApart,
  peopleBesideQuantile,
  percentages,
  roundedRow,
  roundedToFive,
  shares,
  twoPeople,
  withoutOneSite,
} from '../reference/leaks.ts';
import {
  countsBehindPercent,
  dominanceByEstimate,
  dominanceByShare,
  groupsForMeans,
  homogeneousLines,
  isQuantileShown,
  nearestFive,
  protectTable,
  siteDominance,
  smallDifferences,
  valueBetweenMeans,
} from './index.ts';

describe('countsBehindPercent', () => {
  it.each(percentages)('finds what $percent % of $n can stand for', ({ n, percent, decimals, feasible }) => {
    expect(countsBehindPercent(n, percent, decimals)).toEqual(feasible);
  });

  it('stays between nobody and everybody', () => {
    expect(countsBehindPercent(12, 0, 0)).toEqual([0]);
    expect(countsBehindPercent(12, 100, 0)).toEqual([12]);
  });

  it('refuses what is no percentage of people', () => {
    expect(() => countsBehindPercent(0, 5, 0)).toThrow(RangeError);
    expect(() => countsBehindPercent(20, 101, 0)).toThrow(RangeError);
  });
});

describe('valueBetweenMeans', () => {
  it.each(meansOnePersonApart)(
    'gives one value of $nAfter people back',
    ({ meanBefore, meanAfter, nAfter, decimals, value, low, high }) => {
      const revealed = valueBetweenMeans(meanBefore, meanAfter, nAfter, decimals);
      expect(revealed.value).toBeCloseTo(value, 10);
      expect(revealed.low).toBeCloseTo(low, 10);
      expect(revealed.high).toBeCloseTo(high, 10);
    },
  );

  it('refuses a group that had nobody before', () => {
    expect(() => valueBetweenMeans(1, 1, 1, 1)).toThrow(RangeError);
  });
});

describe('mean and SD of two people', () => {
  it('give both values, so a group with two measured shows neither', () => {
    const spread = twoPeople.sd / Math.SQRT2;
    expect(twoPeople.mean - spread).toBeCloseTo(twoPeople.values[0] ?? 0, 12);
    expect(twoPeople.mean + spread).toBeCloseTo(twoPeople.values[1] ?? 0, 12);
    const table = { counts: [[15, 30, 40]] };
    const { usable } = groupsForMeans({ table, protection: protectTable(table) }, { counts: [[2, 25, 35]] });
    expect(usable.cells[0]?.[0]).toBe(false);
    expect(usable.grandTotal).toBe(true);
  });
});

describe('smallDifferences', () => {
  it('finds the one site behind two safe tables', () => {
    for (const table of [allSites, withoutOneSite]) expect(protectTable(table).audit.primary).toEqual([]);
    const cells = smallDifferences(allSites, withoutOneSite).filter(({ row, column }) => row !== 'total' && column !== 'total');
    expect(cells).toEqual([
      { row: 0, column: 0 },
      { row: 0, column: 1 },
      { row: 0, column: 2 },
      { row: 1, column: 0 },
      { row: 1, column: 1 },
      { row: 1, column: 2 },
    ]);
  });

  it('lets equal tables and large differences pass', () => {
    expect(smallDifferences(allSites, allSites)).toEqual([]);
    expect(smallDifferences({ counts: [[40]] }, { counts: [[51]] })).toEqual([]);
    expect(() => smallDifferences({ counts: [[40]] }, { counts: [[40, 1]] })).toThrow(RangeError);
  });
});

describe('isQuantileShown', () => {
  it.each(fewestForQuantile)('shows the quantile $p from $n people', ({ p, n }) => {
    expect(isQuantileShown(n, p)).toBe(true);
    expect(isQuantileShown(n - 1, p)).toBe(false);
  });

  it.each(peopleBesideQuantile)('shows the quantile $p of $n people only with five beyond it on either side', ({ n, p, below, above }) => {
    expect(isQuantileShown(n, p)).toBe(Math.min(below, above) >= 5);
  });

  it('shows a median from 11 people, and a minimum or maximum never', () => {
    expect([10, 11].map((n) => isQuantileShown(n, 0.5))).toEqual([false, true]);
    expect([0, 1].map((p) => isQuantileShown(100_000, p))).toEqual([false, false]);
  });
});

describe('dominance', () => {
  it.each(shares)('judges the $n largest of $contributions at $k percent', ({ contributions, n, k, share, unsafe }) => {
    const verdict = dominanceByShare(contributions, n, k);
    expect(verdict.share).toBeCloseTo(share, 10);
    expect(verdict.unsafe).toBe(unsafe);
  });

  it.each(estimates)(
    'judges how well the second of $contributions can estimate the first',
    ({ contributions, p, remainder, limit, unsafe }) => {
      expect(dominanceByEstimate(contributions, p)).toEqual({ remainder, limit, unsafe });
    },
  );

  it('wants three sites and none above three quarters', () => {
    expect(siteDominance([30, 30, 20]).unsafe).toBe(false);
    expect(siteDominance([75, 15, 10])).toEqual({ sites: 3, largestShare: 0.75, unsafe: false });
    expect(siteDominance([76, 14, 10]).unsafe).toBe(true);
    expect(siteDominance([50, 50, 0])).toEqual({ sites: 2, largestShare: 0.5, unsafe: true });
  });

  it('hides the sum of steps when one of twelve people made 95 percent of them', () => {
    const steps = [95_000, ...Array.from({ length: 11 }, () => 5000 / 11)];
    expect(dominanceByShare(steps, 1, 85).unsafe).toBe(true);
    expect(dominanceByEstimate(steps, 10).unsafe).toBe(true);
    expect(isQuantileShown(steps.length, 0.5)).toBe(true);
  });

  it('refuses contributions that are none', () => {
    expect(() => dominanceByShare([0, 0], 1, 85)).toThrow(RangeError);
    expect(() => dominanceByShare([5, -1], 1, 85)).toThrow(RangeError);
    expect(() => dominanceByShare([5, 1], 0, 85)).toThrow(RangeError);
    expect(() => dominanceByEstimate([5, 1], 120)).toThrow(RangeError);
  });
});

describe('nearestFive', () => {
  it.each(roundedToFive)('prints $count as $printed', ({ count, printed }) => {
    expect(nearestFive(count)).toBe(printed);
  });

  it('stays within two of the true count', () => {
    for (let count = 0; count <= 200; count++) expect(Math.abs(nearestFive(count) - count)).toBeLessThanOrEqual(2);
  });

  it('rounds a total from the true total, so a row need not add up', () => {
    expect(roundedRow.counts.map(nearestFive)).toEqual(roundedRow.printed);
    expect(nearestFive(roundedRow.total)).toBe(roundedRow.printedTotal);
  });

  it('refuses what is no count', () => {
    expect(() => nearestFive(2.5)).toThrow(RangeError);
    expect(() => nearestFive(-5)).toThrow(RangeError);
  });
});

describe('homogeneousLines', () => {
  const counts = [
    [0, 40, 0],
    [12, 15, 0],
    [0, 0, 0],
  ];

  it('names lines whose people all share a cell', () => {
    expect(homogeneousLines({ counts }, 'rows')).toEqual([{ row: 0, column: 'total' }]);
    expect(homogeneousLines({ counts }, 'columns')).toEqual([{ row: 'total', column: 0 }]);
  });

  it('finds none where people spread', () => {
    expect(homogeneousLines({ counts: [[12, 15]] }, 'rows')).toEqual([]);
  });
});
