import { cellKey } from './cell-key.ts';
import type { CellKey } from './exam.ts';
import type { Reason, Sheet } from './explain-sheet.ts';
import { dermatomeCells, dermatomeInWords, muscleInWords } from './explain-sheet.ts';
import { place } from './level-bits.ts';
import type { KeyMuscle, Level, Side } from './segments.ts';
import { keyMuscles, levels, sensorySegments, sides } from './segments.ts';
import type { SideOutcome } from './side-outcomes.ts';

/** Why the one possible sensory level of a side came out. */
export function sensoryLevelReason(sheet: Sheet, side: Side): Reason {
  const level = sheet.found.sensoryLevel[side].values[0]!;
  if (level === 'INT') return { because: 'Light touch and pin prick are normal in every dermatome down to S4-5.', cells: [] };
  const altered = sensorySegments[place[level]]!;
  const which = `Going down from C2, ${dermatomeInWords(sheet, side, altered)} is the first dermatome that is not normal in both modalities.`;
  const rule =
    altered === 'C2'
      ? 'No dermatome above it is tested, so the level is C1.'
      : altered === 'S4_5'
        ? 'S4-5 itself is never a level, so the level is S3.'
        : `The level is the last normal segment, ${level}.`;
  return { because: `${which} ${rule}`, cells: dermatomeCells(side, altered) };
}

function muscleAt(index: number): KeyMuscle {
  return keyMuscles.find((muscle) => place[muscle] === index)!;
}

function followingReason(level: Level): string {
  if (place[level] < place.C4) return 'The sensory level lies above C4, where no key muscle is tested, so the motor level follows it.';
  if (place[level] < place.L1) {
    return 'Every arm key muscle is 5 and the sensory level lies between T2 and T12, where no key muscle is tested, so the motor level follows it.';
  }
  return 'Every key muscle is 5 and the sensory level lies below S1, where no key muscle is tested, so the motor level follows it.';
}

function outcomeReason(sheet: Sheet, side: Side, outcome: SideOutcome): Reason {
  const level = levels[outcome.motor]!;
  const muscleReason = (muscle: KeyMuscle, rule: string): Reason => ({
    because: `${muscleInWords(sheet, side, muscle)} is the first key muscle below 5. ${rule}`,
    cells: [cellKey(side, 'motor', muscle)],
  });
  switch (outcome.end) {
    case 'follows-sensory':
      return { because: followingReason(level), cells: [] };
    case 'below-three':
      return muscleReason(muscleAt(outcome.motor + 1), `It does not reach 3, so the level is the segment above it, ${level}.`);
    case 'three-or-four':
      return muscleReason(muscleAt(outcome.motor), 'It reaches 3, so it is the level.');
    case 'limb-full':
      return {
        because:
          level === 'T1'
            ? 'Every arm key muscle is 5, but sensation is not normal down to T2, so the level is T1.'
            : 'Every key muscle is 5, but sensation is not normal down to S2, so the level is S1.',
        cells: [],
      };
    case 'all-normal':
      return {
        because:
          level === 'INT'
            ? 'All sensation and all key muscles are normal and the anal sphincter contracts at will.'
            : 'All sensation and all key muscles are normal but voluntary anal contraction is absent, so the level is S3.',
        cells: ['vac'],
      };
  }
}

/** Why the one possible motor level of a side came out. Where several searches end there, the first is told. */
export function motorLevelReason(sheet: Sheet, side: Side): Reason {
  return outcomeReason(sheet, side, sheet.outcomes[side][0]!);
}

/** Why the one possible level of injury came out. */
export function nliReason(sheet: Sheet): Reason {
  const { nli, sensoryLevel, motorLevel } = sheet.found;
  const level = nli.values[0]!;
  const named = sides.flatMap((side) => [
    `${side} sensory ${sensoryLevel[side].values.join(' or ')}`,
    `${side} motor ${motorLevel[side].values.join(' or ')}`,
  ]);
  const cells = new Set<CellKey>();
  for (const side of sides) {
    if (sensoryLevel[side].values.join() === level) for (const cell of sensoryLevelReason(sheet, side).cells) cells.add(cell);
    if (motorLevel[side].values.join() === level) for (const cell of motorLevelReason(sheet, side).cells) cells.add(cell);
  }
  return { because: `${level} is the most rostral of the four levels: ${named.join(', ')}.`, cells: [...cells] };
}
