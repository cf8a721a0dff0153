// @vitest-environment node
import { tableKeys } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { makeWorkbook } from '../../../../../packages/submission-files/src/test-support/make-workbook.ts';
import { inProcessWorkroom } from '../in-process-workroom.ts';
import { isCleanCsv } from '../messages.ts';
import { csvFile, passphrase, sampleFiles, sessionsCsv } from '../sample-month.ts';
import type { Circumstances, ColumnPicture, PreparedPicture } from './protocol.ts';

const site: Circumstances = { site: 'S01', month: '2024-04', knownParticipants: [], safeHeaders: [], today: '2026-12-01' };
const newKey = { mode: 'random', idType: 'mrn', stripLeadingZeros: false, passphrase } as const;

async function roomWithKey(circumstances: Circumstances = site) {
  const room = inProcessWorkroom();
  await room.ask('begin', circumstances);
  const { file } = await room.ask('make-key', newKey);
  return { room, file: new Blob([file.text]) };
}

const column = ({ columns }: PreparedPicture, header: string): ColumnPicture => {
  const found = columns.flatMap((table) => table.columns).findLast((each) => each.header === header);
  if (found === undefined) throw new Error(`no column ${header}`);
  return found;
};
const text = (csv: ArrayBuffer | undefined): string => new TextDecoder().decode(csv);

