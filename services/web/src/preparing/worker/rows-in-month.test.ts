import { expect, it } from 'vitest';
import { rowsInMonth } from './rows-in-month.ts';
import type { AssignedSource } from './source-shelf.ts';

const source = (given: Partial<AssignedSource>): AssignedSource => ({
  id: 1,
  file: new File([], 'sessions.csv'),
  sheet: null,
  table: 'sessions',
  headers: ['MRN', 'Date'],
  rows: [
    ['1', '30/10/2026'],
    ['1', '01/11/2026'],
    ['1', '11/12/2026'],
    ['1', ''],
    ['1', 'Monday'],
  ],
  lines: [2, 3, 4, 5, 6],
  encoding: null,
  delimiter: null,
  fittingDelimiters: [],
  decimalMark: '.',
  hasBothMarks: false,
  notes: [],
  matches: [{ header: 'Date', as: 'study-day', variable: 'session_day', dateFormat: 'day/month/year' }],
  ...given,
});

it('counts rows of training by their dates, as the column writes them', () => {
  expect(rowsInMonth([source({})], '2026-11')).toEqual({ table: 'sessions', inside: 1, dated: 3 });
});

it('finds out how dates are written where there is only one way', () => {
  const matches = [{ header: 'Date', as: 'study-day', variable: 'session_day' }] as const;
  expect(rowsInMonth([source({ matches, rows: [['1', '2026-11-30']] })], '2026-11')).toEqual({ table: 'sessions', inside: 1, dated: 1 });
  expect(rowsInMonth([source({ matches, rows: [['1', '05/11/2026']] })], '2026-11')).toBeNull();
});

it('says nothing where no file says when training took place', () => {
  expect(rowsInMonth([source({ table: 'participants' })], '2026-11')).toBeNull();
  expect(rowsInMonth([source({ matches: [] })], '2026-11')).toBeNull();
});
