/**
 * Random numbers that are the same on every machine: xoshiro128** 1.1 (D. Blackman, S. Vigna, 2018), with its state filled
 * by hashing a seed and labels. Only whole-number arithmetic and exact division are used, so that no engine's own
 * rounding of logarithms or cosines can change a byte. Fit for invented data, never for protecting anybody.
 */

const golden = 0x9e3779b9;

/** The finaliser of MurmurHash3: every bit of the input moves every bit of the output. */
function scramble(value: number): number {
  let mixed = value ^ (value >>> 16);
  mixed = Math.imul(mixed, 0x85ebca6b);
  mixed ^= mixed >>> 13;
  mixed = Math.imul(mixed, 0xc2b2ae35);
  return (mixed ^ (mixed >>> 16)) >>> 0;
}

function rotate(value: number, by: number): number {
  return (value << by) | (value >>> (32 - by));
}

export type RandomState = readonly [number, number, number, number];

export class Random {
  private s0: number;
  private s1: number;
  private s2: number;
  private s3: number;

  /** @param state four 32-bit words, not all zero. */
  constructor(state: RandomState) {
    if (state.every((word) => word === 0)) throw new RangeError('a state of zeros yields zeros only');
    [this.s0, this.s1, this.s2, this.s3] = state;
  }

  /** A stream of its own for these labels, so that drawing more in one place changes nothing in another. */
  static of(seed: number, ...labels: readonly (string | number)[]): Random {
    let hash = scramble(seed ^ golden);
    for (const character of labels.join('/')) hash = scramble(Math.imul(hash, 31) + (character.codePointAt(0) ?? 0) + golden);
    const word = (step: number): number => scramble(hash + Math.imul(golden, step));
    return new Random([word(1), word(2), word(3), word(4) | 1]);
  }

  /** A whole number from 0 to 2³² - 1. */
  word(): number {
    const result = Math.imul(rotate(Math.imul(this.s1, 5), 7), 9) >>> 0;
    const shifted = this.s1 << 9;
    this.s2 ^= this.s0;
    this.s3 ^= this.s1;
    this.s1 ^= this.s2;
    this.s0 ^= this.s3;
    this.s2 ^= shifted;
    this.s3 = rotate(this.s3, 11);
    return result;
  }

  /** From 0 up to, not including, 1. */
  fraction(): number {
    return this.word() / 4_294_967_296;
  }

  between(min: number, max: number): number {
    return min + this.fraction() * (max - min);
  }

  /** A whole number, both ends included. */
  whole(min: number, max: number): number {
    return min + Math.floor(this.fraction() * (max - min + 1));
  }

  chance(probability: number): boolean {
    return this.fraction() < probability;
  }

  /** Bell-shaped around the mean; four uniform numbers added up, so nothing lies beyond 3.47 standard deviations. */
  around(mean: number, deviation: number): number {
    const sum = this.fraction() + this.fraction() + this.fraction() + this.fraction();
    return mean + deviation * (sum - 2) * Math.sqrt(3);
  }

  /** @throws RangeError for an empty list. */
  pick<T>(list: readonly T[]): T {
    if (list.length === 0) throw new RangeError('nothing to pick from');
    return list[this.whole(0, list.length - 1)] as T;
  }

  /** One of the keys, each as likely as its weight says. */
  weighted<Key extends string>(weights: Readonly<Partial<Record<Key, number>>>): Key {
    const keys = Object.keys(weights) as Key[];
    const weightOf = (key: Key): number => weights[key] ?? 0;
    let left = this.fraction() * keys.reduce((sum, key) => sum + weightOf(key), 0);
    for (const key of keys) {
      left -= weightOf(key);
      if (left < 0) return key;
    }
    return this.pick(keys);
  }

  /** A new list in random order (Fisher and Yates). */
  shuffled<T>(list: readonly T[]): T[] {
    const mixed = [...list];
    for (let last = mixed.length - 1; last > 0; last--) {
      const other = this.whole(0, last);
      [mixed[last], mixed[other]] = [mixed[other] as T, mixed[last] as T];
    }
    return mixed;
  }
}
