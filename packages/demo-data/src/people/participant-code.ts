import { createHash } from 'node:crypto';
import { pseudonymAlphabet } from '@cairnstep/dictionary';
import type { Random } from '../random.ts';

const characters = 20;

/** A participant code: S, 20 random characters and the check character that a site's own codes have (from the SHA-256 of what stands before it). */
export function participantCode(random: Random): string {
  const body = Array.from({ length: characters }, () => pseudonymAlphabet.charAt(random.whole(0, pseudonymAlphabet.length - 1))).join('');
  const [first = 0] = createHash('sha256').update(`S${body}`).digest();
  return `S${body}${pseudonymAlphabet.charAt(first & 31)}`;
}
