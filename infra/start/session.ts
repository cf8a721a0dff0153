/** The frame of a command that starts things: signals, the order of ending, the exit code. */
import { StartError } from './start-error.ts';

export interface Session {
  /** Aborted when the command is told to end: Ctrl-C, SIGTERM, a closed terminal, the end of what started it. */
  readonly signal: AbortSignal;
  /** Prints a sentence. */
  readonly report: (sentence: string) => void;
  /** Registers what ends a thing that was started. */
  readonly onStarted: (end: () => Promise<void>) => void;
}

/** Resolves when the command is told to end. */
export const untilToldToEnd = ({ signal }: Session): Promise<void> =>
  new Promise((resolve) => {
    if (signal.aborted) resolve();
    else signal.addEventListener('abort', () => resolve(), { once: true });
  });

/**
 * Runs `work`, then ends everything that it started, last first, and this process.
 * @param work resolves with the exit code
 * @param codeWhenToldToEnd the exit code when `work` breaks off because it was told to end; when it fails, the code is 1
 */
export async function runSession(work: (session: Session) => Promise<number>, codeWhenToldToEnd: number): Promise<never> {
  const ending = new AbortController();
  const end = (): void => ending.abort();
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, end);
  process.on('disconnect', end);

  const ends: (() => Promise<void>)[] = [];
  const report = (sentence: string): void => void process.stdout.write(`${sentence}\n`);
  let code = 1;
  try {
    code = await work({ signal: ending.signal, report, onStarted: (one) => ends.push(one) });
  } catch (error) {
    if (ending.signal.aborted) code = codeWhenToldToEnd;
    else process.stderr.write(`${error instanceof StartError ? error.message : ((error as Error).stack ?? String(error))}\n`);
  }
  for (const one of ends.reverse()) {
    await one().catch((error: unknown) => {
      code = 1;
      process.stderr.write(`${String(error)}\n`);
    });
  }
  process.exit(code);
}
