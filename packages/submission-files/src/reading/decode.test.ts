import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ByteDecoder } from './byte-decoder.ts';
import { decode } from './decode.ts';
import { invalidUtf8 } from './invalid-utf8.ts';

const bytesOf = (text: string): number[] => [...new TextEncoder().encode(text)];
const bytes = (...parts: readonly (string | readonly number[])[]): Uint8Array =>
  Uint8Array.from(parts.flatMap((part) => (typeof part === 'string' ? bytesOf(part) : part)));

const utf16 = (text: string, littleEndian: boolean): number[] =>
  Array.from({ length: text.length }, (_, index) => text.charCodeAt(index)).flatMap((unit) =>
    littleEndian ? [unit & 0xff, unit >> 8] : [unit >> 8, unit & 0xff],
  );

const table = 'name,größe\r\nStraße,1\r\n';

describe('decode', () => {
  it.each([
    ['UTF-8', 'utf-8', bytes(table)],
    ['UTF-8 with a mark', 'utf-8', bytes([0xef, 0xbb, 0xbf], table)],
    ['UTF-16, low byte first, with a mark', 'utf-16le', bytes([0xff, 0xfe], utf16(table, true))],
    ['UTF-16, high byte first, with a mark', 'utf-16be', bytes([0xfe, 0xff], utf16(table, false))],
    ['UTF-16, low byte first, without a mark', 'utf-16le', bytes(utf16(table, true))],
    ['UTF-16, high byte first, without a mark', 'utf-16be', bytes(utf16(table, false))],
    // The letters beyond ASCII as Windows code page 1252 has them.
    ['Windows-1252', 'windows-1252', bytes('name,gr', [0xf6, 0xdf], 'e\r\nStra', [0xdf], 'e,1\r\n')],
  ])('reads %s', (_, encoding, file) => {
    expect(decode(file)).toEqual({ ok: true, text: table, encoding });
  });

  it('calls a file of plain letters ASCII', () => {
    expect(decode(bytes('a,b\n1,2\n'))).toEqual({ ok: true, text: 'a,b\n1,2\n', encoding: 'ascii' });
  });

  it('reads an empty file as empty text', () => {
    expect(decode(new Uint8Array(0))).toMatchObject({ ok: true, text: '' });
  });

  it.each([
    ['a zip archive or workbook', bytes([0x50, 0x4b, 0x03, 0x04, 0x14, 0x00])],
    ['an old workbook', bytes([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1])],
    ['a PDF document', bytes('%PDF-1.7\n')],
    ['a PNG image', bytes([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a])],
    ['a JPEG image', bytes([0xff, 0xd8, 0xff, 0xe0])],
    ['a web page', bytes('\r\n  <!DOCTYPE html><html>')],
    ['a web page behind a mark', bytes([0xef, 0xbb, 0xbf], '<table><tr>')],
    ['text in UTF-32', bytes([0xff, 0xfe, 0x00, 0x00, 0x61, 0x00, 0x00, 0x00])],
  ])('refuses %s, whatever it is called', (_, file) => {
    expect(decode(file)).toMatchObject({ ok: false, rule: 'F01', line: null });
  });

  it('refuses zero bytes in text, with the line', () => {
    expect(decode(bytes('a,b\n1,2\n3,', [0], '\n'))).toMatchObject({ ok: false, rule: 'F01', line: 3 });
  });

  it('refuses a byte that UTF-8 does not allow after it has begun as UTF-8, with the line', () => {
    expect(decode(bytes('größe\r\n1\r\n', [0xfc], '\r\n'))).toMatchObject({ ok: false, rule: 'F02', line: 3 });
  });

  it('refuses a byte that Windows-1252 leaves undefined, with the line', () => {
    expect(decode(bytes('a\n', [0xfc], '\n', [0x81], '\n'))).toMatchObject({ ok: false, rule: 'F02', line: 3 });
  });

  it('refuses a character that was lost before, with the line', () => {
    expect(decode(bytes('a\rb\uFFFD\r'))).toMatchObject({ ok: false, rule: 'F02', line: 2 });
  });

  it('refuses UTF-16 that ends within a character', () => {
    expect(decode(bytes([0xff, 0xfe], utf16('a,b', true), [0x41]))).toMatchObject({ ok: false, rule: 'F02' });
  });

  it('repeats nothing of the file in what it says', () => {
    const refused = decode(bytes('größe\nMustermann', [0xfc], '\n'));
    expect(JSON.stringify(refused)).not.toMatch(/Muster/);
  });
});

describe('ByteDecoder', () => {
  const outcome = (file: Uint8Array, cuts: readonly number[]): string => {
    const decoder = new ByteDecoder();
    const ends = [...new Set(cuts.map((cut) => 4 + (cut % Math.max(1, file.length - 4))))]
      .filter((end) => end < file.length)
      .sort((a, b) => a - b);
    let text = '';
    try {
      [...ends, file.length].forEach((end, index, all) => {
        text += decoder.decode(file.subarray(index === 0 ? 0 : all[index - 1], end), end === file.length, () => 1);
      });
    } catch (error) {
      return error instanceof Error ? error.message : 'failed';
    }
    return `${decoder.encoding} ${text}`;
  };

  it('comes to the same result however the bytes are cut', () => {
    const part = fc.constantFrom('a,b\r\n', 'ö', '€', '🙂', [0xe4], [0xe4, 0xf6], [0x81], [0xc3], 'x"y"');
    fc.assert(
      fc.property(fc.array(part, { minLength: 2, maxLength: 12 }), fc.array(fc.nat(60), { maxLength: 6 }), (parts, cuts) => {
        const file = bytes('id,', ...parts);
        expect(outcome(file, cuts)).toBe(outcome(file, []));
      }),
      { seed: 20260801, numRuns: 400 },
    );
  });
});

describe('invalidUtf8', () => {
  const refuses = (file: Uint8Array): boolean => {
    try {
      new TextDecoder('utf-8', { fatal: true }).decode(file);
      return false;
    } catch {
      return true;
    }
  };

  it('agrees with the decoder of the platform on what is UTF-8', () => {
    const byte = fc.oneof(fc.integer({ min: 0x20, max: 0x7e }), fc.integer({ min: 0x80, max: 0xff }));
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 8 }), fc.array(byte, { maxLength: 6 }), (any, high) => {
        for (const file of [any, Uint8Array.from(high)]) expect(invalidUtf8(file) >= 0).toBe(refuses(file));
      }),
      { seed: 20260802, numRuns: 2_000 },
    );
  });
});
