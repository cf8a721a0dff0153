/** A PostgreSQL server of a test's own that writes as safely as in service, to be killed and started again. */
import { chmodSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { Client } from 'pg';
import { startCluster, type RunningCluster } from '../../infra/database/cluster.ts';
import { ensureRoles } from '../../infra/database/roles.ts';
import { makeDataSource } from '../../services/api/src/database/data-source.ts';
import { migrate } from '../../services/api/src/database/migrate.ts';
import { loginPassword } from './addresses.ts';
import type { TestDatabase } from './database.ts';

/** All of its processes at once, as in a power cut; the shutdown that does not wait for anybody; one process that serves a client. */
export type Death = 'all' | 'immediate' | 'one';
export const deaths: readonly Death[] = ['all', 'immediate', 'one'];

export interface OwnCluster {
  readonly appUrl: string;
  /** A connection as superuser; the caller ends it. */
  connect(): Promise<Client>;
  /** As test files know a database. Its connections do not outlive the server. */
  openDatabase(): Promise<TestDatabase>;
  die(death: Death): Promise<void>;
  /** Starts it again where that is needed. Resolves when it answers, its recovery done. */
  recover(): Promise<void>;
  close(): Promise<void>;
}

/** Process numbers of the server's processes with the title each gives itself (PostgreSQL manual, "Standard Unix Tools"). */
function processesOf(master: number): { readonly pid: number; readonly title: string }[] {
  const found = [];
  for (const name of readdirSync('/proc').filter((entry) => /^\d+$/.test(entry))) {
    try {
      // Fields of /proc/<pid>/stat after the name in brackets: state, parent's number.
      const parent = Number(readFileSync(`/proc/${name}/stat`, 'utf8').split(') ').at(-1)?.split(' ')[1]);
      if (parent === master)
        found.push({ pid: Number(name), title: readFileSync(`/proc/${name}/cmdline`, 'utf8').replaceAll('\0', ' ').trim() });
    } catch {
      // It ended while the folder was read.
    }
  }
  return found;
}

function killIfThere(pid: number): void {
  try {
    process.kill(pid, 'SIGKILL');
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ESRCH') throw error;
  }
}

export async function startOwnCluster(): Promise<OwnCluster> {
  const parent = mkdtempSync(join(tmpdir(), 'cairnstep-crash-'));
  // Root's temporary folders are closed to others, and the server runs as another account.
  chmodSync(parent, 0o711);
  const folder = join(parent, 'postgres');
  const options = { folder, adminPassword: 'throw-away', logFile: join(parent, 'postgres.log'), durable: true };
  let running: RunningCluster = await startCluster(options);
  const { port } = running;
  const { appUrl, databaseUrl } = await ensureRoles(running.adminUrl, loginPassword);
  await migrate(databaseUrl);

  const connect = async (): Promise<Client> => {
    const client = new Client({ connectionString: databaseUrl });
    // Lost with the server, as intended.
    client.on('error', () => undefined);
    await client.connect();
    return client;
  };
  const answersQueries = async (): Promise<boolean> => {
    try {
      await (await connect()).end();
      return true;
    } catch {
      return false;
    }
  };

  return {
    appUrl,
    connect,
    openDatabase: async () => {
      const owner = await connect();
      const app = await makeDataSource({ url: appUrl }).initialize();
      return { owner, ownerUrl: databaseUrl, appUrl, app, close: async () => void (await Promise.all([app.destroy(), owner.end()])) };
    },
    die: async (death) => {
      const master = Number(readFileSync(join(folder, 'postmaster.pid'), 'utf8').split('\n')[0]);
      const children = processesOf(master);
      if (death === 'one') {
        const clients = children.filter(({ title }) => title.includes('cairnstep_login'));
        const victim = clients.find(({ title }) => !title.endsWith(' idle')) ?? clients[0];
        if (victim) killIfThere(victim.pid);
        return;
      }
      if (death === 'immediate') process.kill(master, 'SIGQUIT');
      else for (const pid of [master, ...children.map((child) => child.pid)]) killIfThere(pid);
      await running.exited;
    },
    recover: async () => {
      const hasEnded = await Promise.race([running.exited.then(() => true), wait(0, false)]);
      if (hasEnded) running = await startCluster({ ...options, preferredPort: port });
      if (running.port !== port) throw new Error('Another program has taken the port of the killed server.');
      while (!(await answersQueries())) await wait(50);
    },
    close: async () => {
      await running.stop();
      rmSync(parent, { recursive: true, force: true });
    },
  };
}
