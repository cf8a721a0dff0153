import { describe, expect, it } from 'vitest';
import { formatLevelRange, isWithin, parseLevelRange, segmentNamed, segments } from './level-range.ts';

describe('a range of levels', () => {
  it.each([
    ['C5-T6', 'C5', 'T6'],
    ['c5 to t6', 'C5', 'T6'],
    ['T6 – C5', 'C5', 'T6'],
    [' T4 ', 'T4', 'T4'],
    ['L1-S4-5', 'L1', 'S4-5'],
    ['S4-5', 'S4-5', 'S4-5'],
    ['S4-5 to C1', 'C1', 'S4-5'],
  ])('reads "%s"', (text, from, to) => {
    expect(parseLevelRange(text)).toEqual({ from, to });
  });

  it.each(['', 'C9', 'T13', 'C5-', 'C5-T6-L1', 'five', 'C5,T6'])('does not guess at "%s"', (text) => {
    expect(parseLevelRange(text)).toBeNull();
  });

  it('reads back what it writes, for every pair of segments', () => {
    for (const [index, from] of segments.entries()) {
      for (const to of segments.slice(index)) {
        expect(parseLevelRange(formatLevelRange({ from, to }))).toEqual({ from, to });
      }
    }
  });

  it('holds both its ends and nothing beyond', () => {
    const range = { from: 'C8', to: 'T2' } as const;
    expect(segments.filter((segment) => isWithin(segment, range))).toEqual(['C8', 'T1', 'T2']);
  });

  it('has no place for an intact spine', () => {
    expect(segmentNamed('INT')).toBeNull();
    expect(segmentNamed('S4_5')).toBe('S4-5');
  });
});
