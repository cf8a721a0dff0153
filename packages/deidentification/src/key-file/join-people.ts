import type { KnownPerson } from './site-key.ts';

/** One person who was taken for two: of two first training days the earlier is the first; of two ages and days the higher hides more. */
export function joinPeople(one: KnownPerson = {}, other: KnownPerson = {}): KnownPerson {
  const dates = [one.indexDate, other.indexDate].filter((date) => date !== undefined).sort();
  const ages = [one.age, other.age].filter((age) => age !== undefined);
  const days = [one.lastDay, other.lastDay].filter((day) => day !== undefined);
  return {
    ...(dates[0] === undefined ? {} : { indexDate: dates[0] }),
    ...(ages.length === 0 ? {} : { age: Math.max(...ages) }),
    ...(days.length === 0 ? {} : { lastDay: Math.max(...days) }),
  };
}
