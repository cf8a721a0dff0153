/**
 * The k-th smallest of all pairwise sums of two ascending lists, without listing them: bisection on the value, each step counting the
 * sums up to it in one walk along both lists. After Johnson & Mizoguchi (1978) SIAM Journal on Computing 7:147-153.
 */

interface Split {
  /** How many sums are at most the value asked about. */
  readonly count: number;
  /** The largest sum at most, and the smallest sum above, that value. */
  readonly below: number;
  readonly above: number;
}

/** Which pairs (i, j) take part: all of two lists, or i <= j of one list with itself. */
type Pairs = 'all' | 'walsh';

function split(first: Float64Array, second: Float64Array, pairs: Pairs, value: number): Split {
  let count = 0;
  let below = -Infinity;
  let above = Infinity;
  let j = second.length;
  for (let i = 0; i < first.length; i++) {
    const x = first[i] as number;
    while (j > 0 && x + (second[j - 1] as number) > value) j--;
    const start = pairs === 'walsh' ? i : 0;
    if (j > start) {
      count += j - start;
      below = Math.max(below, x + (second[j - 1] as number));
    }
    const next = Math.max(j, start);
    if (next < second.length) above = Math.min(above, x + (second[next] as number));
  }
  return { count, below, above };
}

function kthSmallest(first: Float64Array, second: Float64Array, pairs: Pairs, k: number): number {
  let low = (first[0] as number) + (second[0] as number);
  let high = (first.at(-1) as number) + (second.at(-1) as number);
  while (low < high) {
    const half = low + (high - low) / 2;
    // Between neighbouring doubles the half can round up to the end it must stay below.
    const middle = half < high ? half : low;
    const { count, below, above } = split(first, second, pairs, middle);
    if (count >= k) high = below;
    else low = above;
  }
  return high;
}

/** Mean of the two middle ones when their number is even. */
function medianOf(total: number, kth: (k: number) => number): number {
  const upper = kth(Math.floor(total / 2) + 1);
  return total % 2 === 1 ? upper : (kth(total / 2) + upper) / 2;
}

export interface OrderedPairs {
  readonly total: number;
  /** The k-th smallest, 1 <= k <= total. */
  readonly kth: (k: number) => number;
  readonly median: () => number;
}

function orderedPairs(total: number, kth: (k: number) => number): OrderedPairs {
  return { total, kth, median: () => medianOf(total, kth) };
}

/** The n(n + 1)/2 means of two values, each also with itself: Walsh averages. */
export function walshAverages(values: Float64Array): OrderedPairs {
  const halves = values.map((value) => value / 2).sort();
  return orderedPairs((values.length * (values.length + 1)) / 2, (k) => kthSmallest(halves, halves, 'walsh', k));
}

/** All differences, a value of the first list minus a value of the second. */
export function pairwiseDifferences(first: Float64Array, second: Float64Array): OrderedPairs {
  const ascending = first.slice().sort();
  const negated = second.map((value) => -value).sort();
  return orderedPairs(first.length * second.length, (k) => kthSmallest(ascending, negated, 'all', k));
}
