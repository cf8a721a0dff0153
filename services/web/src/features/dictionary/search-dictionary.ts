/** Finds variables and measures by their name, key, definition, codes and labels, unit or another header of the column. */
import { dictionary, measures } from '@cairnstep/dictionary';
import type { Code, Measure, TableKey, Variable } from '@cairnstep/dictionary';
import { foldText, wordMatcher } from '../../lib/word-match.ts';

/** One table, the measures, or everything. */
export type Scope = TableKey | 'measures' | 'all';

export const scopes: readonly Scope[] = ['all', ...dictionary.tables.map(({ key }) => key), 'measures'];

export interface Found {
  readonly variables: readonly Variable[];
  readonly measures: readonly Measure[];
}

const inCodes = (codes: readonly Code[] = []): string[] => codes.flatMap(({ code, label }) => [code, label]);

function textOf({ key, name, definition, unit = '', codes, missingCodes, aliases = [] }: Variable): string {
  return foldText([key, name, definition, unit, ...inCodes(codes), ...inCodes(missingCodes), ...aliases].join('\n'));
}

const variableTexts = dictionary.tables.flatMap((table) => table.variables.map((variable) => ({ variable, text: textOf(variable) })));
const measureTexts = measures.map((measure) => ({
  measure,
  text: foldText([measure.key, measure.name, measure.definition, measure.unit].join('\n')),
}));

/**
 * What holds every word of the query at the beginning of one of its own, in the dictionary's order. An empty query finds
 * everything within the scope.
 */
export function searchDictionary(query: string, scope: Scope = 'all'): Found {
  const holds = wordMatcher(query);
  return {
    variables: variableTexts
      .filter(({ variable, text }) => (scope === 'all' || scope === variable.table) && holds(text))
      .map(({ variable }) => variable),
    measures: scope === 'all' || scope === 'measures' ? measureTexts.filter(({ text }) => holds(text)).map(({ measure }) => measure) : [],
  };
}
