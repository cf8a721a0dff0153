/** The code a participant has in the registry: the letter S, 100 bits in 20 characters, and a check character. */
import { checkCharacterOf, pseudonymAlphabet, pseudonymPattern } from '@cairnstep/dictionary';

const bodyLength = 20;
const bitsPerCharacter = 5;

/** @param bytes at least 13; the first 100 bits are used */
export async function codeFromBits(bytes: Uint8Array): Promise<string> {
  let body = 'S';
  for (let place = 0; place < bodyLength; place += 1) {
    const bit = place * bitsPerCharacter;
    const pair = ((bytes[bit >> 3] ?? 0) << 8) | (bytes[(bit >> 3) + 1] ?? 0);
    body += pseudonymAlphabet.charAt((pair >> (16 - bitsPerCharacter - (bit & 7))) & 31);
  }
  return body + (await checkCharacter(body));
}

const checkCharacter = async (body: string): Promise<string> =>
  checkCharacterOf(new Uint8Array(await crypto.subtle.digest('SHA-256', new TextEncoder().encode(body))));

/** Whether a code has the shape of a participant code and its check character is right: a mistyped one rarely has. */
export async function hasValidCheckCharacter(code: string): Promise<boolean> {
  return pseudonymPattern.test(code) && (await checkCharacter(code.slice(0, -1))) === code.slice(-1);
}
