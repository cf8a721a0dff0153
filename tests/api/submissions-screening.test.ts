/** What identifies a person is found again on the server, whatever the browser did, and nothing of it is kept anywhere. */
import { stringify } from 'csv-stringify/sync';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { cellCases, columnCases, headerCases, type Expected } from '../../packages/deidentification/reference/identifier-cases.ts';
import { identifierWords, type IdentifierClass } from '../../packages/deidentification/src/index.ts';
import { columnLetters } from '../../packages/submission-files/src/index.ts';
import type { Submission } from '../../packages/contract/src/index.ts';
import { tableOf, type TableKey } from '../../packages/dictionary/src/index.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { participantCode, rowOf } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { checkSubmission } from '../../services/api/src/features/submissions/check-submission.ts';
import { askForCheck, filesOf, submitMonth, uploadMonth } from '../support/submit-month.ts';

let server: TestServer;
let site: TestSite;
let coordinator: TestPerson;
let steward: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
  steward = await makePerson(server, { grants: [{ role: 'steward' }] });
});
beforeEach(async () => {
  site = await makeSite(server);
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
});
afterAll(() => server.close());

const anna = participantCode(1);
const codeOf = (body: { type?: string }): string => (body.type ?? '').replace('/problems/', '');

/** Keys that make a row of the table one that can be read. */
const keysOf: Partial<Record<TableKey, readonly (readonly [string, string])[]>> = {
  sessions: [['participant', anna], ['session_day', '0'], ['session_no', '1']],
  bouts: [['participant', anna], ['session_day', '0'], ['session_no', '1']],
  exams: [['participant', anna], ['exam_day', '0']],
}; // prettier-ignore

/** A file of the table's keys with further columns, each with cells from its second line on. */
function fileWith(table: TableKey, columns: readonly { readonly header: string; readonly cells: readonly string[] }[]): string {
  const keys = keysOf[table] ?? [];
  const rows = Math.max(1, ...columns.map(({ cells }) => cells.length));
  return stringify([
    [...keys.map(([key]) => key), ...columns.map(({ header }) => header)],
    ...Array.from({ length: rows }, (_, row) => [...keys.map(([, value]) => value), ...columns.map(({ cells }) => cells[row] ?? '')]),
  ]);
}

interface Listed {
  readonly Rule: string;
  readonly Table: string;
  readonly Line: string;
  readonly Column: string;
  readonly Found: string;
}
async function findingsOf(who: TestPerson, submission: Submission): Promise<Listed[]> {
  const answer = await who.get(`/api/submissions/${submission.id}/findings.csv`).expect(200);
  return parse(answer.text, { columns: true, bom: true }) as Listed[];
}

/** Longer words first: those of one class may end like another's. */
const classes = (Object.keys(identifierWords) as IdentifierClass[]).sort((a, b) => identifierWords[b].length - identifierWords[a].length);
const classIn = ({ Found }: Listed): IdentifierClass =>
  classes.find(
    (name) =>
      Found.includes(`${identifierWords[name]} (`) ||
      Found.includes(`${identifierWords[name]},`) ||
      Found.endsWith(`${identifierWords[name]}.`),
  ) ?? expect.fail(`no class in "${Found}"`);

/** Everything in the database as text, with bytes as text too where they are any. */
async function wholeDatabase(): Promise<string> {
  const { owner } = server.database;
  const { rows: tables } = await owner.query<{ name: string }>(
    "select format('%I.%I', schemaname, tablename) as name from pg_tables where schemaname in ('public', 'pgboss')",
  );
  let all = '';
  for (const { name } of tables) {
    const { rows } = await owner.query<{ text: string }>(`select t::text as text from ${name} t`);
    for (const { text } of rows)
      all += `${text}\n${text.replace(/\\+x([0-9a-f]*)/g, (_, hex: string) => Buffer.from(hex, 'hex').toString('utf8'))}\n`;
  }
  return all;
}

