import { createHash } from 'node:crypto';
import { pseudonymAlphabet } from '@cairnstep/dictionary';
import type { Random } from '../random.ts';

const characters = 20;

/** The check character of a participant code, from the SHA-256 of everything before it. */
export function checkCharacter(code: string): string {
  const [first = 0] = createHash('sha256').update(code).digest();
  return pseudonymAlphabet.charAt(first & 31);
}

/** A participant code as a site would draw it: S, 20 random characters and the check character. */
export function participantCode(random: Random): string {
  const drawn = Array.from({ length: characters }, () => pseudonymAlphabet.charAt(random.whole(0, pseudonymAlphabet.length - 1)));
  const code = `S${drawn.join('')}`;
  return code + checkCharacter(code);
}
