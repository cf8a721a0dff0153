import { beforeAll, describe, expect, it } from 'vitest';
import { keyFileVector } from '../../reference/pseudonym-vectors.ts';
import { usualNormalisation } from '../pseudonyms/normalise-local-id.ts';
import { createKeyFile, openKeyFile, saveKeyFile } from './key-file.ts';
import { iterationLimits } from './key-file-header.ts';
import { KeyFileRefusal } from './key-file-refusal.ts';
import type { KeyFileRefusalCode } from './key-file-refusal.ts';
import { generatePassphrase } from './passphrase.ts';
import { passphraseWords } from './passphrase-words.ts';
import { additionalData, seal, unseal } from './seal.ts';
import type { SiteKey } from './site-key.ts';

const passphrase = 'bafo rina tuke sobi malu pegi';
/** The least that opens; the test would be no stronger with the usual number, only slower. */
const { least } = iterationLimits;

async function refusalOf(work: Promise<unknown>): Promise<KeyFileRefusalCode | 'accepted'> {
  try {
    await work;
    return 'accepted';
  } catch (error) {
    if (error instanceof KeyFileRefusal) return error.code;
    throw error;
  }
}

interface WrittenFile {
  header: { site: string; version: number; format: string; kdf: { iterations: unknown; salt: string }; cipher: { iv: string } };
  ciphertext: string;
}

function altered(file: string, change: (parsed: WrittenFile) => void): string {
  const parsed = JSON.parse(file) as WrittenFile;
  change(parsed);
  return JSON.stringify(parsed);
}

describe('the key file of the vector', () => {
  const { header, ciphertext, additionalData: text, plaintext } = keyFileVector;
  const file = JSON.stringify({ header, ciphertext });
  const open = (changed: string) => openKeyFile(changed, keyFileVector.passphrase, { site: 'site-07' });

  it('binds its whole header', () => {
    expect(additionalData(header)).toBe(text);
  });

  it('is written byte for byte', async () => {
    expect(await seal(plaintext, header, keyFileVector.passphrase)).toEqual({ header, ciphertext });
  });

  it('opens unchanged', async () => {
    expect(await unseal({ header, ciphertext }, keyFileVector.passphrase)).toBe(plaintext);
    const key = await open(file);
    expect(key).toMatchObject({ site: 'site-07', mode: 'hmac', revision: 0, normalisation: usualNormalisation });
    expect([...key.generations[0].secret]).toEqual(Array.from({ length: 32 }, (_, place) => place));
  });

  it('fails with other iterations or another site in its header', async () => {
    expect(await refusalOf(open(altered(file, (parsed) => (parsed.header.kdf.iterations = 1_000))))).toBe('too-few-iterations');
    expect(await refusalOf(open(altered(file, (parsed) => (parsed.header.kdf.iterations = 600_001))))).toBe('cannot-be-opened');
    const moved = altered(file, (parsed) => (parsed.header.site = 'site-08'));
    expect(await refusalOf(open(moved))).toBe('other-site');
    expect(await refusalOf(openKeyFile(moved, keyFileVector.passphrase, { site: 'site-08' }))).toBe('cannot-be-opened');
  });
});

