/** Repeatable made-up data of a registry's size, for timing. */
import { seededGenerator } from '../src/index.ts';

export const visits = ['baseline', 'week 4', 'week 8', 'week 12', 'month 6', 'month 12'];
export const grades = ['A', 'B', 'C', 'D'];

export interface RegistryVisits {
  /** One in seven is missing. */
  readonly outcome: readonly (number | null)[];
  readonly participant: readonly string[];
  readonly visit: readonly string[];
  readonly grade: readonly string[];
}

/** People with six visits each. */
export function registryVisits(participants: number): RegistryVisits {
  const generator = seededGenerator(30_000);
  /** Sum of twelve fractions less six: close enough to a normal deviate for a timing. */
  const deviate = (): number => Array.from({ length: 12 }, () => generator.nextFraction()).reduce((sum, value) => sum + value, -6);
  const outcome: (number | null)[] = [];
  const participant: string[] = [];
  const visit: string[] = [];
  const grade: string[] = [];
  for (let person = 0; person < participants; person++) {
    const own = 0.2 * deviate();
    const letter = grades[generator.nextIndex(grades.length)] as string;
    for (const [time, name] of visits.entries()) {
      outcome.push(generator.nextFraction() < 0.15 ? null : 0.4 + 0.05 * time + own + 0.1 * deviate());
      participant.push(`P${person}`);
      visit.push(name);
      grade.push(letter);
    }
  }
  return { outcome, participant, visit, grade };
}

/** Numbers with two decimals between 0 and 10: a linear congruential generator (Numerical Recipes, ranqd1). */
export function roundedNumbers(count: number, start: number): Float64Array {
  let state = start;
  return Float64Array.from({ length: count }, () => {
    state = (state * 1664525 + 1013904223) >>> 0;
    return Math.floor((state / 2 ** 32) * 1000) / 100;
  });
}
