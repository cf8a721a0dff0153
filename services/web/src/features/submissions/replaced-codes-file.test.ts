import { mostReplacedCodes } from '@cairnstep/contract';
import { describe, expect, it } from 'vitest';
import { readReplacedCodes } from './replaced-codes-file.ts';

const code = (number: number): string => `S${String(number).padStart(21, '0')}`;
const fileOf = (...lines: readonly string[]): string => ['from,to', ...lines, ''].join('\r\n');

describe('the file of replaced codes', () => {
  it('holds pairs of codes in their order, whatever its line ends', () => {
    const codes = [
      { from: code(1), to: code(2) },
      { from: code(3), to: code(4) },
    ];
    const lines = codes.map(({ from, to }) => `${from},${to}`);
    expect(readReplacedCodes(fileOf(...lines))).toEqual({ codes });
    expect(readReplacedCodes(`\uFEFF${['from,to', ...lines].join('\n')}`)).toEqual({ codes });
  });

  it('is refused by line, without what stands there', () => {
    const faultOf = (text: string): string => {
      const read = readReplacedCodes(text);
      if (!('fault' in read)) throw new Error('The file was taken.');
      return read.fault;
    };
    const good = `${code(1)},${code(2)}`;
    expect(faultOf(`name,ward\r\n${good}\r\n`)).toMatch(/^This is not the file of replaced codes/);
    expect(faultOf(fileOf(good, `${code(3)},Okafor`))).toBe('Line 3 holds something other than participant codes.');
    expect(faultOf(fileOf(good, good, `${good},Okafor`))).toBe('Line 4 does not hold two codes with a comma between them.');
    expect(faultOf(fileOf(`${code(1)};${code(2)}`))).toBe('Line 2 does not hold two codes with a comma between them.');
    expect(faultOf(fileOf())).toBe('Send at least one pair of codes.');
    const tooMany = Array.from({ length: mostReplacedCodes + 1 }, () => good);
    expect(faultOf(fileOf(...tooMany))).toBe(`Send at most ${mostReplacedCodes} pairs at a time.`);
  });
});
