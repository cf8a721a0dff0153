/** The frame of a command that runs until it is told to end: signals, order of ending, exit code. */
import { StartError } from './start-error.ts';

export interface Session {
  /** Aborted when the command is told to end. */
  readonly signal: AbortSignal;
  /** Prints a sentence. */
  readonly report: (sentence: string) => void;
  /** Registers what ends a thing that was started. */
  readonly onStarted: (end: () => Promise<void>) => void;
}

const untilAborted = (signal: AbortSignal): Promise<void> =>
  new Promise((resolve) => {
    if (signal.aborted) resolve();
    else signal.addEventListener('abort', () => resolve(), { once: true });
  });

/**
 * Runs `work`, then waits for Ctrl-C, SIGTERM, a closed terminal, or the end of the process that started this one, then
 * ends everything that `work` started, last first. Exit code 0 when told to end, 1 when `work` failed.
 */
export async function runUntilToldToEnd(work: (session: Session) => Promise<void>): Promise<never> {
  const ending = new AbortController();
  const end = (): void => ending.abort();
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, end);
  process.on('disconnect', end);

  const ends: (() => Promise<void>)[] = [];
  const report = (sentence: string): void => void process.stdout.write(`${sentence}\n`);
  let code = 0;
  try {
    await work({ signal: ending.signal, report, onStarted: (one) => ends.push(one) });
    await untilAborted(ending.signal);
  } catch (error) {
    if (!ending.signal.aborted) {
      code = 1;
      process.stderr.write(`${error instanceof StartError ? error.message : ((error as Error).stack ?? String(error))}\n`);
    }
  }
  if (ending.signal.aborted) report('Ending …');
  for (const one of ends.reverse()) {
    await one().catch((error: unknown) => {
      code = 1;
      process.stderr.write(`${String(error)}\n`);
    });
  }
  process.exit(code);
}
