import { flagCodes } from './code-lists.ts';
import type { Table, Variable } from './types.ts';

/** A variable as a table file writes it: the table and the first version are filled in, and a flag needs no code list. */
export type VariableDraft = Omit<Variable, 'table' | 'since'> & { readonly since?: string };

/** Makes a table of the dictionary from drafts. Variables are of version 1.0 unless they say otherwise. */
export function defineTable(draft: Omit<Table, 'variables'> & { readonly variables: readonly VariableDraft[] }): Table {
  const variables = draft.variables.map((variable): Variable => ({
    ...variable,
    ...(variable.type === 'flag' ? { codes: flagCodes } : {}),
    table: draft.key,
    since: variable.since ?? '1.0',
  }));
  return { ...draft, variables };
}
