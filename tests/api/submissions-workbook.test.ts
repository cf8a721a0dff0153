/** Workbooks: the template out, the filled one in, findings in its cells; hostile ones refused. */
import { parse } from 'csv-parse/sync';
import { unzipSync } from 'fflate';
import type supertest from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Submission } from '../../packages/contract/src/index.ts';
import { tableOf, type Row, type TableKey } from '../../packages/dictionary/src/index.ts';
import { FindingLog, readWorkbook } from '../../packages/submission-files/src/index.ts';
import { makeWorkbook, type DraftCell, type WorkbookDraft } from '../../packages/submission-files/src/test-support/make-workbook.ts';
import { makeZip } from '../../packages/submission-files/src/test-support/make-zip.ts';
import { checkSubmission } from '../../services/api/src/features/submissions/check-submission.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { csvOf, participantCode, rowOf } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { submitMonth, uploadMonth, type MonthRows } from '../support/submit-month.ts';

let server: TestServer;
let site: TestSite;
let coordinator: TestPerson;
let therapist: TestPerson;
let steward: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
});
beforeEach(async () => {
  site = await makeSite(server);
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
  therapist = await makePerson(server, { grants: [{ role: 'therapist', site }] });
  steward = await makePerson(server, { grants: [{ role: 'steward' }] });
});
afterAll(() => server.close());

const anna = participantCode(1);
const codeOf = (body: { type?: string }): string => (body.type ?? '').replace('/problems/', '');

const month: MonthRows = {
  participants: [rowOf('participants', { participant: anna })],
  consents: [rowOf('consents', { participant: anna })],
  sessions: [rowOf('sessions', { participant: anna, upright_min: 30, steps_total: null, distance_total_m: null })],
  bouts: [1, 2].map((bout) => rowOf('bouts', { participant: anna, bout_no: bout })),
};

/** Keys as the header, then the rows. */
function sheetOf(table: TableKey, rows: readonly Row[]): { name: string; rows: DraftCell[][] } {
  const keys = tableOf(table).variables.map(({ key }) => key);
  return { name: tableOf(table).name, rows: [keys, ...rows.map((row) => keys.map((key) => row[key] ?? null))] };
}
const workbookOf = (rows: MonthRows, more: Omit<WorkbookDraft, 'sheets'> = {}): Uint8Array =>
  makeWorkbook({ sheets: Object.entries(rows).map(([table, of]) => sheetOf(table as TableKey, of)), ...more });

