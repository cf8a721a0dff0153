import { dictionary } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { matchColumns } from './match-columns.ts';
import { nameSimilarity } from './name-similarity.ts';

const matched = (table: TableKey, columns: Readonly<Record<string, readonly string[]>>) => {
  const headers = Object.keys(columns);
  const length = Math.max(...Object.values(columns).map((cells) => cells.length));
  const rows = Array.from({ length }, (_, row) => headers.map((header) => columns[header]?.[row] ?? ''));
  return matchColumns(table, { headers, rows });
};

describe('columns of a clinic', () => {
  it('are matched by key, name and alias, and by their unit', () => {
    expect(
      matched('bouts', {
        bout_no: ['1'],
        Duration: ['60'],
        'Distance (ft)': ['10'],
        step_count: ['8'],
        'Belt speed [km/h]': ['1.2'],
        'BWS %': ['30'],
      }),
    ).toEqual([
      { header: 'bout_no', as: 'value', variable: 'bout_no' },
      { header: 'Duration', as: 'value', variable: 'duration_s' },
      { header: 'Distance (ft)', as: 'value', variable: 'distance_m', unit: 'ft' },
      { header: 'step_count', as: 'value', variable: 'steps' },
      { header: 'Belt speed [km/h]', as: 'value', variable: 'treadmill_speed_mps', unit: 'km/h' },
      { header: 'BWS %', as: 'value', variable: 'bws_pct' },
    ]);
  });

  it('are matched by every spelling of a unit that files may use', () => {
    expect(matched('sessions', { 'Peak heart rate (bpm)': ['120'], 'Body mass (pounds)': ['150'] })).toEqual([
      { header: 'Peak heart rate (bpm)', as: 'value', variable: 'hr_peak' },
      { header: 'Body mass (pounds)', as: 'value', variable: 'body_mass_kg', unit: 'lb' },
    ]);
  });

  it('find the column of the dictionary under every key and name of it', () => {
    for (const { key: table, variables } of dictionary.tables) {
      for (const { key, type } of variables) {
        const [match] = matched(table, { [key]: ['1'] });
        expect(match, `${table} ${key}`).toEqual(
          type === 'pseudonym' ? { header: key, as: 'participant' } : { header: key, as: 'value', variable: key },
        );
      }
    }
  });

  it('take a record number for the participant', () => {
    expect(matched('sessions', { 'Hospital No': ['A1'], 'Chart No': ['7'] })).toEqual([{ header: 'Hospital No', as: 'participant' }]);
  });

  it('turn columns of dates into what they are about, with the format where it is certain', () => {
    expect(matched('participants', { DOB: ['13/06/1950'], 'Date of injury': ['01/02/2020'], 'First training': ['2024-03-05'] })).toEqual([
      { header: 'DOB', as: 'birth-date', dateFormat: 'day/month/year' },
      { header: 'Date of injury', as: 'injury-date' },
      { header: 'First training', as: 'index-date', dateFormat: 'iso' },
    ]);
    expect(matched('sessions', { Date: ['5.3.2024'] })).toEqual([
      { header: 'Date', as: 'study-day', variable: 'session_day', dateFormat: 'day.month.year' },
    ]);
    expect(matched('sessions', { session_day: ['2024-03-05'] })).toEqual([
      { header: 'session_day', as: 'study-day', variable: 'session_day', dateFormat: 'iso' },
    ]);
    expect(matched('adverse_events', { 'Event date': ['2024-03-05'], 'Resolved date': ['2024-03-06'] })).toMatchObject([
      { variable: 'event_day' },
      { variable: 'resolved_day' },
    ]);
    expect(matched('exams', { 'ISNCSCI date': ['45356'] })).toEqual([{ header: 'ISNCSCI date', as: 'study-day', variable: 'exam_day' }]);
    expect(matched('sessions', { admission: ['2024-03-05'] })).toEqual([]);
  });

  it('propose a name that is nearly the same, and none that could be two things', () => {
    expect(matched('sessions', { 'Planned minuts': ['30'] })).toEqual([{ header: 'Planned minuts', as: 'value', variable: 'planned_min' }]);
    expect(matched('sessions', { systolic: ['120'] })).toEqual([]);
    expect(nameSimilarity('night', 'nacht')).toBe(0.25);
    expect(nameSimilarity('', 'a')).toBe(0);
  });

  it('never take a column that announces an identifier for a measurement', () => {
    expect(matched('sessions', { Surname: ['x'], Mobile: ['1'], steps_tel: ['1'] })).toEqual([]);
  });

  it('keep their meaning when dates are written in another way than last month, and the way is clear', () => {
    const lastMonth = [{ header: 'Session date', as: 'study-day', variable: 'session_day', dateFormat: 'day/month/year' }] as const;
    const now = (...cells: string[]) =>
      matchColumns('sessions', { headers: ['Session date'], rows: cells.map((cell) => [cell]) }, lastMonth);
    expect(now('2026-11-04', '2026-11-23')).toEqual([{ ...lastMonth[0], dateFormat: 'iso' }]);
    // Either way of reading is possible, so that of last month counts.
    expect(now('04/11/2026', '05/11/2026')).toEqual(lastMonth);
    expect(now('soon')).toEqual(lastMonth);
  });

  it('use what was chosen last month first, and each thing once', () => {
    const file = { headers: ['Steps', 'All steps', 'Steps', 'What'], rows: [] };
    const lastMonth = [
      { header: 'All steps', as: 'value', variable: 'steps_total' },
      { header: 'Gone', as: 'value', variable: 'rest_min' },
      { header: 'What', as: 'left-out' },
    ] as const;
    expect(matchColumns('sessions', file, lastMonth)).toEqual([lastMonth[0], lastMonth[2]]);
  });
});

describe('a column without a cell', () => {
  it('is matched to a day when its header speaks of a date, without a question about how it is written', () => {
    expect(matched('consents', { 'Signing date': ['2026-01-05'], 'Valid until date': [''] })).toContainEqual({
      header: 'Valid until date',
      as: 'study-day',
      variable: 'valid_until_day',
    });
  });

  it('that was taken for days of the registry is one of dates once it holds dates', () => {
    const lastMonth = [{ header: 'valid_until_day', as: 'value', variable: 'valid_until_day' }] as const;
    expect(matchColumns('consents', { headers: ['valid_until_day'], rows: [['31/12/2027']] }, lastMonth)).toEqual([
      { header: 'valid_until_day', as: 'study-day', variable: 'valid_until_day', dateFormat: 'day/month/year' },
    ]);
  });
});
