import { tableOf } from '@cairnstep/dictionary';
import type { Row, TableKey } from '@cairnstep/dictionary';
import { ColumnStore } from './column-store.ts';
import { TypedTable } from './typed-table.ts';

/** A typed table of rows that are typed already, such as those the registry holds. Keys the dictionary does not have are passed over. */
export function tableFromRows(table: TableKey, rows: readonly Row[]): TypedTable {
  const stores = tableOf(table).variables.map((variable) => new ColumnStore(variable, rows.length));
  rows.forEach((row, index) => {
    for (const store of stores) {
      const cell = row[store.variable.key];
      if (typeof cell === 'number') store.setNumber(index, cell);
      else if (cell !== undefined) store.setWord(index, store.vocabulary.number(cell));
    }
  });
  const columns = stores.map((store) => store.take(rows.length));
  return new TypedTable(table, rows.length, new Uint32Array(rows.length), columns, new Set(stores.map(({ variable }) => variable.key)));
}
