import type { Group } from '../src/index.ts';

interface LongFormat {
  readonly inputs: { readonly y: readonly number[]; readonly group: readonly (string | number)[] };
}

/** Values and their group labels, one each per person, as groups in order of first appearance. */
export function groupsOf({ inputs }: LongFormat): Group[] {
  const byName = new Map<string, number[]>();
  inputs.y.forEach((value, i) => {
    const name = String(inputs.group[i]);
    const values = byName.get(name);
    if (values) values.push(value);
    else byName.set(name, [value]);
  });
  return [...byName].map(([name, values]) => ({ name, values }));
}
