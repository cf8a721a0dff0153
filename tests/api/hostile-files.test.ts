/**
 * Files that are broken, disguised or made to do harm, sent as a coordinator's page sends files. Each is refused, or becomes findings,
 * and takes nothing with it.
 */
import { createServer, request } from 'node:http';
import type { AddressInfo } from 'node:net';
import { zipSync } from 'fflate';
import supertest from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { watchMemory } from '../../infra/bench/memory.ts';
import type { Submission } from '../../packages/contract/src/index.ts';
import type { TableKey } from '../../packages/dictionary/src/index.ts';
import { isFormulaLike, readCsvText } from '../../packages/submission-files/src/index.ts';
import { makeWorkbook, workbookParts, type WorkbookDraft } from '../../packages/submission-files/src/test-support/make-workbook.ts';
import { makeZip, type ZipDraft } from '../../packages/submission-files/src/test-support/make-zip.ts';
import { makeApp } from '../../services/api/src/app.ts';
import { checkSubmission } from '../../services/api/src/features/submissions/check-submission.ts';
import { serverLimits } from '../../services/api/src/http/server-limits.ts';
import { makeSessionPool } from '../../services/api/src/http/session.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { csvOf, participantCode, rowOf, type Overrides } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { filesOf, submitMonth, uploadMonth, type MonthRows } from '../support/submit-month.ts';

let server: TestServer;
let site: TestSite;
let coordinator: TestPerson;
let colleague: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
});
beforeEach(async () => {
  site = await makeSite(server);
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }], name: 'Coordinator' });
  colleague = await makePerson(server, { grants: [{ role: 'coordinator', site }], name: 'Colleague' });
});
afterAll(() => server.close());

const MB = 1_000_000;
const anna = participantCode(1);
const month = '2026-01';
const codeOf = (body: { type?: string }): string => (body.type ?? '').replace('/problems/', '');
const openMonth = async (): Promise<string> => (await coordinator.post('/api/submissions', { siteId: site.id, month }).expect(201)).body.id;
const placeFor = (id: string, table: TableKey = 'bouts', fileName = 'bouts.csv') =>
  `/api/submissions/${id}/files/${table}?${new URLSearchParams({ fileName })}`;
const errorsOf = (submission: Submission): string[] =>
  submission.findings.filter(({ severity }) => severity === 'error').map(({ rule }) => rule);
const held = async (table: TableKey): Promise<number> =>
  (await server.database.owner.query(`select count(*)::int as n from ${table} where site_id = $1`, [site.id])).rows[0].n;

interface Outcome {
  /** Rules that the file breaks. */
  readonly errors: readonly string[];
  /** Megabytes above what the process held before. */
  readonly memory: number;
}

/** What becomes of one file, sent and checked. */
async function outcomeOf(bytes: Buffer | string): Promise<Outcome> {
  const grown = watchMemory(process.pid);
  const checked = await uploadMonth(server, coordinator, site, month, { bouts: bytes });
  expect(checked.preview).toBeNull();
  expect(await held('bouts')).toBe(0);
  return { errors: errorsOf(checked), memory: grown() };
}

/** Sent in chunks of a megabyte, so that no header announces the length. */
async function sendChunked(
  id: string,
  megabytes: number,
  headers: Readonly<Record<string, string>> = {},
): Promise<{ status: number; code: string; memory: number }> {
  const chunk = Buffer.alloc(MB, 'a');
  async function* chunks() {
    for (let sent = 0; sent < megabytes; sent += 1) yield chunk;
  }
  const grown = watchMemory(process.pid);
  const answer = await fetch(`${server.url}${placeFor(id)}`, {
    method: 'PUT',
    headers: { 'X-Cairnstep-Request': '1', 'Content-Type': 'text/csv', Cookie: coordinator.cookie, ...headers },
    body: chunks() as unknown as BodyInit,
    duplex: 'half',
  } as RequestInit);
  return { status: answer.status, code: codeOf((await answer.json()) as { type?: string }), memory: grown() };
}

