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

/** The services of a killed run need a moment to notice that it is gone. */
async function freeWithinMoments(wanted: number): Promise<boolean> {
  for (let attempt = 0; attempt < 30; attempt += 1) {
    if (await isPortFree(wanted)) return true;
    await wait(100);
  }
  return false;
}

/** The port of last time when it can be had again. */
const again = async (last: number | undefined): Promise<number | undefined> =>
  last !== undefined && (await freeWithinMoments(last)) ? last : undefined;

/**
 * Chooses all ports and remembers them.
 * @param given the PORT setting
 * @throws StartError when the given port is taken
 */
export async function choosePorts(dataFolder: string, given: number | undefined): Promise<Ports> {
  const last = remembered(dataFolder);
  if (given !== undefined && !(await freeWithinMoments(given))) {
    throw new StartError(`PORT: another program already uses port ${given}. Choose another, or leave PORT out to have a free one found.`);
  }
  const [product, provider, mailPages, smtp] = await Promise.all([
    given ?? again(last.product),
    again(last.provider),
    again(last.mailPages),
    again(last.smtp),
  ]);
  const chosenProvider = provider ?? (await drawFreePort());
  const ports = {
    product: product ?? (await freePortFrom(firstForProduct)),
    provider: chosenProvider,
    mailPages: mailPages ?? (await freePortFrom(firstForMailPages)),
    smtp: smtp ?? (await drawFreePort([chosenProvider])),
  };
  rememberPorts(dataFolder, ports);
  return { ...ports, database: last.database };
}
