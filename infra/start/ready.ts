import { readFileSync } from 'node:fs';
import { setTimeout as wait } from 'node:timers/promises';
import { tail } from './command.ts';
import { StartError } from './start-error.ts';
import type { Supervised } from './supervise.ts';

const withinMs = 60_000;
const everyMs = 100;

/** Whether something answers at the address, with success. */
export const answers = async (address: string): Promise<boolean> => {
  try {
    return (await fetch(address, { signal: AbortSignal.timeout(2000) })).ok;
  } catch {
    return false;
  }
};

/** Waits until a service is ready. @throws StartError with its last words when it dies first or takes too long */
export async function untilReady(supervised: Supervised, isReady: () => boolean | Promise<boolean>, signal: AbortSignal): Promise<void> {
  const deadline = Date.now() + withinMs;
  while (!(await isReady())) {
    signal.throwIfAborted();
    const { title, logFile } = supervised.service;
    const last = (): string => `Its last words (all of them: ${logFile}):\n\n${tail(readFileSync(logFile, 'utf8'))}`;
    if (supervised.deaths() > 0) throw new StartError(`${title} ended while starting. ${last()}`);
    if (Date.now() > deadline) throw new StartError(`${title} did not answer within ${withinMs / 1000} s. ${last()}`);
    await wait(everyMs);
  }
}
