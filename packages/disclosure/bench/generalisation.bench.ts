/**
 * Time of the search over 216 combinations of levels for 3,000 and 30,000 people.
 * Run: npx tsx --conditions @cairnstep/source packages/disclosure/bench/generalisation.bench.ts
 */
import type { GeneralisedVariable } from '../src/index.ts';
import { searchGeneralisations } from '../src/index.ts';
import { seededRandom, timed } from './bench-tools.ts';

const random = seededRandom(3);
const below = (limit: number) => Math.floor(random() * limit);
const person = () => ({
  age: 18 + below(70),
  injured: 1990 + below(36),
  level: below(29),
  grade: below(4),
  cause: below(8),
  site: below(12),
});
type Person = ReturnType<typeof person>;

/** Levels by integer division; the last one drops the variable. */
const variable = (key: keyof Person, ...widths: readonly number[]): GeneralisedVariable<Person> => ({
  key,
  levels: [
    ...widths.map((width) => ({ name: `bands of ${String(width)}`, of: (row: Person) => Math.floor(row[key] / width) })),
    { name: 'left out', of: () => null },
  ],
});
const variables = [
  variable('age', 10, 20),
  variable('injured', 5, 10),
  variable('level', 6, 12),
  variable('grade', 1),
  variable('cause', 1),
  variable('site', 1),
];

for (const people of [3_000, 30_000]) {
  const rows = Array.from({ length: people }, person);
  const offers = searchGeneralisations({ rows, variables, k: 5 });
  console.log(
    `${String(people)} people, ${String(offers.length)} offers: ${timed(() => searchGeneralisations({ rows, variables, k: 5 }), 3)}`,
  );
}
