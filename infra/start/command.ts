/** Commands that run to their end during a start. */
import { spawn } from 'node:child_process';
import { closeSync, openSync, readFileSync, statSync } from 'node:fs';
import { leaveWithParent } from './programs.ts';
import { StartError } from './start-error.ts';

export interface Command {
  /** What it does, for its failure: "The build". */
  readonly title: string;
  readonly program: string;
  readonly arguments: readonly string[];
  readonly cwd: string;
  readonly environment: NodeJS.ProcessEnv;
  /** Everything it says is appended here. */
  readonly logFile: string;
  /** Ends it early. */
  readonly signal?: AbortSignal;
}

const linesShown = 25;

/** The last lines of a text. */
export function tail(text: string, lines = linesShown): string {
  return text.trimEnd().split('\n').slice(-lines).join('\n');
}

/** Runs a command quietly; when it fails its last words are in the error. */
export async function runCommand(command: Command): Promise<void> {
  const log = openSync(command.logFile, 'a', 0o600);
  const before = statSync(command.logFile).size;
  const code = await new Promise<number | null>((resolve, reject) => {
    const isNode = command.program === process.execPath;
    const child = spawn(command.program, [...(isNode ? leaveWithParent : []), ...command.arguments], {
      cwd: command.cwd,
      env: command.environment,
      stdio: ['ignore', log, log, ...(isNode ? (['ipc'] as const) : [])],
      // In a group of its own, so that a Ctrl-C reaches it only through `signal`.
      detached: true,
      ...(command.signal === undefined ? {} : { signal: command.signal }),
    });
    child.once('error', reject);
    child.once('exit', resolve);
  }).finally(() => closeSync(log));
  if (code === 0) return;
  const said = readFileSync(command.logFile).subarray(before).toString('utf8');
  throw new StartError(`${command.title} failed. Its last words (all of them: ${command.logFile}):\n\n${tail(said)}`);
}
