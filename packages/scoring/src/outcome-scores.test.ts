import { describe, expect, it } from 'vitest';
import { constructedCases } from '../reference/constructed-cases.ts';
import { motorScores } from './motor-scores.ts';
import { scimMobility, scimTotal } from './scim.ts';
import { helpAgrees, helpAtLevel, helpDifferences } from './walking-index.ts';
import { speedAgrees, walkingSpeed } from './walking-speed.ts';

describe('motor scores', () => {
  it('are the sums of the exam, examined grades counted and NT kept open', () => {
    for (const { exam, expected } of constructedCases) {
      const { uer, uel, uems, ler, lel, lems } = expected.totals;
      expect(motorScores(exam)).toEqual({ uer, uel, uems, ler, lel, lems });
    }
  });
});

describe('SCIM III', () => {
  it('adds the four parts, and the two of mobility', () => {
    expect(scimTotal({ selfCare: 20, respirationSphincter: 40, mobilityRoom: 10, mobilityInOut: 30 })).toBe(100);
    expect(scimTotal({ selfCare: 0, respirationSphincter: 0, mobilityRoom: 0, mobilityInOut: 0 })).toBe(0);
    expect(scimTotal({ selfCare: 12, respirationSphincter: 31, mobilityRoom: 6, mobilityInOut: 9 })).toBe(58);
    expect(scimMobility({ mobilityRoom: 10, mobilityInOut: 30 })).toBe(40);
  });

  it('refuses a part outside its range and names it', () => {
    const parts = { selfCare: 20, respirationSphincter: 40, mobilityRoom: 10, mobilityInOut: 30 };
    expect(() => scimTotal({ ...parts, selfCare: 21 })).toThrow('SCIM III selfCare');
    expect(() => scimTotal({ ...parts, respirationSphincter: -1 })).toThrow('SCIM III respirationSphincter');
    expect(() => scimTotal({ ...parts, mobilityRoom: 2.5 })).toThrow('SCIM III mobilityRoom');
    expect(() => scimMobility({ mobilityRoom: 5, mobilityInOut: Number.NaN })).toThrow('SCIM III mobilityInOut');
  });
});

describe('walking speed', () => {
  // Wu et al., J Neuroeng Rehabil 2018 (doi 10.1186/s12984-018-0355-1), table 2: ten metres in 52, 155, 76 and 126 s.
  const printed = [
    { time: 52, speed: 0.19, exact: 0.1923 },
    { time: 155, speed: 0.06, exact: 0.0645 },
    { time: 76, speed: 0.13, exact: 0.1316 },
    { time: 126, speed: 0.07, exact: 0.0794 },
  ];

  it('is the distance over the time', () => {
    for (const { time, exact } of printed) expect(walkingSpeed(10, time)).toBeCloseTo(exact, 4);
    // Six minutes: 69.33 m is printed as 0.193 m/s.
    expect(speedAgrees(0.193, 69.33, 360)).toBe(true);
  });

  it('agrees with printed speeds at the tolerance for transcribed data, and finds the truncated one', () => {
    expect(printed.map(({ speed, time }) => speedAgrees(speed, 10, time))).toEqual([true, true, true, false]);
    expect(printed.map(({ speed, time }) => speedAgrees(speed, 10, time, 0.01))).toEqual([true, true, true, true]);
  });

  it('holds a difference of exactly the tolerance', () => {
    expect(speedAgrees(0.405, 10, 25)).toBe(true);
    expect(speedAgrees(0.4051, 10, 25)).toBe(false);
  });

  it('refuses a time or distance that cannot be', () => {
    for (const time of [0, -1, Number.NaN, Number.POSITIVE_INFINITY]) expect(() => walkingSpeed(10, time)).toThrow(RangeError);
    for (const distance of [-1, Number.NaN, Number.POSITIVE_INFINITY]) expect(() => walkingSpeed(distance, 10)).toThrow(RangeError);
    expect(walkingSpeed(0, 10)).toBe(0);
  });
});

describe('walking index and walking aids', () => {
  const noHelp = { aid: 'none', brace: false, persons: 0 } as const;

  it('takes no help at level 20 and at least one kind below it', () => {
    expect(helpAgrees(20, noHelp)).toBe(true);
    expect(helpAgrees(20, { ...noHelp, aid: 'stick' })).toBe(false);
    expect(helpAgrees(20, { ...noHelp, brace: true })).toBe(false);
    expect(helpAgrees(20, { ...noHelp, persons: 1 })).toBe(false);
    expect(helpAgrees(19, noHelp)).toBe(false);
    expect(helpAgrees(19, { ...noHelp, aid: 'stick' })).toBe(true);
    expect(helpAgrees(17, { ...noHelp, persons: 1 })).toBe(true);
    expect(helpAgrees(0, noHelp)).toBe(false);
  });

  it('agrees with the help that each level itself names', () => {
    for (let level = 1; level <= 20; level++) {
      const named = helpAtLevel(level);
      expect(named && helpAgrees(level, named)).toBe(true);
      expect(named && helpDifferences(level, named)).toEqual([]);
    }
    expect(helpAtLevel(0)).toBeUndefined();
  });

  it('names the attributes that differ from the level', () => {
    expect(helpDifferences(13, { aid: 'two_crutches', brace: true, persons: 0 })).toEqual(['aid', 'brace']);
    expect(helpDifferences(17, noHelp)).toEqual(['persons']);
  });

  it('needs no more help at a higher level with the same aid', () => {
    // Within one aid the levels rise as brace and persons fall away: a check of the table against itself.
    for (const aid of ['bars', 'walker', 'two_crutches', 'stick', 'none']) {
      const named = Array.from({ length: 20 }, (_, index) => helpAtLevel(index + 1)).filter((help) => help?.aid === aid);
      const burden = named.map((help) => 2 * (help?.persons ?? 0) + (help?.brace ? 1 : 0));
      expect(burden.length).toBeGreaterThan(2);
      expect(burden).toEqual(burden.toSorted((one, other) => other - one));
    }
  });

  it('refuses a level that does not exist', () => {
    for (const level of [-1, 21, 2.5, Number.NaN]) {
      expect(() => helpAtLevel(level)).toThrow(RangeError);
      expect(() => helpAgrees(level, noHelp)).toThrow(RangeError);
    }
    expect(() => helpDifferences(0, noHelp)).toThrow(RangeError);
  });
});