describe('threat 32: a large or slow file', () => {
  it('is refused by the bytes that arrive, whatever was announced, and nothing of it is kept', async () => {
    const id = await openMonth();
    const { status, code, memory } = await sendChunked(id, 100);
    expect([status, code]).toEqual([413, 'too-large']);
    // The limit of 50 MB once, and what the network keeps of what follows.
    expect(memory).toBeLessThan(150);
    expect((await coordinator.get(`/api/submissions/${id}`)).body.files).toEqual([]);
  });

  it('of one cell without end is refused while it is read', async () => {
    const { errors, memory } = await outcomeOf(Buffer.alloc(40 * MB, 'a'));
    expect(errors).toEqual(['F03']);
    expect(memory).toBeLessThan(400);
  });

  it.each([
    ['200,000 columns', () => Buffer.from(`${Array.from({ length: 200_000 }, (_, index) => `column_${index}`).join(',')}\n`), 'F03'],
    ['ten million empty lines', () => Buffer.alloc(10 * MB, '\n'), 'F05'],
    ['a quotation mark that is never closed', () => Buffer.from(`${csvOf('bouts', [])}"${'a\n'.repeat(10 * MB)}`), 'F04'],
  ])('of %s is refused early', async (_, make, rule) => {
    const bytes = make();
    const { errors, memory } = await outcomeOf(bytes);
    expect(errors).toEqual([rule]);
    expect(memory).toBeLessThan(250);
  });

  it('that trickles is cut off, and others are served meanwhile', async () => {
    const pool = makeSessionPool(server.config, server.context.log);
    const slow = createServer(
      { ...serverLimits, requestTimeout: 400, headersTimeout: 200, connectionsCheckingInterval: 50 },
      makeApp(server.context, { sessionPool: pool }),
    );
    await new Promise<void>((resolve) => slow.listen(0, '127.0.0.1', resolve));
    const { port } = slow.address() as AddressInfo;
    const id = await openMonth();
    const sending = request({
      port,
      host: '127.0.0.1',
      method: 'PUT',
      path: placeFor(id),
      headers: { 'X-Cairnstep-Request': '1', 'Content-Type': 'text/csv', 'Content-Length': '1000', Cookie: coordinator.cookie },
    });
    const ended = new Promise<number | undefined>((resolve) => {
      sending.on('response', (response) => resolve(response.statusCode));
      sending.on('error', () => resolve(undefined));
    });
    const drop = setInterval(() => sending.write('a'), 20);
    await supertest(`http://127.0.0.1:${port}`).get('/api/public/figures').expect(200);
    // Node answers 408, or cuts the connection where an answer has begun.
    expect([408, 503, undefined]).toContain(await ended);
    clearInterval(drop);
    sending.destroy();
    expect((await coordinator.get(`/api/submissions/${id}`)).body.files).toEqual([]);
    slow.closeAllConnections();
    await new Promise((resolve) => slow.close(resolve));
    await pool.end();
  });
});

/** What becomes of a workbook as it arrives: the answer, and megabytes above what the process held before. */
async function sendWorkbook(bytes: Uint8Array): Promise<{ status: number; detail: string; memory: number }> {
  const id = await openMonth();
  const body = Buffer.from(bytes);
  const grown = watchMemory(process.pid);
  const answer = await coordinator.upload(`/api/submissions/${id}/workbook?fileName=month.xlsx`, body);
  const { status } = answer;
  const memory = grown();
  expect((await coordinator.get(`/api/submissions/${id}`)).body.files).toEqual([]);
  return { status, detail: String(answer.body.detail), memory };
}

const plain: WorkbookDraft = { sheets: [{ name: 'bouts', rows: [['bout_no'], [1]] }] };
const withPart = (...parts: readonly ZipDraft[]): Uint8Array =>
  makeZip([...workbookParts(plain).filter(({ name }) => !parts.some((part) => part.name === name)), ...parts]);
const sheetPart = 'xl/worksheets/sheet1.xml';

