import type { TableKey } from '@cairnstep/dictionary';

/** An error keeps a submission from being committed; a warning needs a reason first. */
export type Severity = 'error' | 'warning';

/** Something wrong or improbable, and where. No field ever repeats the content of a cell. */
export interface Finding {
  readonly rule: string;
  readonly severity: Severity;
  /** Null when about a whole workbook rather than one of its tables. */
  readonly table: TableKey | null;
  /**
   * Line of the file as an editor counts it, 1 for the header (of a record that spans lines: its first), or row of the
   * sheet. Null when about the whole file or sheet.
   */
  readonly line: number | null;
  /** Column key of the dictionary, or the header as written when the dictionary has no such column. Null when about the whole row or file. */
  readonly column: string | null;
  /** What kind of thing was found. */
  readonly found: string;
  /** What puts it right. */
  readonly mend: string;
}

/** What a rule demands, why, and what puts a breach right, in the words shown to the person who sends the file. */
export interface RuleText {
  readonly id: string;
  readonly severity: Severity;
  readonly statement: string;
  readonly why: string;
  readonly mend: string;
}

/** The findings of one rule: how many there are, and the ones kept for reading, in the order of table and line. */
export interface RuleFindings extends RuleText {
  readonly count: number;
  readonly kept: readonly Finding[];
}
