/** Cells mended on screen, reasons that outlast a change of files, and a commit whose answer was lost. */
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Submission } from '../../packages/contract/src/index.ts';
import { makeWorkbook } from '../../packages/submission-files/src/test-support/make-workbook.ts';
import { FindingLog, readWorkbook } from '../../packages/submission-files/src/index.ts';
import { checkSubmission } from '../../services/api/src/features/submissions/check-submission.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { csvOf, participantCode, rowOf, type Overrides } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { filesOf, uploadMonth, type MonthRows } from '../support/submit-month.ts';

let server: TestServer;
let site: TestSite;
let coordinator: TestPerson;
let colleague: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
});
beforeEach(async () => {
  site = await makeSite(server);
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
  colleague = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
});
afterAll(() => server.close());

const anna = participantCode(1);
const codeOf = (body: { type?: string }): string => (body.type ?? '').replace('/problems/', '');

const month = ({ bouts = {}, session = {} }: { bouts?: Overrides; session?: Overrides } = {}): MonthRows => ({
  participants: [rowOf('participants', { participant: anna })],
  consents: [rowOf('consents', { participant: anna })],
  sessions: [rowOf('sessions', { participant: anna, upright_min: 30, steps_total: null, distance_total_m: null, ...session })],
  bouts: [1, 2].map((bout) => rowOf('bouts', { participant: anna, bout_no: bout, ...bouts })),
});
const upload = (rows: MonthRows): Promise<Submission> => uploadMonth(server, coordinator, site, '2026-01', filesOf(rows));
async function check(id: string): Promise<Submission> {
  await coordinator.post(`/api/submissions/${id}/check`).expect(202);
  await checkSubmission(server.context, id);
  return (await coordinator.get(`/api/submissions/${id}`).expect(200)).body;
}
const mend = (id: string, ...mends: readonly object[]) => coordinator.post(`/api/submissions/${id}/mends`, { mends });
const hr = (line: number, value: string) => ({ table: 'bouts', line, column: 'hr_end', value });
const errorsOf = ({ findings }: Submission) =>
  findings.filter(({ severity }) => severity === 'error').map(({ rule, count }) => [rule, count]);
const commit = (who: TestPerson, { id, preview }: Submission) =>
  who.post(`/api/submissions/${id}/commit`, { previewDigest: preview?.digest });
async function acknowledge({ id, findings }: Submission): Promise<void> {
  for (const { rule } of findings)
    await coordinator.post(`/api/submissions/${id}/acknowledgements`, { rule, reason: 'as in the record' }).expect(200);
}

