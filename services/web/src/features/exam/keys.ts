/** Which key does what in the grid. */
import type { Act } from './entry.ts';
import type { Step } from './places.ts';

export interface PressedKey {
  readonly key: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly altKey: boolean;
}

const steps: Readonly<Record<string, Step>> = {
  ArrowUp: 'up',
  ArrowDown: 'down',
  ArrowLeft: 'left',
  ArrowRight: 'right',
  Home: 'rowStart',
  End: 'rowEnd',
  PageUp: 'regionUp',
  PageDown: 'regionDown',
};

const acts: Readonly<Record<string, Act>> = {
  n: { act: 'write', text: 'NT' },
  y: { act: 'write', text: 'yes' },
  '*': { act: 'star' },
  r: { act: 'ask-reason' },
  d: { act: 'fill', fill: 'normal-down' },
  u: { act: 'fill', fill: 'normal-up' },
  a: { act: 'fill', fill: 'absent-down' },
  Backspace: { act: 'back' },
  Delete: { act: 'clear' },
  Enter: { act: 'go-on' },
};

/** Null: the key is not the grid's, and does what it does everywhere. */
export function actOfKey({ key, ctrlKey, metaKey, altKey }: PressedKey): Act | null {
  if (altKey) return null;
  if (ctrlKey || metaKey) {
    if (key === 'Home') return { act: 'step', step: 'sheetStart' };
    if (key === 'End') return { act: 'step', step: 'sheetEnd' };
    return key.toLowerCase() === 'z' ? { act: 'undo' } : null;
  }
  const step = steps[key];
  if (step !== undefined) return { act: 'step', step };
  if (/^[0-9]$/.test(key)) return { act: 'write', text: key };
  return acts[key.length === 1 ? key.toLowerCase() : key] ?? null;
}

/** For the list of keys on the page. */
export const keyWords: readonly { readonly keys: string; readonly does: string }[] = [
  { keys: '0 to 5', does: 'write the score and go on; for the two answers 1 is yes and 0 is no' },
  { keys: 'N', does: 'not tested (NT)' },
  { keys: 'R', does: 'why it was not tested' },
  { keys: '*', does: 'another condition affects the score just written: asks how it counts and what it is; once more takes the star off' },
  { keys: 'Backspace', does: 'empty the cell, or go back and empty the one before' },
  { keys: 'Delete', does: 'empty the cell and stay' },
  { keys: 'D', does: 'fill the blank cells from here down the column as normal' },
  { keys: 'U', does: 'fill the blank cells from here up the column as normal' },
  { keys: 'A', does: 'fill the blank cells from here down the column as absent (0)' },
  { keys: 'Arrows', does: 'move; Page up and Page down by region' },
  { keys: 'Home, End', does: 'first and last cell of the row; with Ctrl, of the sheet' },
  { keys: 'Enter', does: 'go on without writing' },
  { keys: 'Ctrl+V', does: 'paste a column, a block, or a run of scores' },
  { keys: 'Ctrl+Z', does: 'undo' },
];
