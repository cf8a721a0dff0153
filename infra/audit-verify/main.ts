/**
 * npm run audit:verify: runs the API's check of the audit log against the data folder's registry, starting its database
 * for the time of the check when it does not run. Exit code 0 when the chain holds.
 */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { adminUrlOf } from '../database/cluster.ts';
import { withAccount, withDatabase } from '../database/connection-url.ts';
import { runningServerPort } from '../database/leftover-server.ts';
import { defaultDatabase, loginRole } from '../database/roles.ts';
import { buildIfChanged } from '../start/build.ts';
import { chooseDataFolder } from '../start/data-folder.ts';
import { clusterFolderOf, openDatabase } from '../start/database.ts';
import { claimDataFolder } from '../start/only-one.ts';
import { compiled } from '../start/programs.ts';
import { runChild } from '../start/run-child.ts';
import { secretsOf } from '../start/secrets.ts';
import { runSession } from '../start/session.ts';
import { readSettings } from '../start/settings.ts';
import { StartError } from '../start/start-error.ts';

await runSession(async ({ report, onStarted, signal }) => {
  const settings = readSettings(process.env);
  const folder = chooseDataFolder(settings.dataFolder, settings.databaseUrl === undefined);
  const clusterFolder = clusterFolderOf(folder.path);
  if (settings.databaseUrl === undefined && !existsSync(clusterFolder)) {
    throw new StartError(`There is no registry in ${folder.path} yet. npm start makes one; CAIRNSTEP_DATA_DIR names another.`);
  }
  await buildIfChanged(['servers'], { logFile: join(folder.logs, 'build.log'), onWork: (what) => report(`${what} …`), signal });

  const secrets = secretsOf(folder.path);
  const runningPort = settings.databaseUrl === undefined ? runningServerPort(clusterFolder) : undefined;
  let appUrl: string;
  if (runningPort !== undefined) {
    const adminUrl = adminUrlOf(runningPort, secrets.databaseAdminPassword);
    appUrl = withAccount(withDatabase(adminUrl, defaultDatabase), loginRole, secrets.databaseLoginPassword);
  } else {
    onStarted(await claimDataFolder(folder.path));
    const database = await openDatabase({ givenUrl: settings.databaseUrl, folder, secrets, preferredPort: undefined, report });
    onStarted(() => database.stop());
    ({ appUrl } = database);
  }
  const verify = [...compiled('services/api/src/audit/verify-command.ts'), ...process.argv.slice(2)];
  return (await runChild(process.execPath, verify, { ...process.env, DATABASE_APP_URL: appUrl }, signal)) ?? 1;
}, 130);
