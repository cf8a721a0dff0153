/**
 * A PostgreSQL cluster of the project's own: made, started and stopped here, reachable on the loopback interface alone,
 * without a Unix socket (the limit on its path's length would rule out deep folders).
 */
import { execFileSync, spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { chmodSync, chownSync, closeSync, existsSync, mkdirSync, mkdtempSync, openSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { Client } from 'pg';
import { drawFreePort, isPortFree, loopback } from '../network/ports.ts';
import { serverBinaries } from './binaries.ts';
import { clearLeftovers } from './leftover-server.ts';
import { canEnter, serverUser } from './server-user.ts';
import type { ServerUser } from './server-user.ts';

export interface ClusterOptions {
  /** The cluster's folder; made on first use. As root, the account `postgres` must be able to enter its parent. */
  readonly folder: string;
  /** Password of the superuser `postgres`, set when the cluster is made. */
  readonly adminPassword: string;
  /** What the server says is appended here. */
  readonly logFile: string;
  /** false gives up safety against a power cut for speed: for clusters that are thrown away. */
  readonly durable: boolean;
  /** The port of last time. Taken again when free, else another is drawn. */
  readonly preferredPort?: number;
}

export interface RunningCluster {
  readonly port: number;
  /** Superuser's address of the database `postgres`. */
  readonly adminUrl: string;
  /** Settles when the server process has ended, whoever ended it. */
  readonly exited: Promise<void>;
  /** Ends sessions and the server (fast shutdown), and waits for it. */
  stop(): Promise<void>;
}

const startAttempts = 3;
const readyWithinMs = 120_000;
const pollEveryMs = 50;
const fastShutdownWithinMs = 30_000;

/** The superuser's address of a cluster's database `postgres`. */
export function adminUrlOf(port: number, adminPassword: string): string {
  return `postgres://postgres:${encodeURIComponent(adminPassword)}@${loopback}:${port}/postgres`;
}

/** Makes the cluster's files when there are none yet. */
function initialise(options: ClusterOptions, binaries: string, user: ServerUser | undefined): void {
  if (existsSync(join(options.folder, 'PG_VERSION'))) return;
  // A folder without PG_VERSION is the rest of an interrupted initdb, which would refuse it.
  rmSync(options.folder, { recursive: true, force: true });
  mkdirSync(options.folder, { recursive: true, mode: 0o700 });
  const secret = mkdtempSync(join(tmpdir(), 'cairnstep-initdb-'));
  const passwordFile = join(secret, 'password');
  try {
    writeFileSync(passwordFile, options.adminPassword, { mode: 0o600 });
    if (user !== undefined) for (const path of [options.folder, secret, passwordFile]) chownSync(path, user.uid, user.gid);
    const settings = [
      '-U',
      'postgres',
      '--auth=scram-sha-256',
      `--pwfile=${passwordFile}`,
      '-E',
      'UTF8',
      '--locale=C.UTF-8',
      '--data-checksums',
    ];
    execFileSync(join(binaries, 'initdb'), ['-D', options.folder, ...settings, ...(options.durable ? [] : ['--no-sync'])], {
      cwd: '/',
      stdio: 'pipe',
      ...user,
    });
  } finally {
    rmSync(secret, { recursive: true, force: true });
  }
}

function launch(options: ClusterOptions, port: number, binaries: string, user: ServerUser | undefined): ChildProcess {
  const settings: Record<string, string> = {
    listen_addresses: loopback,
    port: String(port),
    unix_socket_directories: '',
    ...(options.durable ? {} : { fsync: 'off', synchronous_commit: 'off', full_page_writes: 'off', max_connections: '200' }),
  };
  const log = openSync(options.logFile, 'a', 0o600);
  try {
    // Detached: a Ctrl-C in the terminal reaches the program that owns the cluster, which then stops things in order.
    return spawn(
      join(binaries, 'postgres'),
      ['-D', options.folder, ...Object.entries(settings).flatMap(([name, value]) => ['-c', `${name}=${value}`])],
      {
        cwd: '/',
        detached: true,
        stdio: ['ignore', log, log],
        ...user,
      },
    );
  } finally {
    closeSync(log);
  }
}

type Readiness = 'ready' | 'ended' | 'wrong-password' | 'late';

/** Polls until the server answers the superuser, ends, refuses the password, or takes too long (a crash recovery may last). */
async function untilReady(adminUrl: string, hasEnded: () => boolean): Promise<Readiness> {
  const deadline = Date.now() + readyWithinMs;
  while (Date.now() < deadline) {
    if (hasEnded()) return 'ended';
    const client = new Client({ connectionString: adminUrl });
    try {
      await client.connect();
      return 'ready';
    } catch (error) {
      // 28P01: invalid_password (PostgreSQL, appendix A). Everything else is a server that is not up yet.
      if ((error as { code?: string }).code === '28P01') return 'wrong-password';
    } finally {
      await client.end().catch(() => undefined);
    }
    await wait(pollEveryMs);
  }
  return 'late';
}

/** Starts the cluster, making it first when needed and clearing what a killed run left. Resolves once it answers. */
export async function startCluster(options: ClusterOptions): Promise<RunningCluster> {
  const user = serverUser();
  const binaries = serverBinaries(options.folder);
  mkdirSync(dirname(options.folder), { recursive: true });
  mkdirSync(dirname(options.logFile), { recursive: true });
  if (!canEnter(user, dirname(options.folder))) {
    throw new Error(`The account postgres, as which the database runs under root, cannot enter ${dirname(options.folder)}.`);
  }
  initialise(options, binaries, user);
  clearLeftovers(options.folder, binaries, user);

  for (let attempt = 1; attempt <= startAttempts; attempt += 1) {
    const usePreferred = attempt === 1 && options.preferredPort !== undefined && (await isPortFree(options.preferredPort));
    const port = usePreferred ? options.preferredPort : await drawFreePort();
    const server = launch(options, port, binaries, user);
    const exited = new Promise<void>((resolve) => {
      server.once('exit', () => resolve());
      server.once('error', () => resolve());
    });
    let ended = false;
    void exited.then(() => (ended = true));
    const adminUrl = adminUrlOf(port, options.adminPassword);

    const stop = async (): Promise<void> => {
      if (ended) return;
      // PostgreSQL, pg_ctl: SIGINT is the fast shutdown, SIGQUIT the immediate one.
      server.kill('SIGINT');
      const impatience = setTimeout(() => server.kill('SIGQUIT'), fastShutdownWithinMs);
      await exited;
      clearTimeout(impatience);
    };

    const readiness = await untilReady(adminUrl, () => ended);
    if (readiness === 'ready') return { port, adminUrl, exited, stop };
    await stop();
    if (readiness === 'wrong-password') {
      throw new Error(
        `The database in ${options.folder} was made with another password. Put back the secrets it was made with, or move the folder away to begin anew.`,
      );
    }
    // 'ended' is tried again: another program may have taken the port in between.
    if (readiness === 'late') break;
  }
  throw new Error(`PostgreSQL did not start on ${options.folder}. Its reason stands at the end of ${options.logFile}.`);
}

/** A cluster in a new folder under the system's temporary one, fast and not durable; `stop` also deletes it. */
export async function startThrowAwayCluster(): Promise<RunningCluster> {
  const parent = mkdtempSync(join(tmpdir(), 'cairnstep-test-'));
  // Root's temporary folders are closed to others, and the server runs as another account.
  chmodSync(parent, 0o711);
  const discard = (): void => rmSync(parent, { recursive: true, force: true });
  try {
    const cluster = await startCluster({
      folder: join(parent, 'postgres'),
      adminPassword: 'throw-away',
      logFile: join(parent, 'postgres.log'),
      durable: false,
    });
    const stop = async (): Promise<void> => {
      await cluster.stop();
      discard();
    };
    return { ...cluster, stop };
  } catch (error) {
    const log = join(parent, 'postgres.log');
    const said = existsSync(log) ? execFileSync('tail', ['-n', '20', log], { encoding: 'utf8' }) : '';
    discard();
    throw new Error(`The throw-away database did not start.\n${said}`, { cause: error });
  }
}
