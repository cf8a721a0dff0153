/** One scale for every interval of a grid, so that marks can be compared by eye. */
import type { Cell, Grid } from '@cairnstep/contract';

export interface IntervalScale {
  readonly lower: number;
  readonly upper: number;
  /** The line all marks share: no change, or the mean of everyone. Absent where the latter is not shown. */
  readonly reference?: number;
}

type Shown = Extract<Cell, { state: 'shown' }>;

/** An interval over fewer people can be so wide that all others would shrink to dots; it is cut at the ends of the scale instead. */
const enoughForScale = 11;

/** Null when nothing is shown. */
export function intervalScale({ statistic, total, ...grid }: Grid): IntervalScale | null {
  const cells = [...grid.rows.flatMap((row) => [...row.cells, row.total]), ...grid.columnTotals, total].filter(
    (cell): cell is Shown => cell.state === 'shown',
  );
  if (cells.length === 0) return null;
  const reference = statistic === 'change' ? 0 : total.state === 'shown' ? total.mean : undefined;
  const values = cells.flatMap(({ n, mean, interval }) => [
    mean,
    ...(interval !== null && n >= enoughForScale ? [interval.lower, interval.upper] : []),
  ]);
  if (reference !== undefined) values.push(reference);
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const room = least === most ? Math.abs(least) || 1 : (most - least) * 0.06;
  return { lower: least - room, upper: most + room, ...(reference !== undefined && { reference }) };
}

/** 0 at the lower end, 1 at the upper; values outside stay at the end. */
export function positionOn({ lower, upper }: IntervalScale, value: number): number {
  return Math.min(1, Math.max(0, (value - lower) / (upper - lower)));
}
