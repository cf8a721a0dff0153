import { existsSync, mkdirSync, mkdtempSync, renameSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { areNodePackagesCurrent } from '../bootstrap/node-packages.mjs';
import { contentHash } from './content-hash.ts';
import { sweepOutputs } from './sweep-outputs.ts';

let root: string;
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'cairnstep-stamps-test-'));
});
afterEach(() => rmSync(root, { recursive: true }));

function write(path: string, text: string): void {
  mkdirSync(dirname(join(root, path)), { recursive: true });
  writeFileSync(join(root, path), text);
}

describe('contentHash', () => {
  const hash = (): string => contentHash(root, ['src', 'tsconfig.json', 'absent'], (path) => path.endsWith('.test.ts'));

  it('depends on contents and names, not on dates or on what is left out', () => {
    write('src/a.ts', 'one');
    write('src/deep/b.ts', 'two');
    write('tsconfig.json', '{}');
    const before = hash();
    utimesSync(join(root, 'src/a.ts'), 1, 1);
    write('src/a.test.ts', 'anything');
    write('elsewhere.ts', 'anything');
    expect(hash()).toBe(before);
    write('src/a.ts', 'One');
    const changed = hash();
    expect(changed).not.toBe(before);
    write('src/a.ts', 'one');
    expect(hash()).toBe(before);
    renameSync(join(root, 'src/a.ts'), join(root, 'src/c.ts'));
    expect(hash()).not.toBe(before);
  });

  it('notices text that moves from one file to the next', () => {
    write('src/a.ts', 'xy');
    write('src/b.ts', 'z');
    const before = hash();
    write('src/a.ts', 'x');
    write('src/b.ts', 'yz');
    expect(hash()).not.toBe(before);
  });
});

describe('sweepOutputs', () => {
  it('deletes what has no source any more, and nothing else', () => {
    for (const path of [
      'dist/kept.js',
      'dist/kept.js.map',
      'dist/kept.d.ts',
      'dist/part.js',
      'dist/old/gone.js',
      'dist/old/gone.d.ts',
      'dist/data.json',
    ])
      write(path, '');
    write('src/kept.ts', '');
    write('src/part.tsx', '');
    expect(sweepOutputs(root).sort()).toEqual([join(root, 'dist/old/gone.d.ts'), join(root, 'dist/old/gone.js')]);
    expect(existsSync(join(root, 'dist/kept.js'))).toBe(true);
    expect(existsSync(join(root, 'dist/data.json'))).toBe(true);
    expect(sweepOutputs(root)).toEqual([]);
  });
});

describe('areNodePackagesCurrent', () => {
  const lock = (packages: object): string => JSON.stringify({ packages: { '': {}, ...packages } });
  const one = { 'node_modules/one': { version: '1.0.0', integrity: 'sha512-a' } };
  const elsewhere = { 'node_modules/other-system': { version: '1.0.0', integrity: 'sha512-b', optional: true } };

  it('compares npm’s note of what it installed with the lock file', () => {
    write('package-lock.json', lock({ ...one, ...elsewhere }));
    expect(areNodePackagesCurrent(root)).toBe(false);
    const note = 'node_modules/.package-lock.json';
    write(note, JSON.stringify({ packages: one }));
    expect(areNodePackagesCurrent(root)).toBe(true);
    write('package-lock.json', lock({ 'node_modules/one': { version: '1.0.1', integrity: 'sha512-c' } }));
    expect(areNodePackagesCurrent(root)).toBe(false);
    write('package-lock.json', lock({ ...one, 'node_modules/two': { version: '1.0.0' } }));
    expect(areNodePackagesCurrent(root)).toBe(false);
    write('package-lock.json', lock({}));
    expect(areNodePackagesCurrent(root)).toBe(false);
  });
});
