/** Starts the product with a new data folder, exactly as `npm start` does, and ends it after the last journey. */
import { spawn } from 'node:child_process';
import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { projectRoot } from '../../infra/project-root.ts';
import { exampleFilesOf } from '../../infra/start/environment.ts';
import { readRun } from '../../infra/start/run-note.ts';
import { exampleFilesVariable, mailUrlVariable, productUrlVariable, providerUrlVariable } from './product-variables.ts';

/** The first start builds the program and fills in the demonstration data. */
const readyWithinMs = 15 * 60_000;
const ready = 'Cairnstep is ready at';

export default async function startProduct(): Promise<() => Promise<void>> {
  const folder = mkdtempSync(join(tmpdir(), 'cairnstep-journeys-'));
  // Under root the database runs as another account, which has to pass through.
  chmodSync(folder, 0o711);
  const dataFolder = join(folder, 'data');
  // The tests' own Node options and settings of a developer's product are not the product's.
  const { NODE_OPTIONS: _options, PORT: _port, DATABASE_URL: _database, PUBLIC_URL: _public, ...inherited } = process.env;
  const product = spawn(process.execPath, ['--conditions=@cairnstep/source', '--import', 'tsx', 'infra/start/main.ts'], {
    cwd: projectRoot,
    // All journeys come from one address, which ordinary limits would take for one busy person.
    env: { ...inherited, CAIRNSTEP_DATA_DIR: dataFolder, SIGN_IN_LIMIT_PER_MINUTE: '1000', WRITE_LIMIT_PER_MINUTE: '10000' },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  });
  let said = '';
  const exited = new Promise<void>((resolve) => product.once('exit', () => resolve()));
  const stop = async (): Promise<void> => {
    product.kill('SIGTERM');
    await exited;
    rmSync(folder, { recursive: true, force: true });
  };

  let impatience: NodeJS.Timeout | undefined;
  const isReady = await new Promise<boolean>((resolve) => {
    const listen = (chunk: Buffer): void => {
      said += chunk.toString('utf8');
      if (said.includes(ready)) resolve(true);
    };
    product.stdout?.on('data', listen);
    product.stderr?.on('data', listen);
    void exited.then(() => resolve(false));
    impatience = setTimeout(() => resolve(false), readyWithinMs);
  });
  clearTimeout(impatience);
  const run = readRun(dataFolder);
  if (!isReady || run === undefined) {
    await stop();
    throw new Error(`The product did not start. It said:\n${said}`);
  }
  process.env[productUrlVariable] = run.address;
  process.env[mailUrlVariable] = run.mailAddress;
  process.env[providerUrlVariable] = run.providerAddress;
  process.env[exampleFilesVariable] = exampleFilesOf(dataFolder);
  return stop;
}
