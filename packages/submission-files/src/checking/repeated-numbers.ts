/** The numbers from 0 up that occur at least so many times. Sorting finds them without a table of all numbers; usually there are none. */
export function repeatedNumbers(numbers: Float64Array, times: number): ReadonlySet<number> {
  const sorted = numbers.slice().sort();
  const found = new Set<number>();
  for (let at = times - 1; at < sorted.length; at += 1) {
    const number = sorted[at] ?? -1;
    if (number >= 0 && sorted[at - times + 1] === number) found.add(number);
  }
  return found;
}
