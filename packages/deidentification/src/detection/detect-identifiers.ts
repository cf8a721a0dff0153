import type { DetectionContext } from './detection-context.ts';
import type { IdentifierFinding } from './identifier-finding.ts';
import { lineOf } from './line-of.ts';
import { IdentifierScreen } from './identifier-screen.ts';
import type { TextTable } from './text-table.ts';

/**
 * Everything in a table that seems to identify somebody: one finding for each column, class and strength.
 *
 * A net, not a proof: names outside the lists and telling stories go unseen, so a column of free text is always a warning.
 */
export function detectIdentifiers(table: TextTable, context: DetectionContext = {}): IdentifierFinding[] {
  const screen = new IdentifierScreen(table.headers, context);
  table.rows.forEach((cells, row) => screen.row(cells, lineOf(table, row)));
  return screen.findings();
}

/**
 * The same for rows that arrive one after the other; rows are counted from line 2. Where rows span lines, feed an
 * {@link IdentifierScreen} with the lines instead.
 */
export async function screenCsvText(
  headers: readonly string[],
  rows: Iterable<readonly string[]> | AsyncIterable<readonly string[]>,
  context: DetectionContext = {},
): Promise<IdentifierFinding[]> {
  const screen = new IdentifierScreen(headers, context);
  let row = 0;
  for await (const cells of rows) screen.row(cells, lineOf({}, row++));
  return screen.findings();
}
