/** A month from the clinic: upload, findings, preview, commit, receipt, correction. */
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Submission, SubmissionReceipt } from '../../packages/contract/src/index.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { participantCode, rowOf, type Overrides } from '../support/rows.ts';
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

const anna = participantCode(1);
/** One person with one session of two bouts. */
function oneMonth({ bouts = {}, session = {} }: { bouts?: Overrides; session?: Overrides } = {}): MonthRows {
  return {
    participants: [rowOf('participants', { participant: anna })],
    consents: [rowOf('consents', { participant: anna })],
    sessions: [rowOf('sessions', { participant: anna, upright_min: 30, steps_total: null, distance_total_m: null, ...session })],
    bouts: [1, 2].map((bout) => rowOf('bouts', { participant: anna, bout_no: bout, ...bouts })),
  };
}
const held = async (table: string): Promise<number> =>
  (await server.database.owner.query(`select count(*)::int as n from ${table} where site_id = $1`, [site.id])).rows[0].n;
const codeOf = (body: { type?: string }): string => (body.type ?? '').replace('/problems/', '');

describe('a clean month', () => {
  it('is previewed, committed and confirmed by a receipt and a mail', async () => {
    const checked = await uploadMonth(server, coordinator, site, '2026-01', filesOf(oneMonth()));
    expect(checked.status).toBe('checked');
    expect(checked.preview?.tables).toEqual(
      ['participants', 'consents', 'sessions', 'bouts'].map((table) => ({
        table,
        added: table === 'bouts' ? 2 : 1,
        changed: 0,
        unchanged: 0,
        removed: 0,
      })),
    );
    expect(await held('bouts')).toBe(0);
    const rows = await coordinator.get(`/api/submissions/${checked.id}/changes?table=bouts&kind=added`).expect(200);
    expect(rows.body.items[1]).toMatchObject({ kind: 'added', line: 3, key: { participant: anna, bout_no: '2' } });

    const committed = await coordinator
      .post(`/api/submissions/${checked.id}/commit`, { previewDigest: checked.preview?.digest })
      .expect(200);
    const receipt = committed.body as SubmissionReceipt;
    expect(receipt).toMatchObject({ month: '2026-01', acceptedBy: 'Coordinator', digest: checked.preview?.digest });
    expect(receipt.files.find((file) => file.table === 'bouts')).toMatchObject({ rows: 2, fileName: 'bouts.csv' });
    expect(await held('bouts')).toBe(2);
    expect((await coordinator.get(`/api/submissions/${checked.id}/receipt`).expect(200)).body).toEqual(receipt);
    const { rows: mails } = await server.database.owner.query('select recipient, status from mail_messages where event like $1', [
      `submission-accepted:${checked.id}%`,
    ]);
    expect(mails).toEqual([{ recipient: coordinator.email, status: 'waiting' }]);
    const months = await coordinator.get(`/api/sites/${site.id}/months`).expect(200);
    expect(months.body.months.find((one: { month: string }) => one.month === '2026-01')).toMatchObject({ state: 'accepted', rows: 5 });
  });

  it('changes nothing when the same files come again', async () => {
    await submitMonth(server, coordinator, site, '2026-01', oneMonth());
    const again = await uploadMonth(server, coordinator, site, '2026-01', filesOf(oneMonth()));
    expect(again.preview?.tables.map(({ added, changed, removed }) => added + changed + removed)).toEqual([0, 0, 0, 0]);
    await coordinator.post(`/api/submissions/${again.id}/commit`, { previewDigest: again.preview?.digest }).expect(200);
    expect(await held('bouts')).toBe(2);
    expect(await held('row_history')).toBe(0);
  });
});

