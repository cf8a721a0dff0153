import type { ExamIssue } from './exam-issue.ts';
import type { Level, SegmentLevel, Side } from './segments.ts';

/**
 * A result as the set of every value it can have, in printed order. One value: determinate. Several: not determinable
 * from this exam (ND). `tagged` when tagged cells changed the set, compared with the same exam without tags.
 */
export interface Determined<T> {
  readonly values: readonly T[];
  readonly tagged: boolean;
}

export const aisGrades = ['A', 'B', 'C', 'D', 'E', 'none'] as const;
/** `none`: normal in every part and no earlier deficit on record, so no grade is given. */
export type AisGrade = (typeof aisGrades)[number];

export const completenessValues = ['C', 'I'] as const;
/** Complete or incomplete. */
export type Completeness = (typeof completenessValues)[number];

/** `NA`: not applicable, because sensation (or voluntary contraction) is preserved at S4-5. */
export type Zone = 'NA' | SegmentLevel;

/** A sum of examined scores, tags ignored; `ND` when a contributing cell is NT. */
export type Total = number | 'ND';

/** Totals by their usual short names: upper and lower extremity right, left, both; light touch and pin prick the same. */
export interface Totals {
  readonly uer: Total;
  readonly uel: Total;
  readonly uems: Total;
  readonly ler: Total;
  readonly lel: Total;
  readonly lems: Total;
  readonly ltr: Total;
  readonly ltl: Total;
  readonly lt: Total;
  readonly ppr: Total;
  readonly ppl: Total;
  readonly pp: Total;
}

export interface Classification {
  readonly sensoryLevel: Readonly<Record<Side, Determined<Level>>>;
  readonly motorLevel: Readonly<Record<Side, Determined<Level>>>;
  /** Neurological level of injury: the most rostral of the four levels. */
  readonly nli: Determined<Level>;
  readonly completeness: Determined<Completeness>;
  readonly ais: Determined<AisGrade>;
  /** Zones of partial preservation. */
  readonly zppSensory: Readonly<Record<Side, Determined<Zone>>>;
  readonly zppMotor: Readonly<Record<Side, Determined<Zone>>>;
  readonly totals: Totals;
  /** Findings that are improbable together and should be looked at; the classification stands. */
  readonly warnings: readonly ExamIssue[];
}
