/** Which column of a table a header means, and in which unit: by key, name or alias, however it is spaced or capitalised. */
import { keyWithoutUnit, tableOf, unitSpellings } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';

/** Written number × `times` ÷ `dividedBy` = stored number; whole numbers, so that the factor is exact. */
export interface UnitFactor {
  readonly times: number;
  readonly dividedBy: number;
}

const storedUnit: UnitFactor = { times: 1, dividedBy: 1 };

export type HeaderMeaning =
  | { readonly kind: 'column'; readonly position: number; readonly variable: Variable; readonly factor: UnitFactor }
  | { readonly kind: 'other-unit'; readonly variable: Variable; readonly allowed: readonly string[] }
  | { readonly kind: 'undeclared' };

/** Compatibility forms become plain, and case, spaces, underscores, hyphens and full stops do not count. */
export const foldName = (text: string): string =>
  text
    .normalize('NFKC')
    .toLowerCase()
    .replace(/[\s_.\-\u200b-\u200d\u2060\ufeff\u00ad]+/g, '');

/** Folded. In a clinic's brackets a unit may stand without what is counted: `Heart rate (/min)`. */
const namesOfUnit = (unit: string): string[] =>
  [unit, ...(unitSpellings[unit] ?? []), ...(unit === 'beats/min' ? ['/min'] : [])].map(foldName);

/** Longer headers name no column; they are not looked at any closer. */
const longestHeader = 200;

/** A header in two parts when it ends in brackets: `Distance (ft)`, `Distance [ft]`. */
const withUnit = /^(.*?)\s*[([]\s*([^()[\]]{1,20}?)\s*[)\]]\s*$/su;

interface Named {
  readonly position: number;
  readonly variable: Variable;
}

const meaningOf = (named: Named, factor: UnitFactor): HeaderMeaning => ({ kind: 'column', ...named, factor });

export class HeaderNames {
  /** Folded header → column, for headers that name no unit or the stored one. */
  private readonly plain = new Map<string, Named>();
  /** Folded header with another unit at its end, such as `distance_ft`. */
  private readonly converted = new Map<string, HeaderMeaning>();

  constructor(table: TableKey) {
    const all = tableOf(table).variables.map((variable, position): Named => ({ position, variable }));
    // A key beats a name, a name beats an alias, and an alias beats a key shortened by its unit.
    for (const named of all) this.declare(named.variable.key, named);
    for (const named of all) this.declare(named.variable.name, named);
    for (const named of all) for (const alias of named.variable.aliases ?? []) this.declare(alias, named);
    for (const named of all) this.declareUnits(named);
  }

  private declare(name: string, named: Named): void {
    const folded = foldName(name);
    if (!this.plain.has(folded)) this.plain.set(folded, named);
  }

  private declareUnits(named: Named): void {
    const short = keyWithoutUnit(named.variable);
    if (short !== null) this.declare(short, named);
    for (const base of [short ?? named.variable.key, named.variable.name, ...(named.variable.aliases ?? [])]) {
      for (const accepted of named.variable.acceptedUnits ?? []) {
        for (const unit of namesOfUnit(accepted.unit)) {
          const folded = foldName(base) + unit;
          if (!this.plain.has(folded) && !this.converted.has(folded)) this.converted.set(folded, meaningOf(named, accepted));
        }
      }
    }
  }

  meaning(header: string): HeaderMeaning {
    if (header.length > longestHeader) return { kind: 'undeclared' };
    const folded = foldName(header);
    const plain = this.plain.get(folded);
    if (plain) return meaningOf(plain, storedUnit);
    const converted = this.converted.get(folded);
    if (converted) return converted;

    const [, base = '', unit = ''] = withUnit.exec(header) ?? [];
    const named = this.plain.get(foldName(base));
    return named ? inUnit(named, foldName(unit)) : { kind: 'undeclared' };
  }
}

function inUnit(named: Named, unit: string): HeaderMeaning {
  const { variable } = named;
  const accepted = variable.acceptedUnits ?? [];
  if (variable.unit !== undefined && namesOfUnit(variable.unit).includes(unit)) return meaningOf(named, storedUnit);
  const other = accepted.find((candidate) => namesOfUnit(candidate.unit).includes(unit));
  if (other) return meaningOf(named, other);
  const allowed = [...(variable.unit === undefined ? [] : [variable.unit]), ...accepted.map((candidate) => candidate.unit)];
  return { kind: 'other-unit', variable, allowed };
}
