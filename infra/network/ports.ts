/** Free TCP ports on the loopback interface. */
import { randomInt } from 'node:crypto';
import { createServer } from 'node:net';

export const loopback = '127.0.0.1';

/**
 * Ports that are remembered between runs are drawn from here: above the well-known services, below Linux's default
 * range for outgoing connections (32768 to 60999), so that no passing connection takes a remembered port.
 */
const drawnFrom = 20_000;
const drawnBelow = 30_000;
const draws = 50;

/** True when nothing listens on `port` (1 to 65535) of the loopback interface and this process may listen on it. */
export function isPortFree(port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ port, host: loopback, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/** The first free port at or above `first`, trying `attempts` in a row: a default that gives way to its neighbours. */
export async function freePortFrom(first: number, attempts = 50): Promise<number> {
  for (let port = first; port < first + attempts; port += 1) {
    if (await isPortFree(port)) return port;
  }
  throw new Error(`No free port between ${first} and ${first + attempts - 1} on ${loopback}. End a program that uses one of them.`);
}

/**
 * A free port drawn at random, for a service whose address is remembered and should rarely meet another program.
 * @param except ports spoken for, though nothing listens on them yet
 */
export async function drawFreePort(except: readonly number[] = []): Promise<number> {
  for (let draw = 0; draw < draws; draw += 1) {
    const port = randomInt(drawnFrom, drawnBelow);
    if (!except.includes(port) && (await isPortFree(port))) return port;
  }
  throw new Error(`No free port found among ${draws} drawn between ${drawnFrom} and ${drawnBelow - 1} on ${loopback}.`);
}