describe('threat 33: a workbook that unpacks to far more than it is', () => {
  const blanks = Buffer.alloc(200 * MB, ' ');
  const laughs = Array.from({ length: 9 }, (_, level) => `<!ENTITY l${level + 1} "${`&l${level};`.repeat(10)}">`).join('');
  it.each([
    ['a sheet of 200 MB of blanks', () => withPart({ name: sheetPart, content: blanks })],
    ['the same, saying it were small', () => withPart({ name: sheetPart, content: blanks, claims: { size: 5_000 } })],
    [
      'an archive in an archive in an archive',
      () => makeZip([{ name: 'a.zip', content: makeZip([{ name: 'b.zip', content: makeZip([{ name: 'c', content: blanks }]) }]) }]),
    ],
    [
      'more shared texts than there may be',
      () => makeWorkbook({ ...plain, sharedStrings: '<si><t>aaaaaaaaaaaaaaaaaaaa</t></si>'.repeat(1_000_001) }),
    ],
    [
      'entities that grow to a billion',
      () =>
        withPart({
          name: sheetPart,
          content: `<!DOCTYPE a [<!ENTITY l0 "lol">${laughs}]><worksheet><sheetData><row r="1"><c r="A1" t="str"><v>&l9;</v></c></row></sheetData></worksheet>`,
        }),
    ],
    [
      'more parts than a workbook has',
      () => withPart(...Array.from({ length: 1_001 }, (_, index) => ({ name: `xl/media/${index}.bin`, content: 'x' }))),
    ],
    [
      '200,000 columns',
      () =>
        makeWorkbook({
          sheets: [
            { name: 'bouts', xml: `<worksheet><sheetData><row r="1">${'<c><v>1</v></c>'.repeat(200_000)}</row></sheetData></worksheet>` },
          ],
        }),
    ],
  ])('is refused before it has: %s', async (_, make) => {
    const { status, memory } = await sendWorkbook(make());
    expect(status).toBe(422);
    expect(memory).toBeLessThan(150);
  });
});

describe('threat 34: a workbook whose parts lead elsewhere', () => {
  it.each([
    ['out of it', { name: '../../evil.xml', content: 'x' }],
    ['out of it, with the other slash', { name: '..\\..\\evil.xml', content: 'x' }],
    ['to a drive', { name: 'C:\\evil.xml', content: 'x' }],
    ['to the root', { name: '/etc/evil.xml', content: 'x' }],
    ['to a link', { name: 'xl/link', content: '/etc/passwd', claims: { mode: 0o120777 } }],
    ['to a NUL', { name: 'xl/a\0.xml', content: 'x' }],
    ['to another name than the list says', { name: 'xl/a.xml', content: 'x', claims: { localName: '../a.xml' } }],
  ])('is refused: %s', async (_, part) => {
    expect((await sendWorkbook(withPart(part))).status).toBe(422);
  });

  it.each([
    ['the same name', [sheetPart, sheetPart]],
    ['a name that differs in its case', [sheetPart, 'xl/worksheets/SHEET1.xml']],
  ])('is refused when two parts have %s', async (_, names) => {
    const [first] = workbookParts(plain).filter(({ name }) => name === sheetPart);
    const parts = names.map((name) => ({ ...first, name }));
    expect((await sendWorkbook(makeZip([...workbookParts(plain).filter(({ name }) => name !== sheetPart), ...parts]))).status).toBe(422);
  });
});

