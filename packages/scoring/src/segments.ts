/** The tested segments, the key muscles and the order of levels (ISNCSCI, 2019 revision). */

/** The 28 dermatomes tested for light touch and pin prick on each side, from the head down. */
// prettier-ignore
export const sensorySegments = [
  'C2', 'C3', 'C4', 'C5', 'C6', 'C7', 'C8',
  'T1', 'T2', 'T3', 'T4', 'T5', 'T6', 'T7', 'T8', 'T9', 'T10', 'T11', 'T12',
  'L1', 'L2', 'L3', 'L4', 'L5',
  'S1', 'S2', 'S3', 'S4_5',
] as const;
export type SensorySegment = (typeof sensorySegments)[number];

/** The ten key muscles graded on each side, named by their segment, from the arm down. */
export const keyMuscles = ['C5', 'C6', 'C7', 'C8', 'T1', 'L2', 'L3', 'L4', 'L5', 'S1'] as const;
export type KeyMuscle = (typeof keyMuscles)[number];

/** Every level a side or an injury can have, rostral first. `INT` is intact; S4-5 is tested but is never a level. */
// prettier-ignore
export const levels = [
  'C1', 'C2', 'C3', 'C4', 'C5', 'C6', 'C7', 'C8',
  'T1', 'T2', 'T3', 'T4', 'T5', 'T6', 'T7', 'T8', 'T9', 'T10', 'T11', 'T12',
  'L1', 'L2', 'L3', 'L4', 'L5',
  'S1', 'S2', 'S3',
  'INT',
] as const;
export type Level = (typeof levels)[number];
/** A level that is not `INT`. */
export type SegmentLevel = Exclude<Level, 'INT'>;

export const sides = ['right', 'left'] as const;
export type Side = (typeof sides)[number];

export const modalities = ['lightTouch', 'pinPrick', 'motor'] as const;
export type Modality = (typeof modalities)[number];
