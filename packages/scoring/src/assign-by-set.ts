/** The answer when an exam leaves open which group applies. A visible row of its own, never folded into another. */
export const notDeterminable = 'not_determinable';
export type NotDeterminable = typeof notDeterminable;

/**
 * Assigns a result to a group only when every value it can have falls in that group (NLI C5 or C6 is in C5-C8; C4 or C5 is
 * not determinable).
 * @throws RangeError when there is no value at all.
 */
export function assignBySet<Value, Group>(values: readonly Value[], groupOf: (value: Value) => Group): Group | NotDeterminable {
  if (values.length === 0) throw new RangeError('A result needs at least one possible value to be grouped.');
  const groups = new Set(values.map(groupOf));
  return groups.size === 1 ? groupOf(values[0]!) : notDeterminable;
}