describe('a month in the worker', () => {
  it('goes from files to what is sent, as often as it is asked for', async () => {
    const { room } = await roomWithKey();
    const { sources } = await room.ask('add-files', { files: sampleFiles() });
    expect(sources.map(({ table, delimiter, decimalMark, rows }) => [table, delimiter, decimalMark, rows])).toEqual([
      ['participants', ',', '.', 2],
      ['sessions', ';', ',', 4],
    ]);
    const { prepared } = await room.ask('prepare', null);
    expect(prepared).toMatchObject({ people: 2, newPeople: 2, rowsLeftBehind: 0, agesTopCoded: 1, emptyTables: [], lengthChange: null });
    expect(prepared.rowsInMonth).toEqual({ table: 'sessions', inside: 2, dated: 4 });
    expect(prepared.tables.map(({ table, rows, people }) => [table, rows, people])).toEqual([
      ['participants', 2, 2],
      ['sessions', 4, 2],
    ]);

    const { tables, replacedCodes } = await room.ask('tables-to-send', null);
    expect(replacedCodes).toEqual([]);
    expect(tables.every(({ csv }) => isCleanCsv(csv))).toBe(true);
    const sessions = text(tables[1]?.csv).split('\r\n');
    expect(sessions[0]).toBe('participant,session_day,session_no,course_no,status,device_class,distance_total_m');
    // Counted by hand from 28 March 2024 and 2 April 2024, the first days of training.
    expect(sessions.slice(1, 5).map((line) => line.slice(23))).toEqual([
      '-2,1,1,cancelled_before,manual_bwstt,',
      '0,1,1,completed,manual_bwstt,120',
      '4,1,1,,manual_bwstt,200',
      '0,1,1,shortened,manual_bwstt,50',
    ]);
    expect(prepared.tables[1]?.firstRows.map((row) => row.join(','))).toEqual(sessions.slice(1, 5));
    const again = await room.ask('tables-to-send', null);
    expect(again.tables.map(({ csv }) => text(csv))).toEqual(tables.map(({ csv }) => text(csv)));
  });

  it('tells the digest of the very bytes that are sent', async () => {
    const { room } = await roomWithKey();
    await room.ask('add-files', { files: sampleFiles() });
    const { prepared } = await room.ask('prepare', null);
    const { tables } = await room.ask('tables-to-send', null);
    for (const [at, { csv }] of tables.entries()) {
      const digest = Buffer.from(await crypto.subtle.digest('SHA-256', csv)).toString('hex');
      expect(prepared.tables[at]).toMatchObject({ digest, bytes: csv.byteLength });
    }
  });

  it('wants the key saved, remembers columns and people in it, and goes on from it next month', async () => {
    const { room } = await roomWithKey();
    await room.ask('add-files', { files: sampleFiles() });
    const first = await room.ask('prepare', null);
    expect(first.picture.key).toMatchObject({ isUnsaved: true, people: 2, revision: 1 });
    expect(first.picture.key?.changes).toMatchObject({ newPeople: 2, columns: ['participants', 'sessions'], hasOtherCodes: false });
    expect(column(first.prepared, 'Status').isNew).toBe(true);
    const [, sent] = (await room.ask('tables-to-send', null)).tables;
    const { file, picture } = await room.ask('save-key', null);
    expect(file.name).toMatch(/^S01-site-key-r2-2026-12-01-[0-9a-f]{4}\.json$/);
    expect(picture.key).toMatchObject({ isUnsaved: false, revision: 2, peopleWithFirstDay: 2 });
    expect(text((await room.ask('tables-to-send', null)).tables[1]?.csv)).toBe(text(sent?.csv));

    const next = inProcessWorkroom();
    await next.ask('begin', { ...site, knownParticipants: [...new Set(text(sent?.csv).match(/^S\w{21}/gm))] });
    expect((await next.ask('open-key', { file: new Blob([file.text]), passphrase })).key).toMatchObject({ lacking: null });
    await next.ask('add-files', { files: [csvFile('sessions.csv', sessionsCsv)] });
    const { prepared, picture: later } = await next.ask('prepare', null);
    expect(prepared).toMatchObject({ newPeople: 0, lengthChange: { ids: 2, newLengths: 0 } });
    expect(prepared.columns[0]?.columns.some(({ isNew }) => isNew)).toBe(false);
    expect(later.key).toMatchObject({ isUnsaved: false, changes: null });
    expect(text((await next.ask('tables-to-send', null)).tables[0]?.csv)).toBe(text(sent?.csv));
  });

  it('tells without the registry whom the opened key file did not know, also after it was saved', async () => {
    const { room, file } = await roomWithKey({ ...site, knownParticipants: null });
    await room.ask('add-files', { files: sampleFiles() });
    const newPeople = { people: 2, newPeople: 2, newToKey: 2 };
    expect((await room.ask('prepare', null)).prepared).toMatchObject(newPeople);
    const saved = await room.ask('save-key', null);
    expect((await room.ask('prepare', null)).prepared).toMatchObject(newPeople);
    await room.ask('rotate-key', { recordNumbers: ['0048-2913'] });
    expect((await room.ask('prepare', null)).prepared).toMatchObject(newPeople);

    await room.ask('open-key', { file: new Blob([saved.file.text]), passphrase });
    expect((await room.ask('prepare', null)).prepared).toMatchObject({ people: 2, newToKey: 0 });
    await room.ask('open-key', { file, passphrase });
    expect((await room.ask('prepare', null)).prepared).toMatchObject(newPeople);
  });

  it('takes words, units and meanings of columns as they are chosen', async () => {
    const { room } = await roomWithKey();
    const { sources } = await room.ask('add-files', { files: [csvFile('sessions.csv', sessionsCsv)] });
    const source = sources[0]?.id ?? 0;
    const { prepared } = await room.ask('prepare', null);
    expect(prepared.problems).toMatchObject([{ kind: 'unreadable-cell', header: 'Status', lines: [4], count: 1 }]);
    expect(column(prepared, 'Status').unknownWords).toEqual(['all done']);
    expect(column(prepared, 'Therapist').match).toEqual({ header: 'Therapist', as: 'left-out' });

    await room.ask('match-column', {
      source,
      match: { header: 'Status', as: 'value', variable: 'status', codes: { 'all done': 'completed' } },
    });
    await room.ask('match-column', { source, match: { header: 'device', as: 'left-out' } });
    const changed = await room.ask('prepare', null);
    expect(changed.prepared.problems).toEqual([]);
    const status = changed.prepared.tables[0]?.words.find((each) => each.column === 'status');
    expect(status?.values.find(({ value }) => value === 'completed')?.count).toBe(2);
    expect(changed.prepared.tables[0]?.headers).not.toContain('device_class');
  });

  it('tells words that nobody understands also where their rows stay behind', async () => {
    const { room } = await roomWithKey();
    const file = csvFile('sessions.csv', 'MRN,Session date,Status\r\n0042,2026-03-01,done\r\n0042,2026-03-03,done\r\n');
    await room.ask('add-files', { files: [file] });
    const { prepared } = await room.ask('prepare', null);
    expect(prepared).toMatchObject({ rowsLeftBehind: 2, problems: [{ kind: 'index-date-unknown' }] });
    expect(column(prepared, 'Status').unknownWords).toEqual(['done']);
  });

  it('counts from a first training day that is stated for a place in the file', async () => {
    const { room } = await roomWithKey();
    const assessments = csvFile(
      'assessments.csv',
      'MRN,Assessed on,Note\r\n0042,2026-03-01,x\r\n0042,2026-03-29,x\r\n0043,2026-03-02,x\r\n',
    );
    const { sources } = await room.ask('add-files', { files: [assessments] });
    const match = { header: 'Assessed on', as: 'study-day', variable: 'assessment_day' } as const;
    await room.ask('match-column', { source: sources[0]?.id ?? 0, match });
    const before = await room.ask('prepare', null);
    expect(before.prepared.firstDays).toEqual([
      { table: 'assessments', line: 2, stated: null },
      { table: 'assessments', line: 4, stated: null },
    ]);
    expect(before.prepared.emptyTables).toEqual(['assessments']);

    await room.ask('state-first-day', { table: 'assessments', line: 3, date: '2026-03-28' });
    const { prepared } = await room.ask('prepare', null);
    const day = prepared.tables[0]?.headers.indexOf('assessment_day') ?? -1;
    expect(prepared.tables[0]?.firstRows.map((row) => row[day])).toEqual(['-27', '1']);
    expect(prepared.firstDays).toEqual([
      { table: 'assessments', line: 3, stated: '2026-03-28' },
      { table: 'assessments', line: 4, stated: null },
    ]);
    await room.ask('state-first-day', { table: 'assessments', line: 2, date: null });
    expect((await room.ask('prepare', null)).prepared.tables).toEqual([]);
    await expect(room.ask('state-first-day', { table: 'assessments', line: 99, date: '2026-03-28' })).rejects.toMatchObject({
      code: 'no-such-place',
    });
    await expect(room.ask('state-first-day', { table: 'assessments', line: 2, date: '2026-02-30' })).rejects.toMatchObject({
      code: 'no-such-place',
    });
  });

  it('gives nobody the example row of a template for a person', async () => {
    const { room } = await roomWithKey();
    const file = csvFile('participants.csv', 'Participant code,Sex\r\nEXAMPLE,female\r\n0042,male\r\n');
    await room.ask('add-files', { files: [file] });
    const { prepared } = await room.ask('prepare', null);
    expect(prepared).toMatchObject({ people: 1, rowsLeftBehind: 0 });
  });

  it('tells the page nothing of record numbers and dates beyond the example cells', async () => {
    const { room } = await roomWithKey();
    const rows = Array.from({ length: 30 }, (_, at) => `00${730_000 + at * 137},${String(at + 1).padStart(2, '0')}/05/2025,1,1,completed`);
    const file = csvFile('sessions.csv', ['MRN,Session date,Session,course,Status', ...rows, ''].join('\r\n'));
    await room.ask('add-files', { files: [file] });
    await room.ask('prepare', null);
    await room.ask('save-key', null);
    const told = JSON.stringify(room.told);
    expect(rows.filter((row) => told.includes(row.slice(0, 8)))).toHaveLength(3);
    expect(rows.filter((row) => told.includes(row.slice(9, 19)))).toHaveLength(3);
    expect(told).not.toMatch(/2025-05-\d\d/);
  });
});

