import { describe, expect, it } from 'vitest';
import { totalInWords, valuesInWords } from './result-words.ts';

describe('results in words', () => {
  it('write runs of levels as from and to, and short ones in full', () => {
    const words = (...values: string[]) => valuesInWords({ result: 'zppMotor' }, values);
    expect(words('C5')).toBe('C5');
    expect(words('C5', 'C6')).toBe('C5, C6');
    expect(words('C8', 'T1', 'T2')).toBe('C8 to T2');
    expect(words('NA', 'T9', 'T10', 'T11', 'L2')).toBe('NA, T9 to T11, L2');
    expect(words('L5', 'S1', 'S2', 'S3', 'INT')).toBe('L5 to INT');
  });

  it('write grades and completeness out', () => {
    expect(valuesInWords({ result: 'ais' }, ['A', 'B', 'none'])).toBe('A, B, no grade');
    expect(valuesInWords({ result: 'completeness' }, ['C', 'I'])).toBe('Complete, Incomplete');
  });

  it('tell a total that is open from one that cannot be determined', () => {
    expect([totalInWords(25, false), totalInWords('ND', false), totalInWords('ND', true)]).toEqual(['25', 'open', 'ND']);
  });
});
