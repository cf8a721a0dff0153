/** Shapes of the dictionary: each variable of each table once. Everything else (schemas, columns, templates, codebook, screens) is derived from it. */

export const tableKeys = ['participants', 'consents', 'exams', 'assessments', 'sessions', 'bouts', 'adverse_events'] as const;
export type TableKey = (typeof tableKeys)[number];

/** How a value is stored: `code` is one of `codes`; `pseudonym` is a site-made participant code; `flag` is the codes `yes` and `no`. */
export type ValueType = 'code' | 'flag' | 'integer' | 'decimal' | 'pseudonym';

/** Inclusive limits. `step` is the smallest distance between two allowed values; whole numbers have a step of 1 without saying so. */
export interface Range {
  readonly min: number;
  readonly max: number;
  readonly step?: number;
}

export interface Code {
  readonly code: string;
  readonly label: string;
}

/**
 * A unit a file may use instead of the stored one: stored value = written value × `times` ÷ `dividedBy`.
 * Both are whole numbers, so that the factor is exact.
 */
export interface AcceptedUnit {
  readonly unit: string;
  readonly times: number;
  readonly dividedBy: number;
  readonly source: string;
}

/** Holds when another column of the same row has one of these values. */
export interface Condition {
  readonly column: string;
  readonly isOneOf: readonly string[];
}

/** Whether a cell must be filled: always, never forced, under a condition on the same row (and a second one), or whenever another column is filled. */
export type Requirement =
  | { readonly when: 'always' }
  | { readonly when: 'optional' }
  | ({ readonly when: 'if'; readonly and?: Condition } & Condition)
  | { readonly when: 'with'; readonly column: string };

/** The measure's key is `prefix` followed by the code in `column`. */
export interface MeasuredBy {
  readonly column: string;
  readonly prefix: string;
}

/** What a value could tell an outsider; decides what an export does with the column (governance rules). */
export type Exposure = 'identifier' | 'quasi-identifier' | 'time' | 'measurement';

export type Direction = 'higher' | 'lower' | 'neutral';

export interface Variable {
  readonly table: TableKey;
  /** Column key, unique in its table: lower-case letters, digits, underscore. Also the CSV header and the database column. */
  readonly key: string;
  readonly name: string;
  readonly definition: string;
  readonly type: ValueType;
  readonly unit?: string;
  /** Digits after the decimal point that are shown. What is stored keeps every digit a unit conversion gives. */
  readonly decimals?: number;
  readonly hard?: Range;
  readonly plausible?: Range;
  /** The allowed codes of a `code` or `flag`. */
  readonly codes?: readonly Code[];
  /** Codes that say why a value is absent ("not tested"). They are data, stored as written, never treated as numbers. */
  readonly missingCodes?: readonly Code[];
  readonly required: Requirement;
  /** The cell must be empty unless this holds. */
  readonly emptyUnless?: Condition;
  /** Set where unit, limits and step are those of a measure that another column of the row names. */
  readonly measuredBy?: MeasuredBy;
  readonly better?: Direction;
  readonly exposure: Exposure;
  readonly acceptedUnits?: readonly AcceptedUnit[];
  /** Other headers a clinic's file may use for this column. */
  readonly aliases?: readonly string[];
  readonly source: string;
  /** Dictionary version that introduced the variable. */
  readonly since: string;
}

export interface Table {
  readonly key: TableKey;
  readonly name: string;
  readonly definition: string;
  /** Columns that together name one row within a site, in order. */
  readonly rowKey: readonly string[];
  /** Column holding the study day the row is about, where it has one. */
  readonly studyDay?: string;
  readonly variables: readonly Variable[];
}

export interface Dictionary {
  readonly version: string;
  readonly tables: readonly Table[];
}

/** One typed row, as stored and as checked. An empty cell has no key or the value undefined. */
export type Row = Readonly<Record<string, string | number | undefined>>;

/** How sure a published figure is: seen in print, or recalled and still to be checked before it drives a decision. */
export type Confidence = 'looked-up' | 'from-memory' | 'paper-looked-up-figure-from-memory';

/** A published smallest real (mdc) or meaningful (mcid) change. Configuration with a source, not a constant of nature. */
export interface Threshold {
  readonly value: number | { readonly min: number; readonly max: number };
  readonly unit: string;
  readonly population: string;
  readonly citation: string;
  readonly confidence: Confidence;
  readonly note?: string;
}

/** `count` is a number of events in a unit of time; `ordinal` grades have an order but no equal distances. */
export type Scale = 'ratio' | 'ordinal' | 'count';

export interface Measure {
  readonly key: string;
  readonly name: string;
  readonly definition: string;
  readonly unit: string;
  readonly scale: Scale;
  /** True where the field prints means of an ordinal score; a mean is shown only then, and labelled. */
  readonly meanIsCustomary: boolean;
  readonly hard: Range;
  readonly plausible: Range;
  readonly better: Direction;
  readonly decimals: number;
  /** Smallest difference the instrument shows; statistics are rounded to it for display. */
  readonly step: number;
  /** Where only certain grades exist: how each is written in a file and the number it is stored as. */
  readonly grades?: readonly { readonly written: string; readonly stored: number }[];
  readonly acceptedUnits?: readonly AcceptedUnit[];
  /** True where an attempt that ended early still has a score. */
  readonly scoredWhenStoppedEarly: boolean;
  /** How the registry can compute it from other values. */
  readonly derivedFrom?: string;
  /** False where the value is only ever computed, so that a file may not hold it. */
  readonly entered: boolean;
  readonly timing: readonly string[];
  readonly thresholds: { readonly mdc: readonly Threshold[]; readonly mcid: readonly Threshold[] };
  readonly licence: string;
  readonly cautions: readonly string[];
  readonly source: string;
  readonly since: string;
}

export type Severity = 'error' | 'warning';

/** What a rule looks at: one row; the rows of one participant on one day; all rows of one participant; or a statistic over many. */
export type RuleScope = 'row' | 'day' | 'participant' | 'statistic';

/** A check across fields. What it says stands here; that it holds is worked out elsewhere, with the limits given here. */
export interface Rule {
  readonly id: string;
  readonly severity: Severity;
  readonly scope: RuleScope;
  readonly tables: readonly TableKey[];
  readonly statement: string;
  readonly why: string;
  readonly mend: string;
  /** Numbers of the statement that a registry may want to set otherwise. */
  readonly limits?: Readonly<Record<string, number>>;
  readonly source: string;
  readonly since: string;
}
