/**
 * npm run first-administrator -- --issuer ADDRESS --subject SUBJECT, with DATABASE_APP_URL set: gives the administrator's
 * role to a person who has signed in once, as long as the registry has no administrator. Everybody else is invited on screen.
 */
import { parseArgs } from 'node:util';
import { makeDataSource } from '../../services/api/src/database/data-source.ts';
import { runSession } from '../start/session.ts';
import { StartError } from '../start/start-error.ts';
import { appointFirstAdministrator } from './appoint.ts';

await runSession(async ({ report, onStarted }) => {
  const { issuer, subject } = parseArgs({ options: { issuer: { type: 'string' }, subject: { type: 'string' } } }).values;
  const url = process.env['DATABASE_APP_URL'];
  if (issuer === undefined || subject === undefined || url === undefined) {
    throw new StartError('Usage: DATABASE_APP_URL=… npm run first-administrator -- --issuer ADDRESS --subject SUBJECT');
  }
  const database = await makeDataSource({ url, poolSize: 1 }).initialize();
  onStarted(() => database.destroy());
  await appointFirstAdministrator(database, { issuer, subject });
  report('Done. The role counts from the next request on; the act is in the audit log.');
  return 0;
}, 130);