describe('threat 35: a file of another kind', () => {
  const good = csvOf('bouts', [rowOf('bouts')]);
  it.each([
    ['a workbook called CSV', Buffer.from(zipSync({ 'xl/workbook.xml': Buffer.from('<workbook/>') })), 'F01'],
    ['a web page called CSV', Buffer.from('<!doctype html><html><body><table><tr><td>1</td></tr></table></body></html>'), 'F01'],
    ['an image called CSV', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0]), 'F01'],
    ['text with NUL bytes', Buffer.from(good.replace('\r\n', '\0\r\n')), 'F01'],
    [
      'two encodings in one file',
      Buffer.concat([Buffer.from('\ufeffparticipant,bout_no\r\n'), Buffer.from([0xe9, 0xc3, 0xa9, 0x2c, 0x31])]),
      'F02',
    ],
    ['half a character at the end', Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from(good, 'utf16le'), Buffer.from([0x41])]), 'F02'],
    ['nothing at all', Buffer.alloc(0), 'F05'],
  ])('is told from a table by its content: %s', async (_, bytes, rule) => {
    expect((await outcomeOf(bytes)).errors).toEqual([rule]);
  });
});

const encodings: Readonly<Record<string, (text: string) => Buffer>> = {
  'UTF-8': (text) => Buffer.from(text),
  'UTF-8 with a mark': (text) => Buffer.from(`\ufeff${text}`),
  'UTF-16, low byte first': (text) => Buffer.from(`\ufeff${text}`, 'utf16le'),
  'UTF-16, high byte first': (text) => Buffer.from(`\ufeff${text}`, 'utf16le').swap16(),
};
const delimiters = { comma: ',', semicolon: ';', tab: '\t' };
const lineEnds = { CRLF: '\r\n', LF: '\n', CR: '\r' };
const quoting: Readonly<Record<string, (cell: string, position: number) => string>> = {
  none: (cell) => cell,
  all: (cell) => `"${cell}"`,
  some: (cell, position) => (position % 2 === 0 ? `"${cell}"` : cell),
};
const endings = ['none', 'several'] as const;

describe('threat 36: a file that browser and server could read differently', () => {
  const rows: readonly Overrides[] = [
    { participant: anna, bout_no: 1, distance_m: 12.5 },
    { participant: anna, bout_no: 2, distance_m: 0.25, hr_end: null },
    { participant: participantCode(2), bout_no: 1, distance_m: 100 },
  ];
  const plain = csvOf(
    'bouts',
    rows.map((row) => rowOf('bouts', row)),
  );
  const table = plain
    .trimEnd()
    .split('\r\n')
    .map((line) => line.split(','));
  const variants = Object.keys(encodings).flatMap((encoding) =>
    Object.entries(delimiters).flatMap(([delimiter, mark]) =>
      Object.entries(lineEnds).flatMap(([lineEnd, end]) =>
        Object.entries(quoting).flatMap(([quotes, quote]) =>
          endings.map((ending) => {
            const decimals = mark === ',' ? '.' : ',';
            const lines = table.map((cells) => cells.map((cell, at) => quote(cell.replace('.', decimals), at)).join(mark));
            const text = lines.join(end) + { none: '', several: end + mark.repeat(3) + end + end }[ending];
            return {
              name: [encoding, delimiter, lineEnd, quotes, ending].join(', '),
              decimals,
              bytes: encodings[encoding]?.(text) ?? Buffer.alloc(0),
            };
          }),
        ),
      ),
    ),
  );
  /** Each row's cells in the words of the preview. */
  async function readByServer(bytes: Buffer): Promise<string> {
    const { id } = await uploadMonth(server, coordinator, site, month, {
      ...filesOf({ participants: [anna, participantCode(2)].map((participant) => rowOf('participants', { participant })) }),
      ...filesOf({ consents: [anna, participantCode(2)].map((participant) => rowOf('consents', { participant })) }),
      bouts: bytes,
    });
    const { body } = await coordinator.get(`/api/submissions/${id}/changes?table=bouts&kind=added`).expect(200);
    return JSON.stringify(
      (body as { items: { key: object; line: number; cells: object }[] }).items.map(({ key, line, cells }) => ({ key, line, cells })),
    );
  }

  it(`reads the same cells from ${variants.length} ways to write one table`, async () => {
    const sessions = rows.map((row) =>
      rowOf('sessions', {
        participant: row.participant ?? null,
        session_no: 1,
        upright_min: 30,
        steps_total: null,
        distance_total_m: null,
      }),
    );
    await uploadMonth(
      server,
      coordinator,
      site,
      month,
      filesOf({ sessions: [sessions[0], sessions[2]].flatMap((row) => (row ? [row] : [])) }),
    );
    const expected = await readByServer(Buffer.from(plain));
    expect(expected).toContain('12.5');
    const differing: string[] = [];
    for (const { name, bytes, decimals } of variants) {
      const inBrowser = await readCsvText(bytes);
      const cells = inBrowser.ok
        ? [inBrowser.headers, ...inBrowser.rows].map((row) => row.map((cell) => cell.replace(decimals, '.')))
        : inBrowser.found;
      if (JSON.stringify(cells) !== JSON.stringify(table)) differing.push(`browser: ${name}`);
      if ((await readByServer(bytes)) !== expected) differing.push(`server: ${name}`);
    }
    expect(differing).toEqual([]);
  });

  const header = 'participant,bout_no';
  it.each([
    ['a quotation mark that is never closed', `${header}\r\n"S1,1\r\n`],
    ['text behind a closing quotation mark', `${header}\r\n"S1"x,1\r\n`],
    ['a NUL byte', `${header}\r\nS1\0,1\r\n`],
    ['a web page', '<html><body>1</body></html>'],
    ['a cell beyond the limit', `${header}\r\n${'a'.repeat(10_001)},1\r\n`],
    ['columns beyond the limit', `${Array.from({ length: 501 }, (_, index) => `c${index}`).join(',')}\r\n`],
    ['nothing', ''],
  ])('is refused by both: %s', async (_, text) => {
    expect((await readCsvText(Buffer.from(text))).ok).toBe(false);
    expect((await outcomeOf(text)).errors.some((rule) => ['F01', 'F03', 'F04', 'F05'].includes(rule))).toBe(true);
  });
});

