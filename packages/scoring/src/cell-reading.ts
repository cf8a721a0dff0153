/**
 * What a written cell can stand for in the classification, and the score it adds to a total, packed into one integer, so
 * that reading the 132 cells of an exam allocates nothing.
 */

const untaggedShift = 6;
const scoreShift = 12;
const notTestable = 1 << 15;
const tagged = 1 << 16;

/** Every score the classification may take for the cell, as bits (bit 2 is score 2); as if it had no tag on request. */
export function scoresOf(reading: number, ignoreTag: boolean): number {
  return (ignoreTag ? reading >>> untaggedShift : reading) & 0b111111;
}

/** The examined score; 0 when not testable. */
export function examinedScore(reading: number): number {
  return (reading >>> scoreShift) & 0b111;
}

/** Whether the reading, or any of several joined by `|`, is not testable. */
export function isNotTestable(readings: number): boolean {
  return (readings & notTestable) !== 0;
}

/** Whether the reading, or any of several joined by `|`, has a tag. */
export function isTagged(readings: number): boolean {
  return (readings & tagged) !== 0;
}

/** The cells one modality may hold. */
export interface CellReadings {
  /** Readings of the untagged scores, by score. */
  readonly plain: readonly number[];
  readonly byText: ReadonlyMap<string, number>;
}

/** `normal` is the score of normal function: 2 for sensation, 5 for a key muscle. A normal score takes no tag. */
function readingsUpTo(normal: number): CellReadings {
  const asNormal = 1 << normal;
  const asAltered = asNormal - 1;
  const byText = new Map<string, number>();
  const plain: number[] = [];
  for (let score = 0; score <= normal; score++) {
    const examined = ((1 << score) << untaggedShift) | (score << scoreShift);
    plain[score] = (1 << score) | examined;
    byText.set(`${score}`, plain[score]!);
    if (score === normal) continue;
    // The condition may hide a better score, so a tagged score that counts as altered is only a lower limit.
    byText.set(`${score}*`, (asAltered & -(1 << score)) | examined | tagged);
    byText.set(`${score}**`, asNormal | examined | tagged);
  }
  const anyScore = asNormal | asAltered;
  const unknown = (anyScore << untaggedShift) | notTestable;
  byText.set('NT', anyScore | unknown);
  byText.set('NT*', asAltered | unknown | tagged);
  byText.set('NT**', asNormal | unknown | tagged);
  return { plain, byText };
}

export const sensoryReadings = readingsUpTo(2);
export const motorReadings = readingsUpTo(5);

const digitZero = 48;

/** The reading of a written cell, or undefined when the sheet does not allow it. */
export function readCell(readings: CellReadings, written: string | undefined): number | undefined {
  if (written === undefined) return undefined;
  // Nearly every cell is one digit, and indexing is faster than hashing.
  if (written.length === 1) return readings.plain[written.charCodeAt(0) - digitZero];
  return readings.byText.get(written);
}
