/** Zones of partial preservation as sets: the levels as bits, and whether the zone can be not applicable. */
import type { SideFindings } from './read-side.ts';
import { perianalBit } from './read-side.ts';
import type { SideReading } from './grades.ts';
import type { SideOutcome } from './side-outcomes.ts';
import { caudalTo, countBits, mostCaudal, mostRostral, notApplicable, place, rostralTo } from './level-bits.ts';
import type { Counts, StrengthBelow } from './strength.ts';
import { canMove, canReachThree, keyMusclesBelow, mustReachThree, nonKeyFarBelow, strengthBelow } from './strength.ts';

const c1 = 1 << place.C1;

/** Sensory zone of one side. */
export function sensoryZones(found: SideFindings, canFeelPressure: boolean, canLackPressure: boolean): number {
  const zones = canFeelPressure || found.canBeFelt & perianalBit ? notApplicable : 0;
  if (!canLackPressure || found.mustBeFelt & perianalBit) return zones;
  const sure = found.mustBeFelt & ~perianalBit;
  const reached = sure === 0 ? -1 : ~rostralTo(mostCaudal(sure));
  // A dermatome's bit is that of the level above it; as a zone the dermatome stands for itself.
  const felt = (found.canBeFelt & ~perianalBit & reached) << 1;
  return zones | felt | (sure === 0 ? c1 : 0);
}

/** The most caudal of motor level and moving key muscles, over what one outcome leaves open. */
function reachOfKeyMuscles(found: SideFindings, outcome: SideOutcome): number {
  const below = (outcome.free | outcome.weak) & caudalTo(outcome.motor);
  const moving = below & ((outcome.free & canMove(found)) | (outcome.weak & found.canBeFaint));
  const sure = below & ~found.canBeStill;
  if (sure === 0) return moving | (1 << outcome.motor);
  return moving & ~rostralTo(mostCaudal(sure));
}

/** What a grade C or D needs to know when the zone of a side is to be `zone` by key muscles alone. */
function fewestAndMost(found: SideFindings, outcome: SideOutcome, zone: number, nli: number): Counts {
  const below = caudalTo(nli);
  const sure = countBits(outcome.strong & below);
  const between = outcome.free & below & rostralTo(zone);
  const last = outcome.free & (1 << zone);
  return {
    fewest: sure + countBits(between & mustReachThree(found)) + countBits(last & ~found.canBeFaint),
    most: sure + countBits((between | last) & canReachThree(found)),
  };
}

/** The counts of a side for each candidate level, by place. */
function strengthByCandidate(side: SideReading, nli: number): StrengthBelow[] {
  const strength: StrengthBelow[] = [];
  for (let candidates = nli; candidates !== 0; candidates &= candidates - 1) {
    const candidate = mostRostral(candidates);
    strength[candidate] = strengthBelow(side.found, side.outcomes, candidate);
  }
  return strength;
}

/**
 * Zones of one outcome whose non-key entry lies more than three levels below its motor level: the entry replaces a more
 * rostral reach of the key muscles exactly when the grade is C.
 */
function zonesWithNonKey(found: SideFindings, outcome: SideOutcome, reach: number, nli: number, across: readonly StrengthBelow[]): number {
  let zones = reach & caudalTo(found.nonKey);
  for (let rest = reach & ~zones; rest !== 0; rest &= rest - 1) {
    const zone = mostRostral(rest);
    for (let candidates = nli & ~caudalTo(outcome.rostral); candidates !== 0; candidates &= candidates - 1) {
      const candidate = mostRostral(candidates);
      const opposite = outcome.rostral === candidate ? across[candidate]!.from : across[candidate]!.at;
      const total = keyMusclesBelow(candidate);
      const here = fewestAndMost(found, outcome, zone, candidate);
      if (2 * (here.fewest + opposite.fewest) < total) zones |= 1 << found.nonKey;
      if (2 * (here.most + opposite.most) >= total) zones |= 1 << zone;
    }
  }
  return zones;
}

/** Motor zone of one side without voluntary anal contraction. `sacral` says whether sensation at S4-5 can be present, absent. */
export function motorZones(
  own: SideReading,
  other: SideReading,
  nli: number,
  sacral: { readonly canBePresent: boolean; readonly canBeAbsent: boolean },
): number {
  let across: readonly StrengthBelow[] | undefined;
  let zones = 0;
  for (const outcome of own.outcomes) {
    const reach = reachOfKeyMuscles(own.found, outcome);
    if (!nonKeyFarBelow(own.found, outcome)) {
      zones |= reach;
      continue;
    }
    if (sacral.canBeAbsent) zones |= reach;
    if (sacral.canBePresent) {
      across ??= strengthByCandidate(other, nli);
      zones |= zonesWithNonKey(own.found, outcome, reach, nli, across);
    }
  }
  return zones;
}
