import type { IdentifierClass, Strength } from './identifier-class.ts';

/** What seems to identify somebody, and where. It never repeats a cell, nor a header that itself looks like an identifier. */
export interface IdentifierFinding {
  readonly class: IdentifierClass;
  readonly strength: Strength;
  /** The table as the caller named it; null when it was not named. */
  readonly table: string | null;
  /** Position of the column, 1 for the first. */
  readonly columnNumber: number;
  /** The header; null when it looks like an identifier itself, or is empty. */
  readonly column: string | null;
  /** Line of the first hit as the caller counts lines; null when the finding is about the column as a whole or its header. */
  readonly line: number | null;
  /** Cells that were hit; 0 when the header alone was. */
  readonly count: number;
}
