import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { chooseDataFolder } from './data-folder.ts';
import { claimDataFolder } from './only-one.ts';
import { removeRun, writeRun } from './run-note.ts';
import { secretsOf } from './secrets.ts';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'cairnstep-folder-test-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

describe('chooseDataFolder', () => {
  it('makes the given folder, with logs that nobody else reads', () => {
    const chosen = chooseDataFolder(join(folder, 'a', 'b'), false);
    expect(chosen.path).toBe(join(folder, 'a', 'b'));
    expect(statSync(chosen.logs).mode & 0o077).toBe(0);
    expect(statSync(chosen.path).mode & 0o066).toBe(0);
  });

  it('refuses a folder that the database’s account cannot enter', () => {
    // The temporary folder is closed to others. Only under root is the database's account another one.
    const choose = () => chooseDataFolder(join(folder, 'a'), true);
    if (process.getuid?.() === 0) expect(choose).toThrow('Choose a folder that everybody may pass through');
    else expect(choose().path).toBe(join(folder, 'a'));
  });
});

describe('claimDataFolder', () => {
  it('lets one start have a folder at a time, and tells the second where the first is', async () => {
    const release = await claimDataFolder(folder);
    await expect(claimDataFolder(folder)).rejects.toThrow('just starting or stopping');
    writeRun(folder, { address: 'http://127.0.0.1:8420', mailAddress: 'http://127.0.0.1:2', providerAddress: 'http://127.0.0.1:3' });
    await expect(claimDataFolder(folder)).rejects.toThrow('It answers at http://127.0.0.1:8420.');
    removeRun(folder);
    await release();
    await (
      await claimDataFolder(folder)
    )();
  });
});

describe('secretsOf', () => {
  it('draws each secret once, for its owner’s eyes', () => {
    const first = secretsOf(folder);
    expect(new Set(Object.values(first)).size).toBe(5);
    expect(secretsOf(folder)).toEqual(first);
    expect(statSync(join(folder, 'secrets.json')).mode & 0o777).toBe(0o600);
  });

  it('adds one that an older version did not know', () => {
    const { siteSystemSecret, ...older } = secretsOf(folder);
    writeFileSync(join(folder, 'secrets.json'), JSON.stringify(older));
    const newer = secretsOf(folder);
    expect(newer).toMatchObject(older);
    expect(newer.siteSystemSecret).not.toBe(siteSystemSecret);
    expect(JSON.parse(readFileSync(join(folder, 'secrets.json'), 'utf8'))).toEqual(newer);
  });
});
