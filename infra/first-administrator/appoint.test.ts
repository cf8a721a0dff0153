import { randomUUID } from 'node:crypto';
import type { DataSource } from 'typeorm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readVerdict } from '../../services/api/src/audit/read-verdict.ts';
import { registry } from '../../services/api/src/authority/actor.ts';
import { asActor } from '../../services/api/src/database/as-actor.ts';
import { makeDataSource } from '../../services/api/src/database/data-source.ts';
import { migrate } from '../../services/api/src/database/migrate.ts';
import { startThrowAwayCluster } from '../database/cluster.ts';
import type { RunningCluster } from '../database/cluster.ts';
import { ensureRoles } from '../database/roles.ts';
import { appointFirstAdministrator } from './appoint.ts';

const issuer = 'https://sign-in.example';

let cluster: RunningCluster;
let database: DataSource;
beforeAll(async () => {
  cluster = await startThrowAwayCluster();
  const { databaseUrl, appUrl } = await ensureRoles(cluster.adminUrl, 'login');
  await migrate(databaseUrl);
  database = await makeDataSource({ url: appUrl, poolSize: 2 }).initialize();
  for (const subject of ['first', 'second']) {
    await asActor(database, registry, (tx) =>
      tx.query('insert into accounts (id, issuer, subject, name) values ($1, $2, $3, $4)', [randomUUID(), issuer, subject, subject]),
    );
  }
}, 120_000);
afterAll(async () => {
  await database.destroy();
  await cluster.stop();
});

const administrators = (): Promise<{ subject: string }[]> =>
  asActor(
    database,
    registry,
    (tx) =>
      tx.query(`select subject from grants join accounts on accounts.id = account_id where role = 'administrator'`) as Promise<
        { subject: string }[]
      >,
  );

describe('appointFirstAdministrator', () => {
  it('appoints only somebody who has signed in under the named provider', async () => {
    await expect(appointFirstAdministrator(database, { issuer: 'https://other.example', subject: 'first' })).rejects.toThrow(
      'has signed in yet',
    );
    await expect(appointFirstAdministrator(database, { issuer, subject: 'nobody' })).rejects.toThrow('has signed in yet');
    expect(await administrators()).toEqual([]);
  });

  it('appoints one of two who try at once, once, and writes it into the audit log', async () => {
    const tries = await Promise.allSettled(['first', 'second'].map((subject) => appointFirstAdministrator(database, { issuer, subject })));
    expect(tries.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    expect(await administrators()).toHaveLength(1);
    await expect(appointFirstAdministrator(database, { issuer, subject: 'second' })).rejects.toThrow('has an administrator already');
    const acts = (await asActor(database, registry, (tx) => tx.query('select act, result from audit_entries'))) as object[];
    expect(acts).toEqual([{ act: 'grant.first-administrator', result: 'ok' }]);
    expect(await asActor(database, registry, readVerdict)).toMatchObject({ holds: true, entries: 1 });
  });

  it('fills the post again once nobody holds it any more', async () => {
    await asActor(database, registry, (tx) => tx.query(`update grants set ends_on = date '2000-01-01' where role = 'administrator'`));
    await appointFirstAdministrator(database, { issuer, subject: 'second' });
    expect((await administrators()).map(({ subject }) => subject)).toContain('second');
  });
});
