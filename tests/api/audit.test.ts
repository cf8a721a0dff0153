import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

let server: TestServer;
let site: TestSite;
let steward: TestPerson;
let coordinator: TestPerson;
let researcher: TestPerson;

beforeAll(async () => {
  server = await startTestServer();
  site = await makeSite(server);
  steward = await makePerson(server, { grants: [{ role: 'steward' }], name: 'Steward' });
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }], name: 'Coordinator' });
  researcher = await makePerson(server, { grants: [{ role: 'researcher' }], name: 'Researcher' });
  for (const month of ['2026-01', '2026-02', '2026-03']) {
    await coordinator.post('/api/submissions', { siteId: site.id, month }).expect(201);
  }
});
afterAll(() => server.close());

describe('the audit log', () => {
  it('shows a steward every entry, a coordinator the own ones, a researcher none of theirs', async () => {
    const all = await steward.get('/api/audit').expect(200);
    expect(all.body.total).toBe(3);
    expect(all.body.items[0]).toMatchObject({ actor: 'Coordinator', act: 'submission.open', result: 'ok' });
    expect((await coordinator.get('/api/audit').expect(200)).body.total).toBe(3);
    expect((await researcher.get('/api/audit').expect(200)).body.total).toBe(0);
  });

  it('holds after honest use, and the check is itself an entry', async () => {
    const verdict = await steward.post('/api/audit/verification').expect(200);
    expect(verdict.body).toMatchObject({ holds: true, entries: 3, firstBrokenSeq: null });
    expect((await steward.get('/api/audit')).body.items[0]).toMatchObject({ act: 'audit.verify', result: 'ok' });
  });

  it('is one chain without a gap when fifty people write at once', async () => {
    const months = Array.from({ length: 12 }, (_, index) => `2025-${String(index + 1).padStart(2, '0')}`);
    const writes = Array.from({ length: 50 }, (_, index) =>
      coordinator.post('/api/submissions', { siteId: site.id, month: months[index % 12] }),
    );
    const answers = await Promise.all(writes);
    expect(answers.every((answer) => answer.status === 201)).toBe(true);
    const { rows } = await server.database.owner.query(
      'select count(*)::int as n, max(seq)::int as last, count(distinct prev)::int as links from audit_entries',
    );
    expect(rows[0].n).toBe(rows[0].last);
    expect(rows[0].links).toBe(rows[0].n);
    expect((await steward.post('/api/audit/verification')).body.holds).toBe(true);
  });

  it('notices a changed, a removed and a swapped entry', async () => {
    const { owner } = server.database;
    // What the superuser of the database could do behind the application's back: the application itself has no right to any of it.
    await owner.query('alter table audit_entries disable trigger audit_entries_stay');
    const expectBroken = async (seq: number): Promise<void> => {
      const verdict = await steward.post('/api/audit/verification');
      expect(verdict.body).toMatchObject({ holds: false, firstBrokenSeq: seq });
      // The check wrote an entry of its own, which the next step must not find in its way.
      await owner.query("delete from audit_entries where act = 'audit.verify' and result = 'failed'");
    };
    const { rows: kept } = await owner.query('select * from audit_entries where seq in (2, 3) order by seq');
    const restore = async (): Promise<void> => {
      await owner.query('delete from audit_entries where seq in (2, 3, 900000)');
      for (const row of kept) {
        await owner.query('insert into audit_entries select * from jsonb_populate_record(null::audit_entries, $1)', [JSON.stringify(row)]);
      }
      expect((await steward.post('/api/audit/verification')).body.holds).toBe(true);
    };

    await owner.query("update audit_entries set event = replace(event, 'submission.open', 'submission.shut') where seq = 2");
    await expectBroken(2);
    await restore();

    await owner.query('delete from audit_entries where seq = 2');
    await expectBroken(2);
    await restore();

    await owner.query('update audit_entries set seq = 900000 where seq = 2');
    await owner.query('update audit_entries set seq = 2 where seq = 3');
    await owner.query('update audit_entries set seq = 3 where seq = 900000');
    await expectBroken(2);
    await restore();
    await owner.query('alter table audit_entries enable trigger audit_entries_stay');
  });

  it('takes the act back when its entry cannot be written', async () => {
    const { owner } = server.database;
    const before = await owner.query('select count(*)::int as n from submissions');
    await owner.query('revoke insert on audit_entries from cairnstep_app');
    await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-05' }).expect(500);
    await owner.query('grant insert on audit_entries to cairnstep_app');
    expect((await owner.query('select count(*)::int as n from submissions')).rows[0].n).toBe(before.rows[0].n);
    await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-05' }).expect(201);
  });
});
