/** Every role, and nobody, through every route: generated from the contract and the authority table, so that a new route is walked too. */
import { randomBytes, randomUUID } from 'node:crypto';
import type supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { endpoints, roles, type Endpoint, type EndpointName, type Role } from '../../packages/contract/src/index.ts';
import { authority, entries } from '../../services/api/src/authority/table.ts';
import { browser, makePerson, makeSite, type TestPerson, type TestSite } from '../support/people.ts';
import { emptyForm } from '../support/request-form.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

let server: TestServer;
let siteA: TestSite;
let siteB: TestSite;
const people = new Map<Role, TestPerson>();
let stranger: TestPerson;
/** Ids that exist and belong to somebody else, by the name of the parameter. */
let foreign: Record<string, string>;

const all = Object.entries(endpoints) as [EndpointName, Endpoint][];

beforeAll(async () => {
  server = await startTestServer();
  siteA = await makeSite(server);
  siteB = await makeSite(server);
  for (const role of roles) {
    const site = role === 'therapist' || role === 'coordinator' ? { site: siteA } : {};
    people.set(role, await makePerson(server, { grants: [{ role, ...site }], name: role }));
  }
  stranger = await makePerson(server, { name: 'No grant' });
  const coordinatorB = await makePerson(server, { grants: [{ role: 'coordinator', site: siteB }] });
  const otherResearcher = await makePerson(server, { grants: [{ role: 'researcher' }] });
  const submission = await coordinatorB.post('/api/submissions', { siteId: siteB.id, month: '2026-01' }).expect(201);
  const request = await otherResearcher.post('/api/access-requests', { form: emptyForm }).expect(201);
  const exportId = randomUUID();
  await server.database.owner.query(
    "insert into exports (id, number, request_id, requested_by, status) values ($1, 'EX-1', $2, $3, 'building')",
    [exportId, request.body.id, otherResearcher.id],
  );
  foreign = {
    siteId: siteB.id,
    submissionId: submission.body.id,
    requestId: request.body.id,
    exportId,
    table: 'bouts',
    month: '2026-02',
    token: randomBytes(32).toString('base64url'),
    personId: otherResearcher.id,
    grantId: randomUUID(),
    invitationId: randomUUID(),
  };
});
afterAll(() => server.close());

function addressOf(endpoint: Endpoint, value: (name: string) => string): string {
  const path = endpoint.path.replace(/:(\w+)/g, (_match, name: string) => encodeURIComponent(value(name)));
  const query: Record<string, string> = endpoint.upload ? { fileName: 'bouts.csv' } : {};
  if (endpoint.path === '/api/submissions') query['siteId'] = value('siteId');
  if (endpoint.path.endsWith('/template')) query['month'] = '2026-01';
  if (endpoint.path.endsWith('/safe-headers') && endpoint.method === 'DELETE') query['header'] = 'mobile';
  if (endpoint.path.endsWith('/changes')) Object.assign(query, { table: 'bouts', kind: 'added' });
  return Object.keys(query).length > 0 ? `${path}?${new URLSearchParams(query).toString()}` : path;
}

function send(
  who: Pick<TestPerson, 'get' | 'post' | 'put' | 'delete' | 'upload'>,
  endpoint: Endpoint,
  value: (name: string) => string,
  body: object = {},
): supertest.Test {
  const address = addressOf(endpoint, value);
  if (endpoint.upload) return who.upload(address, 'a,b\r\n');
  if (endpoint.method === 'GET') return who.get(address);
  if (endpoint.method === 'POST') return who.post(address, body);
  if (endpoint.method === 'PUT') return who.put(address, body);
  return who.delete(address);
}
const anyId = (name: string): string =>
  name === 'table' ? 'bouts' : name === 'month' ? '2026-02' : name === 'token' ? randomBytes(32).toString('base64url') : randomUUID();
const codeOf = (answer: supertest.Response): string | undefined => /^\/problems\/(.+)$/.exec(answer.body?.type ?? '')?.[1];

describe.each(all)('%s', (name, endpoint) => {
  const entry = entries[name];

  it('answers nobody only when it is for anyone', async () => {
    const answer = await send(browser(server, null), endpoint, anyId);
    if (entry === 'anyone') expect([401, 403]).not.toContain(answer.status);
    else expect(codeOf(answer)).toBe('not-signed-in');
  });

  it('tells an identity without a grant whom to ask', async () => {
    const answer = await send(stranger, endpoint, anyId);
    if (entry === 'anyone' || entry === 'signed-in') expect(codeOf(answer)).not.toBe('no-grant');
    else expect(codeOf(answer)).toBe('no-grant');
    // Signing out ended this person's session.
    if (name === 'signOut') stranger = await makePerson(server, { name: 'No grant' });
  });

  it.each(roles)('does for a %s what the table says', async (role) => {
    const person = people.get(role);
    if (!person) throw new Error('every role has a person');
    const answer = await send(person, endpoint, anyId);
    const may = entry === 'anyone' || entry === 'signed-in' || authority[entry][role] !== 'no';
    if (may) expect([401, 403]).not.toContain(answer.status);
    else expect(codeOf(answer)).toBe('not-permitted');
    if (name === 'signOut')
      people.set(
        role,
        await makePerson(server, { grants: [{ role, ...(role === 'therapist' || role === 'coordinator' ? { site: siteA } : {}) }] }),
      );
  });
});

