import { dictionary } from './dictionary.ts';
import { history } from './history.ts';
import type { Revision } from './history.ts';
import { measures } from './measures.ts';
import { rules } from './rules.ts';
import type { Dictionary, Measure, Rule } from './types.ts';

/** The whole dictionary as one document that survives JSON unchanged. */
export interface DictionaryDocument extends Dictionary {
  readonly measures: readonly Measure[];
  readonly rules: readonly Rule[];
  readonly history: readonly Revision[];
}

export function dictionaryAsJson(): DictionaryDocument {
  return { ...dictionary, measures, rules, history };
}