describe('cells mended on screen', () => {
  it('count in place of those of the file, and the receipt says how many', async () => {
    const wrong = await upload(month({ bouts: { hr_end: 900 } }));
    expect(errorsOf(wrong)).toEqual([['F21', 2]]);
    const mended = (await mend(wrong.id, hr(2, '117'), hr(3, '118')).expect(200)).body as Submission;
    expect([mended.status, mended.preview, mended.files.find(({ table }) => table === 'bouts')?.mended]).toEqual(['open', null, 2]);
    const right = await check(wrong.id);
    expect(errorsOf(right)).toEqual([]);
    expect(right.files.find(({ table }) => table === 'bouts')?.sha256).toBe(wrong.files.find(({ table }) => table === 'bouts')?.sha256);
    await acknowledge(right);
    const receipt = await commit(coordinator, right).expect(200);
    expect(receipt.body.files.map(({ table, mended: cells }: { table: string; mended: number }) => [table, cells])).toContainEqual([
      'bouts',
      2,
    ]);
    const { rows } = await server.database.owner.query('select bout_no, hr_end from bouts where site_id = $1 order by bout_no', [site.id]);
    expect(rows.map(({ hr_end }) => Number(hr_end))).toEqual([117, 118]);
    const { rows: left } = await server.database.owner.query('select 1 from submission_mends where submission_id = $1', [right.id]);
    expect(left).toEqual([]);
  });

  it('are in the audit log by column and number, without their values', async () => {
    const wrong = await upload(month({ bouts: { hr_end: 900 } }));
    await mend(wrong.id, hr(2, '4711'), hr(3, '118'), { table: 'sessions', line: 2, column: 'hr_rest', value: '66' }).expect(200);
    const { rows } = await server.database.owner.query("select event from audit_entries where act = 'submission.mend' and object = $1", [
      wrong.id,
    ]);
    expect(rows.map(({ event }) => JSON.parse(event).detail)).toEqual([{ 'bouts.hr_end': 2, 'sessions.hr_rest': 1 }]);
    expect(rows[0].event).not.toContain('4711');
  });

  it('are typed and checked like any cell, and may be mended again', async () => {
    const wrong = await upload(month({ bouts: { hr_end: 900 } }));
    await mend(wrong.id, hr(2, 'fast'), hr(3, '=1+1')).expect(200);
    const checked = await check(wrong.id);
    const found = await coordinator.get(`/api/submissions/${wrong.id}/findings?severity=error`).expect(200);
    expect(found.body.items.map(({ rule, line }: { rule: string; line: number }) => [rule, line])).toEqual([
      ['F10', 2],
      ['F13', 3],
    ]);
    expect(JSON.stringify(found.body)).not.toContain('fast');
    await mend(checked.id, hr(2, '117'), hr(3, '')).expect(200);
    expect(errorsOf(await check(wrong.id))).toEqual([]);
  });

  it('bind the preview: a commit of the earlier one is refused', async () => {
    const first = await upload(month());
    await acknowledge(first);
    await mend(first.id, hr(2, '111')).expect(200);
    expect(codeOf((await commit(coordinator, first)).body)).toBe('submission-stale');
    const second = await check(first.id);
    expect(second.preview?.digest).not.toBe(first.preview?.digest);
    await mend(first.id, hr(2, '112')).expect(200);
    const third = await check(first.id);
    expect(third.preview?.tables).toEqual(second.preview?.tables);
    expect(third.preview?.digest).not.toBe(second.preview?.digest);
  });

  it('go with their file', async () => {
    const wrong = await upload(month({ bouts: { hr_end: 900 } }));
    await mend(wrong.id, hr(2, '117'), hr(3, '118')).expect(200);
    const anew = await uploadMonth(server, coordinator, site, '2026-01', {
      bouts: csvOf('bouts', month({ bouts: { hr_end: 901 } }).bouts ?? []),
    });
    expect(anew.files.find(({ table }) => table === 'bouts')?.mended).toBe(0);
    expect(errorsOf(anew)).toEqual([['F21', 2]]);
  });

  it('stand for those of a workbook as well, and are shown in the workbook of findings', async () => {
    const rows = month({ bouts: { hr_end: 900 } });
    const keys = Object.keys(rows.bouts?.[0] ?? {});
    const sheets = [{ name: 'Bouts', rows: [keys, ...(rows.bouts ?? []).map((row) => keys.map((key) => row[key] ?? null))] }];
    const { bouts: _, ...others } = rows;
    const opened = await uploadMonth(server, coordinator, site, '2026-01', filesOf(others));
    await coordinator
      .upload(`/api/submissions/${opened.id}/workbook?fileName=month.xlsx`, Buffer.from(makeWorkbook({ sheets })))
      .expect(200);
    expect(errorsOf(await check(opened.id))).toEqual([['F21', 2]]);
    const mended = await mend(opened.id, hr(2, '117'), hr(3, '118')).expect(200);
    expect(mended.body.files.find(({ table }: { table: string | null }) => table === null).mended).toBe(2);
    const right = await check(opened.id);
    expect(errorsOf(right)).toEqual([]);
    const { body } = await coordinator
      .get(`/api/submissions/${opened.id}/findings.xlsx`)
      .buffer(true)
      .parse((answer, done) => {
        const pieces: Buffer[] = [];
        answer.on('data', (piece: Buffer) => pieces.push(piece));
        answer.on('end', () => done(null, Buffer.concat(pieces)));
      });
    const tables = await readWorkbook(body, new FindingLog());
    expect([0, 1].map((row) => tables.bouts?.column('hr_end').number(row))).toEqual([117, 118]);
  });

  it('are refused at once when they could identify a person, and nothing of them is kept', async () => {
    const wrong = await upload(month({ bouts: { hr_end: 900 } }));
    const refused = await mend(wrong.id, hr(2, '117'), hr(3, 'Mrs Jones'));
    expect([refused.status, codeOf(refused.body)]).toEqual([422, 'identifies-somebody']);
    expect(refused.body.errors).toEqual([{ pointer: '/body/mends/1/value', detail: 'This could identify a person.' }]);
    expect(JSON.stringify(refused.body)).not.toContain('Jones');
    const { rows } = await server.database.owner.query('select 1 from submission_mends where submission_id = $1', [wrong.id]);
    expect(rows).toEqual([]);
  });

  it('need a file and a column that are there; a line that is not is told by the check', async () => {
    const wrong = await upload(month());
    const refused = await mend(
      wrong.id,
      hr(2, '117'),
      { ...hr(2, '1'), column: 'colour' },
      { ...hr(2, '1'), table: 'exams', column: 'vac' },
    );
    expect([refused.status, codeOf(refused.body)]).toEqual([400, 'invalid-input']);
    expect(refused.body.errors.map(({ pointer }: { pointer: string }) => pointer)).toEqual(['/body/mends/1', '/body/mends/2']);
    await mend(wrong.id, hr(40, '117')).expect(200);
    const checked = await check(wrong.id);
    expect(errorsOf(checked)).toEqual([['F54', 1]]);
    const found = await coordinator.get(`/api/submissions/${wrong.id}/findings?rule=F54`).expect(200);
    expect(found.body.items).toMatchObject([{ table: 'bouts', line: 40, column: 'hr_end' }]);
  });

  it('are not a way to type a whole file', async () => {
    const checked = await upload(month());
    await server.database.owner.query(
      `insert into submission_mends (submission_id, site_id, table_key, line, column_key, value)
       select $1, $2, 'bouts', line, 'hr_end', '117' from generate_series(2, 20001) line`,
      [checked.id, site.id],
    );
    const refused = await mend(checked.id, { ...hr(2, '118'), column: 'steps' });
    expect([refused.status, codeOf(refused.body)]).toEqual([413, 'too-large']);
    expect((await coordinator.get(`/api/submissions/${checked.id}`).expect(200)).body.status).toBe('checked');
  });

  it('are the coordinators’ alone, and only until the month is settled', async () => {
    const checked = await upload(month());
    const therapist = await makePerson(server, { grants: [{ role: 'therapist', site }] });
    expect((await therapist.post(`/api/submissions/${checked.id}/mends`, { mends: [hr(2, '117')] })).status).toBe(403);
    await acknowledge(checked);
    await commit(coordinator, checked).expect(200);
    expect(codeOf((await mend(checked.id, hr(2, '117'))).body)).toBe('submission-closed');
  });
});

