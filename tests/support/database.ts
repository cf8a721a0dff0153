/** A database of a test file's own, cloned from the template, and the doors to it. */
import { randomBytes } from 'node:crypto';
import { Client } from 'pg';
import type { DataSource } from 'typeorm';
import { withAccount, withDatabase } from '../../infra/database/connection-url.ts';
import { makeDataSource } from '../../services/api/src/database/data-source.ts';
import { adminUrl, loginPassword, templateDatabase } from './addresses.ts';

export interface TestDatabase {
  /** As the superuser, past row-level security: to look whether there was something to see. */
  readonly owner: Client;
  readonly ownerUrl: string;
  /** As the application signs in. */
  readonly appUrl: string;
  readonly app: DataSource;
  close(): Promise<void>;
}

export async function cloneDatabase(): Promise<TestDatabase> {
  const name = `test_${randomBytes(6).toString('hex')}`;
  const server = new Client({ connectionString: adminUrl() });
  await server.connect();
  // Two files may clone at once; PostgreSQL wants the template for itself.
  await server.query('select pg_advisory_lock(4120)');
  await server.query(`create database ${name} template ${templateDatabase} owner cairnstep_owner`);
  await server.query(`revoke all on database ${name} from public`);
  await server.query(`grant connect on database ${name} to cairnstep_login`);
  await server.query(`grant temporary on database ${name} to cairnstep_app`);
  await server.query('select pg_advisory_unlock(4120)');
  const ownerUrl = withDatabase(adminUrl(), name);
  const appUrl = withAccount(ownerUrl, 'cairnstep_login', loginPassword);
  const owner = new Client({ connectionString: ownerUrl });
  await owner.connect();
  const app = await makeDataSource({ url: appUrl, statementTimeout: 60_000 }).initialize();
  return {
    owner,
    ownerUrl,
    appUrl,
    app,
    close: async () => {
      await app.destroy();
      await owner.end();
      await server.query(`drop database ${name} with (force)`);
      await server.end();
    },
  };
}
