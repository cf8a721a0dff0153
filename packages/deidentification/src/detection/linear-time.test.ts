import { describe, expect, it } from 'vitest';
import { boundedPattern } from './bounded-pattern.ts';
import { detectIdentifiers } from './detect-identifiers.ts';

const headers = ['notes', 'session_date', 'phone'];
/** Beginnings of everything the detectors look for, repeated without ever coming to an end. */
const pieces = [
  'a', '1', ' ', '1.', '1-', '1 ', '+1 ', '01 ', '(0', '4111 ', 'a@', 'a.', 'a.a@', '1:', 'aa:', 'DE89 0', 'SW1 ', 'John ', 'John, ', 'Pt ', 'Aa ', 'by J. ',
  'March ', '1 March ', '12/12/', '2024-', 'S/N ', 'MRN ', 'www.', '.jpg', '12 Aa ', '1.1234, ', '9 yo ', '\u0301', '\u200b', '\ufdfa',
]; // prettier-ignore

/** Processor time, which other work on the machine does not lengthen. */
function workOn(text: string): number {
  const rows = [headers.map(() => text)];
  const begun = process.cpuUsage();
  detectIdentifiers({ headers, rows });
  return process.cpuUsage(begun).user / 1000;
}

describe('the work on a cell', () => {
  it('is bounded by construction: a pattern may not repeat without limit', () => {
    for (const source of ['a+', 'a*', '(?:ab)+', '[a+]*', 'a{2,}', '\\d+\\.'])
      expect(() => boundedPattern(source), source).toThrow(RangeError);
    for (const source of ['\\+', '[+*]{1,3}', '\\*a?', '(?:a|b){1,4}']) expect(() => boundedPattern(source), source).not.toThrow();
  });

  it('grows in proportion to its length, whatever the cell holds', () => {
    for (const piece of pieces) {
      const long = piece.repeat(Math.ceil(50_000 / piece.length));
      const short = workOn(long.slice(0, 12_500));
      // Four times the length: four times the work. A pattern that started over at every character would take sixteen times as long.
      expect(workOn(long) / Math.max(short, 5), JSON.stringify(piece)).toBeLessThan(12);
    }
  });
});
