import { tableKeys, tableOf } from '@cairnstep/dictionary';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dateFormats } from '../dates/date-format.ts';
import type { DateFormat } from '../dates/date-format.ts';
import { saveKeyFile } from '../key-file/key-file.ts';
import { iterationLimits } from '../key-file/key-file-header.ts';
import type { SiteKey } from '../key-file/site-key.ts';
import { drawSecret } from '../pseudonyms/keyed-hash.ts';
import { usualNormalisation } from '../pseudonyms/normalise-local-id.ts';
import { cleanCsv } from './clean-csv.ts';
import type { ColumnMatch } from './column-match.ts';
import type { PreparedMonth, RawTable } from './month.ts';
import { prepareMonth } from './prepare-month.ts';

/** What is planted: record numbers, dates in every spelling, and names; long enough never to appear by chance. */
const recordNumber = fc.oneof(
  fc.stringMatching(/^[1-9]\d{6,9}$/),
  fc.stringMatching(/^[A-Z]{2}-\d{3}-\d{4}$/),
  fc.stringMatching(/^00\d{5,7}$/),
);
const plantedDate = fc
  .tuple(
    fc.integer({ min: 1915, max: 2025 }),
    fc.integer({ min: 1, max: 12 }),
    fc.integer({ min: 1, max: 28 }),
    fc.constantFrom(...dateFormats),
  )
  .map(([year, month, day, format]) => spell(year, month, day, format));
const name = fc.constantFrom('Siobhan McAllister', 'Okorafor, Adaku', 'Wojciechowski', 'Nguyen Thi Lan');

function spell(year: number, month: number, day: number, format: DateFormat): string {
  const [m, d] = [String(month).padStart(2, '0'), String(day).padStart(2, '0')];
  // Day numbers of earlier years are as small as counts of steps. No limit of the dictionary reaches those of the years since.
  const serial = Date.UTC(Math.max(year, 1995), month - 1, day) / 86_400_000;
  switch (format) {
    case 'iso':
      return `${year}-${m}-${d}`;
    case 'day/month/year':
      return `${d}/${m}/${year}`;
    case 'month/day/year':
      return `${m}/${d}/${year}`;
    case 'day.month.year':
      return `${d}.${m}.${year}`;
    case 'serial-1900':
      return String(serial + 25_569);
    case 'serial-1904':
      return String(serial + 24_107);
  }
}

const planted = fc.oneof(recordNumber, plantedDate, name);

/** A file with any headers, any matches, and something planted in every other cell. */
const hostileTable = fc.constantFrom(...tableKeys).chain((table): fc.Arbitrary<RawTable> => {
  const { variables } = tableOf(table);
  const keys = variables.map(({ key }) => key);
  const header = fc.oneof(
    fc.constantFrom(...keys),
    fc.constantFrom('MRN', 'DOB', 'Date', 'Injury date', 'Notes', 'Surname', 'x', '__proto__'),
    planted,
  );
  return fc.uniqueArray(header, { minLength: 2, maxLength: 8 }).chain((headers) => {
    const column = fc.constantFrom(...headers);
    const match: fc.Arbitrary<ColumnMatch> = fc.oneof(
      column.map((each): ColumnMatch => ({ header: each, as: 'participant' })),
      fc.tuple(column, fc.constantFrom(...keys)).map(([each, variable]): ColumnMatch => ({ header: each, as: 'value', variable })),
      fc
        .tuple(column, fc.constantFrom('birth-date', 'injury-date', 'index-date'), fc.constantFrom(...dateFormats))
        .map(([each, as, dateFormat]): ColumnMatch => ({ header: each, as, dateFormat })),
      fc
        .tuple(column, fc.constantFrom(...keys), fc.constantFrom(...dateFormats))
        .map(([each, variable, dateFormat]): ColumnMatch => ({ header: each, as: 'study-day', variable, dateFormat })),
    );
    const cell = fc.oneof(
      planted,
      fc.constantFrom('', '1', '12', 'yes', 'completed', '45'),
      planted.map((each) => `seen ${each} today`),
    );
    return fc.record({
      table: fc.constant(table),
      headers: fc.constant(headers),
      rows: fc.array(fc.array(cell, { minLength: headers.length, maxLength: headers.length + 1 }), { minLength: 1, maxLength: 6 }),
      matches: fc.array(match, { minLength: 1, maxLength: 8 }),
    });
  });
});

