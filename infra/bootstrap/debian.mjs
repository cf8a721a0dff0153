/**
 * Programs that come from Debian rather than from npm, installed when they are missing. Plain JavaScript: nothing of
 * the project is installed yet when this runs.
 */
import { execFileSync, spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { delimiter, dirname, join } from 'node:path';

const onPath = (program) => (process.env.PATH ?? '').split(delimiter).some((folder) => existsSync(join(folder, program)));

const debianServers = '/usr/lib/postgresql';
const hasServer = () =>
  existsSync(debianServers) && readdirSync(debianServers).some((version) => existsSync(join(debianServers, version, 'bin', 'initdb')));

/** Debian's package would start a cluster of its own on port 5432; the project makes its own instead. */
const noMainCluster = { file: '/etc/postgresql-common/createcluster.d/cairnstep.conf', text: 'create_main_cluster = false\n' };

export const programs = {
  postgresql: { title: 'PostgreSQL', isThere: () => hasServer() || onPath('initdb'), before: noMainCluster },
  curl: { title: 'curl', isThere: () => onPath('curl') },
  chromium: { title: 'Chromium', isThere: () => existsSync('/usr/bin/chromium') },
};

/** What to put before a command so that it runs as root: nothing, sudo, or undefined when neither works. */
function asRoot() {
  if (process.getuid() === 0) return [];
  return spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0 ? ['sudo', '-n'] : undefined;
}

function writeAsRoot(prefix, { file, text }) {
  if (prefix.length === 0) {
    mkdirSync(dirname(file), { recursive: true });
    writeFileSync(file, text);
    return;
  }
  const [sudo, ...flags] = prefix;
  execFileSync(sudo, [...flags, 'mkdir', '-p', dirname(file)]);
  execFileSync(sudo, [...flags, 'tee', file], { input: text, stdio: ['pipe', 'ignore', 'inherit'] });
}

function aptGet(prefix, ...what) {
  const [command, ...rest] = [
    ...prefix,
    'env',
    'DEBIAN_FRONTEND=noninteractive',
    'apt-get',
    '-y',
    '-qq',
    '-o',
    'DPkg::Lock::Timeout=300',
    ...what,
  ];
  return spawnSync(command, rest, { encoding: 'utf8', stdio: ['ignore', 'pipe', 'pipe'] });
}

/**
 * Installs what is missing of `names` (keys of `programs`).
 * @throws Error saying what to install by hand when this account may not, or when apt-get fails
 */
export function ensureDebianPrograms(names) {
  const missing = names.filter((name) => !programs[name].isThere());
  if (missing.length === 0) return;
  const titles = missing.map((name) => programs[name].title).join(' and ');
  const byHand = `apt-get install --no-install-recommends ${missing.join(' ')}`;
  if (!onPath('apt-get'))
    throw new Error(`${titles} is missing, and this is not Debian. Install it in this system's own way, so that its programs are on PATH.`);
  const prefix = asRoot();
  if (prefix === undefined)
    throw new Error(`${titles} is missing, and this account may not install it. Ask an administrator to run:\n  ${byHand}`);

  process.stderr.write(`Installing ${titles} from Debian (once) …\n`);
  for (const name of missing) if (programs[name].before !== undefined) writeAsRoot(prefix, programs[name].before);
  const install = () => aptGet(prefix, 'install', '--no-install-recommends', ...missing);
  let result = install();
  if (result.status !== 0) {
    // The usual reason: no package lists yet, or lists that name versions no longer served.
    aptGet(prefix, 'update');
    result = install();
  }
  if (result.status !== 0) throw new Error(`${titles} could not be installed. apt-get said:\n${result.stderr.trim()}\nBy hand: ${byHand}`);
}
