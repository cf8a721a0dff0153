/** A table as read from a file, before anything is known about its columns: every cell is text. */
export interface TextTable {
  readonly headers: readonly string[];
  readonly rows: readonly (readonly string[])[];
  /** Line of each row in its file; without it the first row stands on line 2. */
  readonly lines?: readonly number[];
}