describe('an id of somebody else', () => {
  /** Of stewards alone, who reach every site: no site is somebody else's. */
  const ofStewards: readonly EndpointName[] = ['markSafeHeader', 'unmarkSafeHeader'];
  const withIds = all.filter(
    ([name, endpoint]) =>
      !ofStewards.includes(name) &&
      (/:(siteId|submissionId|requestId|exportId)/.test(endpoint.path) || name === 'listSubmissions' || name === 'openSubmission'),
  );
  /** Valid bodies where the body is read before the row is looked for. */
  const bodies: Partial<Record<EndpointName, () => object>> = {
    replaceCodes: () => ({ codes: [{ from: `S${'0'.repeat(21)}`, to: `S${'1'.repeat(21)}` }] }),
    openSubmission: () => ({ siteId: siteB.id, month: '2026-01' }),
    mendCells: () => ({ mends: [{ table: 'bouts', line: 2, column: 'steps', value: '40' }] }),
    acknowledgeFindings: () => ({ rule: 'C01', reason: 'it is right' }),
    commitSubmission: () => ({ previewDigest: 'a'.repeat(64) }),
    saveRequest: () => ({ form: emptyForm }),
    decideRequest: () => ({ versionHash: 'a'.repeat(64), vote: 'approve', reason: 'a good and proper use', noConflict: true }),
  };

  it.each(withIds)('%s: reads the same as an id that does not exist', async (name, endpoint) => {
    const entry = entries[name];
    if (entry === 'anyone' || entry === 'signed-in') throw new Error('a route with an id needs an action');
    const limited = roles.filter((role) => authority[entry][role] === 'own-site' || authority[entry][role] === 'own');
    // A draft of a researcher is out of reach of stewards as well.
    const askers: Role[] = limited.length > 0 ? limited : ['steward'];
    for (const role of askers) {
      const person = people.get(role);
      if (!person) throw new Error('every role has a person');
      const value = (parameter: string): string => {
        const known = foreign[parameter];
        if (!known) throw new Error(`Add a foreign id for the parameter ${parameter}.`);
        return known;
      };
      const theirs = await send(person, endpoint, value, bodies[name]?.());
      const unknownBody = name === 'openSubmission' ? { siteId: randomUUID(), month: '2026-01' } : bodies[name]?.();
      const unknown = await send(person, endpoint, anyId, unknownBody);
      expect(theirs.status).toBe(404);
      const { instance: _a, ...theirBody } = theirs.body;
      const { instance: _b, ...unknownAnswer } = unknown.body;
      expect(theirBody).toEqual(unknownAnswer);
      expect(unknown.status).toBe(404);
    }
  });
});

describe('a change of grants', () => {
  it('takes effect at the next request, and a disabled account is signed out', async () => {
    const person = await makePerson(server, { grants: [{ role: 'steward' }] });
    await person.get('/api/releases').expect(200);
    await server.database.owner.query('update grants set ends_on = current_date - 1 where account_id = $1', [person.id]);
    expect(codeOf(await person.get('/api/releases'))).toBe('no-grant');
    await server.database.owner.query('update grants set ends_on = null where account_id = $1', [person.id]);
    await person.get('/api/releases').expect(200);
    await server.database.owner.query("update accounts set status = 'disabled' where id = $1", [person.id]);
    expect(codeOf(await person.get('/api/releases'))).toBe('not-signed-in');
  });

  it('begins on its first day and ends after its last', async () => {
    const person = await makePerson(server, { grants: [{ role: 'steward' }] });
    await server.database.owner.query("update grants set starts_on = (now() at time zone 'UTC')::date + 1 where account_id = $1", [
      person.id,
    ]);
    expect(codeOf(await person.get('/api/releases'))).toBe('no-grant');
    await server.database.owner.query(
      "update grants set starts_on = (now() at time zone 'UTC')::date - 1, ends_on = (now() at time zone 'UTC')::date where account_id = $1",
      [person.id],
    );
    await person.get('/api/releases').expect(200);
  });
});