async function open(): Promise<string> {
  return (await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-01' }).expect(201)).body.id;
}
const put = (id: string, bytes: Uint8Array, fileName = 'month.xlsx'): supertest.Test =>
  coordinator.upload(`/api/submissions/${id}/workbook?fileName=${encodeURIComponent(fileName)}`, Buffer.from(bytes));
async function check(id: string): Promise<Submission> {
  await coordinator.post(`/api/submissions/${id}/check`).expect(202);
  await checkSubmission(server.context, id);
  return (await coordinator.get(`/api/submissions/${id}`).expect(200)).body;
}
const contentOf = async (id: string): Promise<Buffer | null> =>
  (await server.database.owner.query("select content from submission_files where submission_id = $1 and table_key = 'workbook'", [id]))
    .rows[0]?.content ?? null;
const download = (who: TestPerson, path: string): supertest.Test =>
  who
    .get(path)
    .buffer(true)
    .parse((answer, done) => {
      const pieces: Buffer[] = [];
      answer.on('data', (piece: Buffer) => pieces.push(piece));
      answer.on('end', () => done(null, Buffer.concat(pieces)));
    });

describe('a workbook', () => {
  it('comes in like files of its tables, and is named in the receipt', async () => {
    const id = await open();
    const added = (await put(id, workbookOf(month), 'training data 2026-01.xlsx').expect(200)).body as Submission;
    expect(added.files).toMatchObject([{ table: null, tables: null, rows: null, fileName: 'training data 2026-01.xlsx', refused: false }]);
    const checked = await check(id);
    expect(checked.findings.filter(({ severity }) => severity === 'error')).toEqual([]);
    expect(checked.files).toMatchObject([{ table: null, tables: ['participants', 'consents', 'sessions', 'bouts'], rows: 5 }]);
    expect(checked.preview?.tables.map(({ table, added: rows }) => [table, rows])).toEqual([
      ['participants', 1],
      ['consents', 1],
      ['sessions', 1],
      ['bouts', 2],
    ]);
    const listed = await coordinator.get(`/api/submissions/${id}/changes?table=bouts&kind=added`).expect(200);
    expect(listed.body.items.map(({ line }: { line: number }) => line)).toEqual([2, 3]);
    for (const { rule } of checked.findings)
      await coordinator.post(`/api/submissions/${id}/acknowledgements`, { rule, reason: 'as in the record' });
    const receipt = await coordinator.post(`/api/submissions/${id}/commit`, { previewDigest: checked.preview?.digest }).expect(200);
    expect(receipt.body.files).toMatchObject([{ table: null, rows: 5, mended: 0 }]);
    expect(await contentOf(id)).toBeNull();
  });

  it('changes nothing of a table whose sheet has no row', async () => {
    await submitMonth(server, coordinator, site, '2026-01', month);
    const id = await open();
    await put(id, workbookOf({ sessions: month.sessions ?? [], bouts: [] })).expect(200);
    const checked = await check(id);
    expect(checked.files[0]?.tables).toEqual(['sessions']);
    expect(checked.preview?.tables.map(({ table, unchanged, removed }) => [table, unchanged, removed])).toEqual([['sessions', 1, 0]]);
  });

  it('is told when it has nothing below its headers', async () => {
    const id = await open();
    await put(id, workbookOf({ sessions: [], bouts: [] })).expect(200);
    const checked = await check(id);
    expect(checked.findings.map(({ rule }) => rule)).toEqual(['F05']);
    expect(checked.files).toMatchObject([{ refused: false, tables: [] }]);
    expect(checked.preview).toBeNull();
  });

  it('and a file do not both count for one table', async () => {
    const id = await open();
    await put(id, workbookOf(month)).expect(200);
    await coordinator.upload(`/api/submissions/${id}/files/bouts?fileName=bouts.csv`, csvOf('bouts', month.bouts ?? [])).expect(200);
    const checked = await check(id);
    expect(checked.findings.find(({ rule }) => rule === 'F53')).toMatchObject({ count: 1, severity: 'error' });
    await coordinator.delete(`/api/submissions/${id}/files/bouts`).expect(200);
    expect((await check(id)).findings.filter(({ severity }) => severity === 'error')).toEqual([]);
    const without = await coordinator.delete(`/api/submissions/${id}/workbook`).expect(200);
    expect(without.body.files).toEqual([]);
  });

  it('is kept without author, folder, comments, images and sheets that are no tables', async () => {
    const id = await open();
    const bytes = workbookOf(month, {
      workbookProperties: '<fileSharing userName="Jane Roe"/>',
      sharedStrings: '<si><t>Jane Roe</t></si>',
      more: [
        { name: 'docProps/core.xml', content: '<creator>Jane Roe</creator>' },
        { name: 'xl/comments1.xml', content: '<comment>Jane Roe</comment>' },
        { name: 'xl/media/image1.png', content: Uint8Array.of(0x89, 0x50, 0x4e, 0x47) },
      ],
    });
    await put(id, bytes).expect(200);
    const kept = unzipSync((await contentOf(id)) ?? expect.fail('nothing was kept'));
    expect(Object.keys(kept).filter((name) => /docProps|comments|media/.test(name))).toEqual([]);
    expect(Buffer.concat(Object.values(kept)).toString('utf8')).not.toContain('Jane Roe');
  });

  it('that identifies somebody is deleted, and so is one with a sheet that nobody declared', async () => {
    const id = await open();
    await put(id, workbookOf({ ...month, sessions: [rowOf('sessions', { participant: anna, status: 'ask Mrs Jones' })] })).expect(200);
    const refused = await check(id);
    expect(refused.findings.map(({ rule }) => rule)).toContain('F50');
    expect(refused.files).toMatchObject([{ table: null, refused: true }]);
    expect(await contentOf(id)).toBeNull();
    expect((await check(id)).findings.map(({ rule }) => rule)).toEqual(['F52']);

    await put(id, makeWorkbook({ sheets: [sheetOf('bouts', month.bouts ?? []), { name: 'Jane Roe', rows: [['1961']] }] })).expect(200);
    const undeclared = await check(id);
    expect(undeclared.findings.map(({ rule }) => rule)).toContain('F42');
    expect(undeclared.files).toMatchObject([{ refused: true }]);
    const found = await coordinator.get(`/api/submissions/${id}/findings?rule=F42`).expect(200);
    expect(found.body.items).toMatchObject([
      { table: null, line: null, found: 'The sheet in position 2 of the workbook is none of the tables.' },
    ]);
  });
});

describe('a hostile workbook', () => {
  const good = () => workbookOf(month);
  const compound = Uint8Array.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, ...Buffer.from('EncryptedPackage', 'utf16le')]);

  const growing =
    '<!DOCTYPE lolz [<!ENTITY a "lol"><!ENTITY b "&a;&a;&a;">]><worksheet><sheetData><row r="1"><c r="A1" t="str"><v>&b;</v></c></row></sheetData></worksheet>';

  it.each([
    ['with a password', () => compound, 'The workbook is protected by a password.'],
    [
      'with macros',
      () => workbookOf(month, { more: [{ name: 'xl/vbaProject.bin', content: 'x' }] }),
      'The workbook holds macros or is of a kind that may.',
    ],
    [
      'that is a bomb',
      () => workbookOf(month, { more: [{ name: 'xl/media/a.bin', content: ' '.repeat(3_000_000) }] }),
      'A part of the workbook unpacks to more than 200 times its size.',
    ],
    ['that is cut off', () => good().subarray(0, 2_000), 'The workbook is damaged. It ends too early.'],
    [
      'that leads out of itself',
      () => workbookOf(month, { more: [{ name: '../../evil.xml', content: 'x' }] }),
      'The workbook is damaged. It has a part whose name leads out of the workbook.',
    ],
    [
      'with a link in place of a part',
      () => workbookOf(month, { more: [{ name: 'xl/link', content: '/etc/passwd', claims: { mode: 0o120777 } }] }),
      'The workbook is damaged. It has a part whose name leads out of the workbook.',
    ],
    ['with entities that grow', () => makeWorkbook({ sheets: [{ name: 'bouts', xml: growing }] }), 'The workbook is damaged.'],
    [
      'with more columns than there are',
      () => makeWorkbook({ sheets: [{ name: 'bouts', rows: [[{ xml: '<c r="XFD1"><v>1</v></c>' }]] }] }),
      'A row has a cell behind column 500.',
    ],
    ['that is an image', () => Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a), 'The file is an image, not a workbook in XLSX form.'],
    ['that is CSV', () => Buffer.from('participant\r\n'), 'The file is text or of an unknown kind, not a workbook in XLSX form.'],
    [
      'that is an archive of something else',
      () => makeZip([{ name: 'scan.png', content: 'x' }]),
      'The file is a zip archive that holds no workbook.',
    ],
  ])('%s is refused at once, with what it is, and nothing of it is kept', async (_, bytes, found) => {
    const id = await open();
    const refused = await put(id, bytes());
    expect([refused.status, codeOf(refused.body)]).toEqual([422, 'file-unreadable']);
    expect(refused.body.detail).toContain(found);
    expect(refused.body.detail).toContain('Nothing was kept.');
    expect(await contentOf(id)).toBeNull();
  });

  it('is refused with the row of the sheet that it cannot be read in', async () => {
    const id = await open();
    const xml =
      '<worksheet><sheetData><row r="1"><c r="A1" t="str"><v>bout_no</v></c></row><row r="7"><c r="A7" t="x"/></row></sheetData></worksheet>';
    const refused = await put(id, makeWorkbook({ sheets: [{ name: 'bouts', xml }] }));
    expect([refused.status, codeOf(refused.body)]).toEqual([422, 'file-unreadable']);
    expect(refused.body.detail).toContain('That is in row 7 of a sheet.');
  });

  it('beyond the limit of bytes is refused by what arrives', async () => {
    const small = await startTestServer({ UPLOAD_LIMIT_BYTES: '2000' }, server.database);
    const id = await open();
    const answer = await fetch(`${small.url}/api/submissions/${id}/workbook?fileName=a.xlsx`, {
      method: 'PUT',
      headers: { 'X-Cairnstep-Request': '1', Cookie: coordinator.cookie },
      body: Buffer.from(good()),
    });
    await small.close();
    expect(answer.status).toBe(413);
  });
});

