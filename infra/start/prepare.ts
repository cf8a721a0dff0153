/** What every way of running needs before anything is started: settings, a folder of its own, secrets, ports. */
import { chooseDataFolder } from './data-folder.ts';
import type { DataFolder } from './data-folder.ts';
import type { Place } from './environment.ts';
import { claimDataFolder } from './only-one.ts';
import { choosePorts } from './ports.ts';
import { secretsOf } from './secrets.ts';
import type { Session } from './session.ts';
import { readSettings } from './settings.ts';

export interface Prepared {
  readonly folder: DataFolder;
  readonly place: Place;
}

/** @throws StartError when a setting is wrong, the folder is in use or closed, or a given port is taken */
export async function prepare({ report, onStarted }: Session): Promise<Prepared> {
  const settings = readSettings(process.env);
  const folder = chooseDataFolder(settings.dataFolder, settings.databaseUrl === undefined);
  if (folder.note !== undefined) report(folder.note);
  onStarted(await claimDataFolder(folder.path));
  const ports = await choosePorts(folder.path, settings.port);
  return { folder, place: { settings, dataFolder: folder.path, ports, secrets: secretsOf(folder.path), apiPort: ports.product } };
}
