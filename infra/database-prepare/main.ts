/**
 * npm run database:prepare: brings roles, database and tables of an installation up to date. Run it before the first
 * start and after every upgrade; running it again changes nothing but the login role's password.
 */
import { databaseOf } from '../database/connection-url.ts';
import { ensureRoles, loginRole } from '../database/roles.ts';
import { compiled } from '../start/programs.ts';
import { runChild } from '../start/run-child.ts';
import { runSession } from '../start/session.ts';
import { readPrepareSettings } from './settings.ts';

await runSession(async ({ report, signal }) => {
  const { DATABASE_URL, DATABASE_LOGIN_PASSWORD } = readPrepareSettings(process.env);
  const { databaseUrl } = await ensureRoles(DATABASE_URL, DATABASE_LOGIN_PASSWORD);
  const code = await runChild(
    process.execPath,
    compiled('services/api/src/database/migrate.ts'),
    { ...process.env, DATABASE_URL: databaseUrl },
    signal,
  );
  if (code === 0) report(`The database ${databaseOf(databaseUrl)} is up to date. The product connects to it as ${loginRole}.`);
  return code ?? 1;
}, 130);