const spoilt = (column: string, cell: string): string => {
  const [header = '', row = ''] = csvOf('bouts', [rowOf('bouts', { participant: anna })])
    .trimEnd()
    .split('\r\n');
  const at = header.split(',').indexOf(column);
  return `${header}\r\n${row
    .split(',')
    .map((text, index) => (index === at ? `"${cell.replaceAll('"', '""')}"` : text))
    .join(',')}\r\n`;
};
const withColumn = (header: string, cell = '1'): string =>
  csvOf('bouts', [rowOf('bouts', { participant: anna })])
    .trimEnd()
    .split('\r\n')
    .map((line, index) => `${line},"${(index === 0 ? header : cell).replaceAll('"', '""')}"`)
    .join('\r\n');
/** Everything that the pages of a submission are told, as one text. */
async function toldOf({ id }: Submission): Promise<string> {
  const [one, findings] = [await coordinator.get(`/api/submissions/${id}`), await coordinator.get(`/api/submissions/${id}/findings`)];
  return JSON.stringify([one.body, findings.body]);
}

const formulas = ['=HYPERLINK("http://evil.example","look")', '\t=1+1', '＝1+1', ';=1+1', '+1+cmd|x', '@SUM(1)', '-2+3', '\r=1'];

describe('threat 38: formulas for whoever opens the data later', () => {
  it.each(formulas)('in a cell are an error, and not repeated to anybody: %j', async (formula) => {
    const checked = await uploadMonth(server, coordinator, site, month, { bouts: spoilt('stop_reason', formula) });
    expect(checked.preview).toBeNull();
    expect(errorsOf(checked).some((rule) => ['F10', 'F11', 'F13'].includes(rule))).toBe(true);
    expect(await toldOf(checked)).not.toContain(JSON.stringify(formula).slice(1, -1));
  });

  it.each(formulas)('in a header are an error: %j', async (formula) => {
    const checked = await uploadMonth(server, coordinator, site, month, { bouts: withColumn(formula) });
    expect(checked.preview).toBeNull();
    expect(errorsOf(checked).some((rule) => ['F06', 'F13'].includes(rule))).toBe(true);
  });

  it.each(formulas)('in the name of a file are not kept: %j', async (formula) => {
    const id = await openMonth();
    const answer = await coordinator.upload(placeFor(id, 'bouts', `${formula}.csv`), csvOf('bouts', [rowOf('bouts')])).expect(200);
    const [file] = (answer.body as Submission).files;
    expect(isFormulaLike(file?.fileName ?? '=')).toBe(false);
    expect(file?.fileName).not.toContain(formula);
  });
});

