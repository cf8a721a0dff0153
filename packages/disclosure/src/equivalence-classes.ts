/** People who look alike: groups of rows with the same values of the quasi-identifiers. */

/** A value as it would leave in an export; `null` is "missing", a value like any other to somebody who tries to match. */
export type CellValue = string | number | null;

/** One row per person. */
export type PersonRow = Readonly<Record<string, CellValue>>;

export interface EquivalenceClass {
  /** Values of the quasi-identifiers, in the order asked. */
  readonly values: readonly CellValue[];
  /** Positions of the rows. */
  readonly members: readonly number[];
}

/**
 * Classes in the order their first member appears.
 *
 * @throws RangeError when a row lacks one of the quasi-identifiers (a misspelt name would otherwise hide the risk)
 */
export function equivalenceClasses(rows: readonly PersonRow[], quasiIdentifiers: readonly string[]): EquivalenceClass[] {
  const classes = new Map<string, { values: CellValue[]; members: number[] }>();
  rows.forEach((row, position) => {
    const values = quasiIdentifiers.map((name) => {
      const value = row[name];
      if (value === undefined) throw new RangeError(`A row has no column "${name}".`);
      return value;
    });
    const key = JSON.stringify(values);
    const found = classes.get(key);
    if (found) found.members.push(position);
    else classes.set(key, { values, members: [position] });
  });
  return [...classes.values()];
}
