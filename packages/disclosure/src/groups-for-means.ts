/**
 * Which groups of a table may show a mean, SD or other figure of an outcome.
 *
 * The people with the outcome measured (n) are fewer than the people counted, and n is printed beside every mean, so the n's are a
 * table of counts of their own. They get the same protection, on top of what is hidden in the table of people: a group whose size is
 * hidden shows no figure either, and no total's mean may leave a hidden rest of 1 to 10 measured people (why: `protection-problem.ts`).
 * A reader also knows that nobody is measured who is not counted, which the protection takes into account.
 *
 * The number of people without the outcome is the count minus n. Where both are shown, so is that difference; it says that somebody
 * was not measured, not what anybody's result was.
 */
import type { CountTable, PerPlace, Place } from './count-table.ts';
import { perPlace, positionOf, withTotals } from './count-table.ts';
import type { ProtectedTable } from './protect-table.ts';
import { protectTable } from './protect-table.ts';

export interface GroupsForMeans {
  /** `true`: n, mean, SD and other figures of this group may be shown. */
  readonly usable: PerPlace<boolean>;
  /** The n's under protection; `n.published` is what may be shown, a published 0 meaning that nobody was measured. */
  readonly n: ProtectedTable;
}

/**
 * @param people the table of people and its protection, as `protectTable` gave it (the smallest count shown is taken from there)
 * @param measured per cell of the same table, how many of these people have the outcome
 * @throws RangeError when the tables differ in shape, or more people are measured than counted
 */
export function groupsForMeans(
  people: { readonly table: CountTable; readonly protection: ProtectedTable },
  measured: CountTable,
): GroupsForMeans {
  const counted = withTotals(people.table);
  const known = withTotals(measured);
  if (known.rows !== counted.rows || known.columns !== counted.columns) throw new RangeError('The two tables differ in shape.');
  if (known.values.some((n, position) => n > (counted.values[position] ?? 0))) {
    throw new RangeError('More people are measured than counted.');
  }
  const { hidden, audit } = people.protection;
  const most = [...counted.values];
  for (const { place, high } of audit.intervals) most[positionOf(counted, place)] = high;
  const n = protectTable(measured, {
    smallestShown: audit.smallestShown,
    alsoHide: hidden,
    atMost: (place: Place) => most[positionOf(counted, place)] ?? 0,
  });
  const stillHidden = new Set(n.audit.intervals.map(({ place }) => positionOf(counted, place)));
  return {
    usable: perPlace(known, (position) => !stillHidden.has(position) && (known.values[position] ?? 0) > 0),
    n,
  };
}
