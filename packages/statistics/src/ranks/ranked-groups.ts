import type { CleanGroup } from '../groups/groups.ts';
import { midranks } from './midranks.ts';

export interface RankedGroup {
  readonly name: string;
  readonly n: number;
  readonly meanRank: number;
}

/** Mean midrank of each group among all values together. */
export function rankedGroups(groups: readonly CleanGroup[]): {
  readonly groups: readonly RankedGroup[];
  readonly tieSizes: readonly number[];
} {
  const all = new Float64Array(groups.reduce((sum, group) => sum + group.values.length, 0));
  let start = 0;
  for (const { values } of groups) {
    all.set(values, start);
    start += values.length;
  }
  const { ranks, tieSizes } = midranks(all);
  let from = 0;
  return {
    tieSizes,
    groups: groups.map(({ name, values }) => {
      const own = ranks.subarray(from, from + values.length);
      from += values.length;
      return { name, n: values.length, meanRank: own.reduce((sum, rank) => sum + rank, 0) / values.length };
    }),
  };
}
