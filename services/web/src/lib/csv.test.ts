import { describe, expect, it } from 'vitest';
import { toCsv, toTabSeparated } from './csv.ts';

describe('a table as text', () => {
  it('quotes what holds commas, quotes or line breaks (RFC 4180)', () => {
    expect(toCsv([['a,b', 'say "so"', 'two\nlines', 'plain']])).toBe('"a,b","say ""so""","two\nlines",plain\r\n');
  });

  it('keeps numbers numbers and leaves the unknown empty', () => {
    expect(toCsv([[-5, 0.25, null]])).toBe('-5,0.25,\r\n');
  });

  it('turns text that a spreadsheet would run into plain text', () => {
    expect(toCsv([['=1+1', '-5', '@x']])).toBe("'=1+1,'-5,'@x\r\n");
    expect(toTabSeparated([['=1+1', 'a-b']])).toBe("'=1+1\ta-b");
  });

  it('keeps one row on one line on the clipboard', () => {
    expect(
      toTabSeparated([
        ['two\nlines', 1],
        ['b', 2],
      ]),
    ).toBe('two lines\t1\nb\t2');
  });
});
