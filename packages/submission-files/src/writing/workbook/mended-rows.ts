import type { TableKey } from '@cairnstep/dictionary';
import type { CellKind } from '../../table/cell-kind.ts';
import { readHeaderRow } from '../../table/header-row.ts';
import type { Mends } from '../../table/table-options.ts';
import type { SubmittedRow } from './submitted-tables.ts';

/** The rows of a table with what was typed in place of their cells; columns that the file lacks stand behind those it has. */
export async function* mendedRows(table: TableKey, rows: AsyncIterable<SubmittedRow>, mends: Mends): AsyncGenerator<SubmittedRow> {
  const positions = new Map<string, number>();
  for await (const row of rows) {
    if (positions.size === 0) {
      const added = takeColumns(table, row.cells, mends, positions);
      yield { ...row, cells: [...row.cells, ...added] };
      continue;
    }
    const mended = mends.get(row.line);
    yield mended ? mendedRow(row, mended, positions) : row;
  }
}

/** Notes down where each column stands, and gives the keys of those that have to be added. */
function takeColumns(table: TableKey, cells: readonly string[], mends: Mends, positions: Map<string, number>): readonly string[] {
  readHeaderRow(table, cells, cells.length).forEach(({ meaning }, position) => {
    if (meaning.kind === 'column' && !positions.has(meaning.variable.key)) positions.set(meaning.variable.key, position);
  });
  const keys = new Set([...mends.values()].flatMap((row) => [...row.keys()]));
  const added = [...keys].filter((key) => !positions.has(key));
  added.forEach((key, index) => positions.set(key, cells.length + index));
  return added;
}

const isNumber = (text: string): boolean => /^-?\d+(?:\.\d+)?$/.test(text);

function mendedRow(
  { line, cells, kinds }: SubmittedRow,
  mended: ReadonlyMap<string, string>,
  positions: ReadonlyMap<string, number>,
): SubmittedRow {
  const texts = [...cells];
  const newKinds: CellKind[] | null = kinds && [...kinds];
  for (const [key, text] of mended) {
    const position = positions.get(key);
    if (position === undefined) continue;
    for (let empty = texts.length; empty < position; empty += 1) {
      texts[empty] = '';
      if (newKinds) newKinds[empty] = 'text';
    }
    texts[position] = text;
    if (newKinds) newKinds[position] = isNumber(text) ? 'number' : 'text';
  }
  return { line, cells: texts, kinds: newKinds };
}
