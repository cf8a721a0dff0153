import { strToU8, zipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { defaultWorkbookLimits } from '../limits.ts';
import { UnreadableFile } from '../reading/unreadable-file.ts';
import { makeZip } from '../test-support/make-zip.ts';
import type { ZipDraft } from '../test-support/make-zip.ts';
import { crc32 } from './crc32.ts';
import { unpack } from './unpack.ts';
import { readZipDirectory } from './zip-directory.ts';

const text = 'On one leg, then on two. '.repeat(5_000);

function contents(bytes: Uint8Array, limits = defaultWorkbookLimits): Record<string, string> {
  const entries = [...readZipDirectory(bytes, limits)];
  return Object.fromEntries(
    entries.map(([name, entry]) => [name, [...unpack(entry)].map((piece) => new TextDecoder().decode(piece)).join('')]),
  );
}

/** The rule and the words of the refusal. */
function refusal(bytes: Uint8Array, limits = defaultWorkbookLimits): string {
  try {
    contents(bytes, limits);
  } catch (error) {
    if (error instanceof UnreadableFile) return `${error.rule} ${error.found}`;
    throw error;
  }
  return 'none';
}

const archive = (...drafts: readonly ZipDraft[]): Uint8Array => makeZip([...drafts, { name: 'Last.xml', content: text }]);

describe('crc32', () => {
  it('gives the check value of the polynomial', () => {
    // CRC-32/ISO-HDLC of "123456789": Greg Cook, Catalogue of parametrised CRC algorithms.
    expect(crc32(strToU8('123456789'))).toBe(0xcbf43926);
    expect(crc32(strToU8('6789'), crc32(strToU8('12345')))).toBe(0xcbf43926);
  });
});

describe('readZipDirectory', () => {
  it('finds and unpacks the parts of an archive, packed and stored, made by another program', () => {
    const bytes = zipSync({ 'a.xml': [strToU8(text), { level: 9 }], 'b/C.xml': [strToU8('stored'), { level: 0 }] });
    expect(contents(bytes)).toEqual({ 'a.xml': text, 'b/c.xml': 'stored' });
  });

  it('takes an archive with a comment, with an empty part, and with a folder', () => {
    expect(contents(makeZip([{ name: 'a.xml', content: text }], 'by hand'))).toEqual({ 'a.xml': text });
    expect(contents(archive({ name: 'a/' }, { name: 'a/b.xml', content: '' }))).toEqual({ 'a/': '', 'a/b.xml': '', 'last.xml': text });
  });

  it.each(['../../x.xml', 'a/../../x.xml', '..', '/etc/x.xml', 'C:/x.xml', 'c:x.xml', '\\x.xml', 'a\\..\\x.xml', 'a\0.xml', ''])(
    'refuses a part called %j',
    (name) => {
      expect(refusal(archive({ name, content: text }))).toBe(
        'F41 The workbook is damaged. It has a part whose name leads out of the workbook.',
      );
    },
  );

  it.each(['a..b.xml', '...', 'a/..b/c.xml'])('takes a part called %j', (name) => {
    expect(refusal(archive({ name, content: text }))).toBe('none');
  });

  it('refuses a symbolic link and takes a file with a mode', () => {
    expect(refusal(archive({ name: 'a.xml', claims: { mode: 0o120777 } }))).toMatch(/^F41 .* leads out of/);
    expect(refusal(archive({ name: 'a.xml', claims: { mode: 0o100644 } }))).toBe('none');
  });

  it('refuses two parts of the same name, whatever the case', () => {
    expect(refusal(archive({ name: 'a.xml' }, { name: 'A.XML' }))).toMatch(/^F41 .* two parts of the same name/);
    expect(refusal(archive({ name: 'a.xml' }, { name: 'b.xml' }))).toBe('none');
  });

  it('refuses a part with another name or form in its own header than in the list', () => {
    expect(refusal(archive({ name: 'a.xml', claims: { localName: 'b.xml' } }))).toMatch(/^F41 .* another name or form/);
  });

  it('refuses a part with a password, and one packed in an unknown way', () => {
    expect(refusal(archive({ name: 'a.xml', claims: { flags: 1 } }))).toBe('F40 The workbook is protected by a password.');
    expect(refusal(archive({ name: 'a.xml', content: text, claims: { method: 12 } }))).toMatch(/^F41 .* packed in a way/);
  });

  it('refuses parts that share bytes', () => {
    // The trick of Fifield, A better zip bomb, USENIX WOOT 2019: many entries, one kernel.
    expect(
      refusal(archive({ name: 'a.xml', content: text }, { name: 'a2.xml', content: text, claims: { localName: 'a.xml', offset: 0 } })),
    ).toMatch(/^F41 .* do not stand where/);
  });

  it('refuses every archive that is cut off, wherever', () => {
    const whole = archive({ name: 'a.xml', content: text });
    expect(refusal(whole)).toBe('none');
    for (let length = 0; length < whole.length; length += 1) expect(refusal(whole.subarray(0, length)), String(length)).toMatch(/^F41/);
  });

  it('refuses an archive with anything behind its end', () => {
    const whole = archive();
    expect(refusal(new Uint8Array([...whole, 0]))).toMatch(/^F41/);
  });

  it('notices every byte of a part that has changed', () => {
    const whole = makeZip([{ name: 'a.xml', content: 'Seven steps to the left.' }]);
    expect(refusal(whole)).toBe('none');
    for (let at = 35; at < 35 + 20; at += 1) {
      const changed = Uint8Array.from(whole);
      changed[at] = (changed[at] ?? 0) ^ 0x10;
      expect(refusal(changed), String(at)).toMatch(/^F41/);
    }
  });

  it('refuses more parts than allowed before it looks at any', () => {
    const many = makeZip(Array.from({ length: 30 }, (_, index) => ({ name: `../${index}` })));
    expect(refusal(many, { ...defaultWorkbookLimits, entries: 29 })).toBe('F03 The workbook has more than 29 parts.');
    expect(refusal(makeZip([{ name: 'a.xml' }]), { ...defaultWorkbookLimits, entries: 1 })).toBe('none');
  });

  it('refuses parts that say they unpack to more than allowed, or to too many times their size', () => {
    const zeros = new Uint8Array(2_000_000);
    expect(refusal(makeZip([{ name: 'a.xml', content: zeros }]))).toBe(
      'F03 A part of the workbook unpacks to more than 200 times its size.',
    );
    expect(refusal(makeZip([{ name: 'a.xml', content: zeros }]), { ...defaultWorkbookLimits, unpackRatio: 1_032 })).toBe('none');
    expect(refusal(makeZip([{ name: 'a.xml', content: text }]), { ...defaultWorkbookLimits, unpackedBytes: text.length - 1 })).toMatch(
      /^F03 The workbook unpacks to more than/,
    );
    expect(refusal(makeZip([{ name: 'a.xml', content: text }]), { ...defaultWorkbookLimits, unpackedBytes: text.length })).toBe('none');
  });

  it('stops unpacking a part that is larger than it says', () => {
    const lying = makeZip([{ name: 'a.xml', content: new Uint8Array(20_000_000), claims: { size: 50_000 } }]);
    const entry = readZipDirectory(lying, defaultWorkbookLimits).get('a.xml');
    let unpacked = 0;
    const unpackAll = (): void => {
      for (const piece of unpack(entry!)) unpacked += piece.length;
    };
    expect(unpackAll).toThrow(UnreadableFile);
    expect(unpacked).toBeLessThanOrEqual(50_000);
  });

  it('refuses a part beyond 4 GB', () => {
    expect(refusal(archive({ name: 'a.xml', claims: { size: 0xffffffff } }))).toBe('F03 A part of the workbook is larger than 4 GB.');
  });
});
