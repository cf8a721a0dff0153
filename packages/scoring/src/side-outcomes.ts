/** The sensory and motor level of one side, with everything that each possible pair of them takes for granted. */
import type { SideFindings } from './read-side.ts';
import { caudalTo, intact, keyMuscleBits, mostRostral, place, rostralTo } from './level-bits.ts';

/**
 * How the search for the motor level ended: in segments without key muscles, where it follows the sensory level; at a key
 * muscle below 3; at one of 3 or 4; past the last key muscle of a limb while sensation is altered higher up; with all normal.
 */
export type SearchEnd = 'follows-sensory' | 'below-three' | 'three-or-four' | 'limb-full' | 'all-normal';

/**
 * One way the search for the motor level can end, for the sensory levels that allow it. The key muscles fall into three
 * sets: those the search needs at grade 3 or more, the one it needs below 3, and those it never looked at.
 */
export interface SideOutcome {
  readonly end: SearchEnd;
  /** The more rostral of sensory and motor level. */
  readonly rostral: number;
  readonly motor: number;
  /** Key muscles this outcome needs at grade 3 or more. */
  readonly strong: number;
  /** The key muscle this outcome needs below grade 3, or 0. */
  readonly weak: number;
  /** Key muscles this outcome says nothing about. */
  readonly free: number;
}

const aboveC4 = rostralTo(place.C4);
const c4ToT1 = rostralTo(place.T2) & ~aboveC4;
const t2ToT12 = rostralTo(place.L1) & ~rostralTo(place.T2);
const fromL1 = ~rostralTo(place.L1);
const l1ToS1 = rostralTo(place.S2) & fromL1;
const s2AndS3 = rostralTo(place.INT) & ~rostralTo(place.S2);

/** The levels a side's sensation can have: each dermatome that can be altered while all before it can be normal. */
export function sensoryLevels(found: SideFindings): number {
  const surelyAltered = ~found.canBeNormal & rostralTo(place.INT);
  const first = surelyAltered & -surelyAltered;
  // With no dermatome surely altered the search can run through to INT.
  const reached = first === 0 ? -1 : (first << 1) - 1;
  return (found.canBeAltered | intact) & reached;
}

/** Adds one end of the search, once for every rostral level that the sensory levels make of it. */
function addEnd(outcomes: SideOutcome[], end: SearchEnd, sensory: number, motor: number, strong: number, weak: number): void {
  const free = keyMuscleBits & caudalTo(motor) & ~strong & ~weak;
  for (let above = sensory & rostralTo(motor); above !== 0; above &= above - 1) {
    outcomes.push({ end, rostral: mostRostral(above), motor, strong, weak, free });
  }
  if (sensory & ~rostralTo(motor)) outcomes.push({ end, rostral: motor, motor, strong, weak, free });
}

/** Adds an end at each sensory level of the set, where the motor level follows the sensory level. */
function addFollowing(outcomes: SideOutcome[], sensory: number, strong: number): void {
  for (let left = sensory; left !== 0; left &= left - 1) {
    const level = mostRostral(left);
    addEnd(outcomes, 'follows-sensory', 1 << level, level, strong, 0);
  }
}

/** Searches the key muscles from `first` to `last`. Answers the muscles passed, or -1 when the search cannot pass them all. */
function search(outcomes: SideOutcome[], found: SideFindings, sensory: number, first: number, last: number, passed: number): number {
  let strong = passed;
  for (let muscle = first; muscle <= last; muscle++) {
    const bit = 1 << muscle;
    if ((found.canBeStill | found.canBeFaint) & bit) addEnd(outcomes, 'below-three', sensory, muscle - 1, strong, bit);
    if (found.canBeUseful & bit) addEnd(outcomes, 'three-or-four', sensory, muscle, strong | bit, 0);
    if (!(found.canBeFull & bit)) return -1;
    strong |= bit;
  }
  return strong;
}

/**
 * Every outcome of one side, given the sensory levels it can have and whether the anal sphincter contracts (which only
 * decides between INT and S3 when all else is normal).
 */
export function sideOutcomes(found: SideFindings, sensory: number, contraction: boolean): SideOutcome[] {
  const outcomes: SideOutcome[] = [];
  addFollowing(outcomes, sensory & aboveC4, 0);

  const searched = sensory & ~aboveC4;
  if (searched === 0) return outcomes;
  const arms = search(outcomes, found, searched, place.C5, place.T1, 0);
  if (arms === -1) return outcomes;
  if (searched & c4ToT1) addEnd(outcomes, 'limb-full', searched & c4ToT1, place.T1, arms, 0);
  addFollowing(outcomes, searched & t2ToT12, arms);

  const lumbar = searched & fromL1;
  if (lumbar === 0) return outcomes;
  const all = search(outcomes, found, lumbar, place.L2, place.S1, arms);
  if (all === -1) return outcomes;
  if (lumbar & l1ToS1) addEnd(outcomes, 'limb-full', lumbar & l1ToS1, place.S1, all, 0);
  addFollowing(outcomes, lumbar & s2AndS3, all);
  if (lumbar & intact) addEnd(outcomes, 'all-normal', intact, contraction ? place.INT : place.S3, all, 0);
  return outcomes;
}
