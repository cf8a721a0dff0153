/** Whether a new data cut may replace the last one: the change at each site must be nobody, or enough people to hide among. */
import type { PeopleSet } from './people-set.ts';
import { countDifference, peopleSet } from './people-set.ts';
import { requireSmallestShown, SMALLEST_SHOWN } from './smallest-shown.ts';

/**
 * Sites whose people change by 1 to 10 from one cut to the next, joined and left taken together. While there is one, the cut is held:
 * the same question in both cuts would tell about these few. A withdrawal thus waits for other changes before statistics are renewed;
 * exports leave the person out at once.
 *
 * @param before people per site in the cut now published; @param after the same in the new one
 * @returns site keys in the order they are first met, empty when the cut may be published
 */
export function sitesHoldingTheCut(
  before: ReadonlyMap<string, PeopleSet>,
  after: ReadonlyMap<string, PeopleSet>,
  smallestShown: number = SMALLEST_SHOWN,
): string[] {
  const limit = requireSmallestShown(smallestShown) - 1;
  const nobody = peopleSet([]);
  return [...new Set([...before.keys(), ...after.keys()])].filter((site) => {
    const changed = countDifference(before.get(site) ?? nobody, after.get(site) ?? nobody);
    return changed >= 1 && changed <= limit;
  });
}
