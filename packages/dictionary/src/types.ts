/** Shapes of the dictionary: each variable of each table once. Everything else (schemas, columns, templates, codebook, screens) is derived from it. */

export const tableKeys = ['participants', 'consents', 'exams', 'assessments', 'sessions', 'bouts', 'adverse_events'] as const;
export type TableKey = (typeof tableKeys)[number];

/** How a value is stored: `code` is one of `codes`; `pseudonym` is a site-made participant code; `flag` is the codes `yes` and `no`. */
export type ValueType = 'code' | 'flag' | 'integer' | 'decimal' | 'pseudonym';

/** Inclusive limits. `step` is the smallest distance between two allowed values. */
export interface Range {
  readonly min: number;
  readonly max: number;
  readonly step?: number;
}

export interface Code {
  readonly code: string;
  readonly label: string;
}

/** A unit a file may use instead of the stored one; `toStored` multiplies the written value (exact factor, see `source`). */
export interface AcceptedUnit {
  readonly unit: string;
  readonly toStored: number;
  readonly source: string;
}

/** Whether a cell must be filled: always, never forced, or under a condition on another column of the same row. */
export type Requirement =
  | { readonly when: 'always' }
  | { readonly when: 'optional' }
  | { readonly when: 'if'; readonly column: string; readonly isOneOf: readonly string[] };

/** What a value could tell an outsider; decides what an export does with the column (governance rules). */
export type Exposure = 'identifier' | 'quasi-identifier' | 'time' | 'measurement';

export interface Variable {
  readonly table: TableKey;
  /** Column key, unique in its table: lower-case letters, digits, underscore. Also the CSV header and the database column. */
  readonly key: string;
  readonly name: string;
  readonly definition: string;
  readonly type: ValueType;
  readonly unit?: string;
  /** Digits after the decimal point that are stored and shown. */
  readonly decimals?: number;
  readonly hard?: Range;
  readonly plausible?: Range;
  readonly codes?: readonly Code[];
  /** Codes that say why a value is absent ("not tested"). They are data, stored as written, never treated as numbers. */
  readonly missingCodes?: readonly Code[];
  readonly required: Requirement;
  readonly better?: 'higher' | 'lower' | 'neutral';
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
