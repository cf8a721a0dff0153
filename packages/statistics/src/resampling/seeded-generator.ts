/**
 * Random numbers that can be repeated: xoshiro128** with 128 bits of state, filled from one 32-bit seed by splitmix32.
 * Every figure made with it prints its seed, so a reader can make the same figure again.
 *
 * Source: Blackman & Vigna (2021), Scrambled linear pseudorandom number generators, ACM Trans Math Softw 47(4):36. Not for secrets.
 */

export interface SeededGenerator {
  /** Next 32 bits as an integer from 0 to 2^32 - 1. */
  readonly nextBits: () => number;
  /** Integer from 0 to `count - 1`, each equally likely (draws that would favour some are thrown away). */
  readonly nextIndex: (count: number) => number;
  /** Number from 0 up to but not 1, with 53 random bits. */
  readonly nextFraction: () => number;
}

const words = 2 ** 32;

function rotateLeft(value: number, places: number): number {
  return (value << places) | (value >>> (32 - places));
}

function splitMix(seed: number): () => number {
  let state = seed | 0;
  return () => {
    state = (state + 0x9e3779b9) | 0;
    let mixed = state ^ (state >>> 16);
    mixed = Math.imul(mixed, 0x85ebca6b);
    mixed ^= mixed >>> 13;
    mixed = Math.imul(mixed, 0xc2b2ae35);
    return mixed ^ (mixed >>> 16);
  };
}

/** The generator from a state given in full; the state must not be all zero. */
export function generatorFromState(state: readonly [number, number, number, number]): SeededGenerator {
  let [a, b, c, d] = state;
  if ((a | b | c | d) === 0) throw new RangeError('A state of zeroes would repeat zero for ever.');

  function nextBits(): number {
    const result = Math.imul(rotateLeft(Math.imul(b, 5), 7), 9);
    const shifted = b << 9;
    c ^= a;
    d ^= b;
    b ^= c;
    a ^= d;
    c ^= shifted;
    d = rotateLeft(d, 11);
    return result >>> 0;
  }

  function nextIndex(count: number): number {
    if (!(Number.isInteger(count) && count >= 1 && count <= words)) throw new RangeError('An index is drawn from 1 to 2^32 places.');
    const fair = words - (words % count);
    let bits = nextBits();
    while (bits >= fair) bits = nextBits();
    return bits % count;
  }

  const nextFraction = (): number => ((nextBits() >>> 5) * 2 ** 26 + (nextBits() >>> 6)) / 2 ** 53;

  return { nextBits, nextIndex, nextFraction };
}

/** `seed`: integer from 0 to 2^32 - 1. */
export function seededGenerator(seed: number): SeededGenerator {
  if (!(Number.isInteger(seed) && seed >= 0 && seed < words)) throw new RangeError('A seed is an integer from 0 to 4294967295.');
  const next = splitMix(seed);
  return generatorFromState([next(), next(), next(), next()]);
}
