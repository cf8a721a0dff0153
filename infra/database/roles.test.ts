import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Client } from 'pg';
import { startThrowAwayCluster } from './cluster.ts';
import type { RunningCluster } from './cluster.ts';
import { withDatabase } from './connection-url.ts';
import { ensureRoles, loginRole, ownerRole, workRoles } from './roles.ts';

let cluster: RunningCluster;
beforeAll(async () => {
  cluster = await startThrowAwayCluster();
}, 120_000);
afterAll(async () => {
  await cluster.stop();
});

async function ask<Row extends object>(url: string, sql: string): Promise<Row[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Row>(sql)).rows;
  } finally {
    await client.end();
  }
}

describe('ensureRoles', () => {
  it('gives the same roles and database when several ask at once and again later', async () => {
    const answers = await Promise.all([1, 2, 3].map(() => ensureRoles(cluster.adminUrl, 'first')));
    answers.push(await ensureRoles(cluster.adminUrl, 'first'));
    expect(new Set(answers.map((answer) => answer.appUrl)).size).toBe(1);
    const roles = await ask<{ name: string }>(
      cluster.adminUrl,
      `select rolname as name from pg_roles where rolname like 'cairnstep%' order by 1`,
    );
    expect(roles.map(({ name }) => name)).toEqual([ownerRole, ...workRoles, loginRole].sort());
    const databases = await ask<{ owner: string }>(
      cluster.adminUrl,
      `select pg_get_userbyid(datdba) as owner from pg_database where datname = 'cairnstep'`,
    );
    expect(databases).toEqual([{ owner: ownerRole }]);
  });

  it('lets the login role in with the newest password only', async () => {
    const before = await ensureRoles(cluster.adminUrl, "it's the 1st");
    expect(await ask(before.appUrl, 'select current_user as who')).toEqual([{ who: loginRole }]);
    const after = await ensureRoles(cluster.adminUrl, 'the second');
    await expect(ask(before.appUrl, 'select 1')).rejects.toThrow(/password authentication failed/);
    expect(await ask(after.appUrl, 'select current_user as who')).toEqual([{ who: loginRole }]);
  });

  it('keeps the login role from what the roles it may become can reach', async () => {
    const { databaseUrl, appUrl } = await ensureRoles(cluster.adminUrl, 'login');
    await ask(
      databaseUrl,
      `set role ${ownerRole}; create table visible_to_app (x int); grant select on visible_to_app to cairnstep_app; insert into visible_to_app values (1)`,
    );
    await expect(ask(appUrl, 'select x from visible_to_app')).rejects.toThrow(/permission denied/);
    const client = new Client({ connectionString: appUrl });
    await client.connect();
    await client.query('set role cairnstep_app');
    expect((await client.query('select x from visible_to_app')).rows).toEqual([{ x: 1 }]);
    await expect(client.query('drop table visible_to_app')).rejects.toThrow(/must be owner/);
    await expect(client.query(`set role ${ownerRole}`)).rejects.toThrow(/permission denied/);
    await client.end();
  });

  it('refuses a role that could step around row-level security', async () => {
    await ensureRoles(cluster.adminUrl, 'login');
    await ask(cluster.adminUrl, 'alter role cairnstep_app bypassrls');
    await expect(ensureRoles(cluster.adminUrl, 'login')).rejects.toThrow('cairnstep_app');
    await ask(cluster.adminUrl, 'alter role cairnstep_app nobypassrls');
    await expect(ensureRoles(cluster.adminUrl, 'login')).resolves.toBeDefined();
  });

  it('works for an administrator who is no superuser, in a database of their naming', async () => {
    const other = await startThrowAwayCluster();
    try {
      await ask(other.adminUrl, `create role hosted login createdb createrole password 'hosted'`);
      const hosted = new URL(withDatabase(other.adminUrl, 'clinic registry'));
      hosted.username = 'hosted';
      hosted.password = 'hosted';
      const { databaseUrl, appUrl } = await ensureRoles(hosted.href, 'login');
      await ask(databaseUrl, `set role ${ownerRole}; create table owned (x int)`);
      expect(await ask(databaseUrl, `select tableowner as owner from pg_tables where tablename = 'owned'`)).toEqual([{ owner: ownerRole }]);
      expect(await ask(appUrl, 'select current_database() as here')).toEqual([{ here: 'clinic registry' }]);
    } finally {
      await other.stop();
    }
  });
});
