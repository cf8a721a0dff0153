/** What a killed run leaves in a cluster's folder: a server without a master, or the note of one that is gone. */
import { execFileSync, spawnSync } from 'node:child_process';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import type { ServerUser } from './server-user.ts';

/** True when process `pid` is a PostgreSQL server; after a restart of the machine its number may be anybody's. */
function isServer(pid: number): boolean {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0')[0]?.endsWith('postgres') ?? false;
  } catch {
    return false;
  }
}

/** The process number in the cluster's `postmaster.pid`, or undefined without such a file. */
function notedServer(clusterFolder: string): number | undefined {
  const file = join(clusterFolder, 'postmaster.pid');
  if (!existsSync(file)) return undefined;
  return Number(readFileSync(file, 'utf8').split('\n')[0]);
}

/** The loopback port of the server that runs on `clusterFolder` now, or undefined when none does. */
export function runningServerPort(clusterFolder: string): number | undefined {
  const pid = notedServer(clusterFolder);
  if (pid === undefined || !isServer(pid)) return undefined;
  // Line 4 of postmaster.pid is the port (PostgreSQL, src/include/utils/pidfile.h).
  const port = Number(readFileSync(join(clusterFolder, 'postmaster.pid'), 'utf8').split('\n')[3]);
  return Number.isInteger(port) && port > 0 ? port : undefined;
}

/**
 * Ends a server that still runs on `clusterFolder`. The note of a dead one is left for PostgreSQL, which reads in its
 * other lines whether processes of the dead server still write; only a number that now belongs to another program, and
 * would stop PostgreSQL from starting, is replaced by one that belongs to nobody.
 */
export function clearLeftovers(clusterFolder: string, binaries: string, user: ServerUser | undefined): void {
  const pid = notedServer(clusterFolder);
  if (pid === undefined) return;
  if (isServer(pid)) {
    execFileSync(join(binaries, 'pg_ctl'), ['-D', clusterFolder, '-m', 'fast', '-w', '-t', '60', 'stop'], {
      cwd: '/',
      stdio: 'pipe',
      ...user,
    });
  } else if (existsSync(`/proc/${pid}`)) {
    const file = join(clusterFolder, 'postmaster.pid');
    const [, ...others] = readFileSync(file, 'utf8').split('\n');
    writeFileSync(file, [spawnSync('true').pid, ...others].join('\n'));
  }
}