describe('files', () => {
  it('are recognised by sheet name, file name and columns, and told apart from sheets that are none of the month', async () => {
    const { room } = await roomWithKey();
    const workbook = makeWorkbook({
      sheets: [
        {
          name: 'Training log',
          rows: [['November'], ['MRN', 'Session date', 'Session', 'course', 'Status'], ['0042', '2026-03-01', 1, 1, 'completed']],
        },
        {
          name: 'Adverse events',
          rows: [
            ['MRN', 'x'],
            ['0042', 'y'],
          ],
        },
        {
          name: 'Rota',
          rows: [
            ['Monday', 'Tuesday'],
            ['early', 'late'],
          ],
        },
      ],
    });
    const { sources, refused } = await room.ask('add-files', { files: [new File([workbook as Uint8Array<ArrayBuffer>], 'November.xlsx')] });
    expect(refused).toEqual([]);
    expect(sources.map(({ sheet, table }) => [sheet, table])).toEqual([
      ['Training log', 'sessions'],
      ['Adverse events', 'adverse_events'],
      ['Rota', null],
    ]);
    expect(sources[0]?.notes).toEqual(['Rows above the names of the columns, which were passed over: 1.']);
    const { prepared } = await room.ask('prepare', null);
    expect(prepared.columns.map(({ table }) => table)).toEqual(['sessions', 'adverse_events']);
  });

  it('take the place of their namesakes, change their table and separator, and are left out', async () => {
    const { room } = await roomWithKey();
    const ambiguous = csvFile('sessions.csv', 'MRN;Session date,x\r\n1;2026-03-01,5\r\n');
    const first = await room.ask('add-files', { files: [ambiguous, csvFile('sessions.csv', 'MRN;Session date,x\r\n1;2026-03-01,5\r\n')] });
    expect(first.sources).toHaveLength(1);
    const id = first.sources[0]?.id ?? 0;
    expect(first.sources[0]).toMatchObject({ delimiter: ',', fittingDelimiters: [',', ';'], table: 'sessions' });
    const changed = await room.ask('change-source', { id, delimiter: ';', decimalMark: ',', table: 'bouts' });
    expect(changed.sources[0]).toMatchObject({ delimiter: ';', decimalMark: ',', table: 'bouts' });
    expect((await room.ask('prepare', null)).prepared.columns[0]?.columns.map(({ header }) => header)).toEqual(['MRN', 'Session date,x']);
    expect((await room.ask('leave-out', { id })).sources).toEqual([]);
    await expect(room.ask('change-source', { id, table: 'bouts' })).rejects.toMatchObject({ code: 'no-such-place' });
  });

  it('are refused with what was found and what mends it, and the others are read', async () => {
    const { room } = await roomWithKey();
    const { sources, refused } = await room.ask('add-files', {
      files: [
        csvFile('sessions.csv', sessionsCsv),
        csvFile('bouts.csv', 'a,b\r\n1,"open'),
        new File([Uint8Array.of(0x50, 0x4b, 3, 4)], 'November.xlsx'),
      ],
    });
    expect(sources.map(({ table }) => table)).toEqual(['sessions']);
    expect(refused.map(({ fileName, line }) => [fileName, line])).toEqual([
      ['bouts.csv', 2],
      ['November.xlsx', null],
    ]);
    for (const { found, mend } of refused) expect(`${found}${mend}`).not.toContain('open"');
  });

  it('that changed on the disk since they were chosen are to be chosen again', async () => {
    const { room } = await roomWithKey();
    class ChangedFile extends File {
      override stream(): never {
        throw new DOMException('changed', 'NotReadableError');
      }
    }
    const { refused } = await room.ask('add-files', { files: [new ChangedFile(['a'], 'sessions.csv')] });
    expect(refused).toMatchObject([{ fileName: 'sessions.csv', mend: 'Choose the file again.' }]);
  });

  it('of one table cannot be two', async () => {
    const { room } = await roomWithKey();
    await room.ask('add-files', { files: [csvFile('sessions.csv', sessionsCsv), csvFile('sessions 2.csv', sessionsCsv)] });
    await expect(room.ask('prepare', null)).rejects.toThrow('Two files are for the same table');
  });
});

