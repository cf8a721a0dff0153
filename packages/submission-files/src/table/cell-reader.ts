import type { TableKey } from '@cairnstep/dictionary';
import type { FindingLog } from '../finding-log.ts';
import type { AsciiText } from '../reading/ascii-text.ts';
import type { CellKind } from './cell-kind.ts';
import type { ColumnStore } from './column-store.ts';
import { isFormulaLike } from './formula-like.ts';

/** Turns the cells of one column into numbers or words, stores them, and reports the cells it cannot read. */
export interface CellReader {
  /**
   * @param text The cell as the file has it, never empty. A cell of blanks only counts as empty.
   * @param kind A `number` is written with a decimal point, whatever other cells do.
   */
  read(text: string, row: number, line: number, kind: CellKind): void;
  /**
   * Reads the cell that stands in the text from `from` to before `to`, when it is just what the column takes and no other cell has a say.
   * @returns false when `read` has to look at it; then nothing was stored or reported that `read` would not store.
   */
  readPlain(text: AsciiText, from: number, to: number, row: number): boolean;
}

/** Where a reader stores and reports. */
export interface CellPlace {
  readonly table: TableKey;
  readonly store: ColumnStore;
  readonly findings: FindingLog;
}

/** Reports a cell that could not be read, or that it looks like a formula, which is the more urgent thing to say. */
export function rejectCell(
  place: CellPlace,
  at: { row: number; line: number; text: string },
  rule: string,
  found: string,
  mend: string,
): void {
  const { store, findings, table } = place;
  store.setUnreadable(at.row);
  const where = { table, line: at.line, column: store.variable.key };
  if (isFormulaLike(at.text)) findings.add({ rule: 'F13', ...where, found: 'The cell begins like a spreadsheet formula.' });
  else findings.add({ rule, ...where, found, mend });
}

/** The cell without surrounding blanks. A leading tab stays: spreadsheets use it to hide a formula. */
export function trimmed(text: string): string {
  return text.startsWith('\t') ? text : text.trim();
}

/** Whether the text says from `from` to before `to` what other bytes say. */
export function saysAt({ bytes }: AsciiText, from: number, to: number, word: Uint8Array): boolean {
  if (to - from !== word.length) return false;
  for (let index = 0; index < word.length; index += 1) {
    if (bytes[from + index] !== word[index]) return false;
  }
  return true;
}
