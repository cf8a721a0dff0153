import { describe, expect, it } from 'vitest';
import { empty, exampleGrid, hidden, shown } from '../../testing/example-grid.ts';
import { intervalScale, positionOn } from './interval-scale.ts';

describe('the scale of the interval marks', () => {
  it('holds every interval shown and the line of no change', () => {
    const scale = intervalScale(exampleGrid);
    expect(scale?.reference).toBe(0);
    expect(scale?.lower).toBeLessThan(0);
    expect(scale?.upper).toBeGreaterThan(0.216);
  });

  it('has the mean of everyone as its line for values, and none where that is not shown', () => {
    expect(intervalScale({ ...exampleGrid, statistic: 'baseline' })?.reference).toBe(0.131);
    expect(intervalScale({ ...exampleGrid, statistic: 'baseline', total: hidden })).not.toHaveProperty('reference');
  });

  it('is not stretched by the interval of a few people, which is cut at its ends', () => {
    const [first, ...others] = exampleGrid.rows;
    if (first === undefined) throw new Error('The grid has rows.');
    const few = { ...exampleGrid, rows: [{ ...first, cells: [shown(2, 0.1, 9), empty, empty, empty, empty, empty] }, ...others] };
    expect(intervalScale(few)).toEqual(intervalScale(exampleGrid));
    expect(positionOn({ lower: 0, upper: 1 }, 9)).toBe(1);
    expect(positionOn({ lower: 0, upper: 1 }, -9)).toBe(0);
    expect(positionOn({ lower: 0, upper: 4 }, 1)).toBe(0.25);
  });

  it('has room even when all values are the same, and is none when nothing is shown', () => {
    const nothing = { ...exampleGrid, rows: [], columnTotals: [], total: empty };
    expect(intervalScale(nothing)).toBeNull();
    const flat = intervalScale({ ...nothing, total: { state: 'shown', n: 20, mean: 0, sd: null, interval: null } });
    expect(flat && flat.upper - flat.lower).toBeGreaterThan(0);
  });
});
