/** Counts as anyone may see them: 1 to 10 hidden (null), and what would give them back; the others to the nearest 5. */
import { HIDDEN, nearestFive, protectTable, SMALLEST_SHOWN } from '@cairnstep/disclosure';

/** A count that stands alone. */
export const publicCount = (count: number): number | null => (count > 0 && count < SMALLEST_SHOWN ? null : nearestFive(count));

/** Counts that add up to a known total: hiding one small one would leave it to be worked out. */
export function publicCounts(counts: readonly number[]): (number | null)[] {
  const { published } = protectTable({ counts: [counts] });
  return (published.cells[0] ?? []).map((count) => (count === HIDDEN ? null : nearestFive(count)));
}
