import { headerHits } from '../detection/header-rules.ts';
import type { IdentifierFinding } from '../detection/identifier-finding.ts';
import { normaliseLocalId } from '../pseudonyms/normalise-local-id.ts';
import type { NormalisationOptions } from '../pseudonyms/normalisation-options.ts';
import type { RawTable } from './month.ts';

/** Shorter record numbers agree with measurements by chance. */
const shortestTelling = 4;

/**
 * Positions of columns that cannot pass for measurements: their header announces an identifier, half of their cells are one, or half of
 * them repeat the record number of the row. A single such cell is no reason, because it is left out by itself, nor is an age of 90 and
 * more, because it is capped.
 *
 * @param participant position of the record numbers, where it is known
 */
export function identifyingColumns(
  { headers, rows }: RawTable,
  findings: readonly IdentifierFinding[],
  safeHeaders: ReadonlySet<string>,
  participant: number | null,
  normalisation: NormalisationOptions,
): ReadonlySet<number> {
  const filled = headers.map(() => 0);
  const repeated = headers.map(() => 0);
  for (const row of rows) {
    const localId = participant === null ? '' : normaliseLocalId(row[participant] ?? '', normalisation);
    headers.forEach((_, position) => {
      const cell = row[position] ?? '';
      if (cell.trim() === '') return;
      filled[position] = (filled[position] ?? 0) + 1;
      if (localId.length < shortestTelling || cell.length < shortestTelling || normaliseLocalId(cell, normalisation) !== localId) return;
      repeated[position] = (repeated[position] ?? 0) + 1;
    });
  }
  const isHalf = (count: number, position: number): boolean => count > 0 && count >= (filled[position] ?? 0) / 2;
  const found = new Set<number>();
  headers.forEach((header, position) => {
    if (!safeHeaders.has(header) && headerHits(header).some(({ strength }) => strength === 'block')) found.add(position);
    if (isHalf(repeated[position] ?? 0, position)) found.add(position);
  });
  for (const { class: name, strength, columnNumber, count } of findings) {
    if (strength === 'block' && name !== 'age_over_89' && isHalf(count, columnNumber - 1)) found.add(columnNumber - 1);
  }
  return found;
}
