/** Which variable of a table a clinic's header means, and in which unit. */
import { keyWithoutUnit, tableOf, unitSpellings } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';

export interface NamedVariable {
  readonly variable: Variable;
  /** Where the header names a unit other than the stored one. */
  readonly unit?: string;
}

/** Letters and digits only, in lower case. */
export const foldName = (name: string): string =>
  name
    .normalize('NFKC')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}%]+/gu, '');

const writtenForms = (unit: string): string[] => [unit, ...(unitSpellings[unit] ?? [])].map(foldName);

export class VariableNames {
  private readonly named = new Map<string, NamedVariable>();

  constructor(table: TableKey) {
    const { variables } = tableOf(table);
    // A key beats a name, a name beats an alias, and all beat a name with a unit at its end.
    for (const variable of variables) this.declare(variable.key, { variable });
    for (const variable of variables) this.declare(variable.name, { variable });
    for (const variable of variables) for (const alias of variable.aliases ?? []) this.declare(alias, { variable });
    for (const variable of variables) this.declareUnits(variable);
  }

  find(header: string): NamedVariable | undefined {
    return header.length > 200 ? undefined : this.named.get(foldName(header));
  }

  private declareUnits(variable: Variable): void {
    const { key, name, aliases = [], unit, acceptedUnits = [] } = variable;
    if (unit === undefined) return;
    const bases = [keyWithoutUnit(variable) ?? key, name, ...aliases];
    for (const base of bases) {
      this.declare(base, { variable });
      for (const form of writtenForms(unit)) this.declare(base + form, { variable });
      for (const accepted of acceptedUnits)
        for (const form of writtenForms(accepted.unit)) this.declare(base + form, { variable, unit: accepted.unit });
    }
  }

  private declare(name: string, named: NamedVariable): void {
    const folded = foldName(name);
    if (!this.named.has(folded)) this.named.set(folded, named);
  }
}
