/** A set of people as a bitmap over their registry numbers, for comparing cohorts by who is in them, not by how they were asked for. */

/** Bit n of word n / 32 stands for registry number n. Sets may differ in length; missing words are empty. */
export interface PeopleSet {
  readonly words: Uint32Array;
  readonly size: number;
}

/**
 * @param members registry numbers: whole numbers from 0, dense (they index a bitmap); repeats count once
 * @throws RangeError for anything else
 */
export function peopleSet(members: Iterable<number>): PeopleSet {
  const numbers = [...members];
  let highest = -1;
  for (const number of numbers) {
    if (!Number.isSafeInteger(number) || number < 0 || number >= 2 ** 31)
      throw new RangeError('Registry numbers are whole numbers from 0.');
    if (number > highest) highest = number;
  }
  const words = new Uint32Array((highest >> 5) + 1);
  for (const number of numbers) words[number >> 5] = (words[number >> 5] ?? 0) | (1 << (number & 31));
  return ofWords(words);
}

export function ofWords(words: Uint32Array): PeopleSet {
  let size = 0;
  for (const word of words) size += bitsIn(word);
  return { words, size };
}

/** Number of ones in a 32-bit word. Source: Warren HS, Hacker's Delight, 2nd edition, section 5-1. */
export function bitsIn(word: number): number {
  const pairs = word - ((word >>> 1) & 0x55555555);
  const fours = (pairs & 0x33333333) + ((pairs >>> 2) & 0x33333333);
  return Math.imul((fours + (fours >>> 4)) & 0x0f0f0f0f, 0x01010101) >>> 24;
}

/** People in exactly one of the two. */
export function countDifference(a: PeopleSet, b: PeopleSet): number {
  let count = 0;
  for (let at = 0; at < Math.max(a.words.length, b.words.length); at++) count += bitsIn((a.words[at] ?? 0) ^ (b.words[at] ?? 0));
  return count;
}
