/** The HTTP door. */
import { createServer } from 'node:http';
import { makeApp } from './app.ts';
import { readConfig, SettingsError } from './config.ts';
import { makeDataSource } from './database/data-source.ts';
import { makeLogger } from './http/log.ts';
import { serverLimits } from './http/server-limits.ts';
import { makeSessionPool } from './http/session.ts';

/** Longest one request's statement may run; a preview of a very large month is the slowest. */
const statementTimeout = 60_000;

try {
  const config = readConfig(process.env);
  const log = makeLogger(config.LOG_LEVEL, 'api');
  const database = await makeDataSource({ url: config.DATABASE_APP_URL, statementTimeout }).initialize();
  const sessionPool = makeSessionPool(config, log);
  const server = createServer(serverLimits, makeApp({ config, database, log, clock: () => new Date() }, { sessionPool }));
  server.listen(config.PORT, config.HOST, () => log.info({ port: config.PORT }, 'listening'));

  const stop = () => {
    log.info('stopping');
    server.close(() => void Promise.allSettled([database.destroy(), sessionPool.end()]).then(() => process.exit(0)));
    server.closeIdleConnections();
    setTimeout(() => process.exit(1), 15_000).unref();
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
} catch (error) {
  process.stderr.write(`${error instanceof SettingsError ? error.message : String(error)}\n`);
  process.exit(1);
}
