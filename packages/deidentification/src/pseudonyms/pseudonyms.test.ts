import { exampleParticipant, pseudonymAlphabet, pseudonymPattern } from '@cairnstep/dictionary';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { pseudonymVectors } from '../../reference/pseudonym-vectors.ts';
import { drawSecret } from './keyed-hash.ts';
import { normaliseLocalId, usualNormalisation } from './normalise-local-id.ts';
import { hasValidCheckCharacter } from './participant-code.ts';
import { pseudonymFromHmac } from './pseudonym-from-hmac.ts';
import { randomPseudonym } from './random-pseudonym.ts';

const bytesOf = (hex: string) => Uint8Array.from(hex.match(/../g) ?? [], (pair) => Number.parseInt(pair, 16));

describe('codes from record numbers', () => {
  it.each(pseudonymVectors)(
    'gives the code of the vector: $says',
    async ({ secretHex, site, idType, localId, options, normalised, code }) => {
      expect(normaliseLocalId(localId, options)).toBe(normalised);
      expect(await pseudonymFromHmac(bytesOf(secretHex), site, idType, normalised)).toBe(code);
    },
  );

  it('refuses what would let two people run into one', async () => {
    const secret = drawSecret();
    await expect(pseudonymFromHmac(secret, 'site-07', 'mrn', '')).rejects.toThrow(RangeError);
    await expect(pseudonymFromHmac(secret, 'site-07', 'mr\u001fn', '1')).rejects.toThrow(RangeError);
    await expect(pseudonymFromHmac(secret.slice(1), 'site-07', 'mrn', '1')).rejects.toThrow('32 bytes');
    expect(await pseudonymFromHmac(secret, 'site-07', 'mrn', '1')).toMatch(pseudonymPattern);
  });
});

describe('normalised record numbers', () => {
  it('stay as they are when normalised again, and never hold the separator of the recipe', () => {
    const text = fc.string({ unit: fc.constantFrom(...'0123aZß\u001f \u200b-–._/éﬁ１\u0301'), maxLength: 12 });
    const options = fc.record({ stripSeparators: fc.boolean(), upper: fc.boolean(), stripLeadingZeros: fc.boolean() });
    fc.assert(
      fc.property(text, options, (localId, chosen) => {
        const once = normaliseLocalId(localId, chosen);
        expect(normaliseLocalId(once, chosen)).toBe(once);
        expect(once).not.toContain('\u001f');
      }),
      { seed: 20261201, numRuns: 500 },
    );
  });

  it('keep a zero that is all there is, and stand for nobody when only separators are there', () => {
    expect(normaliseLocalId('000', { ...usualNormalisation, stripLeadingZeros: true })).toBe('0');
    expect(normaliseLocalId(' -/. ', usualNormalisation)).toBe('');
  });
});

describe('random codes', () => {
  it('have the shape the dictionary asks for, a right check character, and never repeat', async () => {
    const codes = await Promise.all(Array.from({ length: 300 }, randomPseudonym));
    for (const code of codes) {
      expect(code).toMatch(pseudonymPattern);
      expect(await hasValidCheckCharacter(code)).toBe(true);
    }
    expect(new Set(codes).size).toBe(codes.length);
  });
});

describe('check characters', () => {
  it("are right in the dictionary's example and in no other ending of it", async () => {
    const endings = await Promise.all(
      [...pseudonymAlphabet].map(async (last) => ((await hasValidCheckCharacter(exampleParticipant.slice(0, -1) + last)) ? last : '')),
    );
    expect(endings.join('')).toBe(exampleParticipant.slice(-1));
  });

  it.each(['', 'S', 'sswdjqgnw1t2pf47gbenzq', 'SSWDJQGNW1T2PF47GBENZQ ', 'ISWDJQGNW1T2PF47GBENZQ'])('are refused in "%s"', async (code) => {
    expect(await hasValidCheckCharacter(code)).toBe(false);
  });
});
