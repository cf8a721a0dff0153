/** Adjusted p-values against R. */

import { bonferroniAdjusted, falseDiscoveryAdjusted, holmAdjusted } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import { casesOf } from './fixture.ts';
import fixture from './multiplicity.json' with { type: 'json' };

/** R keeps a missing p in its place and does not count it; here it is left out before the call. */
const present = (list: readonly (number | null)[]): number[] => list.filter((p) => p !== null);

export const multiplicityChecks: readonly ReferenceCheck[] = casesOf(fixture, 'padjust.').map((one) => ({
  id: one.id,
  method: 'multiplicity',
  source: 'R 4.2.2, p.adjust',
  compute: () => {
    const p = present(one.inputs.p);
    return { holm: holmAdjusted(p), BH: falseDiscoveryAdjusted(p), bonferroni: bonferroniAdjusted(p) };
  },
  expected: { holm: present(one.expected.holm), BH: present(one.expected.BH), bonferroni: present(one.expected.bonferroni) },
  tolerance: one.tolerance,
}));
