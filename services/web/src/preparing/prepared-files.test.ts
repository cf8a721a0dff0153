import { describe, expect, it } from 'vitest';
import { preparedFiles } from './prepared-files.ts';
import type { PreparedPicture } from './worker/protocol.ts';

const table = { rows: 3, rowsInFile: 4, people: 2, bytes: 120, digest: 'ab12', headers: [], firstRows: [], words: [] };
const prepared: PreparedPicture = {
  tables: [{ table: 'sessions', ...table }],
  columns: [],
  problems: [],
  findings: [],
  firstDays: [],
  emptyTables: [],
  rowsLeftBehind: 1,
  people: 2,
  newPeople: 0,
  newToKey: null,
  agesTopCoded: 0,
  lengthChange: null,
  rowsInMonth: null,
};
const month = {
  site: 'S01',
  calendarMonth: '2026-11',
  prepared,
  tables: [{ table: 'sessions' as const, rows: 3, csv: new ArrayBuffer(120) }],
};

describe('the files that are saved', () => {
  it('are one a table, and a text that says what was prepared', () => {
    const files = preparedFiles({ ...month, replacedCodes: [] });
    expect(files.map(({ name }) => name)).toEqual(['sessions.csv', 'what-was-prepared.txt']);
    const text = String(files[1]?.content);
    expect(text).toContain('site S01, month 2026-11');
    expect(text).toContain('sessions.csv: 3 rows, 120 bytes\r\n  SHA-256 ab12');
    expect(text).toContain('Rows that stayed at the clinic: 1');
    expect(text).not.toContain('replaced');
  });

  it('tell of codes that the registry has to replace', () => {
    const files = preparedFiles({ ...month, replacedCodes: [{ from: 'SOLD', to: 'SNEW' }] });
    expect(files[1]).toMatchObject({ name: 'replaced-codes.csv', content: 'from,to\r\nSOLD,SNEW\r\n' });
    expect(String(files[2]?.content)).toContain('Codes to be replaced: 1');
  });
});
