/** Where PostgreSQL's programs are. Debian keeps the server's out of PATH, one folder per major version. */
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';

const debianFolder = '/usr/lib/postgresql';
const needed = ['initdb', 'postgres', 'pg_ctl'];

const isComplete = (folder: string): boolean => needed.every((program) => existsSync(join(folder, program)));

/** Folders that hold a whole server, the newest of Debian's first, then those on PATH. */
function candidates(): string[] {
  const versions = existsSync(debianFolder) ? readdirSync(debianFolder) : [];
  const debian = versions.sort((a, b) => Number(b) - Number(a)).map((version) => join(debianFolder, version, 'bin'));
  return [...debian, ...(process.env['PATH'] ?? '').split(delimiter)].filter(isComplete);
}

/**
 * The folder of the programs for the cluster in `clusterFolder`: those of its own major version when it exists already
 * (another version cannot read its files), else the newest installed.
 */
export function serverBinaries(clusterFolder: string): string {
  const found = candidates();
  const newest = found[0];
  if (newest === undefined) throw new Error('PostgreSQL is not installed. On Debian: apt-get install postgresql');
  const versionFile = join(clusterFolder, 'PG_VERSION');
  if (!existsSync(versionFile)) return newest;
  const version = readFileSync(versionFile, 'utf8').trim();
  const matching =
    found.find((folder) => folder === join(debianFolder, version, 'bin')) ?? found.find((folder) => !folder.startsWith(debianFolder));
  if (matching === undefined) {
    throw new Error(
      `The data in ${clusterFolder} belongs to PostgreSQL ${version}, which is not installed. Install postgresql-${version}, or move the data with pg_upgrade.`,
    );
  }
  return matching;
}
