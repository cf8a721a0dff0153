/** Limits that protect the registry from floods and from slow statements. */
import { afterEach, describe, expect, it } from 'vitest';
import { Client } from 'pg';
import supertest from 'supertest';
import { registry } from '../../services/api/src/authority/actor.ts';
import { asActor } from '../../services/api/src/database/as-actor.ts';
import { makeDataSource } from '../../services/api/src/database/data-source.ts';
import { makePerson } from '../support/people.ts';
import { adminUrl } from '../support/addresses.ts';
import { startTestServer, type TestServer } from '../support/server.ts';

let server: TestServer;
afterEach(() => server.close());

describe('requests from one address', () => {
  it('that change something are limited, reading is not', async () => {
    server = await startTestServer({ WRITE_LIMIT_PER_MINUTE: '5' });
    const researcher = await makePerson(server, { grants: [{ role: 'researcher' }] });
    const answers = [];
    for (let i = 0; i < 7; i += 1) answers.push((await researcher.post('/api/access-requests', {})).status);
    expect(answers).toEqual([400, 400, 400, 400, 400, 429, 429]);
    for (let i = 0; i < 10; i += 1) await researcher.get('/api/account').expect(200);
    const refused = await researcher.post('/api/access-requests', {});
    expect(refused.body.type).toBe('/problems/too-many-requests');
  });

  it('to sign in are limited, the public pages are not', async () => {
    server = await startTestServer({ SIGN_IN_LIMIT_PER_MINUTE: '3' });
    const statuses = [];
    for (let i = 0; i < 5; i += 1) statuses.push((await supertest(server.url).get('/api/sign-in')).status);
    expect(statuses).toEqual([503, 503, 503, 429, 429]);
    await supertest(server.url).get('/api/public/figures').expect(200);
  });
});

describe('a statement', () => {
  it('that runs too long is ended and its connection is free again', async () => {
    server = await startTestServer();
    const slow = await makeDataSource({ url: server.database.appUrl, statementTimeout: 200, poolSize: 1 }).initialize();
    // 57014: query_canceled (PostgreSQL error codes).
    await expect(asActor(slow, registry, (tx) => tx.query('select pg_sleep(5)'))).rejects.toMatchObject({ code: '57014' });
    expect(await asActor(slow, registry, (tx) => tx.query('select 1 as one'))).toEqual([{ one: 1 }]);
    await slow.destroy();
  });
});

describe('while the database does not answer', () => {
  it('the process lives, is not ready, and says nothing of the inside', async () => {
    server = await startTestServer();
    const name = new URL(server.database.ownerUrl).pathname.slice(1);
    const admin = new Client({ connectionString: adminUrl() });
    await admin.connect();
    await admin.query(`alter database ${name} with allow_connections false`);
    await admin.query("select pg_terminate_backend(pid) from pg_stat_activity where datname = $1 and usename = 'cairnstep_login'", [name]);
    await supertest(server.url).get('/api/health/live').expect(200);
    const ready = await supertest(server.url).get('/api/health/ready');
    expect(ready.status).toBe(503);
    expect(ready.body.type).toBe('/problems/busy');
    expect(JSON.stringify(ready.body)).not.toMatch(/postgres|connect|database "/i);
    await admin.query(`alter database ${name} with allow_connections true`);
    await admin.end();
    await supertest(server.url).get('/api/health/ready').expect(200);
  });
});
