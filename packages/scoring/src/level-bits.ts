/**
 * Sets of levels as bits of one integer: bit 0 is C1, bit 27 is S3, bit 28 is INT. A key muscle uses the bit of its
 * segment. Small integers keep the classification free of allocation in its loops.
 */
import type { KeyMuscle, Level } from './segments.ts';
import { keyMuscles, levels } from './segments.ts';

export const place = Object.fromEntries(levels.map((level, index) => [level, index])) as Readonly<Record<Level, number>>;

export const intact = 1 << place.INT;
/** Not a level: marks a zone of partial preservation as not applicable. */
export const notApplicable = 1 << 29;

function bitsOf(muscles: readonly KeyMuscle[]): number {
  return muscles.reduce((bits, muscle) => bits | (1 << place[muscle]), 0);
}

export const keyMuscleBits = bitsOf(keyMuscles);

/** All bits strictly caudal to a level. */
export function caudalTo(level: number): number {
  return -2 << level;
}

/** All bits more than three levels below a level. Two shifts, because a shift by 32 would not move anything. */
export function farBelow(level: number): number {
  return (-8 << level) << 1;
}

/** All bits strictly rostral to a level. */
export function rostralTo(level: number): number {
  return (1 << level) - 1;
}

/** Place of the most caudal bit of a set that is not empty. */
export function mostCaudal(bits: number): number {
  return 31 - Math.clz32(bits);
}

/** Place of the most rostral bit of a set that is not empty. */
export function mostRostral(bits: number): number {
  return 31 - Math.clz32(bits & -bits);
}

export function countBits(bits: number): number {
  let pairs = bits - ((bits >>> 1) & 0x55555555);
  pairs = (pairs & 0x33333333) + ((pairs >>> 2) & 0x33333333);
  return (((pairs + (pairs >>> 4)) & 0x0f0f0f0f) * 0x01010101) >>> 24;
}
