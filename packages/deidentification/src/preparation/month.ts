/** Shapes of the preparation of a month: what a site's files hold, and what may leave the site. */
import type { TableKey } from '@cairnstep/dictionary';
import type { IdentifierFinding } from '../detection/identifier-finding.ts';
import type { TextTable } from '../detection/text-table.ts';
import type { IsoDate } from '../dates/date-format.ts';
import type { SiteKey } from '../key-file/site-key.ts';
import type { ColumnMatch } from './column-match.ts';

export interface RawTable extends TextTable {
  readonly table: TableKey;
  /** Without matches the columns are matched by the key file of last month, then by name. */
  readonly matches?: readonly ColumnMatch[];
  /** A point unless said otherwise. */
  readonly decimalMark?: '.' | ',';
}

export interface MonthInput {
  readonly tables: readonly RawTable[];
  readonly key: SiteKey;
  /** First training days the coordinator states, by record number as the files write it. */
  readonly indexDates?: ReadonlyMap<string, IsoDate>;
  /** Headers that a steward has marked as safe for this site. */
  readonly safeHeaders?: ReadonlySet<string>;
}

/** Rows ready to be sent: the columns of the dictionary that the file has, and typed cells written as text; '' where a cell is empty. */
export interface CleanTable {
  readonly table: TableKey;
  readonly headers: readonly string[];
  readonly rows: readonly (readonly string[])[];
  /** Line of the clinic's file that each row came from. */
  readonly lines: readonly number[];
}

export type ProblemKind =
  | 'no-participant-column'
  | 'column-matched-twice'
  | 'repeated-header'
  | 'no-such-column'
  | 'no-such-variable'
  | 'identifiers-in-column'
  | 'ambiguous-date-format'
  | 'unreadable-date'
  | 'participant-missing'
  | 'index-date-unknown'
  | 'index-date-differs'
  | 'unreadable-cell'
  | 'value-withheld'
  | 'age-to-correct'
  | 'long-row';

/** Something the site has to mend or confirm. Holds no cell and no header. */
export interface PreparationProblem {
  readonly kind: ProblemKind;
  readonly table: TableKey;
  /** Position of the column in the clinic's file, 1 for the first; null when about rows or the whole table. */
  readonly columnNumber: number | null;
  /** Variable of the dictionary that the cells were meant for, where there is one. */
  readonly variable: string | null;
  /** The first lines concerned, in order. */
  readonly lines: readonly number[];
  /** Rows concerned; 0 when about the table. */
  readonly count: number;
  readonly message: string;
}

export interface DroppedColumn {
  readonly table: TableKey;
  /** Position of the column in the clinic's file, 1 for the first. */
  readonly columnNumber: number;
  readonly reason: 'not-in-the-dictionary' | 'left-out' | 'holds-identifiers';
}

/** A participant met for the first time. The record number stands in the clinic's own file at the place given. */
export interface NewParticipant {
  readonly code: string;
  readonly table: TableKey;
  readonly line: number;
  /** Where the first training day came from. */
  readonly indexDate: 'stated' | 'index-column' | 'first-session' | 'unknown';
}

/** A code that another code replaces, after a rotation or a joining of record numbers; the registry re-maps it. */
export interface ReplacedCode {
  readonly from: string;
  readonly to: string;
}

export interface TablePreview {
  readonly table: TableKey;
  readonly headers: readonly string[];
  /** The first 20 rows, exactly as they would be sent. */
  readonly rows: readonly (readonly string[])[];
  /** All distinct values of each column of codes or words, sorted, with the rows that have each. */
  readonly distinct: readonly { readonly column: string; readonly values: readonly { readonly value: string; readonly count: number }[] }[];
}

/** Record numbers whose length nobody had last month: often leading zeros that a spreadsheet ate. */
export interface LengthChange {
  readonly ids: number;
  readonly newLengths: number;
}

export interface PreparedMonth {
  readonly clean: readonly CleanTable[];
  readonly dropped: readonly DroppedColumn[];
  readonly newParticipants: readonly NewParticipant[];
  readonly replacedCodes: readonly ReplacedCode[];
  readonly problems: readonly PreparationProblem[];
  /** What the detectors saw in columns that stay behind or were taken for values. No header is repeated: one may be a name. */
  readonly findings: readonly IdentifierFinding[];
  /** Participants whose age became 90 because they are older, or because a study day of this month tells so. */
  readonly agesTopCoded: number;
  readonly preview: readonly TablePreview[];
  /** Null when there is no last month to compare with. */
  readonly lengthChange: LengthChange | null;
  /** How each table's columns were matched, to be shown, changed and given back; with the headers, so for the site alone. */
  readonly matches: readonly { readonly table: TableKey; readonly matches: readonly ColumnMatch[] }[];
  /** The key with what this month added. Save it before sending; never send it. */
  readonly key: SiteKey;
}