describe('a correction', () => {
  it('replaces the month, keeps every earlier value with its submission, and removes only what the preview names', async () => {
    const first = await submitMonth(server, coordinator, site, '2026-01', oneMonth());
    const corrected = oneMonth({ bouts: { hr_end: 121 } });
    const second = await uploadMonth(
      server,
      coordinator,
      site,
      '2026-01',
      filesOf({ ...corrected, bouts: corrected.bouts?.slice(0, 1) ?? [] }),
    );
    expect(second.preview?.tables.find((one) => one.table === 'bouts')).toEqual({
      table: 'bouts',
      added: 0,
      changed: 1,
      unchanged: 0,
      removed: 1,
    });
    const changed = await coordinator.get(`/api/submissions/${second.id}/changes?table=bouts&kind=changed`).expect(200);
    expect(changed.body.items[0].cells).toEqual([{ column: 'hr_end', before: '110', after: '121' }]);
    const removed = await coordinator.get(`/api/submissions/${second.id}/changes?table=bouts&kind=removed`).expect(200);
    expect(removed.body.items[0].key).toMatchObject({ bout_no: '2' });
    await coordinator.post(`/api/submissions/${second.id}/commit`, { previewDigest: second.preview?.digest }).expect(200);

    const { rows } = await server.database.owner.query(
      "select change, before->>'hr_end' as hr, submission_id from row_history where site_id = $1 order by change",
      [site.id],
    );
    expect(rows).toEqual([
      { change: 'changed', hr: '110', submission_id: second.id },
      { change: 'removed', hr: '110', submission_id: second.id },
    ]);
    expect((await coordinator.get(`/api/submissions/${first.id}`)).body.status).toBe('superseded');
    expect((await coordinator.get(`/api/submissions/${first.id}/receipt`).expect(200)).body.submissionId).toBe(first.id);
  });

  it('takes the bouts of a session away with it, and says so', async () => {
    await submitMonth(server, coordinator, site, '2026-01', oneMonth());
    const other = { ...oneMonth({ session: { session_day: 2 } }), bouts: [rowOf('bouts', { participant: anna, session_day: 2 })] };
    const second = await uploadMonth(server, coordinator, site, '2026-01', filesOf(other));
    expect(second.preview?.tables.find((one) => one.table === 'bouts')).toMatchObject({ added: 1, removed: 2 });
    await coordinator.post(`/api/submissions/${second.id}/commit`, { previewDigest: second.preview?.digest }).expect(200);
    expect(await held('bouts')).toBe(1);
    expect(await held('sessions')).toBe(1);
  });
});

describe('a month with mistakes', () => {
  it('is told by rule, file, line and column, and cannot be committed', async () => {
    const mistaken = {
      ...oneMonth(),
      bouts: [rowOf('bouts', { participant: anna, hr_end: 900 }), rowOf('bouts', { participant: participantCode(77) })],
    };
    const checked = await uploadMonth(server, coordinator, site, '2026-01', filesOf(mistaken));
    expect(checked.preview).toBeNull();
    const found = await coordinator.get(`/api/submissions/${checked.id}/findings?severity=error`).expect(200);
    expect(found.body.items).toContainEqual(expect.objectContaining({ rule: 'F21', table: 'bouts', line: 2, column: 'hr_end' }));
    expect(found.body.items.some((finding: { line: number; table: string }) => finding.table === 'bouts' && finding.line === 3)).toBe(true);
    expect(JSON.stringify(found.body)).not.toContain('900');
    const refused = await coordinator.post(`/api/submissions/${checked.id}/commit`, { previewDigest: 'a'.repeat(64) });
    expect(codeOf(refused.body)).toBe('submission-has-errors');
    expect(await held('participants')).toBe(0);
  });

  it('goes on from where it was when the corrected file is added', async () => {
    const files = filesOf(oneMonth({ bouts: { hr_end: 900 } }));
    const wrong = await uploadMonth(server, coordinator, site, '2026-01', files);
    const right = await uploadMonth(server, coordinator, site, '2026-01', { bouts: filesOf(oneMonth()).bouts ?? '' });
    expect(right.id).toBe(wrong.id);
    expect(right.preview?.tables).toHaveLength(4);
  });

  it('asks a reason for each warning and keeps it in the receipt', async () => {
    const unusual = oneMonth({ session: { hr_rest: 120 } });
    const checked = await uploadMonth(server, coordinator, site, '2026-01', filesOf(unusual));
    const [warning] = checked.findings.filter((group) => group.severity === 'warning');
    expect(warning).toBeDefined();
    const refused = await coordinator.post(`/api/submissions/${checked.id}/commit`, { previewDigest: checked.preview?.digest });
    expect(codeOf(refused.body)).toBe('submission-has-open-warnings');
    for (const group of checked.findings)
      await coordinator
        .post(`/api/submissions/${checked.id}/acknowledgements`, { rule: group.rule, reason: 'as in the record' })
        .expect(200);
    const receipt = (
      await coordinator.post(`/api/submissions/${checked.id}/commit`, { previewDigest: checked.preview?.digest }).expect(200)
    ).body as SubmissionReceipt;
    expect(receipt.acknowledged).toContainEqual({ rule: warning?.rule, count: warning?.count, reason: 'as in the record' });
  });
});

