/** The database of a start: the server one names, or the data folder's own cluster. */
import { join } from 'node:path';
import { Client } from 'pg';
import { databaseOf } from '../database/connection-url.ts';
import { defaultDatabase, ensureRoles } from '../database/roles.ts';
import type { DatabaseAddresses } from '../database/roles.ts';
import type { DataFolder } from './data-folder.ts';
import { rememberPorts } from './ports.ts';
import { startPrivateDatabase } from './private-database.ts';
import type { Secrets } from './secrets.ts';
import { StartError } from './start-error.ts';

export interface DatabaseNeeds {
  /** The DATABASE_URL setting. */
  readonly givenUrl: string | undefined;
  readonly folder: DataFolder;
  readonly secrets: Secrets;
  readonly preferredPort: number | undefined;
  readonly report: (sentence: string) => void;
}

export interface OpenDatabase extends DatabaseAddresses {
  /** Drops the database and makes it anew. Of a server that is not the start's own, it leaves that to its owner. */
  empty(): Promise<void>;
  stop(): Promise<void>;
}

/** The cluster's folder within a data folder. */
export const clusterFolderOf = (dataFolder: string): string => join(dataFolder, 'postgres');

async function onGivenServer(url: string, secrets: Secrets): Promise<OpenDatabase> {
  try {
    const addresses = await ensureRoles(url, secrets.databaseLoginPassword);
    const empty = (): Promise<never> =>
      Promise.reject(
        new StartError(
          `DATABASE_URL: the database ${databaseOf(addresses.databaseUrl)} holds half of the demonstration data. Drop it, then start again.`,
        ),
      );
    return { ...addresses, empty, stop: async () => undefined };
  } catch (error) {
    // PostgreSQL's words name the server, the account and the database, never the password.
    const said = error instanceof AggregateError ? error.errors.map(String).join('; ') : (error as Error).message;
    throw new StartError(
      `DATABASE_URL: the server could not be prepared (${said}). Its account must be able to create roles and databases.`,
    );
  }
}

async function dropDatabase(adminUrl: string, database: string): Promise<void> {
  const admin = new Client({ connectionString: adminUrl });
  await admin.connect();
  try {
    await admin.query(`drop database ${admin.escapeIdentifier(database)} with (force)`);
  } finally {
    await admin.end();
  }
}

/** Opens the database and sees to its roles. Migrations are the caller's next step. */
export async function openDatabase({ givenUrl, folder, secrets, preferredPort, report }: DatabaseNeeds): Promise<OpenDatabase> {
  if (givenUrl !== undefined) return onGivenServer(givenUrl, secrets);
  const server = await startPrivateDatabase(
    {
      folder: clusterFolderOf(folder.path),
      adminPassword: secrets.databaseAdminPassword,
      logFile: join(folder.logs, 'postgres.log'),
      durable: true,
      ...(preferredPort === undefined ? {} : { preferredPort }),
    },
    report,
  );
  try {
    rememberPorts(folder.path, { database: server.port });
    const ensure = (): Promise<DatabaseAddresses> => ensureRoles(server.adminUrl, secrets.databaseLoginPassword);
    const empty = async (): Promise<void> => {
      await dropDatabase(server.adminUrl, defaultDatabase);
      await ensure();
    };
    return { ...(await ensure()), empty, stop: () => server.stop() };
  } catch (error) {
    await server.stop();
    throw error;
  }
}

/** What tells this database from every other, dropped and made again ones included. */
export async function identityOf(databaseUrl: string): Promise<string> {
  const client = new Client({ connectionString: databaseUrl });
  await client.connect();
  try {
    const { rows } = await client.query<{ identity: string }>(
      `select system_identifier || '/' || oid as identity from pg_control_system(), pg_database where datname = $1`,
      [databaseOf(databaseUrl)],
    );
    const identity = rows[0]?.identity;
    if (identity === undefined) throw new Error('The database does not know itself.');
    return identity;
  } finally {
    await client.end();
  }
}
