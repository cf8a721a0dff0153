/** Sites and people of a test, and their way in: a session as signing in leaves it. */
import { createHmac, randomBytes, randomUUID } from 'node:crypto';
import type { Role } from '../../packages/contract/src/index.ts';
import supertest from 'supertest';
import { cookieName } from '../../services/api/src/http/session.ts';
import type { TestServer } from './server.ts';

export interface TestSite {
  readonly id: string;
  readonly code: string;
  readonly name: string;
}

let siteNumber = 0;

export async function makeSite(server: TestServer, firstMonth = '2025-01'): Promise<TestSite> {
  siteNumber += 1;
  const site = { id: randomUUID(), code: `S${String(siteNumber).padStart(2, '0')}`, name: `Test clinic ${siteNumber}` };
  await server.database.owner.query('insert into sites (id, code, name, first_month) values ($1, $2, $3, $4)', [
    site.id,
    site.code,
    site.name,
    firstMonth,
  ]);
  return site;
}

export interface TestPerson {
  readonly id: string;
  readonly email: string;
  readonly subject: string;
  readonly cookie: string;
  /** A request as this person's browser sends it. */
  readonly get: (path: string) => supertest.Test;
  readonly post: (path: string, body?: object) => supertest.Test;
  readonly put: (path: string, body?: object) => supertest.Test;
  readonly delete: (path: string) => supertest.Test;
  /** A file as the page uploads it. */
  readonly upload: (path: string, bytes: Buffer | string) => supertest.Test;
}

export interface PersonOptions {
  readonly grants?: readonly { readonly role: Role; readonly site?: TestSite }[];
  readonly institution?: string;
  readonly name?: string;
}

/** The signature express-session puts on its cookie (package cookie-signature). */
const sign = (value: string, secret: string): string =>
  `${value}.${createHmac('sha256', secret).update(value).digest('base64').replace(/=+$/, '')}`;

export async function makeSession(server: TestServer, accountId: string, signedInAt = Date.now()): Promise<string> {
  const sid = randomBytes(24).toString('base64url');
  const session = {
    cookie: { originalMaxAge: 1_800_000, path: '/', httpOnly: true },
    accountId,
    issuer: 'https://provider.example',
    subject: accountId,
    signedInAt,
  };
  await server.database.owner.query("insert into web_sessions (sid, sess, expire) values ($1, $2, now() + interval '30 minutes')", [
    sid,
    session,
  ]);
  return `${cookieName(server.config.secure)}=${encodeURIComponent(`s:${sign(sid, server.config.SESSION_SECRET)}`)}`;
}

export function browser(server: TestServer, cookie: string | null): Omit<TestPerson, 'id' | 'email' | 'subject' | 'cookie'> {
  const prepare = (test: supertest.Test): supertest.Test => {
    if (cookie) test.set('Cookie', cookie);
    return test.set('X-Cairnstep-Request', '1');
  };
  const agent = supertest(server.url);
  return {
    get: (path) => prepare(agent.get(path)),
    post: (path, body = {}) => prepare(agent.post(path)).send(body),
    put: (path, body = {}) => prepare(agent.put(path)).send(body),
    delete: (path) => prepare(agent.delete(path)),
    upload: (path, bytes) =>
      prepare(agent.put(path))
        .set('Content-Type', 'text/csv')
        .send(bytes as string),
  };
}

export async function makePerson(
  server: TestServer,
  { grants = [], institution, name = 'Test person' }: PersonOptions = {},
): Promise<TestPerson> {
  const id = randomUUID();
  const email = `${id.slice(0, 8)}@test.example`;
  await server.database.owner.query(
    'insert into accounts (id, issuer, subject, name, email, institution) values ($1, $2, $3, $4, $5, $6)',
    [id, 'https://provider.example', id, name, email, institution ?? null],
  );
  for (const grant of grants) {
    await server.database.owner.query(
      "insert into grants (id, account_id, role, site_id, starts_on) values ($1, $2, $3, $4, (now() at time zone 'UTC')::date)",
      [randomUUID(), id, grant.role, grant.site?.id ?? null],
    );
  }
  const cookie = await makeSession(server, id);
  return { id, email, subject: id, cookie, ...browser(server, cookie) };
}
