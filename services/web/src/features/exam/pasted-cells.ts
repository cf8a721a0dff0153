/** Reads cells from the clipboard: a column, a block of rows and columns, or a run of scores in the order of typing. */
import type { CellKey } from '@cairnstep/scoring';
import { sheetColumns, columnOf, entryOrders, isAnswer, placeOf, cellAt } from './places.ts';
import type { EntryOrder } from './places.ts';
import { sensorySegments } from '@cairnstep/scoring';
import { cellTitle, codeFor } from './exam-sheet.ts';

export type Pasted = { readonly cells: ReadonlyMap<CellKey, string> } | { readonly problem: string };

/** Longer than any sheet; more is not a column of scores. */
const mostCharacters = 5_000;

/**
 * All or nothing: one entry that a cell cannot hold, or one that has no cell, refuses the whole. Empty entries leave their
 * cell as it is.
 */
export function readPasted(text: string, from: CellKey, order: EntryOrder): Pasted {
  const lines = text.replace(/(\r\n|\r|\n)+$/, '').split(/\r\n|\r|\n/);
  if (text.trim() === '') return { problem: 'The clipboard holds no text.' };
  if (text.length > mostCharacters) return { problem: 'The clipboard holds more than a sheet of scores.' };
  const isRun = lines.length === 1 && !text.includes('\t');
  const isBlock = lines.some((line) => line.includes('\t'));
  if (isRun) return inOrder(text.split(/[\s,;]+/), entryOrders[order], from);
  return isBlock ? block(lines, from) : inOrder(lines, columnOf(from), from);
}

function inOrder(entries: readonly string[], cells: readonly CellKey[], from: CellKey): Pasted {
  const room = cells.slice(cells.indexOf(from));
  return placed(entries.map((entry, index) => [entry, room[index], `Entry ${index + 1}`]));
}

function block(lines: readonly string[], from: CellKey): Pasted {
  const place = placeOf(from);
  if (isAnswer(from) || place === undefined) return { problem: 'A block of columns begins in a cell of scores.' };
  const firstRow = sensorySegments.findIndex((segment) => segment === place.segment);
  const firstColumn = sheetColumns.findIndex(({ modality, side }) => modality === place.modality && side === place.side);
  return placed(
    lines.flatMap((line, row) =>
      line.split('\t').map((entry, column): [string, CellKey | undefined, string] => {
        const segment = sensorySegments[firstRow + row];
        const target = sheetColumns[firstColumn + column];
        const key = segment === undefined || target === undefined ? undefined : cellAt(segment, target);
        return [entry, key, `Line ${row + 1}, column ${column + 1}`];
      }),
    ),
  );
}

function placed(entries: readonly (readonly [entry: string, key: CellKey | undefined, where: string])[]): Pasted {
  const cells = new Map<CellKey, string>();
  for (const [entry, key, where] of entries) {
    if (entry.trim() === '') continue;
    if (key === undefined) return { problem: `${where} has no cell on the sheet. Nothing was changed.` };
    const code = codeFor(key, entry);
    if (code === undefined) return { problem: `${where} is not a value for ${cellTitle(key)}. Nothing was changed.` };
    cells.set(key, code);
  }
  return { cells };
}
