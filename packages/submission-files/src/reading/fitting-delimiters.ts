import { defaultLimits } from '../limits.ts';
import { delimiters } from './detect-delimiter.ts';
import type { Delimiter } from './detect-delimiter.ts';
import { mostRowsAbove } from '../table/text-rows.ts';
import { RecordScanner } from './record-scanner.ts';
import { UnreadableFile } from './unreadable-file.ts';

/** Records that tell; of a file whose first hundred rows agree the others do too. */
const recordsCompared = 100;

/**
 * The separators that cut the beginning of a file into rows of equal length, the one that gives most columns first. Decimal commas cut
 * rows into pieces of unequal length, and a header has none.
 * @param beginning The beginning of the file; its last row may be cut off.
 */
export function fittingDelimiters(beginning: string): Delimiter[] {
  const cut = delimiters.map((delimiter) => ({ delimiter, widths: widthsOf(beginning, delimiter) }));
  const fitting = ofEqualRows(cut);
  return fitting.length > 0 ? fitting : ofEqualRows(cut.map(({ delimiter, widths }) => ({ delimiter, widths: withoutTitles(widths) })));
}

interface Cut {
  readonly delimiter: Delimiter;
  /** Cells of each row. */
  readonly widths: readonly number[];
}

function ofEqualRows(cuts: readonly Cut[]): Delimiter[] {
  return cuts
    .flatMap(({ delimiter, widths }) => {
      const [columns = 0] = widths;
      const equal = widths.filter((width) => width === columns).length;
      return columns > 1 && equal * 10 >= widths.length * 9 ? [{ delimiter, columns }] : [];
    })
    .sort((one, other) => other.columns - one.columns)
    .map(({ delimiter }) => delimiter);
}

/** Above the names of the columns there may be a title, which is as wide as it happens to be. */
function withoutTitles(widths: readonly number[]): readonly number[] {
  const start = widths.indexOf(widths.at(-1) ?? 0);
  return start <= mostRowsAbove ? widths.slice(start) : widths;
}

/** Cells of each record that is not blank; the last of several is left out, because it may be cut off. */
function widthsOf(beginning: string, delimiter: Delimiter): number[] {
  const widths: number[] = [];
  const scanner = new RecordScanner(delimiter, defaultLimits, (cells, count) => {
    if (widths.length <= recordsCompared && cells.slice(0, count).some((cell) => cell.trim() !== '')) widths.push(count);
  });
  try {
    scanner.push(beginning, true);
  } catch (error) {
    // What is wrong here is told when the file is read in earnest.
    if (!(error instanceof UnreadableFile)) throw error;
  }
  return widths.length > 1 ? widths.slice(0, -1) : widths;
}
