import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { runCommand } from './command.ts';
import { supervise } from './supervise.ts';

const patience = { firstWait: 10, longestWait: 40, steadyAfter: 60_000, endsWithin: 2000 };

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'cairnstep-supervise-test-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

const service = (program: string) => ({
  title: 'The service',
  arguments: ['-e', program],
  cwd: folder,
  environment: process.env,
  logFile: join(folder, 'service.log'),
});
const logged = (): string => (existsSync(join(folder, 'service.log')) ? readFileSync(join(folder, 'service.log'), 'utf8') : '');
const isAlive = (pid: number): boolean => existsSync(`/proc/${pid}/exe`);

describe('supervise', () => {
  it('starts a service again with growing waits, and says so', async () => {
    const said: string[] = [];
    const supervised = supervise(service('console.log("up"); process.exitCode = 3'), (sentence) => said.push(sentence), patience);
    await vi.waitUntil(() => said.length >= 4, { timeout: 20_000 });
    await supervised.stop();
    expect(said.slice(0, 4).map((sentence) => /\(exit code 3\).* in ([\d.]+) s/.exec(sentence)?.[1])).toEqual([
      '0.01',
      '0.02',
      '0.04',
      '0.04',
    ]);
    expect(logged().match(/up/g)?.length).toBeGreaterThanOrEqual(4);
    expect(supervised.deaths()).toBeGreaterThanOrEqual(4);
  });

  it('ends a service in its own way first, and by force when it does not', async () => {
    const polite = supervise(
      service('process.on("SIGTERM", () => { console.log("bye"); process.exit() }); setInterval(() => {}, 1000); console.log("up")'),
      () => undefined,
      patience,
    );
    await vi.waitUntil(() => logged().includes('up'), { timeout: 20_000 });
    await polite.stop();
    expect(logged()).toContain('bye');
    expect(polite.deaths()).toBe(0);

    const deaf = supervise(
      service('process.on("SIGTERM", () => {}); setInterval(() => {}, 1000); console.log("deaf", process.pid)'),
      () => undefined,
      { ...patience, endsWithin: 50 },
    );
    await vi.waitUntil(() => /deaf \d+/.test(logged()), { timeout: 20_000 });
    await deaf.stop();
    expect(isAlive(Number(/deaf (\d+)/.exec(logged())?.[1]))).toBe(false);
  });

  it('leaves no service behind when the program that started it is killed', async () => {
    const module = JSON.stringify(new URL('./supervise.ts', import.meta.url).href);
    const starter = join(folder, 'starter.mts');
    writeFileSync(
      starter,
      `import { supervise } from ${module};\nsupervise(${JSON.stringify(service('setInterval(() => {}, 1000); console.log("pid", process.pid)'))}, () => undefined);`,
    );
    const parent = spawn(process.execPath, ['--import', 'tsx', starter], { stdio: 'ignore' });
    await vi.waitUntil(() => /pid \d+/.test(logged()), { timeout: 20_000 });
    const pid = Number(/pid (\d+)/.exec(logged())?.[1]);
    expect(isAlive(pid)).toBe(true);
    parent.kill('SIGKILL');
    await vi.waitUntil(() => !isAlive(pid), { timeout: 20_000 });
  });
});

describe('runCommand', () => {
  const command = (program: string) => ({
    title: 'The step',
    program: process.execPath,
    arguments: ['-e', program],
    cwd: folder,
    environment: process.env,
    logFile: join(folder, 'step.log'),
  });

  it('is quiet when the command succeeds, and ends with its last words when it fails', async () => {
    await runCommand(command('console.log("from an earlier run")'));
    const failure = runCommand(command('for (let i = 1; i <= 100; i++) console.log("line", i); process.exitCode = 1'));
    await expect(failure).rejects.toThrow(/^The step failed\.[^]*line 76\n[^]*line 100$/);
    await expect(failure).rejects.not.toThrow(/line 75\n|earlier/);
  });

  it('ends early when told to', async () => {
    const ending = new AbortController();
    const running = runCommand({ ...command('setInterval(() => {}, 1000)'), signal: ending.signal });
    ending.abort();
    await expect(running).rejects.toThrow(/abort/i);
  });
});