describe('every case of the published list', () => {
  const numbered = (header: string, index: number) => `${header} ${index + 1}`;
  const cells = cellCases.map(({ header, cell, expect: expected }, index) => ({
    header: numbered(header, index),
    cells: [cell],
    expected,
  }));
  const columns = columnCases.map((one, index) => ({ header: numbered(one.header, index), cells: one.cells, expected: one.expect }));
  const headers = headerCases.map(({ header, expect: expected }) => ({ header, cells: [], expected }));

  it('is found by the server with its place and class, the file is not kept, and no value is left in database, log or mail', async () => {
    const id = await askForCheck(coordinator, site, '2026-01', {
      sessions: fileWith('sessions', cells),
      bouts: fileWith('bouts', columns),
      exams: fileWith('exams', headers),
    });
    expect(await wholeDatabase()).toContain('jane.doe@example.org');
    await checkSubmission(server.context, id);
    const checked = (await coordinator.get(`/api/submissions/${id}`).expect(200)).body as Submission;
    expect(checked.preview).toBeNull();
    const findings = (await findingsOf(coordinator, checked)).filter(({ Rule }) => Rule === 'F50' || Rule === 'F51');

    /** What was found in a column: by its header, or by its letters where the header may not be shown. */
    const foundIn = (table: TableKey, header: string, position: number): { readonly what: Expected; readonly of: Listed }[] =>
      findings
        .filter((one) => one.Table === tableOf(table).name && (one.Column === header || one.Column === columnLetters(position)))
        .map((of) => ({ what: `${classIn(of)}:${of.Rule === 'F50' ? 'block' : 'warn'}`, of }));
    const sorted = (all: readonly Expected[]) => [...new Set(all)].sort();
    cells.forEach(({ header, expected }, index) => {
      // A sentence makes its column one of running text, and a header may say something of its own; the cases are about the cell.
      const inCell = foundIn('sessions', header, index + 3).filter(
        ({ what, of }) => !of.Found.startsWith('The header') && what !== 'free_text:warn',
      );
      expect(sorted(inCell.map(({ what }) => what)), header).toEqual(sorted(expected.filter((what) => what !== 'free_text:warn')));
      expect(inCell.every(({ of }) => of.Line === '2' || of.Line === '')).toBe(true);
    });
    columns.forEach(({ header, expected }, index) => {
      expect(sorted(foundIn('bouts', header, index + 3).map(({ what }) => what)), header).toEqual(sorted(expected));
    });
    headers.forEach(({ header, expected }, index) => {
      expect(sorted(foundIn('exams', header, index + 2).map(({ what }) => what)), header).toEqual(sorted(expected));
    });

    expect(checked.files.map(({ table, refused, rows }) => [table, refused, rows])).toEqual([
      ['bouts', true, null],
      ['exams', true, null],
      ['sessions', true, null],
    ]);
    const { rows: kept } = await server.database.owner.query(
      'select 1 from submission_files where submission_id = $1 and content is not null',
      [checked.id],
    );
    expect(kept).toEqual([]);

    // Short numbers such as an age occur elsewhere by chance.
    const planted = [...cells, ...columns]
      .filter(({ expected }) => expected.some((what) => what.endsWith(':block')))
      .flatMap((one) => one.cells)
      .filter((cell) => cell.length >= 6 && !/^\d{1,5}$/.test(cell));
    expect(planted.length).toBeGreaterThanOrEqual(40);
    const everything = `${await wholeDatabase()}\n${server.logLines.join('\n')}`;
    expect(everything).toContain(checked.id);
    expect(planted.filter((value) => everything.includes(value))).toEqual([]);
  });
});