describe('the template', () => {
  it('is a workbook for the month with the codes of the site, which comes back as it was sent', async () => {
    await submitMonth(server, coordinator, site, '2025-12', month);
    const answer = await download(coordinator, `/api/sites/${site.id}/template?month=2026-01`).expect(200);
    expect(answer.headers['content-type']).toBe('application/vnd.openxmlformats-officedocument.spreadsheetml.sheet');
    expect(answer.headers['content-disposition']).toBe(`attachment; filename="${site.code}-2026-01.xlsx"`);
    const text = Object.values(unzipSync(answer.body))
      .map((part) => Buffer.from(part).toString('utf8'))
      .join('\n');
    for (const expected of [site.name, '2026-01', anna]) expect(text).toContain(expected);
    const log = new FindingLog();
    expect(Object.values(await readWorkbook(answer.body, log)).map(({ length }) => length)).toEqual([0, 0, 0, 0, 0, 0, 0]);
    expect(log.byRule()).toEqual([]);
    const id = await open();
    await put(id, answer.body).expect(200);
    expect((await check(id)).findings.map(({ rule }) => rule)).toEqual(['F05']);
  });

  it('and the codes are for those who see the rows of the site', async () => {
    await submitMonth(server, coordinator, site, '2025-12', month);
    const elsewhere = await makePerson(server, { grants: [{ role: 'coordinator', site: await makeSite(server) }] });
    for (const who of [coordinator, therapist, steward])
      expect((await who.get(`/api/sites/${site.id}/participant-codes`).expect(200)).body).toEqual({ codes: [anna] });
    await elsewhere.get(`/api/sites/${site.id}/participant-codes`).expect(404);
    await elsewhere.get(`/api/sites/${site.id}/template?month=2026-01`).expect(404);
  });
});

