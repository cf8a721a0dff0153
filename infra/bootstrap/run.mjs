/** First steps of every command: check Node, install what is missing, then hand over to TypeScript. */
import { spawn } from 'node:child_process';
import { constants } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureDebianPrograms } from './debian.mjs';
import { ensureNodePackages } from './node-packages.mjs';

const root = fileURLToPath(new URL('../..', import.meta.url));
const oldestNode = [20, 19];

function requireNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major > oldestNode[0] || (major === oldestNode[0] && minor >= oldestNode[1])) return;
  throw new Error(`Node ${oldestNode.join('.')} or newer is needed; this is ${process.versions.node}.`);
}

/** Runs a TypeScript file as a child that hears every signal, and ends when this process does, however it does. */
function runTypeScript(entry, argv) {
  const child = spawn(process.execPath, ['--conditions=@cairnstep/source', '--import', 'tsx', entry, ...argv], {
    cwd: root,
    // How the API's decorators are compiled, should its sources be among what is run.
    env: { ...process.env, TSX_TSCONFIG_PATH: join(root, 'services/api/tsconfig.json') },
    // The channel carries no messages: its closing tells the child that this process is gone.
    stdio: ['inherit', 'inherit', 'inherit', 'ipc'],
  });
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => child.kill(signal));
  return new Promise((resolve) => {
    child.once('exit', (code, signal) => resolve(code ?? 128 + constants.signals[signal]));
  });
}

/**
 * @param {{ entry: string, programs: string[], argv?: string[] }} command the TypeScript file (from the project's root),
 *   the Debian programs it needs, and its arguments
 */
export async function run({ entry, programs, argv = process.argv.slice(2) }) {
  try {
    requireNode();
    ensureDebianPrograms(programs);
    ensureNodePackages(root);
  } catch (error) {
    process.stderr.write(`${error.message}\n`);
    process.exitCode = 1;
    return;
  }
  process.exitCode = await runTypeScript(entry, argv);
}
