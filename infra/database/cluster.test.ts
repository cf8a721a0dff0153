import { chmodSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startCluster } from './cluster.ts';
import type { ClusterOptions } from './cluster.ts';
import { runningServerPort } from './leftover-server.ts';

let parent: string;
let options: ClusterOptions;
beforeAll(() => {
  parent = mkdtempSync(join(tmpdir(), 'cairnstep-cluster-test-'));
  chmodSync(parent, 0o711);
  options = { folder: join(parent, 'postgres'), adminPassword: 'pass word/@', logFile: join(parent, 'postgres.log'), durable: false };
});
afterAll(() => rmSync(parent, { recursive: true, force: true }));

async function setting(url: string, name: string): Promise<string> {
  const client = new Client({ connectionString: url });
  await client.connect();
  const { rows } = await client.query<Record<string, string>>(`show ${name}`);
  await client.end();
  return rows[0]?.[name] ?? '';
}

describe('startCluster', () => {
  it('starts on the loopback interface without a socket, keeps its port, and stops', async () => {
    const first = await startCluster(options);
    expect(await setting(first.adminUrl, 'listen_addresses')).toBe('127.0.0.1');
    expect(await setting(first.adminUrl, 'unix_socket_directories')).toBe('');
    expect(await setting(first.adminUrl, 'server_encoding')).toBe('UTF8');
    expect(runningServerPort(options.folder)).toBe(first.port);
    await first.stop();
    expect(runningServerPort(options.folder)).toBeUndefined();
    const second = await startCluster({ ...options, preferredPort: first.port });
    expect(second.port).toBe(first.port);
    await second.stop();
  });

  it('draws another port when the remembered one is taken', async () => {
    const other = createServer();
    await new Promise<void>((resolve) => other.listen(0, '127.0.0.1', resolve));
    const taken = (other.address() as { port: number }).port;
    const cluster = await startCluster({ ...options, preferredPort: taken });
    expect(cluster.port).not.toBe(taken);
    await cluster.stop();
    other.close();
  });

  it('takes over from a server that an earlier run left behind', async () => {
    const left = await startCluster(options);
    const next = await startCluster({ ...options, preferredPort: left.port });
    await left.exited;
    expect(await setting(next.adminUrl, 'port')).toBe(String(next.port));
    await next.stop();
  });

  it('starts although the note of a dead server names a process that is now another program', async () => {
    writeFileSync(join(options.folder, 'postmaster.pid'), `${process.pid}\n${options.folder}\n0\n5432\n\n127.0.0.1\n`);
    const cluster = await startCluster(options);
    expect(await setting(cluster.adminUrl, 'port')).toBe(String(cluster.port));
    await cluster.stop();
  });

  it('says that the secrets changed when the password no longer fits', async () => {
    await expect(startCluster({ ...options, adminPassword: 'other' })).rejects.toThrow(/made with another password/);
    expect(runningServerPort(options.folder)).toBeUndefined();
  });
});
