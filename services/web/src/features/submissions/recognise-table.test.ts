import { tableKeys } from '@cairnstep/dictionary';
import { expect, it } from 'vitest';
import { recogniseTable } from './recognise-table.ts';

it.each(tableKeys)('knows a file named as the table %s', (table) => {
  expect(recogniseTable(`${table}.csv`)).toBe(table);
});

it.each([
  ['S01_2026-11_Adverse-Events.csv', 'adverse_events'],
  ['AdverseEvents november.CSV', 'adverse_events'],
  ['session 2026-11 (2).csv', 'sessions'],
  ['export.bouts.2026.csv', 'bouts'],
  ['ISNCSCI examinations.csv', 'exams'],
])('knows %s', (name, table) => {
  expect(recogniseTable(name)).toBe(table);
});

it.each(['november.csv', 'bouts of sessions.csv', 'about.csv', '.csv'])('leaves %s to the reader', (name) => {
  expect(recogniseTable(name)).toBeNull();
});
