/** Versions of the dictionary, oldest first, and how rows of an older version become rows of the next. */
import type { TableKey } from './types.ts';

/** A change that alters how a stored row is read. Additions, texts and limits need none. */
export type RowChange =
  | { readonly kind: 'renamed'; readonly table: TableKey; readonly from: string; readonly to: string }
  | { readonly kind: 'recoded'; readonly table: TableKey; readonly column: string; readonly codes: Readonly<Record<string, string>> };

export interface Revision {
  readonly version: string;
  /** What a reader of the codebook should know, a sentence each. */
  readonly notes: readonly string[];
  /** In the order in which they are to be applied. */
  readonly changes: readonly RowChange[];
}

export const history: readonly Revision[] = [{ version: '1.0', notes: ['First issue.'], changes: [] }];
