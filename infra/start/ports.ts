/** Which ports a start uses: the given one, else those of last time, else free ones. */
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { z } from 'zod';
import { drawFreePort, freePortFrom, isPortFree } from '../network/ports.ts';
import { StartError } from './start-error.ts';

const port = z.number().int().min(1).max(65_535);
const Remembered = z.object({ product: port, provider: port, mailPages: port, smtp: port, database: port }).partial();
type Remembered = z.infer<typeof Remembered>;

export interface Ports {
  readonly product: number;
  readonly provider: number;
  readonly mailPages: number;
  readonly smtp: number;
  /** The database's of last time; the cluster takes it when it is free. */
  readonly database: number | undefined;
}

const firstForProduct = 8420;
const firstForMailPages = 8520;

const fileIn = (dataFolder: string): string => join(dataFolder, 'ports.json');

function remembered(dataFolder: string): Remembered {
  return existsSync(fileIn(dataFolder)) ? Remembered.parse(JSON.parse(readFileSync(fileIn(dataFolder), 'utf8'))) : {};
}

/** Adds to what is remembered. */
export function rememberPorts(dataFolder: string, ports: Remembered): void {
  writeFileSync(fileIn(dataFolder), JSON.stringify({ ...remembered(dataFolder), ...ports }, null, 2));
}

const orElse = async (last: number | undefined, otherwise: () => Promise<number>): Promise<number> =>
  last !== undefined && (await isPortFree(last)) ? last : otherwise();

/** The services of a killed run need a moment to notice that it is gone. */
async function freeWithinMoments(wanted: number): Promise<boolean> {
  for (let attempt = 0; attempt < 30; attempt += 1) {
    if (await isPortFree(wanted)) return true;
    await wait(100);
  }
  return false;
}

async function providerPort(last: number | undefined): Promise<number> {
  if (last === undefined) return drawFreePort();
  if (await freeWithinMoments(last)) return last;
  // An account is known by its provider's address and its subject there, so this port must not change.
  throw new StartError(
    `The demonstration's accounts belong to the local sign-in service at port ${last}, which another program uses now. End that program, or begin anew with CAIRNSTEP_DATA_DIR set to another folder.`,
  );
}

/**
 * Chooses all ports and remembers them.
 * @param given the PORT setting
 * @throws StartError when the given port is taken, or the provider's of last time is
 */
export async function choosePorts(dataFolder: string, given: number | undefined): Promise<Ports> {
  const last = remembered(dataFolder);
  if (given !== undefined && !(await freeWithinMoments(given)))
    throw new StartError(`PORT: another program already uses port ${given}. Choose another, or leave PORT out to have a free one found.`);
  const ports = {
    product: given ?? (await orElse(last.product, () => freePortFrom(firstForProduct))),
    provider: await providerPort(last.provider),
    mailPages: await orElse(last.mailPages, () => freePortFrom(firstForMailPages)),
    smtp: await orElse(last.smtp, drawFreePort),
  };
  rememberPorts(dataFolder, ports);
  return { ...ports, database: last.database };
}
