/** Requests that must be refused whatever they ask: from other origins, malformed, too large, with extra keys. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import supertest from 'supertest';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

let server: TestServer;
let site: TestSite;
let coordinator: TestPerson;
let administrator: TestPerson;
beforeAll(async () => {
  server = await startTestServer();
  site = await makeSite(server);
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
  administrator = await makePerson(server, { grants: [{ role: 'administrator' }] });
});
afterAll(() => server.close());

const plain = () => supertest(server.url);
const submissions = async (): Promise<number> =>
  (await server.database.owner.query('select count(*)::int as n from submissions')).rows[0].n;

describe('a request from another origin', () => {
  it.each([
    ['a form', (test: supertest.Test) => test.type('form').send('month=2026-01')],
    [
      'JSON sent as plain text',
      (test: supertest.Test) => test.set('Content-Type', 'text/plain').send(JSON.stringify({ siteId: site.id, month: '2026-01' })),
    ],
    ['a request without the header', (test: supertest.Test) => test.send({ siteId: site.id, month: '2026-01' })],
    [
      'another origin with the header',
      (test: supertest.Test) =>
        test.set('X-Cairnstep-Request', '1').set('Origin', 'https://elsewhere.example').send({ siteId: site.id, month: '2026-01' }),
    ],
    [
      'a cross-site fetch with the header',
      (test: supertest.Test) =>
        test.set('X-Cairnstep-Request', '1').set('Sec-Fetch-Site', 'cross-site').send({ siteId: site.id, month: '2026-01' }),
    ],
    [
      'a same-site fetch with the header',
      (test: supertest.Test) =>
        test.set('X-Cairnstep-Request', '1').set('Sec-Fetch-Site', 'same-site').send({ siteId: site.id, month: '2026-01' }),
    ],
  ])('%s is refused and changes nothing', async (_what, finish) => {
    const before = await submissions();
    const answer = await finish(plain().post('/api/submissions').set('Cookie', coordinator.cookie));
    expect(answer.status).toBe(403);
    expect(answer.body.type).toBe('/problems/request-not-from-here');
    expect(await submissions()).toBe(before);
  });

  it('is served when it comes from the application itself', async () => {
    const answer = await plain()
      .post('/api/submissions')
      .set('Cookie', coordinator.cookie)
      .set('X-Cairnstep-Request', '1')
      .set('Origin', server.url)
      .set('Sec-Fetch-Site', 'same-origin')
      .send({ siteId: site.id, month: '2026-01' });
    expect(answer.status).toBe(201);
  });
});

describe('keys nobody asked for', () => {
  it.each(['status', 'id', 'createdBy', 'constructor', '__proto__'])('%s in a body is named and nothing is stored', async (key) => {
    const before = await submissions();
    const body = `{"siteId": "${site.id}", "month": "2026-02", "${key}": "x"}`;
    const answer = await plain()
      .post('/api/submissions')
      .set('Cookie', coordinator.cookie)
      .set('X-Cairnstep-Request', '1')
      .type('json')
      .send(body);
    expect(answer.status).toBe(400);
    expect(answer.body.errors.map((error: { pointer: string }) => error.pointer)).toContain(`/body/${key}`);
    expect(await submissions()).toBe(before);
  });

  it('do not let a person give themselves a role', async () => {
    const answer = await administrator.post(`/api/people/${administrator.id}/grants`, {
      role: 'steward',
      siteId: null,
      startsOn: '2026-01-01',
      endsOn: null,
    });
    expect(answer.body.type).toBe('/problems/grant-to-oneself');
  });
});

describe('what cannot be read', () => {
  it('is answered with a problem that says nothing of the inside', async () => {
    const answer = await plain()
      .post('/api/submissions')
      .set('Cookie', coordinator.cookie)
      .set('X-Cairnstep-Request', '1')
      .type('json')
      .send('{"siteId": ');
    expect(answer.status).toBe(400);
    expect(answer.headers['content-type']).toContain('application/problem+json');
    expect(answer.body).toMatchObject({ type: '/problems/invalid-input', status: 400 });
    expect(JSON.stringify(answer.body)).not.toMatch(/SyntaxError|stack|node_modules/);
  });

  it('is refused when it is too large, before it is read', async () => {
    const answer = await coordinator.post('/api/submissions', { siteId: site.id, month: '2026-01', filler: 'x'.repeat(300_000) });
    expect(answer.status).toBe(413);
  });

  it('names every issue with its place', async () => {
    const answer = await administrator.post('/api/invitations', { email: 'nobody', role: 'king', siteId: 5, grantEndsOn: 'soon' });
    expect(answer.status).toBe(400);
    expect(answer.body.errors.map((error: { pointer: string }) => error.pointer).sort()).toEqual([
      '/body/email',
      '/body/grantEndsOn',
      '/body/role',
      '/body/siteId',
    ]);
  });
});

describe('every answer', () => {
  it('forbids caching of data, framing and foreign content, and hides what runs it', async () => {
    const answer = await coordinator.get('/api/account').expect(200);
    expect(answer.headers['cache-control']).toBe('no-store');
    expect(answer.headers['content-security-policy']).toContain("default-src 'none'");
    expect(answer.headers['content-security-policy']).toContain("frame-ancestors 'none'");
    expect(answer.headers['content-security-policy']).not.toContain('unsafe');
    expect(answer.headers['x-content-type-options']).toBe('nosniff');
    expect(answer.headers['x-powered-by']).toBeUndefined();
    expect(answer.headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/);
  });

  it('is logged without cookie, query, body or address of a person', async () => {
    await coordinator.get('/api/submissions?siteId=' + site.id).expect(200);
    await coordinator.post('/api/submissions', { siteId: site.id, month: 'marker-in-body' });
    const log = server.logLines.join('');
    expect(log).toContain('"route":"/api/submissions"');
    for (const secret of [
      coordinator.cookie,
      coordinator.cookie.split('=')[1] ?? '',
      'marker-in-body',
      coordinator.email,
      `siteId=${site.id}`,
    ])
      expect(log).not.toContain(secret);
  });
});
