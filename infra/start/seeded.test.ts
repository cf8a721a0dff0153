import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { noteSeedBegun, noteSeedDone, seedNeeded } from './seeded.ts';

it('seeds a database once, its people again when the provider moves, and all anew when it was broken off', () => {
  const folder = mkdtempSync(join(tmpdir(), 'cairnstep-seeded-test-'));
  const needed = (identity: string, port: number) => seedNeeded(folder, identity, `http://127.0.0.1:${port}`);
  expect(needed('one', 1)).toBe('all');
  noteSeedBegun(folder, 'one');
  expect(needed('one', 1)).toBe('anew');
  noteSeedDone(folder, 'one', 'http://127.0.0.1:1');
  expect(needed('one', 1)).toBe('nothing');
  expect(needed('one', 2)).toBe('people');
  expect(needed('other', 1)).toBe('all');
  rmSync(folder, { recursive: true });
});
