import { describe, expect, it } from 'vitest';
import { completeRows } from './complete-rows.ts';

describe('complete rows', () => {
  it('drops a row with any gap and counts it once, by the worst', () => {
    const rows = completeRows(
      [
        [1, null, 3, 4, 5, 6],
        [1, 2, Infinity, 'unable', 5, 6],
      ],
      [['a', 'a', 'b', 'b', '', 'c']],
    );
    expect(rows.n).toBe(2);
    expect(rows.leftOut).toEqual({ missing: 2, nonFinite: 1, unable: 1 });
    expect([...(rows.columns[0] ?? [])]).toEqual([1, 6]);
    expect(rows.labels[0]?.names).toEqual(['a', 'c']);
    expect([...(rows.labels[0]?.codes ?? [])]).toEqual([0, 1]);
  });

  it('sorts labels, whole numbers by their size', () => {
    expect(completeRows([], [[10, 9, 1]]).labels[0]?.names).toEqual(['1', '9', '10']);
    expect(completeRows([], [['10', '9', 'x']]).labels[0]?.names).toEqual(['10', '9', 'x']);
  });

  it('refuses columns of different length', () => {
    expect(() => completeRows([[1, 2], [1]])).toThrow(RangeError);
    expect(() => completeRows([[1, 2]], [['a']])).toThrow(RangeError);
    expect(completeRows([]).n).toBe(0);
  });
});
