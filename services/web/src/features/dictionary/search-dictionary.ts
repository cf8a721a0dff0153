/** Finds variables and measures by their name, key, definition, codes and labels, unit or another header of the column. */
import { dictionary, measures } from '@cairnstep/dictionary';
import type { Code, Measure, TableKey, Variable } from '@cairnstep/dictionary';

/** One table, the measures, or everything. */
export type Scope = TableKey | 'measures' | 'all';

export const scopes: readonly Scope[] = ['all', ...dictionary.tables.map(({ key }) => key), 'measures'];

export interface Found {
  readonly variables: readonly Variable[];
  readonly measures: readonly Measure[];
}

/** As words are compared: case, hyphens and underscores do not count, so that "S4-5" finds `lt_r_s4_5`. Begins with a space. */
function folded(text: string): string {
  return ` ${text.toLowerCase().replace(/[\s_-]+/g, ' ')}`;
}

const inCodes = (codes: readonly Code[] = []): string[] => codes.flatMap(({ code, label }) => [code, label]);

function textOf({ key, name, definition, unit = '', codes, missingCodes, aliases = [] }: Variable): string {
  return folded([key, name, definition, unit, ...inCodes(codes), ...inCodes(missingCodes), ...aliases].join('\n'));
}

const variableTexts = dictionary.tables.flatMap((table) => table.variables.map((variable) => ({ variable, text: textOf(variable) })));
const measureTexts = measures.map((measure) => ({
  measure,
  text: folded([measure.key, measure.name, measure.definition, measure.unit].join('\n')),
}));

/**
 * What holds every word of the query at the beginning of one of its own, in the dictionary's order. An empty query finds
 * everything within the scope.
 */
export function searchDictionary(query: string, scope: Scope = 'all'): Found {
  const words = query.split(/\s+/).filter(Boolean).map(folded);
  const holds = (text: string) => words.every((word) => text.includes(word));
  return {
    variables: variableTexts
      .filter(({ variable, text }) => (scope === 'all' || scope === variable.table) && holds(text))
      .map(({ variable }) => variable),
    measures: scope === 'all' || scope === 'measures' ? measureTexts.filter(({ text }) => holds(text)).map(({ measure }) => measure) : [],
  };
}
