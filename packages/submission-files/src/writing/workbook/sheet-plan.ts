/** What a sheet of a workbook will hold, given row by row so that none is kept. Columns count from 0, rows from 1. */
import type { CellStyle } from './cell-styles.ts';

/** Text stays text whatever it looks like: none is ever written as a formula. */
export type PlannedValue = string | number | null;

export interface PlannedRow {
  readonly line: number;
  readonly cells: readonly PlannedValue[];
  /** Of every cell that has none in `styles`; without it the column's. */
  readonly style?: CellStyle;
  readonly styles?: ReadonlyMap<number, CellStyle>;
  /** In points. */
  readonly height?: number;
}

export interface PlannedColumn {
  /** In characters. */
  readonly width: number;
  readonly style?: CellStyle;
}

/** What may be typed into the cells of a column from row 2 on, and what is shown while one is typed into. */
export interface PlannedValidation {
  readonly column: number;
  readonly allows:
    | { readonly kind: 'anything' }
    /** `range` as a formula names it. When `isOpen`, other values may be typed as well. */
    | { readonly kind: 'list'; readonly range: string; readonly isOpen: boolean }
    | { readonly kind: 'whole' | 'decimal'; readonly min: number; readonly max: number };
  /** At most 32 characters. */
  readonly title: string;
  /** At most 255 characters. */
  readonly prompt: string;
  /** At most 255 characters. */
  readonly refusal: string;
}

export interface PlannedNote {
  readonly line: number;
  readonly column: number;
  readonly text: string;
}

/** A link from a cell to another place of the workbook. */
export interface PlannedLink {
  readonly cell: string;
  readonly target: string;
}

export interface PlannedSheet {
  readonly name: string;
  readonly columns: readonly PlannedColumn[];
  readonly rows: Iterable<PlannedRow> | AsyncIterable<PlannedRow>;
  /** Rows and columns that stay in sight. */
  readonly frozen?: { readonly rows: number; readonly columns: number };
  readonly hasFilter?: boolean;
  readonly validations?: readonly PlannedValidation[];
  /** Columns of codes that look like numbers, which programs would mark as a mistake. */
  readonly codeColumns?: readonly number[];
  /** Asked for when the rows are written. */
  readonly links?: () => readonly PlannedLink[];
  /** Asked for when the rows are written; present only in sheets that may have some. */
  readonly notes?: () => readonly PlannedNote[];
}