describe('reasons given for warnings', () => {
  const unusual = month({ session: { hr_rest: 120 } });
  const reasonsIn = ({ findings }: Submission) => findings.map(({ acknowledgedReason }) => acknowledgedReason);

  it('outlast files that come and go while their number stays the same', async () => {
    const checked = await upload(unusual);
    expect(checked.findings.length).toBeGreaterThan(0);
    await acknowledge(checked);
    for (let round = 0; round < 2; round += 1)
      await coordinator
        .upload(`/api/submissions/${checked.id}/files/bouts?fileName=bouts.csv`, csvOf('bouts', unusual.bouts ?? []))
        .expect(200);
    const opened = (await coordinator.get(`/api/submissions/${checked.id}`).expect(200)).body as Submission;
    expect([opened.status, opened.findings]).toEqual(['open', []]);
    const again = await check(checked.id);
    expect(reasonsIn(again)).toEqual(checked.findings.map(() => 'as in the record'));
    await commit(coordinator, again).expect(200);
  });

  it('are asked for again when there are more warnings than before', async () => {
    const checked = await upload(unusual);
    await acknowledge(checked);
    const sessions = [1, 2].map((session) =>
      rowOf('sessions', {
        participant: anna,
        session_no: session,
        upright_min: 30,
        steps_total: null,
        distance_total_m: null,
        hr_rest: 120,
      }),
    );
    const more = await uploadMonth(server, coordinator, site, '2026-01', { sessions: csvOf('sessions', sessions) });
    const rule = checked.findings[0]?.rule;
    expect(more.findings.find((group) => group.rule === rule)).toMatchObject({ count: 2, acknowledgedReason: null });
  });
});

describe('a commit whose answer was lost', () => {
  it('answers the same person with the same receipt again, and does nothing twice', async () => {
    const checked = await upload(month());
    await acknowledge(checked);
    const first = await commit(coordinator, checked).expect(200);
    const second = await commit(coordinator, checked).expect(200);
    expect(second.body).toEqual(first.body);
    const { rows: acts } = await server.database.owner.query(
      "select 1 from audit_entries where act = 'submission.commit' and object = $1",
      [checked.id],
    );
    const { rows: mails } = await server.database.owner.query('select 1 from mail_messages where event like $1', [
      `submission-accepted:${checked.id}%`,
    ]);
    expect([acts.length, mails.length]).toEqual([1, 1]);
  });

  it('tells anybody else, and any other preview, that the submission is settled', async () => {
    const checked = await upload(month());
    await acknowledge(checked);
    await commit(coordinator, checked).expect(200);
    expect(codeOf((await commit(colleague, checked)).body)).toBe('submission-closed');
    const other = await coordinator.post(`/api/submissions/${checked.id}/commit`, { previewDigest: 'a'.repeat(64) });
    expect(codeOf(other.body)).toBe('submission-closed');
  });
});
