import type { ReplacedCode } from '../preparation/month.ts';
import { canonicalJson } from './canonical-json.ts';
import { joinPeople } from './join-people.ts';
import { KeyFileRefusal } from './key-file-refusal.ts';
import type { KeyChange } from './rotate-key.ts';
import type { KeyGeneration, KnownPerson, SiteKey } from './site-key.ts';

export interface MergedKey extends KeyChange {
  /** People whose first training day differed between the files. Rows sent with the later one have to be sent again. */
  readonly indexDatesMoved: readonly string[];
}

/**
 * One key out of two copies that two coordinators went on with separately.
 *
 * The same person may have got a code in each: the one that sorts first stays, the other is replaced in the registry. Of two first
 * training days the earlier one counts. Column matches and the lengths of last month are those of the copy that was saved more often.
 *
 * @throws KeyFileRefusal when the copies differ in site, secrets, kind of record number, normalisation or mode
 */
export function mergeKeys(one: SiteKey, other: SiteKey): MergedKey {
  if (originOf(one) !== originOf(other)) throw new KeyFileRefusal('different-keys');
  const [newer, older] = one.revision >= other.revision ? [one, other] : [other, one];
  const same = new SameCodes();
  const generations = newer.generations.map((generation, age) => {
    const counterpart = older.generations[age] as KeyGeneration;
    same.addAll(generation.codes, counterpart.codes);
    same.addAll(generation.replacedBy, counterpart.replacedBy);
    return { ...generation, pair: counterpart };
  });

  const kept = (codes: ReadonlyMap<string, string>) => [...codes].map(([from, code]) => [from, same.keptOf(code)] as const);
  const merged = generations.map(({ keyId, secret, codes, replacedBy, pair }): KeyGeneration => ({
    keyId,
    secret,
    codes: new Map([...kept(codes), ...kept(pair.codes)]),
    replacedBy: new Map([...kept(replacedBy), ...kept(pair.replacedBy)]),
  }));
  const { people, moved } = mergePeople([...newer.people, ...older.people], same);
  return {
    key: {
      ...newer,
      generations: merged as unknown as SiteKey['generations'],
      people,
      matches: new Map([...older.matches, ...newer.matches]),
    },
    replaced: same.replaced(),
    indexDatesMoved: moved,
  };
}

/** What two copies of one key have in common, whatever was done with them since. */
function originOf({ site, mode, idType, normalisation, generations }: SiteKey): string {
  return canonicalJson({ site, mode, idType, normalisation, secrets: generations.map(({ keyId, secret }) => [keyId, [...secret]]) });
}

function mergePeople(
  all: readonly (readonly [string, KnownPerson])[],
  same: SameCodes,
): { people: Map<string, KnownPerson>; moved: string[] } {
  const people = new Map<string, KnownPerson>();
  const moved = new Set<string>();
  for (const [code, person] of all) {
    const kept = same.keptOf(code);
    const before = people.get(kept);
    if (before?.indexDate !== undefined && person.indexDate !== undefined && before.indexDate !== person.indexDate) moved.add(kept);
    people.set(kept, joinPeople(before, person));
  }
  return { people, moved: [...moved].sort() };
}

/** Codes that turn out to be one person's, in groups; of each group the code that sorts first is kept. */
class SameCodes {
  private readonly parents = new Map<string, string>();

  addAll(one: ReadonlyMap<string, string>, other: ReadonlyMap<string, string>): void {
    for (const [key, code] of one) {
      const counterpart = other.get(key);
      if (counterpart !== undefined) this.unite(code, counterpart);
    }
  }

  keptOf(code: string): string {
    let kept = code;
    for (let parent = this.parents.get(kept); parent !== undefined; parent = this.parents.get(kept)) kept = parent;
    return kept;
  }

  replaced(): ReplacedCode[] {
    return [...this.parents.keys()].sort().map((from) => ({ from, to: this.keptOf(from) }));
  }

  private unite(one: string, other: string): void {
    const [first, second] = [this.keptOf(one), this.keptOf(other)].sort() as [string, string];
    if (first !== second) this.parents.set(second, first);
  }
}
