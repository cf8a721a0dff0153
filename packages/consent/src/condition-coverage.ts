/** Whether consented conditions take in what a request studies: a condition reaches itself and whatever it contains. */
import { pathToRoot } from './condition-tree.ts';
import type { ConditionTree } from './condition-tree.ts';
import type { ReasonCode } from './reasons.ts';

export interface Coverage {
  /** Every requested condition is covered. */
  readonly isCovered: boolean;
  /** A requested condition is clearly not covered. */
  readonly isOutside: boolean;
  /** What a person has to settle about the others. */
  readonly open: readonly ReasonCode[];
}

/** Each requested condition must equal, or lie below, one of the consented. */
export function coverageOf(
  consented: readonly string[],
  requested: readonly string[],
  tree: ConditionTree,
  claimsRelated: boolean,
): Coverage {
  const open = new Set<ReasonCode>();
  let isOutside = false;
  for (const condition of requested) {
    if (consented.includes(condition)) continue;
    const path = pathToRoot(tree, condition);
    if (path?.some((containing) => consented.includes(containing)) === true) continue;
    const canCompare = path !== undefined && consented.every((known) => pathToRoot(tree, known) !== undefined);
    if (!canCompare) open.add('condition_not_in_tree');
    else if (claimsRelated) open.add('related_condition_claim');
    else isOutside = true;
  }
  return { isCovered: !isOutside && open.size === 0, isOutside, open: [...open] };
}
