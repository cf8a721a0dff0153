import { exampleRow } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { lookThrough } from './look-through.ts';
import { sampleWorkbook } from './sample-submission.ts';

type Row = Readonly<Record<string, string>>;

const example = (table: TableKey): Row => Object.fromEntries(Object.entries(exampleRow(table)).map(([key, value]) => [key, String(value)]));
const csvOf = (...rows: readonly [Row, ...Row[]]) =>
  [Object.keys(rows[0]), ...rows.map(Object.values)].map((cells) => cells.join(',')).join('\r\n');
const look = (text: string, table: TableKey, safeHeaders: readonly string[] = []) =>
  lookThrough({ file: new File([text], 'november.csv'), table, safeHeaders });

describe('looking through a file before it is sent', () => {
  it('lets a prepared file go', async () => {
    expect(await look(csvOf(example('sessions'), example('sessions')), 'sessions')).toEqual({
      identifies: false,
      isUnread: false,
      stops: [],
      doubts: [],
    });
  });

  it('stops a clinic’s own file by line, column and kind of thing, and repeats nothing of it', async () => {
    const raw = { ...example('participants'), participant: '00417723', surname: 'Rosenquist', 'date of birth': '12/05/1961' };
    const looked = await look(csvOf(raw, raw), 'participants');
    expect(looked.identifies).toBe(true);
    expect(looked.stops.map(({ rule, column }) => `${rule} ${column}`)).toEqual(
      expect.arrayContaining(['F12 participant', 'F50 surname', 'F50 date of birth']),
    );
    expect(looked.stops.find(({ rule }) => rule === 'F12')).toMatchObject({ table: 'participants', line: 2, hasMore: true });
    for (const value of ['00417723', 'Rosenquist', '1961']) expect(JSON.stringify(looked)).not.toContain(value);
  });

  it('stops a file whose participants are not codes of the registry, whatever else is in it', async () => {
    const looked = await look(csvOf({ ...example('bouts'), participant: 'p7' }), 'bouts');
    expect(looked.identifies).toBe(true);
  });

  it('stops what it cannot read to its end', async () => {
    for (const text of ['', 'colour,shape\r\nred,round', `${csvOf(example('sessions'))}\r\n"never closed`]) {
      const looked = await look(text, 'sessions');
      expect(looked.isUnread).toBe(true);
      expect(looked.stops.length).toBeGreaterThan(0);
    }
  });

  it('lets a file go whose doubtful header a steward has marked as safe', async () => {
    const text = csvOf({ ...example('sessions'), 'date of birth': '' });
    expect((await look(text, 'sessions')).identifies).toBe(true);
    expect((await look(text, 'sessions', ['date of birth'])).identifies).toBe(false);
  });

  it('tells what might identify somebody without stopping it', async () => {
    const told = (row: number) => ({
      ...example('sessions'),
      remark: `walked well on the day and came back ${row % 2 ? 'later' : 'sooner'}`,
    });
    const looked = await look(csvOf(told(1), told(2), told(3)), 'sessions');
    expect(looked.identifies).toBe(false);
    expect(looked.doubts).toMatchObject([{ rule: 'F51', table: 'sessions', column: 'remark' }]);
  });

  it('looks into every sheet of a workbook', async () => {
    const template = await sampleWorkbook();
    const lookInto = (file: Blob) => lookThrough({ file: new File([file], 'month.xlsx'), table: 'workbook', safeHeaders: [] });
    expect(await lookInto(template)).toMatchObject({ identifies: false, isUnread: false });
    expect(await lookInto(template.slice(0, -100))).toMatchObject({ isUnread: true });
  });
});
