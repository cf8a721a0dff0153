/** The npm packages that package-lock.json names, installed when they are missing or others than it names. */
import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

const packagesIn = (file) => JSON.parse(readFileSync(file, 'utf8')).packages;

/**
 * True when node_modules holds what the lock file says. npm keeps its own note of what it installed, written last, so an
 * interrupted installation and one made for an older lock file both differ. Packages for other systems are optional and
 * rightly absent.
 */
export function areNodePackagesCurrent(root) {
  const note = join(root, 'node_modules', '.package-lock.json');
  if (!existsSync(note)) return false;
  const wanted = packagesIn(join(root, 'package-lock.json'));
  const there = packagesIn(note);
  const isCurrent = ([path, entry]) =>
    path === '' ||
    (there[path] === undefined
      ? entry.optional === true
      : there[path].version === entry.version && there[path].integrity === entry.integrity);
  return Object.entries(wanted).every(isCurrent) && Object.keys(there).every((path) => path in wanted);
}

/** @throws Error with npm's words when the installation fails */
export function ensureNodePackages(root) {
  if (areNodePackagesCurrent(root)) return;
  process.stderr.write('Installing the npm packages that package-lock.json names …\n');
  const result = spawnSync('npm', ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'], {
    cwd: root,
    encoding: 'utf8',
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  if (result.status !== 0) throw new Error(`npm ci failed:\n${result.error?.message ?? result.stderr.trim()}`);
}
