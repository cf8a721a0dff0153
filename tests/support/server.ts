/** The real application over real HTTP on a database of its own. */
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { pino } from 'pino';
import type pg from 'pg';
import { makeApp } from '../../services/api/src/app.ts';
import { readConfig, type Config } from '../../services/api/src/config.ts';
import type { Context } from '../../services/api/src/context.ts';
import { makeSessionPool } from '../../services/api/src/http/session.ts';
import { cloneDatabase, type TestDatabase } from './database.ts';

export interface TestServer {
  readonly url: string;
  readonly config: Config;
  readonly context: Context;
  readonly database: TestDatabase;
  /** Every line the application logged. */
  readonly logLines: string[];
  /** Moves the application's clock; null gives it back to the machine's. */
  setClock(now: Date | null): void;
  close(): Promise<void>;
}

export async function listenLocally(server: Server): Promise<string> {
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
}

export async function startTestServer(settings: Readonly<Record<string, string>> = {}, given?: TestDatabase): Promise<TestServer> {
  const database = given ?? (await cloneDatabase());
  const server = createServer();
  const url = await listenLocally(server);
  const config = readConfig({
    PUBLIC_URL: url,
    DATABASE_APP_URL: database.appUrl,
    SESSION_SECRET: 'a secret that is used in tests alone',
    OIDC_ISSUER: 'http://127.0.0.1:9',
    OIDC_CLIENT_ID: 'cairnstep',
    OIDC_CLIENT_SECRET: 'a client secret that is used in tests alone',
    OIDC_ALLOW_HTTP: 'yes',
    SMTP_URL: 'smtp://127.0.0.1:9',
    WRITE_LIMIT_PER_MINUTE: '100000',
    SIGN_IN_LIMIT_PER_MINUTE: '100000',
    ...settings,
  });
  const logLines: string[] = [];
  const log = pino({ level: 'debug' }, { write: (line: string) => void logLines.push(line) });
  let now: Date | null = null;
  const context: Context = { config, database: database.app, log, clock: () => now ?? new Date() };
  const sessionPool: pg.Pool = makeSessionPool(config, log);
  server.on('request', makeApp(context, { sessionPool }));
  return {
    url,
    config,
    context,
    database,
    logLines,
    setClock: (date) => {
      now = date;
    },
    close: async () => {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      await sessionPool.end();
      if (!given) await database.close();
    },
  };
}
