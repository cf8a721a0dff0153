/**
 * The cheapest choice of items that has at least one of each set ("hitting set"), by depth-first branch and bound.
 *
 * Branches on the smallest set not yet hit; an item tried is barred from the later branches, so no choice is looked at twice.
 * The bound adds the cheapest items of sets that share none.
 */

export interface Cover {
  readonly items: readonly number[];
  readonly cost: number;
}

/** Counts down the branches a search may still open, so that hard cases end. */
export interface SearchBudget {
  branches: number;
}

/**
 * @param costs positive cost per item
 * @param below only choices cheaper than this are wanted
 * @returns the cheapest choice, `undefined` if none is cheaper than `below`, or `'out-of-budget'` when the search was cut short
 */
export function leastCostCover(
  sets: readonly (readonly number[])[],
  costs: (item: number) => number,
  below: number,
  budget: SearchBudget,
): Cover | undefined | 'out-of-budget' {
  const ordered = withoutSupersets(sets);
  const chosen = new Set<number>();
  const barred = new Set<number>();
  let best: Cover | undefined;
  let limit = below;
  let finished = true;

  const search = (cost: number): void => {
    if (budget.branches-- <= 0) {
      finished = false;
      return;
    }
    const open: number[][] = [];
    for (const set of ordered) {
      if (!set.some((item) => chosen.has(item))) open.push(set.filter((item) => !barred.has(item)));
    }
    if (cost + apartBound(open, costs) >= limit) return;
    const [first] = open.sort((a, b) => a.length - b.length);
    if (first === undefined) {
      best = { items: [...chosen].sort((a, b) => a - b), cost };
      limit = cost;
      return;
    }
    const branchItems = first.sort((a, b) => costs(a) - costs(b) || a - b);
    for (const item of branchItems) {
      chosen.add(item);
      search(cost + costs(item));
      chosen.delete(item);
      barred.add(item);
    }
    for (const item of branchItems) barred.delete(item);
  };
  search(0);
  return finished ? best : 'out-of-budget';
}

/** Shortest first, without sets that are hit whenever a smaller one is. */
function withoutSupersets(sets: readonly (readonly number[])[]): (readonly number[])[] {
  const kept: (readonly number[])[] = [];
  for (const set of [...sets].sort((a, b) => a.length - b.length)) {
    const items = new Set(set);
    if (!kept.some((smaller) => smaller.every((item) => items.has(item)))) kept.push(set);
  }
  return kept;
}

/** What hitting these sets costs at least. */
function apartBound(open: readonly (readonly number[])[], costs: (item: number) => number): number {
  const used = new Set<number>();
  let bound = 0;
  for (const set of open) {
    if (set.some((item) => used.has(item))) continue;
    bound += Math.min(...set.map(costs));
    for (const item of set) used.add(item);
  }
  return bound;
}
