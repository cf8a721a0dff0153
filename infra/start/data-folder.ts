/** The folder that holds everything a start keeps: database, secrets, remembered ports, mails, logs. */
import { createHash } from 'node:crypto';
import { chmodSync, mkdirSync, realpathSync } from 'node:fs';
import { basename, dirname, join, resolve } from 'node:path';
import { canEnter, serverUser } from '../database/server-user.ts';
import { projectRoot } from '../project-root.ts';
import { StartError } from './start-error.ts';

export interface DataFolder {
  readonly path: string;
  readonly logs: string;
  /** Why it is not where it is expected, for the person who starts. */
  readonly note: string | undefined;
}

const systemFolder = '/var/lib/cairnstep';

function make(path: string): void {
  mkdirSync(path, { recursive: true });
  // Root's database runs as another account, which passes through to its own folder and reads nothing on the way.
  chmodSync(path, process.getuid?.() === 0 ? 0o711 : 0o700);
}

/**
 * Chooses and makes the folder: the given one, else `.cairnstep` in the checkout, else (a checkout that the database's
 * account cannot enter, such as one in root's home) one under /var/lib/cairnstep.
 *
 * @param given the setting, relative to the current folder
 * @param holdsDatabase false when the database is elsewhere, so that nobody else has to enter
 */
export function chooseDataFolder(given: string | undefined, holdsDatabase: boolean): DataFolder {
  const user = holdsDatabase ? serverUser() : undefined;
  let path = resolve(given ?? join(projectRoot, '.cairnstep'));
  let note: string | undefined;
  if (given !== undefined) {
    make(path);
    if (!canEnter(user, path))
      throw new StartError(
        `CAIRNSTEP_DATA_DIR: the account postgres, as which the database runs under root, cannot enter ${path}. Choose a folder that everybody may pass through.`,
      );
  } else if (canEnter(user, projectRoot)) {
    make(path);
  } else {
    const mark = createHash('sha256').update(realpathSync(projectRoot)).digest('hex').slice(0, 8);
    path = join(systemFolder, `${basename(projectRoot)}-${mark}`);
    mkdirSync(dirname(path), { recursive: true, mode: 0o755 });
    make(path);
    note = `The database's account cannot enter ${projectRoot}, so data is kept in ${path}.`;
  }
  const logs = join(path, 'logs');
  mkdirSync(logs, { recursive: true, mode: 0o700 });
  return { path: realpathSync(path), logs, note };
}
