/** Services that run beside the start, and are started again when they die. */
import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { closeSync, existsSync, openSync, renameSync, statSync } from 'node:fs';
import { leaveWithParent } from './programs.ts';

export interface Service {
  /** "The API", for messages. */
  readonly title: string;
  /** Node's arguments: flags, the file to run, its own arguments. */
  readonly arguments: readonly string[];
  readonly cwd: string;
  readonly environment: NodeJS.ProcessEnv;
  readonly logFile: string;
}

export interface Supervised {
  readonly service: Service;
  /** How often it has ended without being told to. */
  deaths(): number;
  /** Whether the running process has sent the message "ready" to this one; not every service does. */
  saidReady(): boolean;
  /** Ends it and waits; it is not started again. */
  stop(): Promise<void>;
}

export interface Patience {
  /** First wait before a service is started again, ms; doubles with every death in a row. */
  readonly firstWait: number;
  readonly longestWait: number;
  /** A service that ran this long, ms, starts over with the first wait. */
  readonly steadyAfter: number;
  /** How long a service may take to end when told to, ms. */
  readonly endsWithin: number;
}

const usualPatience: Patience = { firstWait: 1000, longestWait: 30_000, steadyAfter: 60_000, endsWithin: 20_000 };
const largestLogBytes = 10_000_000;

/** Opens a log for appending; one that has grown large is put aside first, replacing the one put aside before. */
function openLog(file: string): number {
  if (existsSync(file) && statSync(file).size > largestLogBytes) renameSync(file, `${file}.1`);
  return openSync(file, 'a', 0o600);
}

function launch(service: Service): ChildProcess {
  const log = openLog(service.logFile);
  try {
    return spawn(process.execPath, [...leaveWithParent, ...service.arguments], {
      cwd: service.cwd,
      env: service.environment,
      // A group of its own: a Ctrl-C reaches the start alone, which ends its services in order.
      detached: true,
      stdio: ['ignore', log, log, 'ipc'],
    });
  } finally {
    closeSync(log);
  }
}

/**
 * Starts a service and keeps it running.
 * @param report told, in a sentence, about every unexpected end
 */
export function supervise(service: Service, report: (sentence: string) => void, patience = usualPatience): Supervised {
  let deaths = 0;
  let deathsInARow = 0;
  let stopping = false;
  let ready = false;
  let child: ChildProcess;
  let ended: Promise<void>;
  let again: NodeJS.Timeout | undefined;

  const start = (): void => {
    const startedAt = Date.now();
    child = launch(service);
    ready = false;
    child.on('message', (message) => (ready ||= message === 'ready'));
    ended = new Promise((resolve) => {
      const onEnd = (reason: string): void => {
        resolve();
        if (stopping) return;
        deaths += 1;
        deathsInARow = Date.now() - startedAt >= patience.steadyAfter ? 1 : deathsInARow + 1;
        const waitFor = Math.min(patience.firstWait * 2 ** (deathsInARow - 1), patience.longestWait);
        report(`${service.title} ended unexpectedly (${reason}) and is started again in ${waitFor / 1000} s. Its log: ${service.logFile}`);
        again = setTimeout(start, waitFor);
      };
      child.once('error', (error) => onEnd(error.message));
      child.once('exit', (code, signal) => onEnd(signal ?? `exit code ${code}`));
    });
  };
  start();

  return {
    service,
    deaths: () => deaths,
    saidReady: () => ready,
    async stop() {
      stopping = true;
      clearTimeout(again);
      child.kill('SIGTERM');
      const impatience = setTimeout(() => child.kill('SIGKILL'), patience.endsWithin);
      await ended;
      clearTimeout(impatience);
    },
  };
}
