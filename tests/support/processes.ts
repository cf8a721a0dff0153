/** The API and the worker as processes of their own, run from their sources, so that they can be killed. */
import { spawn, type ChildProcess } from 'node:child_process';
import { setTimeout as wait } from 'node:timers/promises';
import { drawFreePort, loopback } from '../../infra/network/ports.ts';
import { projectRoot } from '../../infra/project-root.ts';
import { leaveWithParent } from '../../infra/start/programs.ts';
import { answers } from '../../infra/start/ready.ts';
import type { Config } from '../../services/api/src/config.ts';

export interface TestProcess {
  readonly pid: number;
  /** SIGKILL: no chance to finish anything. Resolves when it is gone. */
  kill(): Promise<void>;
  /** SIGTERM, and waits until it has ended in order. */
  stop(): Promise<void>;
  hasEnded(): boolean;
  /** What it wrote. */
  said(): string;
}

/** Milliseconds that a process may take until it is ready, on a busy machine too. */
const readyWithin = 60_000;

/** The settings of a test server as the environment of a process; `changes` has the last word. */
const environmentOf = ({ secure: _derived, ...settings }: Config, changes: NodeJS.ProcessEnv): NodeJS.ProcessEnv => ({
  PATH: process.env['PATH'],
  HOME: process.env['HOME'],
  NODE_ENV: 'production',
  // How decorators are compiled; without it entities come out wrong.
  TSX_TSCONFIG_PATH: 'services/api/tsconfig.json',
  ...Object.fromEntries(
    Object.entries(settings).map(([name, value]) => [name, typeof value === 'boolean' ? (value ? 'yes' : 'no') : String(value)]),
  ),
  ...changes,
});

function launch(source: string, environment: NodeJS.ProcessEnv): TestProcess & { readonly child: ChildProcess } {
  // One process, so that the signal meets the program itself and not a launcher before it.
  const child = spawn(process.execPath, [...leaveWithParent, '--conditions=@cairnstep/source', '--import', 'tsx', source], {
    cwd: projectRoot,
    env: environment,
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  });
  let said = '';
  for (const stream of [child.stdout, child.stderr]) stream?.on('data', (chunk: Buffer) => (said += chunk.toString('utf8')));
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  const end = async (signal: NodeJS.Signals): Promise<void> => {
    child.kill(signal);
    await ended;
  };
  return {
    child,
    pid: child.pid ?? 0,
    kill: () => end('SIGKILL'),
    stop: () => end('SIGTERM'),
    hasEnded: () => child.exitCode !== null || child.signalCode !== null,
    said: () => said,
  };
}

async function untilReady(name: string, started: TestProcess, isReady: () => boolean | Promise<boolean>): Promise<void> {
  const deadline = Date.now() + readyWithin;
  while (!(await isReady())) {
    if (started.hasEnded() || Date.now() > deadline) throw new Error(`The ${name} did not become ready:\n${started.said()}`);
    await wait(20);
  }
}

export interface ApiProcess extends TestProcess {
  readonly url: string;
}

export async function startApiProcess(config: Config, changes: NodeJS.ProcessEnv = {}): Promise<ApiProcess> {
  const port = await drawFreePort();
  const url = `http://${loopback}:${port}`;
  const started = launch('services/api/src/main.ts', environmentOf(config, { PORT: String(port), PUBLIC_URL: url, ...changes }));
  await untilReady('API', started, () => answers(`${url}/api/health/ready`));
  return { ...started, url };
}

export async function startWorkerProcess(config: Config, changes: NodeJS.ProcessEnv = {}): Promise<TestProcess> {
  const started = launch('services/api/src/worker.ts', environmentOf(config, changes));
  let ready = false;
  started.child.on('message', (message) => (ready ||= message === 'ready'));
  await untilReady('worker', started, () => ready);
  return started;
}
