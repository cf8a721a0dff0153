/** The administrator's desk: invitations, grants, accounts. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

let server: TestServer;
let site: TestSite;
let administrator: TestPerson;
let steward: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
  site = await makeSite(server);
  administrator = await makePerson(server, { grants: [{ role: 'administrator' }], name: 'Administrator' });
  steward = await makePerson(server, { grants: [{ role: 'steward' }] });
});
afterAll(() => server.close());

const codeOf = (body: { type?: string }): string => (body.type ?? '').replace('/problems/', '');

describe('an invitation', () => {
  it('is mailed with a link that only the mail holds', async () => {
    const sent = await administrator
      .post('/api/invitations', { email: 'new.person@clinic.example', role: 'coordinator', siteId: site.id, grantEndsOn: null })
      .expect(201);
    expect(sent.body).toMatchObject({ status: 'sent', role: 'coordinator', site: { code: site.code } });
    expect(JSON.stringify(sent.body)).not.toMatch(/token/i);
    const { rows } = await server.database.owner.query("select recipient, body from mail_messages where event like 'invitation:%'");
    expect(rows[0].recipient).toBe('new.person@clinic.example');
    const token = /\/invitation\/([A-Za-z0-9_-]{43})/.exec(rows[0].body as string)?.[1] ?? '';
    const stored = await server.database.owner.query('select token_hash from invitations');
    expect(JSON.stringify(stored.rows)).not.toContain(token);

    const guest = await makePerson(server);
    const account = await guest.post(`/api/invitations/${token}/accept`).expect(200);
    expect(account.body.grants).toEqual([expect.objectContaining({ role: 'coordinator' })]);
    await guest.get(`/api/sites/${site.id}/months`).expect(200);
    const listed = await steward.get('/api/people').expect(200);
    expect(listed.body.invitations).toEqual([expect.objectContaining({ status: 'accepted' })]);
    for (const line of server.logLines) expect(line).not.toContain(token);
  });

  it('asks for a site where the role has one, and for none where it has not', async () => {
    for (const [role, siteId] of [
      ['therapist', null],
      ['steward', site.id],
    ] as const) {
      const refused = await administrator.post('/api/invitations', { email: 'x@clinic.example', role, siteId, grantEndsOn: null });
      expect(refused.body.errors).toEqual([expect.objectContaining({ pointer: '/body/siteId' })]);
    }
  });

  it('says whose account has the address already, and is sent all the same: an address recognises nobody', async () => {
    const known = await makePerson(server, { name: 'Known person' });
    const sent = await administrator
      .post('/api/invitations', { email: known.email.toUpperCase(), role: 'researcher', siteId: null, grantEndsOn: null })
      .expect(201);
    expect(sent.body.accountsWithAddress).toEqual([{ id: known.id, name: 'Known person' }]);
    const stranger = await administrator
      .post('/api/invitations', { email: 'stranger@clinic.example', role: 'researcher', siteId: null, grantEndsOn: null })
      .expect(201);
    expect(stranger.body.accountsWithAddress).toEqual([]);
  });

  it('gives no second grant to whoever has the role, but a longer one', async () => {
    const person = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
    const accept = async (changes: object): Promise<number> => {
      await administrator
        .post('/api/invitations', { email: 'again@clinic.example', role: 'coordinator', siteId: site.id, grantEndsOn: null, ...changes })
        .expect(201);
      const { rows } = await server.database.owner.query(
        "select body from mail_messages where recipient = 'again@clinic.example' order by created_at desc limit 1",
      );
      const token = /\/invitation\/([A-Za-z0-9_-]{43})/.exec(rows[0].body as string)?.[1] ?? '';
      return (await person.post(`/api/invitations/${token}/accept`).expect(200)).body.grants.length;
    };
    expect(await accept({})).toBe(1);
    await server.database.owner.query('update grants set ends_on = current_date + 10 where account_id = $1', [person.id]);
    expect(await accept({})).toBe(2);
  });

  it('can be taken back', async () => {
    const sent = await administrator
      .post('/api/invitations', { email: 'y@clinic.example', role: 'researcher', siteId: null, grantEndsOn: null })
      .expect(201);
    expect((await administrator.delete(`/api/invitations/${sent.body.id}`).expect(200)).body.status).toBe('revoked');
    expect(codeOf((await administrator.delete(`/api/invitations/${sent.body.id}`)).body)).toBe('invitation-unusable');
  });
});

describe('a grant', () => {
  it('is given, takes effect at once, and ends at the next request after it is ended', async () => {
    const person = await makePerson(server, { name: 'Person' });
    await person.get('/api/releases').expect(403);
    const today = new Date().toISOString().slice(0, 10);
    const given = await administrator
      .post(`/api/people/${person.id}/grants`, { role: 'researcher', siteId: null, startsOn: today, endsOn: null })
      .expect(201);
    await person.get('/api/releases').expect(200);
    await administrator.post(`/api/people/${person.id}/grants/${given.body.grants[0].id}/end`).expect(200);
    await person.get('/api/releases').expect(403);
  });

  it('is not given to oneself, nor taken from oneself, nor is the own account disabled', async () => {
    const today = new Date().toISOString().slice(0, 10);
    const own = (await administrator.get('/api/people').expect(200)).body.people.find((one: { id: string }) => one.id === administrator.id);
    for (const attempt of [
      administrator.post(`/api/people/${administrator.id}/grants`, { role: 'steward', siteId: null, startsOn: today, endsOn: null }),
      administrator.post(`/api/people/${administrator.id}/grants/${own.grants[0].id}/end`),
      administrator.put(`/api/people/${administrator.id}/status`, { status: 'disabled' }),
    ]) {
      expect(codeOf((await attempt).body)).toBe('grant-to-oneself');
    }
  });

  it('is given once for the same days, whoever asks at the same time', async () => {
    const person = await makePerson(server);
    const give = (startsOn: string, endsOn: string | null, siteId = site.id) =>
      administrator.post(`/api/people/${person.id}/grants`, { role: 'coordinator', siteId, startsOn, endsOn });
    const answers = await Promise.all([give('2026-05-01', '2026-05-31'), give('2026-05-01', '2026-05-31')]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409]);
    for (const [startsOn, endsOn] of [
      ['2026-05-31', null],
      ['2026-04-01', '2026-05-01'],
      ['2026-05-10', '2026-05-11'],
      ['2026-01-01', null],
    ] as const) {
      expect(codeOf((await give(startsOn, endsOn)).body), `${startsOn} to ${endsOn}`).toBe('already-held');
    }
    await give('2026-06-01', null).expect(201);
    await give('2026-01-01', '2026-04-30').expect(201);
    await give('2026-05-01', null, (await makeSite(server)).id).expect(201);
  });

  it('may be given again after it was ended on its first day', async () => {
    const person = await makePerson(server);
    const today = new Date().toISOString().slice(0, 10);
    const give = () =>
      administrator.post(`/api/people/${person.id}/grants`, { role: 'steward', siteId: null, startsOn: today, endsOn: null });
    const given = await give().expect(201);
    await administrator.post(`/api/people/${person.id}/grants/${given.body.grants[0].id}/end`).expect(200);
    await give().expect(201);
  });

  it('does not end before it begins', async () => {
    const refused = await administrator.post(`/api/people/${steward.id}/grants`, {
      role: 'researcher',
      siteId: null,
      startsOn: '2026-05-02',
      endsOn: '2026-05-01',
    });
    expect(refused.body.errors).toEqual([expect.objectContaining({ pointer: '/body/endsOn' })]);
  });
});

describe('an account', () => {
  it('is disabled and enabled, never deleted, and each act is in the log', async () => {
    const person = await makePerson(server, { grants: [{ role: 'steward' }] });
    await administrator.put(`/api/people/${person.id}/status`, { status: 'disabled' }).expect(200);
    await person.get('/api/releases').expect(401);
    await administrator.put(`/api/people/${person.id}/status`, { status: 'active' }).expect(200);
    const acts = (await administrator.get('/api/audit').expect(200)).body.items.map((entry: { act: string }) => entry.act);
    expect(acts.slice(0, 2)).toEqual(['account.enable', 'account.disable']);
  });
});
