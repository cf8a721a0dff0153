/** What an opened key holds beyond its file, told in counts. */
import type { ColumnMatch, KeyGeneration, KnownPerson, SiteKey } from '@cairnstep/deidentification';
import type { TableKey } from '@cairnstep/dictionary';

/** Everything that later months need and the file does not hold. */
export interface KeyChanges {
  readonly newPeople: number;
  /** People of the file whose first training day, age or latest day has changed. */
  readonly changedPeople: number;
  /** Tables with columns that are read in a way the file does not know. */
  readonly columns: readonly TableKey[];
  /** Record numbers have a length that the file does not know. */
  readonly hasNewLength: boolean;
  /** There is a new secret, or codes lead to other people than before. */
  readonly hasOtherCodes: boolean;
  /** The file is locked with an earlier passphrase. */
  readonly hasNewPassphrase: boolean;
}

/** What was done to the key itself: it asks for a file with a higher number, even where the content came out the same. */
export type KeyActs = Pick<KeyChanges, 'hasOtherCodes' | 'hasNewPassphrase'>;

export const noActs: KeyActs = { hasOtherCodes: false, hasNewPassphrase: false };

/**
 * What was forgotten is no change: a file of few people or columns takes nothing away from the months after it.
 *
 * @returns null where the file holds all that later months need; how often it was saved is not among that
 */
export function keyChanges(saved: SiteKey, current: SiteKey, acts: KeyActs): KeyChanges | null {
  const carriedOver = new Set(current.generations.flatMap(({ replacedBy }) => [...replacedBy.values()]));
  const isNew = (code: string) => !saved.people.has(code) && !carriedOver.has(code);
  const changes: KeyChanges = {
    newPeople: [...current.people.keys()].filter(isNew).length,
    changedPeople: [...current.people].filter(([code, person]) => isChanged(saved.people.get(code), person)).length,
    columns: [...current.matches]
      .filter(([table, matches]) => hasNewMatch(saved.matches.get(table) ?? [], matches))
      .map(([table]) => table),
    hasNewLength: [...current.idLengths.keys()].some((length) => !saved.idLengths.has(length)),
    hasOtherCodes:
      acts.hasOtherCodes ||
      saved.generations.length !== current.generations.length ||
      current.generations.some((generation, age) => leadsElsewhere(saved.generations[age], generation, isNew)),
    hasNewPassphrase: acts.hasNewPassphrase,
  };
  const { newPeople, changedPeople, columns, hasNewLength, hasOtherCodes, hasNewPassphrase } = changes;
  const isAny = newPeople > 0 || changedPeople > 0 || columns.length > 0 || hasNewLength || hasOtherCodes || hasNewPassphrase;
  return isAny ? changes : null;
}

function isChanged(before: KnownPerson | undefined, { indexDate, age, lastDay }: KnownPerson): boolean {
  return before !== undefined && (before.indexDate !== indexDate || before.age !== age || before.lastDay !== lastDay);
}

/** Whether the columns are in another order does not matter. */
function hasNewMatch(saved: readonly ColumnMatch[], current: readonly ColumnMatch[]): boolean {
  const known = new Set(saved.map(asText));
  return current.some((match) => !known.has(asText(match)));
}

/** With sorted keys: a match that was read from a file may have them in another order than one that was just made. */
const asText = (match: ColumnMatch): string =>
  JSON.stringify(match, (_, value: unknown) =>
    typeof value === 'object' && value !== null && !Array.isArray(value)
      ? Object.fromEntries(Object.entries(value).sort(([one], [other]) => (one < other ? -1 : 1)))
      : value,
  );

/** Whether anybody but new people is found by another code than before. */
function leadsElsewhere(saved: KeyGeneration | undefined, current: KeyGeneration, isNew: (code: string) => boolean): boolean {
  if (saved === undefined || saved.keyId !== current.keyId || saved.secret.join() !== current.secret.join()) return true;
  return (
    [...current.codes].some(([lookUp, code]) => saved.codes.get(lookUp) !== code && !(isNew(code) && !saved.codes.has(lookUp))) ||
    [...current.replacedBy].some(([from, to]) => saved.replacedBy.get(from) !== to)
  );
}
