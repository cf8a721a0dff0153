import { createHash } from 'node:crypto';
import { checkCharacterOf, pseudonymAlphabet } from '@cairnstep/dictionary';
import type { Random } from '../random.ts';

const characters = 20;

/** The check character of a participant code, from everything before it. */
export const checkCharacter = (code: string): string => checkCharacterOf(createHash('sha256').update(code).digest());

/** A participant code as a site would draw it: S, 20 random characters and the check character. */
export function participantCode(random: Random): string {
  const drawn = Array.from({ length: characters }, () => pseudonymAlphabet.charAt(random.whole(0, pseudonymAlphabet.length - 1)));
  const code = `S${drawn.join('')}`;
  return code + checkCharacter(code);
}
