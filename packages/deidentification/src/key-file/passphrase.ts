import { KeyFileRefusal } from './key-file-refusal.ts';
import { passphraseWords } from './passphrase-words.ts';

/** NIST SP 800-63B-4: 15 characters for a password that is used alone. */
const shortestPassphrase = 15;
const wordsInPassphrase = 6;

/** @throws KeyFileRefusal when a passphrase that a site chose itself is too short */
export function requirePassphrase(passphrase: string): void {
  if (Array.from(passphrase.normalize('NFKC')).length < shortestPassphrase) throw new KeyFileRefusal('passphrase-too-short');
}

/** Random bytes of the length asked for. */
export type RandomBytes = (length: number) => Uint8Array;

const randomBytesOfBrowser: RandomBytes = (length) => crypto.getRandomValues(new Uint8Array(length));

/**
 * Six words drawn from a list, with a blank between them: 6 × log2(7776) = 77.5 bits from the list of this package. A file that can be
 * attacked without end for years needs that much, and nobody composes it by hand.
 *
 * @throws RangeError when the list has more words than two bytes can number
 */
export function generatePassphrase(
  wordList: readonly string[] = passphraseWords(),
  randomBytes: RandomBytes = randomBytesOfBrowser,
): string {
  return Array.from({ length: wordsInPassphrase }, () => drawWord(wordList, randomBytes)).join(' ');
}

const twoBytes = 65_536;

/** Numbers beyond the last full round of the list are drawn again, so that every word is equally likely. */
function drawWord(wordList: readonly string[], randomBytes: RandomBytes): string {
  if (wordList.length === 0 || wordList.length > twoBytes) throw new RangeError('a word list has 1 to 65,536 words');
  const rounds = twoBytes - (twoBytes % wordList.length);
  for (;;) {
    const [high = 0, low = 0] = randomBytes(2);
    const drawn = high * 256 + low;
    const word = drawn < rounds ? wordList[drawn % wordList.length] : undefined;
    if (word !== undefined) return word;
  }
}
