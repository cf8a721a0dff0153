import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import type { AddressInfo, Server } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { drawFreePort, freePortFrom, isPortFree, loopback } from '../network/ports.ts';
import { choosePorts, rememberPorts } from './ports.ts';

let folder: string;
let others: Server[];
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'cairnstep-ports-test-'));
  others = [];
});
afterEach(async () => {
  await Promise.all(others.map((other) => new Promise((resolve) => other.close(resolve))));
  rmSync(folder, { recursive: true });
});

/** Another program on a port (0: any). */
async function occupy(port = 0): Promise<number> {
  const other = createServer();
  others.push(other);
  await new Promise<void>((resolve) => other.listen(port, loopback, resolve));
  return (other.address() as AddressInfo).port;
}

describe('free ports', () => {
  it('are told from taken ones', async () => {
    const taken = await occupy();
    expect(await isPortFree(taken)).toBe(false);
    await new Promise((resolve) => others.pop()?.close(resolve));
    expect(await isPortFree(taken)).toBe(true);
  });

  it('are looked for upwards from a default', async () => {
    const first = await drawFreePort();
    await occupy(first);
    expect(await freePortFrom(first)).toBeGreaterThan(first);
    await expect(freePortFrom(first, 1)).rejects.toThrow(`No free port between ${first} and ${first}`);
  });
});

describe('choosePorts', () => {
  it('chooses the same again, the database’s included', async () => {
    const first = await choosePorts(folder, undefined);
    expect(first.database).toBeUndefined();
    rememberPorts(folder, { database: 23_456 });
    expect(await choosePorts(folder, undefined)).toEqual({ ...first, database: 23_456 });
  });

  it('gives way where another program sits', async () => {
    const first = await choosePorts(folder, undefined);
    for (const port of [first.product, first.provider, first.smtp]) await occupy(port);
    const second = await choosePorts(folder, undefined);
    expect(second.product).not.toBe(first.product);
    expect(second.provider).not.toBe(first.provider);
    expect(second.smtp).not.toBe(first.smtp);
    expect(second.mailPages).toBe(first.mailPages);
  });

  it('takes the port it is given or says that it is taken', async () => {
    const given = await drawFreePort();
    expect((await choosePorts(folder, given)).product).toBe(given);
    await occupy(given);
    await expect(choosePorts(folder, given)).rejects.toThrow(`PORT: another program already uses port ${given}`);
  });
});
