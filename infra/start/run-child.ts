import { spawn } from 'node:child_process';
import { setTimeout as wait } from 'node:timers/promises';
import { projectRoot } from '../project-root.ts';

/** How long a test program may take to clean up after being told to end. */
const endsWithinMs = 20_000;

/**
 * Runs a program at the project's root, its words on this terminal.
 * @returns its exit code; null when it was ended by `signal` or killed
 */
export async function runChild(
  program: string,
  args: readonly string[],
  environment: NodeJS.ProcessEnv,
  signal: AbortSignal,
): Promise<number | null> {
  // In a group of its own, so that everything it started can be ended with it.
  const child = spawn(program, args, {
    cwd: projectRoot,
    env: environment,
    detached: true,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  const exited = new Promise<number | null>((resolve) => {
    child.once('exit', resolve);
    child.once('error', () => resolve(null));
  });
  const tellGroup = (what: NodeJS.Signals): void => {
    try {
      if (child.pid !== undefined) process.kill(-child.pid, what);
    } catch {
      // The group is gone, which is what was wanted.
    }
  };
  const endEarly = async (): Promise<void> => {
    tellGroup('SIGINT');
    await Promise.race([exited, wait(endsWithinMs)]);
    tellGroup('SIGKILL');
  };
  let ending: Promise<void> | undefined;
  const onAbort = (): void => void (ending = endEarly());
  if (signal.aborted) onAbort();
  else signal.addEventListener('abort', onAbort, { once: true });
  const code = await exited;
  signal.removeEventListener('abort', onAbort);
  await ending;
  return ending === undefined ? code : null;
}
