// @vitest-environment node
import { describe, expect, it } from 'vitest';
import { inProcessWorkroom } from '../in-process-workroom.ts';
import { isCleanCsv } from '../messages.ts';
import { passphrase, sampleFiles } from '../sample-month.ts';
import type { Circumstances } from './protocol.ts';

const site: Circumstances = { site: 'S01', knownParticipants: [], safeHeaders: [], today: '2026-12-01' };
const newKey = { mode: 'random', idType: 'mrn', stripLeadingZeros: false, passphrase } as const;

async function withKey(circumstances: Circumstances = site) {
  const room = inProcessWorkroom();
  await room.ask('begin', circumstances);
  const { file } = await room.ask('make-key', newKey);
  return { room, file: new Blob([file.text]) };
}

describe('a month in the worker', () => {
  it('goes from files to what is sent', async () => {
    const { room } = await withKey();
    const { sources } = await room.ask('add-files', { files: sampleFiles() });
    expect(sources.map(({ table, delimiter, decimalMark, rows }) => [table, delimiter, decimalMark, rows])).toEqual([
      ['participants', ',', '.', 2],
      ['sessions', ';', ',', 4],
    ]);
    const { prepared, picture } = await room.ask('prepare', null);
    expect(prepared.people).toBe(2);
    expect(picture.key?.isUnsaved).toBe(true);
    const { tables } = await room.ask('tables-to-send', null);
    expect(tables.map(({ table, rows, csv }) => [table, rows, isCleanCsv(csv)])).toEqual([
      ['participants', 2, true],
      ['sessions', 4, true],
    ]);
  });
});