describe('a key file', () => {
  let file: string;
  let key: SiteKey;
  const open = (changed: string, revision?: number) =>
    openKeyFile(changed, passphrase, { site: 'site-07', ...(revision === undefined ? {} : { revision }) });

  beforeAll(async () => {
    const created = await createKeyFile({ site: 'site-07', keyId: '2026-01' }, passphrase);
    const filled: SiteKey = {
      ...created.key,
      generations: [
        { ...created.key.generations[0], codes: new Map([['a', 'S1']]), replacedBy: new Map() },
        {
          keyId: '2025-01',
          secret: created.key.generations[0].secret.slice().reverse(),
          codes: new Map([['b', 'S0']]),
          replacedBy: new Map([['S0', 'S1']]),
        },
      ],
      people: new Map([
        ['S1', { indexDate: '2026-01-15', age: 61, lastDay: -3 }],
        ['S2', {}],
      ]),
      matches: new Map([
        [
          'sessions',
          [
            { header: 'MRN', as: 'participant' },
            { header: '__proto__', as: 'left-out' },
            { header: 'Date', as: 'study-day', variable: 'session_day', dateFormat: 'day/month/year' },
            { header: 'Born', as: 'birth-date' },
            { header: 'Speed', as: 'value', variable: 'treadmill_speed_mps', unit: 'km/h' },
            { header: 'What', as: 'value', variable: 'status', codes: { done: 'completed' } },
          ],
        ],
      ]),
      idLengths: new Map([[8, 240]]),
    };
    ({ key, file } = await saveKeyFile(filled, passphrase, least));
    expect(created.key.revision).toBe(1);
    expect(JSON.parse(created.file)).toMatchObject({ header: { kdf: { iterations: 1_000_000 } } });
  });

  it('gives back everything that was saved, and counts the saving', async () => {
    expect(key.revision).toBe(2);
    expect(await open(file, 2)).toEqual(key);
  });

  it('shows none of it', () => {
    for (const word of ['2026-01-15', 'session_day', 'MRN', '240', 'people']) expect(file).not.toContain(word);
  });

  it('is refused when it is older than one used before', async () => {
    expect(await refusalOf(open(file, 3))).toBe('older-file');
  });

  it('is refused with a wrong passphrase', async () => {
    expect(await refusalOf(openKeyFile(file, `${passphrase}x`, { site: 'site-07' }))).toBe('cannot-be-opened');
  });

  it.each<[string, (parsed: WrittenFile) => void, KeyFileRefusalCode]>([
    ['too few iterations', (parsed) => (parsed.header.kdf.iterations = 599_999), 'too-few-iterations'],
    ['too many iterations', (parsed) => (parsed.header.kdf.iterations = 1_000_000_000), 'too-many-iterations'],
    ['iterations that are no number', (parsed) => (parsed.header.kdf.iterations = '1000000'), 'not-a-key-file'],
    ['half an iteration', (parsed) => (parsed.header.kdf.iterations = 700_000.5), 'not-a-key-file'],
    ['a short salt', (parsed) => (parsed.header.kdf.salt = 'AAAA'), 'not-a-key-file'],
    ['a short initialisation vector', (parsed) => (parsed.header.cipher.iv = 'AAAA'), 'not-a-key-file'],
    ['another version', (parsed) => (parsed.header.version = 2), 'unknown-version'],
    ['another format', (parsed) => (parsed.header.format = 'letter'), 'not-a-key-file'],
  ])('is refused at once with %s', async (_, change, code) => {
    expect(await refusalOf(open(altered(file, change)))).toBe(code);
  });

  it('is refused when its initialisation vector was swapped with that of another file', async () => {
    const swapped = altered(file, (parsed) => (parsed.header.cipher.iv = keyFileVector.header.cipher.iv));
    expect(await refusalOf(open(swapped))).toBe('cannot-be-opened');
  });

  it('is refused when a byte of its content was changed', async () => {
    const changed = altered(
      file,
      (parsed) => (parsed.ciphertext = (parsed.ciphertext.startsWith('A') ? 'B' : 'A') + parsed.ciphertext.slice(1)),
    );
    expect(await refusalOf(open(changed))).toBe('cannot-be-opened');
  });

  it.each(['', 'null', '[]', '{}', '{"header":{}}', 'PK\u0003\u0004', '{"header":null,"ciphertext":""}'])(
    'is told from "%s"',
    async (text) => {
      expect(await refusalOf(open(text))).toBe('not-a-key-file');
    },
  );

  it('is not saved under a short passphrase, nor with too little work', async () => {
    expect(await refusalOf(saveKeyFile(key, 'fourteen chars', least))).toBe('passphrase-too-short');
    expect(await refusalOf(saveKeyFile(key, passphrase, least - 1))).toBe('too-few-iterations');
  });
});

describe('passphrases', () => {
  it('come from 7,776 words that four letters tell apart', () => {
    const words = passphraseWords();
    expect(words).toHaveLength(6 ** 5);
    expect(new Set(words.map((word) => word.slice(0, 4))).size).toBe(words.length);
    expect(words.every((word) => /^[bdfghjklmnprstvwyz][aeiou][bdfghjklmnprstvwyz][aeiou]$/.test(word))).toBe(true);
    expect(6 * Math.log2(words.length)).toBeGreaterThan(77.5);
  });

  it('have six words, each as likely as any other', () => {
    expect(generatePassphrase()).toMatch(/^[a-z]{4}( [a-z]{4}){5}$/);
    // 65,536 is eight rounds of 7,776 and a rest of 3,328; what falls into the rest is drawn again.
    const drawn = [
      [243, 0],
      [0, 0],
      [0, 1],
      [30, 96],
      [242, 255],
      [255, 255],
      [0, 2],
      [0, 3],
    ].map((pair) => Uint8Array.from(pair));
    const words = Array.from({ length: 7_776 }, (_, place) => String(place));
    expect(generatePassphrase(words, () => drawn.shift() ?? new Uint8Array(2))).toBe('0 1 0 7775 2 3');
    expect(() => generatePassphrase([])).toThrow(RangeError);
  });
});
