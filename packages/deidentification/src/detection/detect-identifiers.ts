import type { DetectionContext } from './detection-context.ts';
import type { IdentifierFinding } from './identifier-finding.ts';
import { IdentifierScreen } from './identifier-screen.ts';
import type { TextTable } from './text-table.ts';

/** Line of the first row when nothing else is said: the header stands on line 1. */
const firstLine = 2;

/**
 * Everything in a table that seems to identify somebody: one finding for each column, class and strength.
 *
 * A net, not a proof: names outside the lists and telling stories go unseen, so a column of free text is always a warning.
 */
export function detectIdentifiers(table: TextTable, context: DetectionContext = {}): IdentifierFinding[] {
  const screen = new IdentifierScreen(table.headers, context);
  table.rows.forEach((cells, row) => screen.row(cells, table.lines?.[row] ?? row + firstLine));
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
  let line = firstLine;
  for await (const cells of rows) screen.row(cells, line++);
  return screen.findings();
}
