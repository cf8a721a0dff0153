/**
 * How long the whole product takes from the command to readiness, beside the least that any product of this shape needs:
 * PostgreSQL from pg_ctl and one Node process that answers a request.
 */
import { execFileSync, spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { chmodSync, chownSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { serverBinaries } from '../../database/binaries.ts';
import { serverUser } from '../../database/server-user.ts';
import { drawFreePort, loopback } from '../../network/ports.ts';
import { projectRoot } from '../../project-root.ts';
import { buildIfChanged } from '../../start/build.ts';
import { answers } from '../../start/ready.ts';
import { StartError } from '../../start/start-error.ts';
import type { Scenario } from '../scenario.ts';

const seconds = (since: number): number => (performance.now() - since) / 1000;

/** A folder that the database's account can pass through. */
function makeFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), 'cairnstep-bench-'));
  chmodSync(folder, 0o711);
  return folder;
}

async function end(child: ChildProcess): Promise<void> {
  const exited = new Promise((resolve) => child.once('exit', resolve));
  child.kill('SIGTERM');
  await exited;
}

/** Seconds from starting `npm start`'s program on the data folder to its word that it is ready. */
async function startOurs(dataFolder: string): Promise<number> {
  const { PORT: _port, DATABASE_URL: _database, PUBLIC_URL: _public, ...environment } = process.env;
  const begun = performance.now();
  const product = spawn(process.execPath, ['infra/start.mjs'], {
    cwd: projectRoot,
    env: { ...environment, CAIRNSTEP_DATA_DIR: dataFolder },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const took = await new Promise<number>((resolve, reject) => {
    let said = '';
    product.stdout?.on('data', (chunk: Buffer) => {
      said += chunk.toString('utf8');
      if (said.includes('Cairnstep is ready at')) resolve(seconds(begun));
    });
    product.once('exit', () => reject(new StartError(`The product did not start:\n${said}`)));
  });
  await end(product);
  return took;
}

/** Seconds for PostgreSQL (made first when `isFirst`) and a Node process that answers. */
async function startPeer(folder: string, isFirst: boolean): Promise<number> {
  const user = serverUser();
  const cluster = join(folder, 'peer');
  const [databasePort, port] = [await drawFreePort(), await drawFreePort()];
  const binaries = serverBinaries(cluster);
  const asServer = { cwd: '/', stdio: 'ignore', ...user } as const;
  const begun = performance.now();
  if (isFirst) {
    mkdirSync(cluster, { mode: 0o700 });
    if (user !== undefined) chownSync(cluster, user.uid, user.gid);
    execFileSync(join(binaries, 'initdb'), ['-D', cluster, '-E', 'UTF8', '--locale=C.UTF-8'], asServer);
  }
  execFileSync(
    join(binaries, 'pg_ctl'),
    ['-D', cluster, '-w', '-o', `-p ${databasePort} -c listen_addresses=${loopback} -c unix_socket_directories=''`, 'start'],
    asServer,
  );
  const node = spawn(
    process.execPath,
    ['-e', `require('node:http').createServer((_, response) => response.end()).listen(${port}, '${loopback}')`],
    { stdio: 'ignore' },
  );
  while (!(await answers(`http://${loopback}:${port}`))) await wait(5);
  const took = seconds(begun);
  await end(node);
  execFileSync(join(binaries, 'pg_ctl'), ['-D', cluster, '-m', 'fast', '-w', 'stop'], asServer);
  return took;
}

async function inFolder<T>(work: (folder: string) => Promise<T>): Promise<T> {
  const folder = makeFolder();
  try {
    await buildIfChanged(['servers', 'client'], { logFile: join(folder, 'build.log'), onWork: () => undefined });
    return await work(folder);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

export const scenarios: readonly Scenario[] = [
  {
    name: 'start-up, first (built, empty data folder)',
    run: () =>
      inFolder(async (folder) => ({
        ours: await startOurs(join(folder, 'data')),
        peer: await startPeer(folder, true),
        unit: 's',
        peerName: 'initdb, pg_ctl start and a bare Node server',
      })),
  },
  {
    name: 'start-up, second (data there)',
    run: () =>
      inFolder(async (folder) => {
        await startOurs(join(folder, 'data'));
        await startPeer(folder, true);
        return {
          ours: await startOurs(join(folder, 'data')),
          peer: await startPeer(folder, false),
          unit: 's',
          peerName: 'pg_ctl start and a bare Node server',
          goal: 10,
        };
      }),
  },
];
