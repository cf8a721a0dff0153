/** What the offline edition saves: one cleaned file a table, and a text that says what was prepared. */
import type { PreparedTable, ReplacedCodes } from './messages.ts';
import type { PreparedPicture } from './worker/protocol.ts';

export interface PreparedFile {
  readonly name: string;
  readonly content: ArrayBuffer | string;
  readonly type: string;
}

export interface Prepared {
  readonly site: string;
  readonly calendarMonth: string;
  readonly prepared: PreparedPicture;
  readonly tables: readonly PreparedTable[];
  readonly replacedCodes: ReplacedCodes;
}

const csvType = 'text/csv;charset=utf-8';

export function preparedFiles({ site, calendarMonth, prepared, tables, replacedCodes }: Prepared): PreparedFile[] {
  const saved: PreparedFile[] = tables.map(({ table, csv }) => ({ name: `${table}.csv`, content: csv, type: csvType }));
  if (replacedCodes.length > 0) {
    const lines = replacedCodes.map(({ from, to }) => `${from},${to}\r\n`);
    saved.push({ name: 'replaced-codes.csv', content: `from,to\r\n${lines.join('')}`, type: csvType });
  }
  const content = whatWasPrepared({ site, calendarMonth, prepared, replacedCodes });
  return [...saved, { name: 'what-was-prepared.txt', content, type: 'text/plain;charset=utf-8' }];
}

function whatWasPrepared({ site, calendarMonth, prepared, replacedCodes }: Omit<Prepared, 'tables'>): string {
  const { tables, people, rowsLeftBehind, agesTopCoded } = prepared;
  return [
    `Prepared for the registry: site ${site}, month ${calendarMonth}`,
    '',
    ...tables.flatMap(({ table, rows, bytes, digest }) => [`${table}.csv: ${rows} rows, ${bytes} bytes`, `  SHA-256 ${digest}`]),
    '',
    `People: ${people}`,
    `Rows that stayed at the clinic: ${rowsLeftBehind}`,
    `Ages written as 90: ${agesTopCoded}`,
    ...(replacedCodes.length === 0
      ? []
      : [
          `Codes to be replaced: ${replacedCodes.length}. A coordinator gives replaced-codes.csv to the registry, on its page “Site key”, before the tables are sent.`,
        ]),
    '',
  ].join('\r\n');
}
