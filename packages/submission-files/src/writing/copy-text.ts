import type { TypedColumn, TypedTable } from '../table/typed-table.ts';
import { formatNumber } from './format-number.ts';

/** Special characters of PostgreSQL's COPY text format (PostgreSQL 15 documentation, COPY, "Text Format"). */
const escapes: Readonly<Record<string, string>> = { '\\': '\\\\', '\t': '\\t', '\n': '\\n', '\r': '\\r' };

const escaped = (text: string): string => text.replace(/[\\\t\n\r]/g, (character) => escapes[character] ?? character);

/** The cells of a column as COPY writes them; an empty cell is `\N`. */
function copyCells(column: TypedColumn): (row: number) => string {
  const known = new Map<string, string>();
  return (row) => {
    const number = column.number(row);
    if (number !== null) return formatNumber(number);
    const word = column.word(row);
    if (word === null) return '\\N';
    let text = known.get(word);
    if (text === undefined) known.set(word, (text = escaped(word)));
    return text;
  };
}

/**
 * Rows of a table in PostgreSQL's COPY text format, one line each.
 * @param columns Keys of the columns, in the order of the COPY statement.
 * @param leading Cells that every line begins with, such as the number of the submission; null for an empty one.
 */
export function copyText(table: TypedTable, columns: readonly string[], leading: readonly (string | null)[] = []): string {
  const start = leading.map((cell) => `${cell === null ? '\\N' : escaped(cell)}\t`).join('');
  const cells = columns.map((key) => copyCells(table.column(key)));
  let text = '';
  for (let row = 0; row < table.length; row += 1) {
    let line = start;
    cells.forEach((write, index) => {
      line += index === 0 ? write(row) : `\t${write(row)}`;
    });
    text += `${line}\n`;
  }
  return text;
}
