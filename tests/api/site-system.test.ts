/** A site's own system: by an access token of the client credentials grant it submits for its one site, and does nothing else. */
import { createHmac, randomUUID } from 'node:crypto';
import { exportJWK, exportSPKI, generateKeyPair, importJWK, SignJWT, type JWTPayload } from 'jose';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { endpoints, type Endpoint, type EndpointName } from '../../packages/contract/src/index.ts';
import { authority, entries } from '../../services/api/src/authority/table.ts';
import { checkSubmission } from '../../services/api/src/features/submissions/check-submission.ts';
import { makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { csvOf, rowOf } from '../support/rows.ts';
import { startTestServer, type TestServer } from '../support/server.ts';
import { startTestProvider, type TestProvider } from '../support/test-provider.ts';

let provider: TestProvider;
let server: TestServer;
let site: TestSite;
let elsewhere: TestSite;
let administrator: TestPerson;
let steward: TestPerson;
let coordinator: TestPerson;
let systemId: string;

const subject = 'training-records-7';
const label = 'Training records of the test clinic';

beforeAll(async () => {
  provider = await startTestProvider();
  server = await startTestServer({ OIDC_ISSUER: provider.issuer, SYSTEM_LIMIT_PER_MINUTE: '100000' });
  site = await makeSite(server);
  elsewhere = await makeSite(server);
  administrator = await makePerson(server, { grants: [{ role: 'administrator' }], name: 'Administrator' });
  steward = await makePerson(server, { grants: [{ role: 'steward' }] });
  coordinator = await makePerson(server, { grants: [{ role: 'coordinator', site }] });
  const added = await administrator.post('/api/site-systems', { siteId: site.id, subject, label }).expect(201);
  systemId = added.body.id;
});
afterAll(async () => {
  await server.close();
  await provider.close();
});

const seconds = (): number => Math.floor(Date.now() / 1000);
const claims = (changes: JWTPayload = {}): JWTPayload => ({
  iss: provider.issuer,
  sub: subject,
  client_id: subject,
  aud: `${server.url}/api`,
  scope: 'submissions',
  iat: seconds(),
  exp: seconds() + 300,
  ...changes,
});
const sign = (of: JWTPayload, header: Record<string, unknown> = {}): Promise<string> => provider.sign(of, { typ: 'at+jwt', ...header });
const codeOf = (answer: supertest.Response): string => String(answer.body.type).replace('/problems/', '');

/** Requests as the system sends them. */
async function system(token?: string) {
  const bearer = `Bearer ${token ?? (await sign(claims()))}`;
  const agent = supertest(server.url);
  return {
    get: (path: string) => agent.get(path).set('Authorization', bearer),
    post: (path: string, body: object = {}) => agent.post(path).set('Authorization', bearer).send(body),
    put: (path: string, body: object = {}) => agent.put(path).set('Authorization', bearer).send(body),
    delete: (path: string) => agent.delete(path).set('Authorization', bearer),
    upload: (path: string, bytes: string) => agent.put(path).set('Authorization', bearer).set('Content-Type', 'text/csv').send(bytes),
  };
}

describe('the access token of a system', () => {
  it('lets it in: without a session, a cookie or the header of the pages', async () => {
    const { get, post } = await system();
    const answer = await get('/api/sites').expect(200);
    expect(answer.body.sites).toEqual([site]);
    expect(answer.headers['set-cookie']).toBeUndefined();
    await post('/api/submissions', { siteId: site.id, month: '2026-01' }).expect(201);
    const { rows } = await server.database.owner.query('select count(*)::int as n from web_sessions where sess::text like $1', [
      `%${subject}%`,
    ]);
    expect(rows).toEqual([{ n: 0 }]);
  });

  const unsigned = (): string =>
    [{ alg: 'none', typ: 'at+jwt' }, claims()].map((part) => Buffer.from(JSON.stringify(part)).toString('base64url')).join('.') + '.';
  const hostile: [string, () => Promise<string> | string][] = [
    ['has expired', () => sign(claims({ iat: seconds() - 600, exp: seconds() - 10 }))],
    ['does not count yet', () => sign(claims({ nbf: seconds() + 120 }))],
    ['never expires', () => sign({ ...claims(), exp: undefined } as unknown as JWTPayload)],
    ['was given more than a day ago', () => sign(claims({ iat: seconds() - 90_000 }))],
    ['is for the sign-in of people', () => sign(claims({ aud: 'cairnstep' }))],
    ['is for another address that begins alike', () => sign(claims({ aud: `${server.url}/api/` }))],
    ['is of another issuer', () => sign(claims({ iss: `${provider.issuer}/` }))],
    ['is not signed', unsigned],
    [
      'is not signed but for the word none in capitals',
      () => unsigned().replace(/^[^.]+/, Buffer.from('{"alg":"NONE","typ":"at+jwt"}').toString('base64url')),
    ],
    [
      'is signed with the public key as a password',
      async () => {
        const key = await exportSPKI((await importJWK(provider.keys.publicJwk, 'RS256', { extractable: true })) as CryptoKey);
        const text = [{ alg: 'HS256', typ: 'at+jwt', kid: 'key-1' }, claims()]
          .map((part) => Buffer.from(JSON.stringify(part)).toString('base64url'))
          .join('.');
        return `${text}.${createHmac('sha256', key).update(text).digest('base64url')}`;
      },
    ],
    [
      'is signed by somebody else under the same name of a key',
      async () => {
        const { privateKey } = await generateKeyPair('RS256');
        return new SignJWT(claims()).setProtectedHeader({ alg: 'RS256', kid: 'key-1', typ: 'at+jwt' }).sign(privateKey);
      },
    ],
    [
      'brings its own key',
      async () => {
        const { privateKey, publicKey } = await generateKeyPair('RS256', { extractable: true });
        return new SignJWT(claims()).setProtectedHeader({ alg: 'RS256', typ: 'at+jwt', jwk: await exportJWK(publicKey) }).sign(privateKey);
      },
    ],
    ['is an ID token by its type', () => sign(claims(), { typ: 'JWT' })],
    ['is of a person who signed in through the same client', () => sign(claims({ sub: 'person-1' }))],
    ['names no client', () => sign({ ...claims(), client_id: undefined } as unknown as JWTPayload)],
    ['is of a client that nobody registered', () => sign(claims({ sub: 'another', client_id: 'another' }))],
    ['is registered in other letters', () => sign(claims({ sub: subject.toUpperCase(), client_id: subject.toUpperCase() }))],
    ['is no token', () => 'abc'],
    ['is empty', () => ''],
  ];
  it.each(hostile)('is refused when it %s', async (_what, make) => {
    const token = await make();
    const answer = await (await system(token)).get('/api/sites');
    expect([answer.status, codeOf(answer)]).toEqual([401, 'token-refused']);
    expect(answer.headers['www-authenticate']).toBe('Bearer error="invalid_token"');
    if (token.length > 10) for (const line of server.logLines) expect(line).not.toContain(token);
    await (await system()).get('/api/sites').expect(200);
  });

  it.each([
    ['another scope', 'openid'],
    ['a scope that only begins alike', 'submissions-read'],
    ['no scope', undefined],
  ])('is refused with %s, and told which is needed', async (_what, scope) => {
    const answer = await (await system(await sign({ ...claims(), scope } as JWTPayload))).get('/api/sites');
    expect([answer.status, codeOf(answer)]).toEqual([403, 'token-without-scope']);
    expect(answer.headers['www-authenticate']).toBe('Bearer error="insufficient_scope", scope="submissions"');
  });

  it('counts among several scopes', async () => {
    await (await system(await sign(claims({ scope: 'openid submissions' })))).get('/api/sites').expect(200);
  });

  it("is not sent beside a person's session", async () => {
    const answer = await supertest(server.url)
      .get('/api/sites')
      .set('Authorization', `Bearer ${await sign(claims())}`)
      .set('Cookie', `theme=dark; ${coordinator.cookie}`);
    expect([answer.status, codeOf(answer)]).toEqual([400, 'two-identities']);
    // Another cookie, as something between may add one, is no session.
    await supertest(server.url)
      .get('/api/sites')
      .set('Authorization', `Bearer ${await sign(claims())}`)
      .set('Cookie', 'theme=dark')
      .expect(200);
  });

  it('that does not hold never falls back to the session', async () => {
    const answer = await supertest(server.url)
      .post('/api/submissions')
      .set('Authorization', 'Bearer abc')
      .set('Cookie', coordinator.cookie)
      .send({ siteId: site.id, month: '2026-02' });
    expect(answer.status).toBe(400);
  });

  it('is not read from the address or the body', async () => {
    const token = await sign(claims());
    expect((await supertest(server.url).get(`/api/sites?access_token=${token}`)).status).toBe(401);
    expect((await supertest(server.url).post('/api/submissions').send({ access_token: token })).status).toBe(403);
  });

  it('is not asked for where a person signs in: the challenge of an answer 401 names it all the same', async () => {
    const answer = await supertest(server.url).get('/api/sites').expect(401);
    expect(answer.headers['www-authenticate']).toBe('Bearer');
  });

  it('meets a limit of requests, whether it holds or not', async () => {
    const limited = await startTestServer({ OIDC_ISSUER: provider.issuer, SYSTEM_LIMIT_PER_MINUTE: '3' });
    const statuses: number[] = [];
    for (let turn = 0; turn < 5; turn += 1) {
      statuses.push((await supertest(limited.url).get('/api/sites').set('Authorization', 'Bearer abc')).status);
    }
    expect(statuses).toEqual([401, 401, 401, 429, 429]);
    // A person at the same address is not held up.
    await supertest(limited.url).get('/api/account').expect(200);
    await limited.close();
  });

  it('is told from a provider that does not answer', async () => {
    const alone = await startTestServer({ OIDC_ISSUER: 'http://127.0.0.1:9' });
    const answer = await supertest(alone.url)
      .get('/api/sites')
      .set('Authorization', `Bearer ${await sign(claims())}`);
    expect([answer.status, codeOf(answer)]).toEqual([503, 'provider-unavailable']);
    await alone.close();
  });
});

describe('what a system may do', () => {
  const all = Object.entries(endpoints) as [EndpointName, Endpoint][];
  const fill = (name: string): string =>
    name === 'table' ? 'bouts' : name === 'month' ? '2026-02' : name === 'token' ? 'a'.repeat(43) : randomUUID();

  it.each(all)('%s: what its column of the authority table says', async (name, endpoint) => {
    const who = await system();
    const path = endpoint.path.replace(/:(\w+)/g, (_match, parameter: string) => fill(parameter));
    const answer =
      endpoint.method === 'GET'
        ? await who.get(path)
        : endpoint.method === 'DELETE'
          ? await who.delete(path)
          : endpoint.method === 'PUT'
            ? await who.put(path)
            : await who.post(path);
    const entry = entries[name];
    if (['/api/health/live', '/api/health/ready', '/api/public/figures'].includes(endpoint.path))
      expect([200, 503]).toContain(answer.status);
    else if (entry === 'anyone' || entry === 'signed-in' || authority[entry]['site-system'] === 'no')
      expect(codeOf(answer)).toBe('not-permitted');
    else expect([401, 403]).not.toContain(answer.status);
  });

  it('does not reach another site: its months and submissions are not there', async () => {
    const other = await makePerson(server, { grants: [{ role: 'coordinator', site: elsewhere }] });
    const theirs = (await other.post('/api/submissions', { siteId: elsewhere.id, month: '2026-01' }).expect(201)).body.id as string;
    const { get, post, upload } = await system();
    for (const id of [elsewhere.id, randomUUID()]) {
      expect((await get(`/api/sites/${id}/months`)).status).toBe(404);
      expect((await get(`/api/submissions?siteId=${id}`)).status).toBe(404);
      expect((await post('/api/submissions', { siteId: id, month: '2026-01' })).status).toBe(404);
      expect((await post(`/api/sites/${id}/months/2026-02/nothing-to-report`)).status).toBe(404);
    }
    for (const id of [theirs, randomUUID()]) {
      expect((await get(`/api/submissions/${id}`)).status).toBe(404);
      expect((await upload(`/api/submissions/${id}/files/bouts?fileName=bouts.csv`, 'a,b\r\n')).status).toBe(404);
      expect((await post(`/api/submissions/${id}/discard`)).status).toBe(404);
    }
    expect((await get('/api/calendar').expect(200)).body.sites.map((one: { site: TestSite }) => one.site.id)).toEqual([site.id]);
  });

  it('submits a month; submission, receipt and log name it', async () => {
    const who = await system();
    const id = (await who.post('/api/submissions', { siteId: site.id, month: '2026-03' }).expect(201)).body.id as string;
    for (const table of ['participants', 'consents'] as const) {
      await who.upload(`/api/submissions/${id}/files/${table}?fileName=${table}.csv`, csvOf(table, [rowOf(table)])).expect(200);
    }
    await who.post(`/api/submissions/${id}/check`).expect(202);
    await checkSubmission(server.context, id);
    const checked = (await who.get(`/api/submissions/${id}`).expect(200)).body;
    expect(checked).toMatchObject({ status: 'checked', createdBy: label });
    const receipt = (await who.post(`/api/submissions/${id}/commit`, { previewDigest: checked.preview.digest }).expect(200)).body;
    expect(receipt.acceptedBy).toBe(label);
    expect((await coordinator.get(`/api/submissions/${id}/receipt`).expect(200)).body).toEqual(receipt);
    expect((await coordinator.get(`/api/submissions?siteId=${site.id}`).expect(200)).body.items[0].createdBy).toBe(label);
    // Its coordinators are told, by mail.
    const mails = await server.database.owner.query('select recipient, body from mail_messages where event like $1', [
      `submission-accepted:${id}%`,
    ]);
    expect(mails.rows).toEqual([{ recipient: coordinator.email, body: expect.stringContaining(`committed by ${label}`) }]);
    const { items } = (await steward.get('/api/audit').expect(200)).body;
    const commit = items.find((entry: { act: string }) => entry.act === 'submission.commit');
    expect(commit).toMatchObject({ actor: label, role: 'site-system', object: id });
  });
});

describe('the register of systems', () => {
  it('is kept by administrators and seen by stewards', async () => {
    const { body } = await steward.get('/api/site-systems').expect(200);
    expect(body.tokens).toEqual({ issuer: provider.issuer, audience: `${server.url}/api`, scope: 'submissions' });
    expect(body.systems).toEqual([
      {
        id: systemId,
        site,
        issuer: provider.issuer,
        subject,
        label,
        status: 'active',
        addedAt: expect.any(String),
        addedBy: 'Administrator',
        lastUsedAt: expect.any(String),
      },
    ]);
    for (const who of [steward, coordinator]) {
      expect((await who.post('/api/site-systems', { siteId: site.id, subject: 'x', label: 'Another' })).status).toBe(403);
      expect((await who.put(`/api/site-systems/${systemId}/status`, { status: 'disabled' })).status).toBe(403);
    }
    expect((await coordinator.get('/api/site-systems')).status).toBe(403);
  });

  it('holds a client id once', async () => {
    const again = await administrator.post('/api/site-systems', { siteId: elsewhere.id, subject, label: 'The same again' });
    expect([again.status, codeOf(again)]).toEqual([409, 'system-registered']);
  });

  it('asks for a site of the registry and a client id that can be one', async () => {
    const nowhere = await administrator.post('/api/site-systems', { siteId: randomUUID(), subject: 'x', label: 'Another' });
    expect(nowhere.body.errors).toEqual([expect.objectContaining({ pointer: '/body/siteId' })]);
    const spaced = await administrator.post('/api/site-systems', { siteId: site.id, subject: 'a b', label: 'Another' });
    expect(spaced.body.errors).toEqual([expect.objectContaining({ pointer: '/body/subject' })]);
  });

  it('shuts a disabled system out at its next request, and lets it in again when it is enabled', async () => {
    const { get } = await system();
    await administrator.put(`/api/site-systems/${systemId}/status`, { status: 'disabled' }).expect(200);
    expect(codeOf(await get('/api/sites').expect(401))).toBe('token-refused');
    expect((await administrator.put(`/api/site-systems/${systemId}/status`, { status: 'active' }).expect(200)).body.status).toBe('active');
    await get('/api/sites').expect(200);
    const acts = (await administrator.get('/api/audit').expect(200)).body.items.map((entry: { act: string }) => entry.act);
    expect(acts.slice(0, 2)).toEqual(['site-system.enable', 'site-system.disable']);
  });
});
