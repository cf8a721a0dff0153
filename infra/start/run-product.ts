/** From a prepared place to a running product: database, migrations, demonstration data, services, readiness. */
import { join } from 'node:path';
import { projectRoot } from '../project-root.ts';
import { runCommand } from './command.ts';
import type { DataFolder } from './data-folder.ts';
import { identityOf, openDatabase } from './database.ts';
import { adminEnvironment, addressOf, apiEnvironment, mailEnvironment, providerEnvironment } from './environment.ts';
import type { Place } from './environment.ts';
import { compiled, fromSource, watched } from './programs.ts';
import { answers, untilReady } from './ready.ts';
import { noteSeedBegun, noteSeedDone, seedNeeded } from './seeded.ts';
import { supervise } from './supervise.ts';
import type { Supervised } from './supervise.ts';

export interface ProductNeeds {
  readonly place: Place;
  readonly folder: DataFolder;
  /** Runs everything from its sources, API and worker again whenever one changes; the client is served elsewhere. */
  readonly fromSources: boolean;
  readonly report: (sentence: string) => void;
  /** Called with what ends each thing that was started, right after it was; to be called in reverse. */
  readonly onStarted: (end: () => Promise<void>) => void;
  readonly signal: AbortSignal;
}

export async function runProduct({ place, folder, fromSources, report, onStarted, signal }: ProductNeeds): Promise<void> {
  const once = fromSources ? fromSource : compiled;
  const lasting = fromSources ? watched : compiled;
  const log = (name: string): string => join(folder.logs, `${name}.log`);

  const database = await openDatabase({
    givenUrl: place.settings.databaseUrl,
    folder,
    secrets: place.secrets,
    preferredPort: place.ports.database,
    report,
  });
  onStarted(() => database.stop());

  const asAdministrator = (title: string, name: string, source: string): Promise<void> =>
    runCommand({
      title,
      program: process.execPath,
      arguments: once(source),
      cwd: projectRoot,
      environment: adminEnvironment(place, database),
      logFile: log(name),
      signal,
    });
  const migrate = (): Promise<void> =>
    asAdministrator('Bringing the database up to date', 'migrate', 'services/api/src/database/migrate.ts');

  const providerAddress = addressOf(place.ports.provider);
  const seed = seedNeeded(folder.path, await identityOf(database.databaseUrl), providerAddress);
  if (seed === 'anew') {
    report('The demonstration data was only half filled in when the last start was broken off. Beginning anew …');
    await database.empty();
  }
  await migrate();
  if (seed !== 'nothing') {
    const identity = await identityOf(database.databaseUrl);
    if (seed !== 'people') {
      report('Filling in the demonstration data (first start, takes some minutes) …');
      noteSeedBegun(folder.path, identity);
    }
    await asAdministrator('Filling in the demonstration data', 'seed', 'services/api/src/demo/seed.ts');
    noteSeedDone(folder.path, identity, providerAddress);
  }

  const start = (title: string, name: string, programArguments: readonly string[], environment: NodeJS.ProcessEnv): Supervised => {
    const supervised = supervise({ title, arguments: programArguments, cwd: projectRoot, environment, logFile: log(name) }, report);
    onStarted(() => supervised.stop());
    return supervised;
  };
  signal.throwIfAborted();
  const provider = start('The local sign-in service', 'provider', once('services/fake-oidc/src/main.ts'), providerEnvironment(place));
  const mail = start('The mail catcher', 'mail', once('services/mail-catcher/src/main.ts'), mailEnvironment(place));
  const api = start('The API', 'api', lasting('services/api/src/main.ts'), apiEnvironment(place, database));
  const worker = start('The worker', 'worker', lasting('services/api/src/worker.ts'), apiEnvironment(place, database));

  const at = (address: string) => (): Promise<boolean> => answers(address);
  await untilReady(provider, at(`${providerAddress}/.well-known/openid-configuration`), signal);
  await untilReady(mail, at(addressOf(place.ports.mailPages)), signal);
  await untilReady(api, at(`${addressOf(place.apiPort)}/api/health/ready`), signal);
  // The watcher between us and a watched worker does not pass its message on.
  if (!fromSources) await untilReady(worker, () => worker.saidReady(), signal);
}