describe('a file that identifies somebody', () => {
  const withName = (): string => fileWith('sessions', [{ header: 'cause of delay', cells: ['wife Maria present at session'] }]);

  it('stays in its place as refused until another is sent or it is taken out', async () => {
    const clean = filesOf({
      participants: [rowOf('participants', { participant: anna })],
      consents: [rowOf('consents', { participant: anna })],
    });
    const refused = await uploadMonth(server, coordinator, site, '2026-01', { ...clean, sessions: withName() });
    expect(refused.files.find(({ table }) => table === 'participants')).toMatchObject({ refused: false, rows: 1 });
    const again = await uploadMonth(server, coordinator, site, '2026-01', {});
    expect(again.findings.map(({ rule, count }) => [rule, count])).toEqual([['F52', 1]]);
    expect(again.preview).toBeNull();
    await coordinator.delete(`/api/submissions/${again.id}/files/sessions`).expect(200);
    const without = await uploadMonth(server, coordinator, site, '2026-01', {});
    expect(without.findings).toEqual([]);
    const sent = await uploadMonth(server, coordinator, site, '2026-01', filesOf({ sessions: [rowOf('sessions', { participant: anna })] }));
    expect(sent.files.find(({ table }) => table === 'sessions')).toMatchObject({ refused: false });
    expect(sent.findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  });

  it('is told in the audit log by its table alone', async () => {
    const refused = await uploadMonth(server, coordinator, site, '2026-01', { sessions: withName() });
    const { rows } = await server.database.owner.query("select event from audit_entries where act = 'submission.checked' and object = $1", [
      refused.id,
    ]);
    expect(JSON.parse(rows[0].event).detail).toMatchObject({ refused: ['sessions'] });
  });

  it('is found in columns of the dictionary too, and beyond the header', async () => {
    const header = 'participant,session_day,session_no,status,hr_rest';
    const rows = [`${anna},0,1,completed,70`, `Mrs Jones,1,1,completed,70`, `${anna},2,1,completed,70,jane.doe@example.org`];
    const checked = await uploadMonth(server, coordinator, site, '2026-01', { sessions: [header, ...rows].join('\r\n') });
    const found = (await findingsOf(coordinator, checked))
      .filter(({ Rule }) => Rule === 'F50')
      .map(({ Line, Column, Found }) => [Line, Column, Found]);
    expect(found).toEqual([
      ['3', 'participant', 'Holds the name of a person (45 CFR 164.514(b)(2)(i), A), in one cell of this column.'],
      ['4', 'F', 'Holds an e-mail address (45 CFR 164.514(b)(2)(i), F), in one cell of this column.'],
    ]);
  });

  it('is one whose header is somebody, which no finding repeats', async () => {
    const full = rowOf('sessions', { participant: anna });
    const keys = Object.keys(full);
    const bytes = stringify([
      [...keys, 'SMITH, John'],
      [...Object.values(full), '1'],
    ]);
    const checked = await uploadMonth(server, coordinator, site, '2026-01', { sessions: bytes });
    const found = (await findingsOf(coordinator, checked)).filter(({ Column }) => Column !== 'participant');
    expect(found.map(({ Rule, Column }) => [Rule, Column])).toEqual([
      ['F06', columnLetters(keys.length)],
      ['F50', columnLetters(keys.length)],
    ]);
    expect(await wholeDatabase()).not.toContain('SMITH');
  });

  it('is named by headers that are cut to a readable length and hold no control marks', async () => {
    const full = rowOf('sessions', { participant: anna });
    const bytes = stringify([
      [...Object.keys(full), `Surname \u202e${'x'.repeat(300)}`],
      [...Object.values(full), '1'],
    ]);
    const checked = await uploadMonth(server, coordinator, site, '2026-01', { sessions: bytes });
    const names = (await findingsOf(coordinator, checked))
      .filter(({ Rule }) => Rule === 'F06' || Rule === 'F50')
      .map(({ Column }) => Column);
    const cut = `Surname  ${'x'.repeat(51)}…`;
    expect(names).toEqual([cut, cut]);
  });

  it.each([
    ['an image called a table', Buffer.concat([Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a]), Buffer.from('Jane Roe 1961')])],
    ['a file without a header', Buffer.from('Jane Roe,1961-05-12\r\nJane Roe,1961-05-12\r\n')],
    ['a file whose quotation mark is never closed', Buffer.from('participant,session_day\r\n"Jane Roe,1\r\n')],
  ])('may be one that nobody could screen to its end: %s is not kept', async (_, bytes) => {
    const checked = await uploadMonth(server, coordinator, site, '2026-01', { sessions: bytes });
    expect(checked.files).toMatchObject([{ table: 'sessions', refused: true }]);
    expect(await wholeDatabase()).not.toContain('Jane Roe');
  });

  it('may say so by its name, which is kept only when it is made of words of the registry', async () => {
    const { body } = await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-01' }).expect(201);
    const put = async (fileName: string): Promise<string> => {
      const query = new URLSearchParams({ fileName }).toString();
      return (await coordinator.upload(`/api/submissions/${body.id}/files/bouts?${query}`, 'participant\r\n').expect(200)).body.files[0]
        .fileName;
    };
    for (const kept of ['bouts.csv', `${site.code}_2026-01_Bouts_v2.csv`, 'training data final (1).csv', 'Adverse-Events.csv'])
      expect(await put(kept)).toBe(kept);
    for (const hidden of [
      'SMITH John.csv',
      'smith_j_bouts.csv',
      'bouts 12-05-61.csv',
      'bouts-19610512.csv',
      '../../etc/bouts.csv',
      '=bouts.csv',
      'bouts\u202ecsv.csv',
    ])
      expect(await put(hidden)).toBe('bouts.csv');
    expect(await wholeDatabase()).not.toMatch(/smith/i);
  });
});