const newKey = (mode: SiteKey['mode']): SiteKey => ({
  site: 'site-07',
  revision: 1,
  mode,
  idType: 'mrn',
  normalisation: usualNormalisation,
  generations: [{ keyId: '2026-01', secret: drawSecret(), codes: new Map(), replacedBy: new Map() }],
  people: new Map(),
  matches: new Map(),
  idLengths: new Map(),
});

/** Everything in the cells and headers that is long enough to tell, as it stands and without its separators. */
function tellingTexts(tables: readonly RawTable[]): string[] {
  const cells = tables.flatMap(({ headers, rows }) => [...headers, ...rows.flat()]).map((cell) => cell.replace(/^seen | today$/g, ''));
  const telling = cells.filter((cell) => /\d{4,}|\d[^\d]\d|^[A-Z][a-z]+[ ,]|^Woj/.test(cell));
  return [...new Set(telling.flatMap((cell) => [cell, cell.replace(/[^\p{L}\d]/gu, '')]))];
}

function disguises(text: string): string[] {
  const bytes = Buffer.from(text);
  const base64 = [0, 1, 2].map((shift) =>
    Buffer.concat([Buffer.alloc(shift), bytes])
      .toString('base64')
      .slice(shift === 0 ? 0 : 4)
      .replace(/.?={0,2}$/, ''),
  );
  return [
    text,
    text.toLowerCase(),
    text.toUpperCase(),
    [...text].reverse().join(''),
    bytes.toString('hex'),
    ...base64.filter((each) => each.length >= 6),
  ];
}

/** All that could be sent or shown of a month. The key is not among it, and of the matches only what they mean. */
const outputOf = ({ key: _, matches, ...rest }: PreparedMonth): string =>
  JSON.stringify([rest, matches.map((each) => each.matches.map(({ header: __, ...match }) => match))]) + rest.clean.map(cleanCsv).join('');

function expectNothingIn(output: string, tables: readonly RawTable[]): void {
  for (const text of tellingTexts(tables)) {
    for (const disguise of disguises(text)) expect(output.includes(disguise), `${disguise} in ${output}`).toBe(false);
  }
}

describe('a prepared month', () => {
  it('holds nothing of what identifies, whatever the file and however wrongly its columns are matched', async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(hostileTable, { minLength: 1, maxLength: 3 }), fc.constantFrom('random', 'hmac'), async (tables, mode) => {
        expectNothingIn(outputOf(await prepareMonth({ tables, key: newKey(mode) })), tables);
      }),
      { seed: 20261203, numRuns: 160 },
    );
  });

  it('holds nothing of it when the columns are matched by themselves, and neither does the key file', async () => {
    const month = fc.constantFrom('iso' as const, 'day.month.year' as const).chain((format) => {
      const between = (min: number, max: number) =>
        fc
          .tuple(fc.integer({ min, max }), fc.integer({ min: 1, max: 12 }), fc.integer({ min: 1, max: 28 }))
          .map(([year, month, day]) => spell(year, month, day, format));
      return fc.array(fc.tuple(recordNumber, between(1915, 2005), between(2021, 2025)), { minLength: 2, maxLength: 12 });
    });
    await fc.assert(
      fc.asyncProperty(month, fc.constantFrom('random', 'hmac'), async (people, mode) => {
        const sessions: RawTable = {
          table: 'sessions',
          headers: ['Hospital no', 'Session date', 'Therapist', 'Notes', 'session_no', 'course_no', 'status'],
          rows: people.map(([id, , date]) => [id, date, 'Wojciechowski', `MRN ${id} seen ${date}`, '1', '1', 'completed']),
        };
        const participants: RawTable = {
          table: 'participants',
          headers: ['Hospital no', 'DOB'],
          rows: people.map(([id, birth]) => [id, birth]),
        };
        const prepared = await prepareMonth({ tables: [participants, sessions], key: newKey(mode) });
        expect(prepared.clean.map(({ rows }) => rows.length)).toEqual([people.length, people.length]);
        const withoutHeaders = [sessions, participants].map((table) => ({ ...table, headers: [] }));
        expectNothingIn(outputOf(prepared), withoutHeaders);
      }),
      { seed: 20261204, numRuns: 50 },
    );
    const key = { ...newKey('random'), people: new Map([['S1', { indexDate: '2026-01-15' }]]) };
    const { file } = await saveKeyFile(key, 'bafo rina tuke sobi malu pegi', iterationLimits.least);
    for (const disguise of disguises('2026-01-15')) expect(file).not.toContain(disguise);
  });
});