describe('findings to take along', () => {
  const wrong: MonthRows = { ...month, bouts: [1, 2].map((bout) => rowOf('bouts', { participant: anna, bout_no: bout, hr_end: 900 })) };

  it('are one line each in CSV, harmless in a spreadsheet', async () => {
    const bouts = csvOf('bouts', wrong.bouts ?? []).split('\r\n');
    const bytes = [
      `${bouts[0]},=1+1`,
      ...bouts
        .slice(1)
        .filter(Boolean)
        .map((line) => `${line},x`),
    ].join('\r\n');
    const checked = await uploadMonth(server, coordinator, site, '2026-01', { bouts: bytes });
    const answer = await coordinator.get(`/api/submissions/${checked.id}/findings.csv`).expect(200);
    expect(answer.headers['content-disposition']).toBe(`attachment; filename="${site.code}-2026-01-findings.csv"`);
    const lines = parse(answer.text, { columns: true, bom: true }) as Record<string, string>[];
    expect(lines).toHaveLength(checked.findings.reduce((sum, { count }) => sum + count, 0));
    const [first] = lines.filter(({ Rule }) => Rule === 'F21');
    expect(first).toMatchObject({ Severity: 'error', Table: 'Bouts', Line: '2', Column: 'hr_end' });
    expect(first?.Why).not.toBe('');
    expect(lines.flatMap((line) => Object.values(line)).filter((cell) => /^[=+@-]/.test(cell))).toEqual([]);
    expect(answer.text).not.toContain('900');
  });

  it('stand in the cells of the files for those who sent them, and on a list for others', async () => {
    const id = await open();
    await put(id, workbookOf({ sessions: month.sessions ?? [], participants: month.participants ?? [] })).expect(200);
    for (const table of ['bouts', 'consents'] as const)
      await coordinator.upload(`/api/submissions/${id}/files/${table}?fileName=${table}.csv`, csvOf(table, wrong[table] ?? [])).expect(200);
    await check(id);
    const path = `/api/submissions/${id}/findings.xlsx`;
    const mine = await download(coordinator, path).expect(200);
    const tables = await readWorkbook(mine.body, new FindingLog());
    expect(tables.bouts?.column('hr_end').number(1)).toBe(900);
    expect([tables.sessions?.length, tables.consents?.length]).toEqual([1, 1]);
    const parts = Object.entries(unzipSync(mine.body));
    expect(
      parts
        .filter(([name]) => name.includes('comments'))
        .map(([, part]) => Buffer.from(part).toString('utf8'))
        .join(''),
    ).toContain('F21');
    for (const who of [steward, therapist]) {
      const theirs = await download(who, path).expect(200);
      expect(Object.keys(unzipSync(theirs.body)).filter((name) => name.startsWith('xl/worksheets/sheet'))).toHaveLength(1);
    }
  });
});
