/** Coarsens what could give people away until everyone in the export shares it with at least four others (k = 5), at the least loss. */
import { searchGeneralisations, type GeneralisedVariable, type RiskReport } from '@cairnstep/disclosure';
import { levelGroups, regionGroups } from '@cairnstep/scoring';
import { tenYearBands, threeBands } from './export-tables.ts';

export interface Person {
  readonly levelGroup: string;
  readonly ais: string;
  readonly age: number | null;
  readonly sex: string | null;
}

/** Under agreement; a public file would need 11. Source: decision of the registry after El Emam and others, common practice 3 to 5. */
export const smallestClass = 5;
/** Share of people that may be left out rather than coarsening everyone for them. */
const largestShareLeftOut = 0.05;

const bandOf = (age: number | null, edges: readonly number[], names: readonly string[]): string | null => {
  if (age === null) return null;
  const index = edges.findIndex((edge) => age < edge);
  return names[index === -1 ? names.length - 1 : index] ?? null;
};
function region(levelGroup: string): string {
  const first = levelGroups.groups.find((group) => group.id === levelGroup)?.first;
  const found = first === undefined ? undefined : regionGroups.groupOf(first);
  if (found === 'lumbar' || found === 'sacral') return 'lumbosacral';
  return found === 'cervical' || found === 'thoracic' ? found : 'other';
}
const notGiven = () => 'not_given';

const variables: readonly GeneralisedVariable<Person>[] = [
  {
    key: 'level_group',
    levels: [
      { name: 'level groups as on screen', of: (person) => person.levelGroup },
      { name: 'cervical, thoracic, lumbosacral', of: (person) => region(person.levelGroup) },
      { name: 'not given (the code not_given in every row)', of: notGiven },
    ],
  },
  {
    key: 'ais',
    levels: [
      { name: 'grades A to E', of: (person) => person.ais },
      { name: 'A or B against C to E', of: (person) => (person.ais === 'ND' ? 'ND' : ['A', 'B'].includes(person.ais) ? 'AB' : 'CDE') },
      { name: 'not given (the code not_given in every row)', of: notGiven },
    ],
  },
  {
    key: 'age_band',
    levels: [
      { name: 'ten-year bands', of: (person) => bandOf(person.age, [20, 30, 40, 50, 60, 70], tenYearBands) },
      { name: 'three bands', of: (person) => bandOf(person.age, [40, 60], threeBands) },
      { name: 'not given (the code not_given in every row)', of: notGiven },
    ],
  },
  {
    key: 'sex',
    levels: [
      { name: 'as recorded', of: (person) => person.sex },
      { name: 'not given (the code not_given in every row)', of: notGiven },
    ],
  },
];

export interface Generalised {
  /** Per person the four values, or null for who is left out. */
  readonly values: readonly (readonly (string | null)[] | null)[];
  /** What was done, in words: "age_band: three bands". */
  readonly steps: readonly string[];
  readonly leftOut: number;
  readonly risk: RiskReport;
}

/** Null when even the coarsest form does not protect (fewer than five people). */
export function generalise(people: readonly Person[]): Generalised | null {
  if (people.length < smallestClass) return null;
  const [best] = searchGeneralisations({ rows: people, variables, k: smallestClass, largestShareLeftOut });
  if (!best) return null;
  const chosen = variables.map((variable) => ({ key: variable.key, level: variable.levels[best.levels[variable.key] ?? 0] }));
  const valuesOf = (person: Person): (string | null)[] => chosen.map(({ level }) => (level?.of(person) ?? null) as string | null);
  const all = people.map(valuesOf);
  const sizes = new Map<string, number>();
  for (const values of all) sizes.set(JSON.stringify(values), (sizes.get(JSON.stringify(values)) ?? 0) + 1);
  return {
    values: all.map((values) => ((sizes.get(JSON.stringify(values)) ?? 0) >= smallestClass ? values : null)),
    steps: chosen.map(({ key, level }) => `${key}: ${level?.name ?? ''}`),
    leftOut: best.leftOut,
    risk: best.risk,
  };
}
