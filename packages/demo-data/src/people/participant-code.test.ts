import { exampleParticipant, pseudonymPattern } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { Random } from '../random.ts';
import { checkCharacter, participantCode } from './participant-code.ts';

describe('participant codes', () => {
  it('end with the check character that a site computes', () => {
    // Codes made with WebCrypto in the vectors of the registry's pseudonym recipe, and the dictionary's example.
    for (const code of ['SSWDJQGNW1T2PF47GBENZQ', 'SJ3G6AFENN47S21629XVNF', exampleParticipant]) {
      expect(checkCharacter(code.slice(0, -1))).toBe(code.slice(-1));
    }
  });

  it('have the shape the dictionary asks for', () => {
    const random = Random.of(1, 'codes');
    const codes = Array.from({ length: 200 }, () => participantCode(random));
    expect(codes.every((code) => pseudonymPattern.test(code))).toBe(true);
    expect(new Set(codes).size).toBe(200);
  });
});
