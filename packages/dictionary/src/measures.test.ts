import { describe, expect, it } from 'vitest';
import { fitsRange } from './fits-range.ts';
import { measureOf, measures } from './measures.ts';

describe('measures', () => {
  it('are 33, each with its own key', () => {
    expect(measures).toHaveLength(33);
    expect(new Set(measures.map(({ key }) => key)).size).toBe(33);
  });

  it('have plausible limits within hard ones, on their steps', () => {
    for (const { key, hard, plausible, grades, step, decimals } of measures) {
      expect(fitsRange(plausible.min, hard) && fitsRange(plausible.max, hard), key).toBe(true);
      expect(Number(step.toFixed(decimals)), key).toBe(step);
      if (hard.step !== undefined) expect(step, key).toBe(hard.step);
      for (const grade of grades ?? []) expect(fitsRange(grade.stored, hard), key).toBe(true);
    }
  });

  it('give every threshold a size in the better direction, a population, a citation and how sure it is', () => {
    const thresholds = measures.flatMap(({ key, thresholds: { mdc, mcid } }) =>
      [...mdc, ...mcid].map((threshold) => ({ key, ...threshold })),
    );
    expect(thresholds).toHaveLength(19);
    for (const { key, value, unit, population, citation, confidence } of thresholds) {
      const [low, high] = typeof value === 'number' ? [value, value] : [value.min, value.max];
      expect(low > 0 && high >= low && high <= measureOf(key).hard.max, key).toBe(true);
      expect(unit.length > 0 && population.length > 3, key).toBe(true);
      expect(citation, key).toMatch(/(19|20)\d\d/);
      expect(['looked-up', 'from-memory', 'paper-looked-up-figure-from-memory'], key).toContain(confidence);
    }
  });

  it('claim no threshold where no figure for spinal cord injury is published', () => {
    for (const key of ['bbs', 'mas', 'psfs_freq', 'qol_life']) expect(measureOf(key).thresholds).toEqual({ mdc: [], mcid: [] });
  });

  it('show means of an ordinal score only where the field prints them', () => {
    const meant = measures.filter(({ scale, meanIsCustomary }) => scale === 'ordinal' && meanIsCustomary).map(({ key }) => key);
    expect(meant.every((key) => key.startsWith('scim3_') || ['bbs', 'lems', 'uems'].includes(key))).toBe(true);
    expect(measureOf('wisci2').meanIsCustomary).toBe(false);
    expect(measureOf('tmwt_ss').meanIsCustomary).toBe(true);
  });

  it('count a test that was stopped early only for the six-minute walk', () => {
    expect(measures.filter(({ scoredWhenStoppedEarly }) => scoredWhenStoppedEarly).map(({ key }) => key)).toEqual(['six_mwt']);
  });

  it('refuse an unknown key', () => {
    expect(() => measureOf('tmwt_slow')).toThrow(RangeError);
  });
});
