import { matchColumns } from '@cairnstep/deidentification';
import type { StoredMatches } from '@cairnstep/deidentification';
import { tableKeys } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';

/** Rows that tell whether a column holds dates. */
const sampled = 50;
/** Fewer columns than this fit many tables by chance. */
const fewestColumns = 2;

/** Which table a file is of, by its columns: the one that most of them fit; null when none does, or two do alike. */
export function recogniseColumns(
  { headers, rows }: { readonly headers: readonly string[]; readonly rows: readonly (readonly string[])[] },
  remembered: StoredMatches,
): TableKey | null {
  const sample = { headers, rows: rows.slice(0, sampled) };
  const [first, second] = tableKeys
    .map((table) => {
      const matches = matchColumns(table, sample, remembered.get(table));
      return { table, fitting: matches.filter(({ as }) => as !== 'left-out' && as !== 'participant').length };
    })
    .sort((one, other) => other.fitting - one.fitting);
  if (first === undefined || first.fitting < fewestColumns || first.fitting === second?.fitting) return null;
  return first.table;
}
