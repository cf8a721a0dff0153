/** How many key muscles below a level can reach grade 3: the count that separates AIS C from D. */
import type { SideFindings } from './read-side.ts';
import type { SideOutcome } from './side-outcomes.ts';
import { caudalTo, countBits, farBelow, keyMuscleBits } from './level-bits.ts';

/** Smallest and largest count; `fewest > most` when no outcome allows it. */
export interface Counts {
  fewest: number;
  most: number;
}

/**
 * Counts on one side, below one candidate for the neurological level: over outcomes whose own level *is* the candidate
 * (`at`) and over those where it is the candidate or lies below it (`from`); `moving` means that movement more than three
 * levels below the motor level is possible too.
 */
export interface StrengthBelow {
  at: Counts;
  from: Counts;
  atMoving: Counts;
  fromMoving: Counts;
}

const impossible = 99;

function none(): Counts {
  return { fewest: impossible, most: -impossible };
}

function widen(counts: Counts, fewest: number, most: number): void {
  if (fewest < counts.fewest) counts.fewest = fewest;
  if (most > counts.most) counts.most = most;
}

export function canReachThree(found: SideFindings): number {
  return found.canBeUseful | found.canBeFull;
}

export function mustReachThree(found: SideFindings): number {
  return keyMuscleBits & ~(found.canBeStill | found.canBeFaint);
}

export function canMove(found: SideFindings): number {
  return found.canBeFaint | found.canBeUseful | found.canBeFull;
}

/** Whether movement more than three levels below the motor level can be present in an outcome. */
export function canMoveFarBelow(found: SideFindings, outcome: SideOutcome): boolean {
  return nonKeyFarBelow(found, outcome) || (canMove(found) & farBelow(outcome.motor)) !== 0;
}

/** Whether movement more than three levels below the motor level can be absent in an outcome. */
export function canBeStillFarBelow(found: SideFindings, outcome: SideOutcome): boolean {
  return !nonKeyFarBelow(found, outcome) && (keyMuscleBits & ~found.canBeStill & farBelow(outcome.motor)) === 0;
}

/** Whether the non-key entry lies more than three levels below the motor level of an outcome. */
export function nonKeyFarBelow(found: SideFindings, outcome: SideOutcome): boolean {
  return found.nonKey - outcome.motor > 3;
}

/** Counts below the level `nli` over a side's outcomes. */
export function strengthBelow(found: SideFindings, outcomes: readonly SideOutcome[], nli: number): StrengthBelow {
  const below = caudalTo(nli);
  const can = canReachThree(found) & below;
  const must = mustReachThree(found) & below;
  const strength: StrengthBelow = { at: none(), from: none(), atMoving: none(), fromMoving: none() };
  for (const outcome of outcomes) {
    if (outcome.rostral < nli) continue;
    const sure = countBits(outcome.strong & below);
    // Any free muscle that moves can be counted or not as its own score allows, so movement asks for nothing more.
    const fewest = sure + countBits(outcome.free & must);
    const most = sure + countBits(outcome.free & can);
    const moving = canMoveFarBelow(found, outcome);
    widen(strength.from, fewest, most);
    if (moving) widen(strength.fromMoving, fewest, most);
    if (outcome.rostral > nli) continue;
    widen(strength.at, fewest, most);
    if (moving) widen(strength.atMoving, fewest, most);
  }
  return strength;
}

/** Key muscles of both sides below a level. */
export function keyMusclesBelow(nli: number): number {
  return 2 * countBits(keyMuscleBits & caudalTo(nli));
}