describe('a commit', () => {
  it('is refused when the registry changed since its preview, and made anew from a fresh one', async () => {
    const january = await uploadMonth(server, coordinator, site, '2026-01', filesOf(oneMonth()));
    const february = await uploadMonth(
      server,
      colleague,
      site,
      '2026-02',
      filesOf({
        participants: [rowOf('participants', { participant: participantCode(2), age_at_index: 30 })],
        consents: [rowOf('consents', { participant: participantCode(2) })],
      }),
    );
    await colleague.post(`/api/submissions/${february.id}/commit`, { previewDigest: february.preview?.digest }).expect(200);
    const refused = await coordinator.post(`/api/submissions/${january.id}/commit`, { previewDigest: january.preview?.digest });
    expect(codeOf(refused.body)).toBe('submission-stale');
    expect(await held('bouts')).toBe(0);
    const again = await uploadMonth(server, coordinator, site, '2026-01', {});
    await coordinator.post(`/api/submissions/${again.id}/commit`, { previewDigest: again.preview?.digest }).expect(200);
    expect(await held('bouts')).toBe(2);
  });

  it('is refused for any preview but the last', async () => {
    const checked = await uploadMonth(server, coordinator, site, '2026-01', filesOf(oneMonth()));
    const refused = await coordinator.post(`/api/submissions/${checked.id}/commit`, { previewDigest: 'b'.repeat(64) });
    expect(codeOf(refused.body)).toBe('submission-stale');
  });

  it('of two coordinators at once goes through for one; the other is told', async () => {
    const checked = await uploadMonth(server, coordinator, site, '2026-01', filesOf(oneMonth()));
    const answers = await Promise.all(
      [coordinator, colleague].map((who) => who.post(`/api/submissions/${checked.id}/commit`, { previewDigest: checked.preview?.digest })),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect(codeOf(answers.find((answer) => answer.status === 409)?.body)).toBe('submission-closed');
    expect(await held('bouts')).toBe(2);
  });

  it('works for one submission of a month at a time: whoever opens it second joins the first', async () => {
    const [one, two] = await Promise.all(
      [coordinator, colleague].map((who) => who.post('/api/submissions', { siteId: site.id, month: '2026-03' })),
    );
    expect((one?.body as Submission).id).toBe((two?.body as Submission).id);
  });
});

describe('a submission', () => {
  it('is not opened for a month that has not ended or lies before the site joined', async () => {
    server.setClock(new Date('2026-11-20T10:00:00Z'));
    for (const month of ['2026-11', '2026-12', '2024-12']) {
      expect(codeOf((await coordinator.post('/api/submissions', { siteId: site.id, month })).body)).toBe('month-not-open');
    }
    await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-10' }).expect(201);
    server.setClock(null);
  });

  it('refuses a file beyond the limit by what arrives, keeps what was there and leaves nothing of it', async () => {
    const small = await startTestServer({ UPLOAD_LIMIT_BYTES: '20000' }, server.database);
    const opened = await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-04' });
    const path = `${small.url}/api/submissions/${opened.body.id}/files/bouts?fileName=b.csv`;
    async function* chunks() {
      for (let i = 0; i < 100; i += 1) yield Buffer.alloc(1000, 'a');
    }
    // Sent in chunks, so no header announces the length.
    const answer = await fetch(path, {
      method: 'PUT',
      headers: { 'X-Cairnstep-Request': '1', Cookie: coordinator.cookie },
      body: chunks() as unknown as BodyInit,
      duplex: 'half',
    } as RequestInit);
    expect(answer.status).toBe(413);
    await small.close();
    expect((await coordinator.get(`/api/submissions/${opened.body.id}`)).body.files).toEqual([]);
  });

  it('can be given up, after which it takes no file', async () => {
    const checked = await uploadMonth(server, coordinator, site, '2026-01', filesOf(oneMonth()));
    await coordinator.post(`/api/submissions/${checked.id}/discard`).expect(200);
    const refused = await coordinator.upload(`/api/submissions/${checked.id}/files/bouts?fileName=b.csv`, 'x');
    expect(codeOf(refused.body)).toBe('submission-closed');
    expect(await held('participants')).toBe(0);
  });
});