describe('the key in the worker', () => {
  it('that is opened in the place of another brings its own memory of the columns', async () => {
    const { room: first } = await roomWithKey();
    const { sources } = await first.ask('add-files', { files: [csvFile('sessions.csv', sessionsCsv)] });
    await first.ask('match-column', { source: sources[0]?.id ?? 0, match: { header: 'device', as: 'left-out' } });
    await first.ask('prepare', null);
    const { file } = await first.ask('save-key', null);
    const { room } = await roomWithKey();
    await room.ask('add-files', { files: [csvFile('sessions.csv', sessionsCsv)] });
    await room.ask('open-key', { file: new Blob([file.text]), passphrase });
    const { prepared } = await room.ask('prepare', null);
    expect(column(prepared, 'device')).toMatchObject({ match: { as: 'left-out' }, isNew: false });
  });

  it('is not opened where something is wrong with the file, and says what', async () => {
    const { room, file } = await roomWithKey();
    const written = await file.text();
    const opening = (changed: string, words = passphrase) => room.ask('open-key', { file: new Blob([changed]), passphrase: words });
    await expect(opening(written, 'bafo rina tuke sobi malu pegu')).rejects.toMatchObject({ code: 'cannot-be-opened' });
    await expect(opening('MRN,Name')).rejects.toMatchObject({ code: 'not-a-key-file' });
    await expect(opening(written.replace('"S01"', '"S02"'))).rejects.toMatchObject({ code: 'other-site' });
    await expect(opening(written.replace('"2026-12"', '"2026-11"'))).rejects.toMatchObject({ code: 'cannot-be-opened' });
    await expect(opening(written.replace('1000000', '1000'))).rejects.toMatchObject({ code: 'too-few-iterations' });
    await expect(opening(written.replace('1000000', '1000000000'))).rejects.toMatchObject({ code: 'too-many-iterations' });
    expect((await opening(written)).key).toMatchObject({ revision: 1 });
  });

  it('is opened by its words however they are spaced and capitalised, and saved with them as they are', async () => {
    const { room, file } = await roomWithKey();
    await room.ask('open-key', { file, passphrase: `  ${passphrase.toUpperCase().replaceAll(' ', '  ')} ` });
    const { file: saved } = await room.ask('save-key', null);
    expect((await room.ask('open-key', { file: new Blob([saved.text]), passphrase })).key).toMatchObject({ revision: 2 });
  });

  it('has another name in each copy that was saved', async () => {
    const { room: mine, file } = await roomWithKey();
    const theirs = inProcessWorkroom();
    await theirs.ask('begin', site);
    await theirs.ask('open-key', { file, passphrase });
    const [one, other] = [(await mine.ask('save-key', null)).file, (await theirs.ask('save-key', null)).file];
    expect(one.name).not.toBe(other.name);
    expect(one.name.slice(0, -9)).toBe(other.name.slice(0, -9));
  });

  it('that lacks people of the registry is told to be an older copy', async () => {
    const { room, file } = await roomWithKey();
    await room.ask('add-files', { files: sampleFiles() });
    await room.ask('prepare', null);
    const [participants] = (await room.ask('tables-to-send', null)).tables;
    const knownParticipants = text(participants?.csv).match(/^S\w{21}/gm) ?? [];
    const later = inProcessWorkroom();
    await later.ask('begin', { ...site, knownParticipants });
    expect((await later.ask('open-key', { file, passphrase })).key?.lacking).toEqual({ missing: 2, of: 2 });
  });

  it('becomes one with the copy of a second coordinator, and the registry learns which codes were replaced', async () => {
    const { room: mine, file } = await roomWithKey();
    const theirs = inProcessWorkroom();
    await theirs.ask('begin', site);
    await theirs.ask('open-key', { file, passphrase });
    for (const room of [mine, theirs]) {
      await room.ask('add-files', { files: sampleFiles() });
      await room.ask('prepare', null);
    }
    await mine.ask('save-key', null);
    const { file: copy } = await theirs.ask('save-key', null);
    const merged = await mine.ask('merge-key', { file: new Blob([copy.text]), passphrase });
    expect(merged).toMatchObject({ replaced: 2, firstDaysMoved: [] });
    expect(merged.picture.key).toMatchObject({ isUnsaved: true, people: 2, codesToReplace: 2 });
    expect(await mine.ask('codes-to-replace', null)).toHaveLength(2);
    expect((await mine.ask('codes-replaced', null)).key?.codesToReplace).toBe(0);

    const { file: other } = await (await roomWithKey()).room.ask('save-key', null);
    await expect(mine.ask('merge-key', { file: new Blob([other.text]), passphrase })).rejects.toMatchObject({ code: 'different-keys' });
  });

  it('joins two record numbers of one person, unless nobody is known by the one that stays', async () => {
    const { room } = await roomWithKey();
    await room.ask('add-files', { files: sampleFiles() });
    await room.ask('prepare', null);
    await room.ask('save-key', null);
    await expect(room.ask('join-numbers', { kept: '0048-2913', joined: ' 00482913' })).rejects.toMatchObject({ code: 'same-number' });
    await expect(room.ask('join-numbers', { kept: '777', joined: '00482914' })).rejects.toMatchObject({ code: 'nobody-known' });
    await expect(room.ask('join-numbers', { kept: '00482913', joined: ' - ' })).rejects.toMatchObject({ code: 'nobody-known' });
    const joined = await room.ask('join-numbers', { kept: '00482913', joined: '00482914' });
    expect(joined).toMatchObject({ replaced: 1, firstDayMoved: expect.stringMatching(/^S/) as string });
    expect(joined.picture.key).toMatchObject({ people: 1, codesToReplace: 1, isUnsaved: true });
  });

  it('is rotated: people named are carried over now, the others when they are met', async () => {
    const { room } = await roomWithKey();
    await room.ask('add-files', { files: sampleFiles() });
    await room.ask('prepare', null);
    await room.ask('save-key', null);
    const rotated = await room.ask('rotate-key', { recordNumbers: ['0048-2913', 'nobody'] });
    expect(rotated.carriedOver).toBe(1);
    expect(rotated.picture.key).toMatchObject({ keyId: '2026-12-2', secrets: 2, codesToReplace: 1 });
    const { picture } = await room.ask('prepare', null);
    expect(picture.key?.codesToReplace).toBe(2);
    const { file } = await room.ask('save-key', null);
    const { replacedCodes } = await room.ask('tables-to-send', null);
    expect(new Set(replacedCodes.map(({ from }) => from)).size).toBe(2);

    // The page was closed before the registry was told.
    const later = inProcessWorkroom();
    await later.ask('begin', { ...site, knownParticipants: replacedCodes.map(({ from }) => from) });
    const reopened = await later.ask('open-key', { file: new Blob([file.text]), passphrase });
    expect(reopened.key).toMatchObject({ codesToReplace: 2, lacking: null, isUnsaved: false });
    expect(await later.ask('codes-to-replace', null)).toEqual(replacedCodes);
  });

  it('is asked for before anything that needs it', async () => {
    const room = inProcessWorkroom();
    await expect(room.ask('save-key', null)).rejects.toMatchObject({ code: 'failed' });
    await room.ask('begin', site);
    await expect(room.ask('save-key', null)).rejects.toThrow('Open the key file first.');
    await expect(room.ask('tables-to-send', null)).rejects.toThrow('Look at the preview first.');
  });

  it('stays open when the registry says more of the same site, and is closed for another', async () => {
    const { room } = await roomWithKey();
    expect((await room.ask('begin', { ...site, knownParticipants: ['S00000000000000000000Z'] })).key?.lacking).toEqual({
      missing: 1,
      of: 1,
    });
    expect((await room.ask('begin', { ...site, site: 'S02' })).key).toBeNull();
  });
});

it('knows every table by the name of its file', async () => {
  const { room } = await roomWithKey();
  const files = tableKeys.map((table) => csvFile(`${table}.csv`, 'MRN,x\r\n1,2\r\n'));
  expect((await room.ask('add-files', { files })).sources.map(({ table }) => table)).toEqual(tableKeys);
});
