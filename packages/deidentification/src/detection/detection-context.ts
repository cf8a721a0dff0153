import type { TableKey } from '@cairnstep/dictionary';

/** What the site declared a column to hold. Rules that would misfire on it are left out. */
export type ColumnRole = 'text' | 'number' | 'pseudonym' | 'unknown';

export interface DetectionContext {
  /** Name of the table, repeated in the findings. */
  readonly table?: string;
  /** Table of the dictionary: headers that are its keys are declared, and their roles follow from it. */
  readonly dictionaryTable?: TableKey;
  /** Roles of columns that the dictionary does not declare, by header. */
  readonly roles?: ReadonlyMap<string, ColumnRole>;
  /** Headers that a steward has marked as safe for this site: their header is not judged, their cells still are. */
  readonly safeHeaders?: ReadonlySet<string>;
}
