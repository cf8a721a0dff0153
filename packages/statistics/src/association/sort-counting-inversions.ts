/**
 * Sorts a list upwards in place by merging and answers how many pairs stood in the wrong order (equal ones do not). Source: Knight
 * (1966).
 */

export function sortCountingInversions(values: Float64Array): number {
  const spare = new Float64Array(values.length);
  let inversions = 0;
  for (let width = 1; width < values.length; width *= 2) {
    for (let start = 0; start < values.length; start += 2 * width) {
      const middle = Math.min(start + width, values.length);
      const end = Math.min(start + 2 * width, values.length);
      let left = start;
      let right = middle;
      for (let i = start; i < end; i++) {
        const takeLeft = right >= end || (left < middle && (values[left] as number) <= (values[right] as number));
        if (!takeLeft) inversions += middle - left;
        spare[i] = values[takeLeft ? left++ : right++] as number;
      }
    }
    values.set(spare);
  }
  return inversions;
}