const scripts = [
  '<img src=x onerror=alert(1)>',
  '<script>alert(1)</script>',
  '"><svg onload=alert(1)>',
  'javascript:alert(1)',
  '\u202Egpj.exe',
  'x'.repeat(5_000),
];

describe('threat 39: script for the pages that show what was found', () => {
  it.each(scripts)('in a cell is not repeated: %s', async (script) => {
    const checked = await uploadMonth(server, coordinator, site, month, { bouts: spoilt('stop_reason', script) });
    expect(checked.preview).toBeNull();
    expect(await toldOf(checked)).not.toContain(script);
  });

  it.each(scripts)('in a header is told, if at all, as data that no browser takes for a page: %s', async (script) => {
    const checked = await uploadMonth(server, coordinator, site, month, { bouts: withColumn(script) });
    expect(checked.preview).toBeNull();
    const answer = await coordinator.get(`/api/submissions/${checked.id}/findings`).expect(200);
    expect(answer.headers['content-type']).toMatch(/^application\/json/);
    expect(answer.headers['x-content-type-options']).toBe('nosniff');
    expect(answer.headers['content-security-policy']).toContain("default-src 'none'");
  });
});

/** One person, one session, one bout. */
const oneMonth = (bout: Overrides = {}): MonthRows => ({
  participants: [rowOf('participants', { participant: anna })],
  consents: [rowOf('consents', { participant: anna })],
  sessions: [rowOf('sessions', { participant: anna, upright_min: 30, steps_total: null, distance_total_m: null })],
  bouts: [rowOf('bouts', { participant: anna, ...bout })],
});

describe('threat 40: a file sent again, elsewhere or by two', () => {
  it('twice is there once', async () => {
    const files = filesOf(oneMonth());
    await uploadMonth(server, coordinator, site, month, files);
    const again = await uploadMonth(server, coordinator, site, month, files);
    expect(again.files).toHaveLength(4);
    await coordinator.post(`/api/submissions/${again.id}/commit`, { previewDigest: again.preview?.digest }).expect(200);
    await coordinator.post(`/api/submissions/${again.id}/commit`, { previewDigest: again.preview?.digest });
    expect(await held('bouts')).toBe(1);
  });

  it('for another site is answered as if there were no such submission', async () => {
    const id = await openMonth();
    const elsewhere = await makePerson(server, { grants: [{ role: 'coordinator', site: await makeSite(server) }] });
    const refused = await elsewhere.upload(placeFor(id), csvOf('bouts', [rowOf('bouts')]));
    expect([refused.status, codeOf(refused.body)]).toEqual([404, 'not-found']);
    expect((await coordinator.get(`/api/submissions/${id}`)).body.files).toEqual([]);
  });

  it('by two coordinators at once is one file, and the registry holds it whole', async () => {
    const id = await openMonth();
    const texts = [1, 2].map((number) =>
      csvOf(
        'bouts',
        Array.from({ length: number * 50 }, (_, index) => rowOf('bouts', { participant: anna, bout_no: index + 1 })),
      ),
    );
    const answers = await Promise.all([coordinator, colleague].map((who, index) => who.upload(placeFor(id), texts[index] ?? '')));
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
    const { files } = (await coordinator.get(`/api/submissions/${id}`)).body as Submission;
    expect(files).toHaveLength(1);
    expect(texts.map((text) => Buffer.byteLength(text))).toContain(files[0]?.bytes);
  });

  it('while it is being checked is refused', async () => {
    const id = await openMonth();
    await coordinator.upload(placeFor(id), csvOf('bouts', [rowOf('bouts')])).expect(200);
    await coordinator.post(`/api/submissions/${id}/check`).expect(202);
    const refused = await colleague.upload(placeFor(id), csvOf('bouts', [rowOf('bouts')]));
    expect([refused.status, codeOf(refused.body)]).toEqual([409, 'submission-busy']);
    await checkSubmission(server.context, id);
  });
});