describe('a warning', () => {
  const doubtful = (): string => fileWith('sessions', [{ header: 'treating_therapist', cells: ['B'] }]);

  it('needs a reason, and the log keeps column, class and count of what was let stay', async () => {
    const checked = await uploadMonth(server, coordinator, site, '2026-01', { sessions: doubtful() });
    expect(checked.findings.find(({ rule }) => rule === 'F51')).toMatchObject({ severity: 'warning', count: 1, acknowledgedReason: null });
    expect(checked.files).toMatchObject([{ refused: false }]);
    const path = `/api/submissions/${checked.id}/acknowledgements`;
    const refused = await coordinator.post(path, { rule: 'F51', reason: 'it means Dr Jane Roe, jane.roe@example.org' });
    expect([refused.status, codeOf(refused.body)]).toEqual([422, 'identifies-somebody']);
    const kept = await coordinator.post(path, { rule: 'F51', reason: 'one letter for each team' }).expect(200);
    expect(kept.body.findings.find(({ rule }: { rule: string }) => rule === 'F51').acknowledgedReason).toBe('one letter for each team');
    const { rows } = await server.database.owner.query(
      "select event from audit_entries where act = 'submission.acknowledge' and object = $1",
      [checked.id],
    );
    expect(rows.map(({ event }) => JSON.parse(event).detail)).toEqual([
      {
        rule: 'F51',
        count: 1,
        columns: [{ table: 'sessions', column: 'treating_therapist', found: 'The header announces the name of somebody on the staff.' }],
      },
    ]);
  });
});

describe('a header that is marked as safe', () => {
  const file = (cells: readonly string[] = ['yes', 'no']): string => fileWith('sessions', [{ header: 'mobile', cells }]);
  const rulesOf = async (bytes: string): Promise<string[]> =>
    (await uploadMonth(server, coordinator, site, '2026-01', { sessions: bytes })).findings.map(({ rule }) => rule);
  const path = () => `/api/sites/${site.id}/safe-headers`;

  it('is no longer judged at that site, while its cells are', async () => {
    expect(await rulesOf(file())).toContain('F50');
    const marked = await steward.post(path(), { header: ' mobile ' }).expect(200);
    expect(marked.body.headers).toMatchObject([{ header: 'mobile', markedBy: 'Test person' }]);
    expect(await rulesOf(file())).not.toContain('F50');
    expect(await rulesOf(file(['0161 496 0123']))).toContain('F50');
    expect((await coordinator.get(path()).expect(200)).body).toEqual(marked.body);
    await steward.delete(`${path()}?header=mobile`).expect(200);
    expect(await rulesOf(file())).toContain('F50');
    const { rows } = await server.database.owner.query(
      "select act from audit_entries where act like 'header.%' and object = $1 order by seq",
      [site.id],
    );
    expect(rows.map(({ act }) => act)).toEqual(['header.mark-safe', 'header.unmark-safe']);
  });

  it('is marked by a steward alone, for one site alone, and never when it could be a person itself', async () => {
    expect((await coordinator.post(path(), { header: 'mobile' })).status).toBe(403);
    expect(codeOf((await steward.post(path(), { header: 'SMITH, John' })).body)).toBe('identifies-somebody');
    await steward.post(path(), { header: 'mobile' }).expect(200);
    const elsewhere = await makeSite(server);
    const colleague = await makePerson(server, { grants: [{ role: 'coordinator', site: elsewhere }] });
    const checked = await uploadMonth(server, colleague, elsewhere, '2026-01', { sessions: file() });
    expect(checked.findings.map(({ rule }) => rule)).toContain('F50');
    expect((await colleague.get(path())).status).toBe(404);
  });
});

it('a clean month is not held up', async () => {
  const accepted = await submitMonth(server, coordinator, site, '2026-01', {
    participants: [rowOf('participants', { participant: anna })],
    consents: [rowOf('consents', { participant: anna })],
    exams: [rowOf('exams', { participant: anna })],
  });
  expect(accepted.status).toBe('accepted');
});
