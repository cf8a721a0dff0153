import { sampleSd } from '../description/moments.ts';
import type { CleanGroup, ScaledMoments } from './groups.ts';

export interface GroupSummary {
  readonly name: string;
  readonly n: number;
  readonly mean: number;
  readonly sd: number;
}

/** Of groups with at least two values each. */
export function groupSummaries(groups: readonly CleanGroup[], { of, shift, factor }: ScaledMoments): GroupSummary[] {
  return of.map((group, i) => ({
    name: (groups[i] as CleanGroup).name,
    n: group.n,
    mean: (group.mean + shift) * factor,
    sd: sampleSd(group) * factor,
  }));
}