describe('threat 41: a month that would spoil the statistics', () => {
  const foundIn = async (rows: MonthRows): Promise<string[]> =>
    (await uploadMonth(server, coordinator, site, month, filesOf(rows))).findings.map(({ rule }) => rule);

  it('is flagged: the same key twice, rows all alike, one person under two codes', async () => {
    const bout = rowOf('bouts', { participant: anna });
    expect(await foundIn({ ...oneMonth(), bouts: [bout, bout] })).toContain('F30');
    const alike = Array.from({ length: 40 }, (_, index) => rowOf('bouts', { participant: anna, bout_no: index + 1 }));
    expect(await foundIn({ ...oneMonth(), bouts: alike })).toContain('F34');
    const twins = [1, 2].map((number) => rowOf('participants', { participant: participantCode(number) }));
    expect(
      await foundIn({ participants: twins, consents: [1, 2].map((number) => rowOf('consents', { participant: participantCode(number) })) }),
    ).toContain('F33');
  });

  it('once accepted, is taken back as a whole by the files of before', async () => {
    await submitMonth(server, coordinator, site, month, oneMonth({ hr_end: 110 }));
    const poisoned = [1, 2, 3].map((bout) => rowOf('bouts', { participant: anna, bout_no: bout, hr_end: 150 }));
    await submitMonth(server, coordinator, site, month, { ...oneMonth(), bouts: poisoned });
    expect(await held('bouts')).toBe(3);
    await submitMonth(server, coordinator, site, month, oneMonth({ hr_end: 110 }));
    const { rows } = await server.database.owner.query('select bout_no, hr_end from bouts where site_id = $1', [site.id]);
    expect(rows.map((row: { bout_no: unknown; hr_end: unknown }) => [Number(row.bout_no), Number(row.hr_end)])).toEqual([[1, 110]]);
  });
});

describe('threat 42: names and cells that trip a program up', () => {
  it.each(['__proto__', 'constructor', 'toString', 'hasOwnProperty', 'length'])(
    'takes a column %s for what it is: not one of the dictionary',
    async (name) => {
      const checked = await uploadMonth(server, coordinator, site, month, { bouts: withColumn(name, '{"polluted":1}') });
      expect(errorsOf(checked)).toContain('F06');
      expect(({} as Record<string, unknown>).polluted).toBeUndefined();
    },
  );

  it('refuses a cell of 50,000 characters', async () => {
    expect((await outcomeOf(spoilt('stop_reason', '1-'.repeat(25_000)))).errors).toContain('F03');
  });

  /** Texts at which careless patterns go back and forth: dates, addresses, numbers and names that never quite end. */
  const tricky = ['1-', '12.', 'a@', 'a.', '0 ', 'Dr ', '1/', 'ab:', '()', '\u200b', '=', '"'];
  it('takes twice the time for cells twice as long, whatever they hold', async () => {
    async function timeFor(length: number): Promise<number> {
      const cells = tricky.map((piece) => piece.repeat(Math.ceil(length / piece.length)).slice(0, length));
      const [header, ...rows] = cells.flatMap((cell) => spoilt('stop_reason', cell).trimEnd().split('\r\n').slice(1));
      const file = `${csvOf('bouts', []).trimEnd()}\r\n${[header, ...rows].join('\r\n')}\r\n`;
      const times: number[] = [];
      for (let round = 0; round < 5; round += 1) {
        const begun = performance.now();
        await outcomeOf(file);
        times.push(performance.now() - begun);
      }
      return Math.min(...times);
    }
    await timeFor(100);
    // Quadratic work would come to four times.
    expect((await timeFor(9_000)) / (await timeFor(4_500))).toBeLessThan(3);
  });
});
