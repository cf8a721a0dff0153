import { variableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { valueCleaner } from './clean-value.ts';
import type { ColumnMatch } from './column-match.ts';

/**
 * The clinic's words in a column of codes that stand for no code yet, as they are written, each once. Told for every row, also for one
 * that stays behind for another reason: a status that nobody understands may be that reason.
 *
 * @param most words to look for
 * @returns none where the column is not matched to a variable with codes
 */
export function unknownWords(table: TableKey, match: ColumnMatch, cells: Iterable<string>, most: number): string[] {
  if (match.as !== 'value') return [];
  const variable = variableOf(table, match.variable);
  if (variable.codes === undefined) return [];
  const clean = valueCleaner(variable, { ...match, decimalMark: '.' });
  const met = new Set<string>();
  const unknown = new Set<string>();
  for (const cell of cells) {
    const word = cell.trim();
    if (met.has(word)) continue;
    met.add(word);
    if (!clean(word, '').ok) unknown.add(word);
    if (unknown.size >= most) break;
  }
  return [...unknown];
}
