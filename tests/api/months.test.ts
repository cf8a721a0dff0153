/** The months of sites: what is due, what is closed as having nothing to report, and the calendar across sites. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { SiteMonth } from '../../packages/contract/src/index.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { rowOf } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { askForCheck, filesOf, submitMonth, uploadMonth } from '../support/submit-month.ts';

let server: TestServer;
let site: TestSite;
let other: TestSite;
let coordinator: TestPerson;
let otherCoordinator: TestPerson;
let therapist: TestPerson;
let steward: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
  server.setClock(new Date('2026-03-16T09:00:00Z'));
  site = await makeSite(server, '2025-11');
  other = await makeSite(server, '2026-02');
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }], name: 'Mara Lind' });
  otherCoordinator = await makePerson(server, { grants: [{ role: 'coordinator', site: other }] });
  therapist = await makePerson(server, { grants: [{ role: 'therapist', site }] });
  steward = await makePerson(server, { grants: [{ role: 'steward' }] });
});
afterAll(() => server.close());

const codeOf = (body: { type?: string }): string => (body.type ?? '').replace('/problems/', '');
const monthsOf = async (who: TestPerson, of: TestSite): Promise<Map<string, SiteMonth>> => {
  const { months } = (await who.get(`/api/sites/${of.id}/months`).expect(200)).body as { months: SiteMonth[] };
  return new Map(months.map((month) => [month.month, month]));
};
const closing = (month: string, of: TestSite = site): string => `/api/sites/${of.id}/months/${month}/nothing-to-report`;
const month = { participants: [rowOf('participants')], consents: [rowOf('consents')] };

describe("a site's months", () => {
  it('are due until the 15th of the month after, overdue from the 16th, and the running one is not yet due', async () => {
    server.setClock(new Date('2026-03-15T23:59:59Z'));
    expect([...(await monthsOf(therapist, site)).values()].map(({ month: name, state, dueOn }) => [name, state, dueOn])).toEqual([
      ['2026-03', 'not-yet-due', '2026-04-15'],
      ['2026-02', 'due', '2026-03-15'],
      ['2026-01', 'overdue', '2026-02-15'],
      ['2025-12', 'overdue', '2026-01-15'],
      ['2025-11', 'overdue', '2025-12-15'],
    ]);
    server.setClock(new Date('2026-03-16T00:00:00Z'));
    expect((await monthsOf(therapist, site)).get('2026-02')?.state).toBe('overdue');
  });

  it('say when a submission was begun, is being checked, and was accepted', async () => {
    await uploadMonth(server, coordinator, site, '2025-11', filesOf(month));
    expect((await monthsOf(coordinator, site)).get('2025-11')?.state).toBe('in-progress');
    const checking = await askForCheck(coordinator, site, '2025-12', filesOf(month));
    expect((await monthsOf(coordinator, site)).get('2025-12')).toMatchObject({ state: 'checking', submissionId: checking });
    const accepted = await submitMonth(server, coordinator, site, '2025-11', month);
    expect((await monthsOf(coordinator, site)).get('2025-11')).toMatchObject({
      state: 'accepted',
      submissionId: accepted.id,
      rows: 2,
      closed: null,
    });
  });
});

describe('a month with nothing to report', () => {
  it('is closed by its coordinator, who is named, and stays closed when it is closed again', async () => {
    const { body } = await coordinator.post(closing('2026-01')).expect(200);
    expect(body).toMatchObject({
      month: '2026-01',
      state: 'nothing-to-report',
      closed: { at: '2026-03-16T00:00:00.000Z', by: 'Mara Lind' },
      submissionId: null,
    });
    server.setClock(new Date('2026-03-17T00:00:00Z'));
    expect((await coordinator.post(closing('2026-01')).expect(200)).body).toEqual(body);
    expect((await monthsOf(therapist, site)).get('2026-01')).toEqual(body);
    const { rows } = await server.database.owner.query("select object, actor from audit_entries where act = 'month.close'");
    expect(rows).toEqual([{ object: `${site.code} 2026-01`, actor: coordinator.id }]);
  });

  it('gives way to a submission of that month, and says so', async () => {
    await uploadMonth(server, coordinator, site, '2026-01', filesOf(month));
    expect((await monthsOf(coordinator, site)).get('2026-01')).toMatchObject({ state: 'in-progress', closed: { by: 'Mara Lind' } });
    await submitMonth(server, coordinator, site, '2026-01', month);
    expect((await monthsOf(coordinator, site)).get('2026-01')).toMatchObject({ state: 'accepted', closed: { by: 'Mara Lind' } });
  });

  it('is not one that runs, lies before the site joined, has a submission under way or an accepted one', async () => {
    const refusals: [string, string][] = [
      ['2026-03', 'month-not-open'],
      ['2025-10', 'month-not-open'],
      ['2025-12', 'month-not-empty'],
      ['2026-01', 'month-not-empty'],
    ];
    for (const [name, code] of refusals) {
      const answer = await coordinator.post(closing(name));
      expect([answer.status, codeOf(answer.body)], name).toEqual([409, code]);
    }
  });

  it('is closed by nobody else', async () => {
    expect((await therapist.post(closing('2026-02'))).status).toBe(403);
    expect((await steward.post(closing('2026-02'))).status).toBe(403);
    expect((await otherCoordinator.post(closing('2026-02'))).status).toBe(404);
    expect((await monthsOf(coordinator, site)).get('2026-02')).toMatchObject({ state: 'overdue', closed: null });
  });

  it('is either closed or opened when both are asked for at once', async () => {
    const [closed, opened] = await Promise.all([
      coordinator.post(closing('2026-02')),
      coordinator.post('/api/submissions', { siteId: site.id, month: '2026-02' }),
    ]);
    expect(opened.status).toBe(201);
    expect([200, 409]).toContain(closed.status);
    expect((await monthsOf(coordinator, site)).get('2026-02')).toMatchObject({
      state: 'in-progress',
      closed: closed.status === 200 ? { by: 'Mara Lind' } : null,
    });
  });
});

describe('the calendar', () => {
  it('shows a steward the last twelve months of every site, from the first that the site submits', async () => {
    const { body } = await steward.get('/api/calendar').expect(200);
    expect(body.months).toHaveLength(12);
    expect([body.months[0], body.months[11]]).toEqual(['2025-04', '2026-03']);
    expect(body.sites.map((one: { site: TestSite; months: SiteMonth[] }) => [one.site.id, one.months.map(({ state }) => state)])).toEqual([
      [site.id, ['accepted', 'checking', 'accepted', 'in-progress', 'not-yet-due']],
      [other.id, ['overdue', 'not-yet-due']],
    ]);
  });

  it('shows a coordinator and a therapist their own sites', async () => {
    for (const who of [coordinator, therapist]) {
      const { body } = await who.get('/api/calendar').expect(200);
      expect(body.sites.map((one: { site: TestSite }) => one.site.id)).toEqual([site.id]);
    }
  });

  it('is not for researchers and administrators', async () => {
    for (const role of ['researcher', 'administrator'] as const) {
      expect((await (await makePerson(server, { grants: [{ role }] })).get('/api/calendar')).status).toBe(403);
    }
  });
});
