import type { KeyMuscle, SensorySegment } from './segments.ts';

/**
 * One side of an examination, cells as written on the sheet:
 * - sensory `0`, `1`, `2`, `NT`; motor `0` to `5`, `NT`;
 * - `x*`: a condition other than the spinal cord injury affects the score, classified as not normal;
 * - `x**`: the same, classified as normal. `2*` (sensory) and `5*` (motor) do not exist.
 */
export interface SideExam {
  readonly lightTouch: Readonly<Record<SensorySegment, string>>;
  readonly pinPrick: Readonly<Record<SensorySegment, string>>;
  readonly motor: Readonly<Record<KeyMuscle, string>>;
  /** Segment of the lowest non-key muscle that moves. */
  readonly nonKey?: KeyMuscle;
}

export const observations = ['Yes', 'No', 'NT'] as const;
export type Observation = (typeof observations)[number];

/** The column key of a cell, such as `lt_r_c2`, `pp_l_s4_5`, `m_r_c5`, `vac`, `dap`. */
export type CellKey = `${'lt' | 'pp'}_${'r' | 'l'}_${Lowercase<SensorySegment>}` | `m_${'r' | 'l'}_${Lowercase<KeyMuscle>}` | 'vac' | 'dap';

/** A coded remark on all cells it concerns, or on each by its key. Codes, never free text. */
export type Remark = string | Readonly<Partial<Record<CellKey, string>>>;

export interface Exam {
  readonly right: SideExam;
  readonly left: SideExam;
  /** Voluntary anal contraction. */
  readonly vac: Observation;
  /** Deep anal pressure felt. */
  readonly dap: Observation;
  /** Whether an earlier examination of this person recorded a deficit. A normal exam is graded E only then. */
  readonly earlierDeficit?: boolean;
  /** Why cells are NT: one reason for all of them, or one for each. A warning asks for it where it is missing. */
  readonly ntReason?: Remark;
  /** Which condition is behind the tags: one for all of them, or one for each. A tag without it is refused. */
  readonly tagCause?: Remark;
  /** Completed years at the exam. The exam is not usable under six. */
  readonly ageYears?: number;
  /** Hours from injury to exam; negative when the record puts the exam before the injury. */
  readonly hoursSinceInjury?: number;
}
