// @vitest-environment node
import { tableKeys, tableOf } from '@cairnstep/dictionary';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { inProcessWorkroom } from '../in-process-workroom.ts';
import { matchOf, meaningsFor } from '../meanings.ts';
import { isCleanCsv } from '../messages.ts';
import { csvFile, passphrase } from '../sample-month.ts';

const cell = fc.oneof(
  fc.constantFrom(
    '',
    '0',
    '1',
    '12',
    '0,5',
    '2.5',
    'yes',
    'NO',
    'completed',
    'done',
    '28/03/2026',
    '2026-03-28',
    '45000',
    '=1+1',
    '-',
    'NT',
    'S4-5',
  ),
  fc.string({ unit: 'grapheme', maxLength: 12 }),
  fc.stringMatching(/^00\d{4,6}$/),
);
const quoted = (text: string): string => `"${text.replaceAll('"', '""')}"`;

/** A file of any table, with any columns under any separator, and what becomes of one of its columns. */
const anyFile = fc.constantFrom(...tableKeys).chain((table) => {
  const header = fc.oneof(
    fc.constantFrom(...tableOf(table).variables.map(({ key }) => key)),
    fc.constantFrom('MRN', 'Date', 'DOB', 'Notes', '', '__proto__', 'constructor'),
    fc.string({ unit: 'grapheme', maxLength: 10 }),
  );
  return fc.array(header, { minLength: 1, maxLength: 8 }).chain((headers) =>
    fc.record({
      table: fc.constant(table),
      headers: fc.constant(headers),
      delimiter: fc.constantFrom(',', ';', '\t'),
      rows: fc.array(fc.array(cell, { maxLength: headers.length + 1 }), { maxLength: 6 }),
      changed: fc.nat({ max: headers.length - 1 }),
      meaning: fc.constantFrom(...meaningsFor(table).map(({ value }) => value)),
    }),
  );
});

it('works out any files, with any column turned into anything, and gives away codes and numbers only', async () => {
  const room = inProcessWorkroom();
  await room.ask('begin', { site: 'S01', month: '2026-03', knownParticipants: null, safeHeaders: [], today: '2026-12-01' });
  await room.ask('make-key', { mode: 'random', idType: 'mrn', stripLeadingZeros: false, passphrase });
  await fc.assert(
    fc.asyncProperty(fc.uniqueArray(anyFile, { minLength: 1, maxLength: 3, selector: ({ table }) => table }), async (files) => {
      const dropped = files.map(({ table, headers, rows, delimiter }) =>
        csvFile(
          `${table}.csv`,
          [['Record number', ...headers], ...rows.map((row, line) => [`00${4_829 + (line % 3)}`, ...row])]
            .map((cells) => cells.map(quoted).join(delimiter))
            .join('\n'),
        ),
      );
      const { sources } = await room.ask('add-files', { files: dropped });
      for (const [at, { table, headers, changed, meaning }] of files.entries()) {
        const source = sources.find((each) => each.fileName === `${table}.csv`);
        const header = headers[changed] ?? '';
        if (source !== undefined && at === 0)
          await room.ask('match-column', { source: source.id, match: matchOf(meaning, { header, as: 'left-out' }) });
      }
      const { prepared } = await room.ask('prepare', null);
      const { tables } = await room.ask('tables-to-send', null);
      for (const { csv } of tables) expect(isCleanCsv(csv)).toBe(true);
      expect(tables.map(({ table, rows }) => [table, rows])).toEqual(prepared.tables.map(({ table, rows }) => [table, rows]));
      for (const { id } of sources) await room.ask('leave-out', { id });
    }),
    { seed: 20261205, numRuns: 150 },
  );
});
