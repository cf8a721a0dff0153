import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { resamplingChecks } from '../../reference/resampling.checks.ts';
import { hypergeometricMass } from '../distributions/hypergeometric.ts';
import { drawHypergeometric } from './draw-hypergeometric.ts';
import { drawTable } from './draw-table.ts';
import { bootstrapPercentile, percentileLimits, seededGenerator } from './index.ts';

const values = [1.2, 2.4, 1.3, 1.3, 0, 1, 1.8, 0.8, 4.6, 1.4, 2.2, 0.9, 3.1, 1.7, 2.6, 0.4, 1.9, 2.8, 1.1, 2];
const meanOf = (places: Int32Array): number => places.reduce((sum, place) => sum + (values[place] as number), 0) / places.length;

describe('bootstrap', () => {
  it.each(resamplingChecks.filter((check) => check.method === 'bootstrap'))('agrees with the figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });

  it('repeats itself from the same seed, and carries seed and B', () => {
    const input = { n: values.length, statistic: meanOf, seed: 3 };
    const one = bootstrapPercentile(input);
    expect(bootstrapPercentile(input)).toEqual(one);
    expect(one).toMatchObject({ seed: 3, replicates: 1999, method: expect.stringContaining('B = 1999 resamples of participants, seed 3') });
    expect(bootstrapPercentile({ ...input, seed: 4 })).not.toEqual(one);
  });

  it('comes close to the interval by the normal distribution for a mean', () => {
    const found = bootstrapPercentile({ n: values.length, statistic: meanOf, seed: 3, replicates: 9999 });
    if (found.kind !== 'estimate') throw new Error(found.reason);
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    const error = Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0)) / values.length;
    expect(found.estimate).toBeCloseTo(mean, 12);
    // Resampled means vary as the population form of the standard error; a percent or two is the noise of 9999 draws.
    expect(found.standardError / error).toBeCloseTo(1, 1);
    expect((found.interval.upper - found.interval.lower) / (2 * 1.96 * error)).toBeCloseTo(1, 1);
  });

  it('gives no interval where there is nothing to resample, or the statistic fails', () => {
    const statistic = (): number => 1;
    expect(bootstrapPercentile({ n: 0, statistic, seed: 1 })).toMatchObject({ reason: 'no data' });
    expect(bootstrapPercentile({ n: 1, statistic, seed: 1 })).toMatchObject({ kind: 'not-estimable', n: 1 });
    expect(bootstrapPercentile({ n: 5, statistic: () => Number.NaN, seed: 1 })).toMatchObject({
      reason: 'the statistic cannot be computed',
    });
    const onlyWithBoth = (places: Int32Array): number => (places.includes(0) && places.includes(1) ? 1 : Number.NaN);
    expect(bootstrapPercentile({ n: 2, statistic: onlyWithBoth, seed: 1 })).toMatchObject({ pointEstimate: 1 });
    expect(bootstrapPercentile({ n: 3, statistic, seed: 1 })).toMatchObject({ failedAssumptions: ['very small sample (n = 3)'] });
  });

  it('refuses a number of resamples whose limits would lie between two of them', () => {
    expect(() => percentileLimits(new Float64Array(1000), 0.95)).toThrow(RangeError);
    expect(
      percentileLimits(
        Float64Array.from({ length: 39 }, (_, i) => 39 - i),
        0.95,
      ),
    ).toMatchObject({ lower: 1, upper: 39 });
    expect(() => bootstrapPercentile({ n: 2.5, statistic: () => 1, seed: 1 })).toThrow(RangeError);
  });
});

describe('drawing counts', () => {
  it('follows the hypergeometric distribution', () => {
    const generator = seededGenerator(77);
    const [marked, unmarked, draws] = [7, 9, 6];
    const counts = new Array<number>(7).fill(0);
    for (let i = 0; i < 20_000; i++) {
      const drawn = drawHypergeometric(generator, marked, unmarked, draws);
      counts[drawn] = (counts[drawn] as number) + 1;
    }
    const chiSquare = counts.reduce((sum, count, x) => {
      const expected = 20_000 * hypergeometricMass(x, marked, unmarked, draws);
      return sum + (count - expected) ** 2 / expected;
    }, 0);
    // 99.9% point of chi-square with 6 degrees of freedom.
    expect(chiSquare).toBeLessThan(22.458);
  });

  it('keeps the margins of a table and gives each table its probability', () => {
    const generator = seededGenerator(78);
    const margins = { rows: [3, 2], columns: [2, 2, 1] };
    const seen = new Map<string, number>();
    for (let i = 0; i < 20_000; i++) {
      const table = drawTable(generator, margins);
      expect(table.map((row) => row.reduce((sum, count) => sum + count, 0))).toEqual(margins.rows);
      expect(margins.columns.map((_, j) => table.reduce((sum, row) => sum + (row[j] as number), 0))).toEqual(margins.columns);
      const key = table.flat().join(' ');
      seen.set(key, (seen.get(key) ?? 0) + 1);
    }
    // 3! 2! 2! 2! 1! / 5! over the product of the cells' factorials; (2 1 0 / 0 1 1) has 48/120/2.
    expect((seen.get('2 1 0 0 1 1') ?? 0) / 20_000).toBeCloseTo(0.2, 1);
    expect(seen.size).toBe(5);
  });

  it('answers what is certain without drawing', () => {
    const generator = seededGenerator(1);
    expect(drawHypergeometric(generator, 4, 0, 3)).toBe(3);
    expect(drawHypergeometric(generator, 0, 4, 3)).toBe(0);
    expect(drawHypergeometric(generator, 4, 5, 9)).toBe(4);
  });
});
