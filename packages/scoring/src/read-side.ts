import { examinedScore, isNotTestable, isTagged, motorReadings, readCell, scoresOf, sensoryReadings } from './cell-reading.ts';
import type { Total } from './classification.ts';
import type { SideExam } from './exam.ts';
import { place } from './level-bits.ts';
import type { Side } from './segments.ts';
import { keyMuscles, sensorySegments } from './segments.ts';

/**
 * One side, read once into sets. Sensory bits stand for a dermatome by the level above it (bit 0 is C2, bit 27 is S4-5),
 * so that the first altered dermatome *is* the sensory level; motor bits stand for a key muscle by its segment.
 */
export interface SideFindings {
  /** Dermatomes where both modalities can be 2. */
  readonly canBeNormal: number;
  /** Dermatomes where either modality can be below 2. */
  readonly canBeAltered: number;
  /** Dermatomes where either modality can be above 0. */
  readonly canBeFelt: number;
  /** Dermatomes where either modality is surely above 0. */
  readonly mustBeFelt: number;

  /** Key muscles that can be 5. */
  readonly canBeFull: number;
  /** Key muscles that can be 3 or 4. */
  readonly canBeUseful: number;
  /** Key muscles that can be 1 or 2. */
  readonly canBeFaint: number;
  /** Key muscles that can be 0. */
  readonly canBeStill: number;

  /** Place of the lowest moving non-key muscle, or -1. */
  readonly nonKey: number;

  readonly lightTouch: Total;
  readonly pinPrick: Total;
  readonly arm: Total;
  readonly leg: Total;

  readonly hasTags: boolean;
}

const armMuscles = 5;
const keyMuscleBit = keyMuscles.map((muscle) => 1 << place[muscle]);

/** S4-5 within the sensory bits. */
export const perianalBit = 1 << (sensorySegments.length - 1);

/** Thrown when a cell holds nothing the sheet allows. Says where, never what. */
export class UnreadableCellError extends RangeError {
  override readonly name = 'UnreadableCellError';
  constructor(side: Side, modality: string, segment: string) {
    super(`The cell ${side} ${modality} ${segment} holds no listed value; check the exam with validateExam before classifying it.`);
  }
}

/** Cells in the order of `sensorySegments`. Spelt out: reading fields by a computed name is several times slower. */
function dermatomeCells(cells: SideExam['lightTouch']): readonly string[] {
  // prettier-ignore
  return [
    cells.C2, cells.C3, cells.C4, cells.C5, cells.C6, cells.C7, cells.C8,
    cells.T1, cells.T2, cells.T3, cells.T4, cells.T5, cells.T6, cells.T7, cells.T8, cells.T9, cells.T10, cells.T11, cells.T12,
    cells.L1, cells.L2, cells.L3, cells.L4, cells.L5,
    cells.S1, cells.S2, cells.S3, cells.S4_5,
  ];
}

/** Cells in the order of `keyMuscles`. */
function muscleCells(cells: SideExam['motor']): readonly string[] {
  return [cells.C5, cells.C6, cells.C7, cells.C8, cells.T1, cells.L2, cells.L3, cells.L4, cells.L5, cells.S1];
}

/**
 * Reads one side of an exam. With `ignoreTags` every cell counts as if it had no tag.
 * @throws UnreadableCellError when a cell holds nothing the sheet allows.
 */
export function readSide(exam: SideExam, side: Side, ignoreTags: boolean): SideFindings {
  const touchCells = dermatomeCells(exam.lightTouch);
  const prickCells = dermatomeCells(exam.pinPrick);
  let canBeNormal = 0;
  let canBeAltered = 0;
  let canBeFelt = 0;
  let mustBeFelt = 0;
  let touchSum = 0;
  let prickSum = 0;
  let touchMarks = 0;
  let prickMarks = 0;
  for (let index = 0; index < sensorySegments.length; index++) {
    const touch = readCell(sensoryReadings, touchCells[index]);
    const prick = readCell(sensoryReadings, prickCells[index]);
    if (touch === undefined) throw new UnreadableCellError(side, 'light touch', sensorySegments[index]!);
    if (prick === undefined) throw new UnreadableCellError(side, 'pin prick', sensorySegments[index]!);
    const either = scoresOf(touch, ignoreTags) | scoresOf(prick, ignoreTags);
    const both = scoresOf(touch, ignoreTags) & scoresOf(prick, ignoreTags);
    const bit = 1 << index;
    if (both & 0b100) canBeNormal |= bit;
    if (either & 0b011) canBeAltered |= bit;
    if (either & 0b110) canBeFelt |= bit;
    if (!(both & 0b001)) mustBeFelt |= bit;
    touchSum += examinedScore(touch);
    prickSum += examinedScore(prick);
    touchMarks |= touch;
    prickMarks |= prick;
  }

  const gradeCells = muscleCells(exam.motor);
  let canBeFull = 0;
  let canBeUseful = 0;
  let canBeFaint = 0;
  let canBeStill = 0;
  let armSum = 0;
  let legSum = 0;
  let armMarks = 0;
  let legMarks = 0;
  for (let index = 0; index < keyMuscles.length; index++) {
    const reading = readCell(motorReadings, gradeCells[index]);
    if (reading === undefined) throw new UnreadableCellError(side, 'key muscle', keyMuscles[index]!);
    const grades = scoresOf(reading, ignoreTags);
    const bit = keyMuscleBit[index]!;
    if (grades & 0b100000) canBeFull |= bit;
    if (grades & 0b011000) canBeUseful |= bit;
    if (grades & 0b000110) canBeFaint |= bit;
    if (grades & 0b000001) canBeStill |= bit;
    if (index < armMuscles) {
      armSum += examinedScore(reading);
      armMarks |= reading;
    } else {
      legSum += examinedScore(reading);
      legMarks |= reading;
    }
  }

  return {
    canBeNormal,
    canBeAltered,
    canBeFelt,
    mustBeFelt,
    canBeFull,
    canBeUseful,
    canBeFaint,
    canBeStill,
    nonKey: exam.nonKey === undefined ? -1 : place[exam.nonKey],
    lightTouch: isNotTestable(touchMarks) ? 'ND' : touchSum,
    pinPrick: isNotTestable(prickMarks) ? 'ND' : prickSum,
    arm: isNotTestable(armMarks) ? 'ND' : armSum,
    leg: isNotTestable(legMarks) ? 'ND' : legSum,
    hasTags: isTagged(touchMarks | prickMarks | armMarks | legMarks),
  };
}
