/**
 * Whether earlier answers, put together, come so close to a new set of people that the remainder is a handful.
 *
 * A mean with its n is a sum over people, so a reader can add and subtract answered groups. Looked for are, from up to three earlier
 * sets, with the complement of each (everybody's figures are public, so a complement is answered with its set):
 *
 * - a union that equals the new set, or its complement, but for 1 to 10 people. With complements this takes in differences too:
 *   A without B is the complement of (not A) and B together.
 * - two sets that together hold the same people as the new set and a third one, each as often, but for 1 to 10 people.
 *
 * A remainder of nobody is harmless: the answer could be computed already. Unions of overlapping sets are refused too although a
 * reader would also need their overlap: erring on this side costs a question, the other a person. Longer chains are not looked for;
 * auditing every linear system is not feasible, which is why filters are pre-cut and data cuts are frozen.
 */
import type { PeopleSet } from './people-set.ts';
import { bitsIn, ofWords } from './people-set.ts';

/**
 * @param known earlier answered sets
 * @param limit largest number of people that is too few, for instance 10
 */
export function isCloseToCombination(asked: PeopleSet, known: readonly PeopleSet[], everyone: PeopleSet, limit: number): boolean {
  const length = Math.max(asked.words.length, everyone.words.length, ...known.map(({ words }) => words.length));
  const all = resized(everyone, length);
  const earlier = known.map((set) => resized(set, length));
  const withComplements = [...earlier, ...earlier.map((set) => complement(set, all))];
  const target = resized(asked, length);
  return (
    isCloseToUnion(target, withComplements, limit) ||
    isCloseToUnion(complement(target, all), withComplements, limit) ||
    isCloseToExchange(target, [...earlier, all], limit)
  );
}

function resized(set: PeopleSet, length: number): PeopleSet {
  if (set.words.length === length) return set;
  const words = new Uint32Array(length);
  words.set(set.words);
  return { words, size: set.size };
}

function complement(set: PeopleSet, all: PeopleSet): PeopleSet {
  return ofWords(all.words.map((word, at) => word & ~(set.words[at] ?? 0)));
}

function isTooFew(count: number, limit: number): boolean {
  return count >= 1 && count <= limit;
}

function isCloseToUnion(target: PeopleSet, sets: readonly PeopleSet[], limit: number): boolean {
  const inside = sets.filter((set) => set.size > 0 && countOutside(set, target, target, limit) <= limit);
  inside.sort((a, b) => b.size - a.size);
  const nobody: PeopleSet = { words: new Uint32Array(target.words.length), size: 0 };
  for (const [i, first] of inside.entries()) {
    if (isTooFew(countUnionDifference(target, first, nobody, nobody, limit), limit)) return true;
    for (let j = i + 1; j < inside.length; j++) {
      const second = inside[j] ?? nobody;
      if (isTooFew(countUnionDifference(target, first, second, nobody, limit), limit)) return true;
      const missing = missingWords(target, first, second);
      for (let k = j + 1; k < inside.length; k++) {
        const third = inside[k] ?? nobody;
        // Sorted by size: once three sets are too small to fill the target, so are all later ones.
        if (first.size + second.size + third.size + limit < target.size) break;
        if (countStillMissing(missing, third, limit) > limit) continue;
        if (isTooFew(countUnionDifference(target, first, second, third, limit), limit)) return true;
      }
    }
  }
  return false;
}

/** Sets `a` and `b` against the asked set and `c`: the same people, each as often? */
function isCloseToExchange(asked: PeopleSet, known: readonly PeopleSet[], limit: number): boolean {
  for (const c of known) {
    const inside = known.filter((set) => set !== c && countOutside(set, asked, c, limit) <= limit);
    for (const [i, a] of inside.entries()) {
      for (let j = i + 1; j < inside.length; j++) {
        const b = inside[j];
        if (b === undefined || Math.abs(asked.size + c.size - a.size - b.size) > 2 * limit) continue;
        if (isTooFew(countUneven(asked, c, a, b, limit), limit)) return true;
      }
    }
  }
  return false;
}

/** People of a set who are in neither of two others; stops counting above the limit. */
function countOutside(set: PeopleSet, one: PeopleSet, other: PeopleSet, limit: number): number {
  let count = 0;
  for (let at = 0; at < set.words.length && count <= limit; at++) {
    count += bitsIn((set.words[at] ?? 0) & ~((one.words[at] ?? 0) | (other.words[at] ?? 0)));
  }
  return count;
}

/** Where the target has people whom two sets lack: word number and bits, alternating. */
function missingWords(target: PeopleSet, a: PeopleSet, b: PeopleSet): number[] {
  const missing: number[] = [];
  for (let at = 0; at < target.words.length; at++) {
    const bits = (target.words[at] ?? 0) & ~((a.words[at] ?? 0) | (b.words[at] ?? 0));
    if (bits !== 0) missing.push(at, bits);
  }
  return missing;
}

/** How many of them a third set lacks too; stops counting above the limit. */
function countStillMissing(missing: readonly number[], third: PeopleSet, limit: number): number {
  let count = 0;
  for (let i = 0; i < missing.length && count <= limit; i += 2) {
    count += bitsIn((missing[i + 1] ?? 0) & ~(third.words[missing[i] ?? 0] ?? 0));
  }
  return count;
}

/** People in the target or in the union of three sets, but not in both; stops counting above the limit. */
function countUnionDifference(target: PeopleSet, a: PeopleSet, b: PeopleSet, c: PeopleSet, limit: number): number {
  let count = 0;
  for (let at = 0; at < target.words.length && count <= limit; at++) {
    count += bitsIn((target.words[at] ?? 0) ^ ((a.words[at] ?? 0) | (b.words[at] ?? 0) | (c.words[at] ?? 0)));
  }
  return count;
}

/** People who are in one pair of sets more often than in the other pair; stops counting above the limit. */
function countUneven(a1: PeopleSet, a2: PeopleSet, b1: PeopleSet, b2: PeopleSet, limit: number): number {
  let count = 0;
  for (let at = 0; at < a1.words.length && count <= limit; at++) {
    const [p, q, r, s] = [a1.words[at] ?? 0, a2.words[at] ?? 0, b1.words[at] ?? 0, b2.words[at] ?? 0];
    count += bitsIn((p ^ q ^ r ^ s) | ((p & q) ^ (r & s)));
  }
  return count;
}
