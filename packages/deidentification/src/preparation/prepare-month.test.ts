import { pseudonymPattern } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import type { SiteKey } from '../key-file/site-key.ts';
import { drawSecret } from '../pseudonyms/keyed-hash.ts';
import { usualNormalisation } from '../pseudonyms/normalise-local-id.ts';
import { cleanCsv } from './clean-csv.ts';
import type { MonthInput, PreparedMonth, RawTable } from './month.ts';
import { prepareMonth } from './prepare-month.ts';

const newKey = (): SiteKey => ({
  site: 'site-07',
  revision: 1,
  mode: 'random',
  idType: 'mrn',
  normalisation: usualNormalisation,
  generations: [{ keyId: '2026-01', secret: drawSecret(), codes: new Map(), replacedBy: new Map() }],
  people: new Map(),
  matches: new Map(),
  idLengths: new Map(),
});

const participants: RawTable = {
  table: 'participants',
  headers: ['MRN', 'Surname', 'DOB', 'Sex', 'Date of injury', 'Cause', 'Ventilator', 'Notes'],
  rows: [
    ['0048-2913', 'Okafor', '13/06/1950', 'Female', '17/05/2023', 'transport', 'n', 'lives near the park'],
    ['00482914', 'Smith', '25/12/1931', 'male', '28/02/2022', 'sports and leisure', 'no', ''],
    ['', '', '', '', '', '', '', ''],
  ],
};
const sessions: RawTable = {
  table: 'sessions',
  headers: ['MRN', 'Session date', 'Session', 'course', 'Status', 'device', 'Total distance (km)', 'Therapist'],
  rows: [
    ['00482913', '26/03/2024', '1', '1', 'cancelled_before', 'manual_bwstt', '', 'J. Okafor'],
    ['00482913', '28/03/2024', '1', '1', 'completed', 'manual_bwstt', '0.12', 'J. Okafor'],
    ['00482913', '01/04/2024', '1', '1', 'done', 'manual_bwstt', '0.2', 'J. Okafor'],
    ['00482914', '02/04/2024', '1', '1', 'shortened', 'manual_bwstt', '0.05', 'J. Okafor'],
  ],
};

const month = (tables: readonly RawTable[], more: Partial<MonthInput> = {}): MonthInput => ({ tables, key: newKey(), ...more });
const kinds = ({ problems }: PreparedMonth) => problems.map(({ kind, variable }) => (variable === null ? kind : `${kind} ${variable}`));
const cellsOf = (prepared: PreparedMonth, table: number, column: string) => {
  const { headers, rows } = prepared.clean[table] ?? { headers: [] as readonly string[], rows: [] as readonly (readonly string[])[] };
  return rows.map((row) => row[headers.indexOf(column)]);
};

describe('a month', () => {
  it('is prepared from files as a clinic keeps them', async () => {
    const prepared = await prepareMonth(month([participants, sessions]));
    const codes = cellsOf(prepared, 0, 'participant');
    expect(codes.every((code) => pseudonymPattern.test(code ?? ''))).toBe(true);
    expect(new Set(codes).size).toBe(2);
    expect(cellsOf(prepared, 1, 'participant')).toEqual([codes[0], codes[0], codes[0], codes[1]]);

    // Counted by hand from 28 March 2024 and 2 April 2024, the first days of training.
    expect(cellsOf(prepared, 1, 'session_day')).toEqual(['-2', '0', '4', '0']);
    expect(cellsOf(prepared, 1, 'distance_total_m')).toEqual(['', '120', '200', '50']);
    expect(cellsOf(prepared, 0, 'age_at_index')).toEqual(['73', '90']);
    expect(cellsOf(prepared, 0, 'injury_year')).toEqual(['2023', '2022']);
    expect(cellsOf(prepared, 0, 'days_injury_to_index')).toEqual(['316', '764']);
    expect(cellsOf(prepared, 0, 'sex')).toEqual(['female', 'male']);
    expect(cellsOf(prepared, 0, 'cause')).toEqual(['transport', 'sports_leisure']);
    expect(prepared.clean[0]?.lines).toEqual([2, 3]);
    expect(prepared.agesTopCoded).toBe(1);
  });

  it('tells what was left behind, what is new and what to mend', async () => {
    const prepared = await prepareMonth(month([participants, sessions]));
    expect(prepared.dropped.map(({ table, columnNumber, reason }) => [table, columnNumber, reason])).toEqual([
      ['participants', 2, 'not-in-the-dictionary'],
      ['participants', 8, 'not-in-the-dictionary'],
      ['sessions', 8, 'not-in-the-dictionary'],
    ]);
    expect(prepared.newParticipants).toMatchObject([
      { table: 'participants', line: 2, indexDate: 'first-session' },
      { table: 'participants', line: 3, indexDate: 'first-session' },
    ]);
    expect(prepared.problems).toEqual([
      {
        kind: 'unreadable-cell',
        table: 'sessions',
        columnNumber: 5,
        variable: 'status',
        lines: [4],
        count: 1,
        message: 'Write one of completed, shortened, cancelled_before, attended_not_trained.',
      },
    ]);
    expect(prepared.findings.map((finding) => finding.class)).toEqual(['person_name', 'free_text', 'staff_name']);
    expect(prepared.lengthChange).toBeNull();
  });

  it('shows just what would be sent', async () => {
    const prepared = await prepareMonth(month([sessions]));
    const [preview] = prepared.preview;
    expect(preview?.rows).toEqual(prepared.clean[0]?.rows);
    expect(preview?.distinct.find(({ column }) => column === 'status')?.values).toEqual([
      { value: 'cancelled_before', count: 1 },
      { value: 'completed', count: 1 },
      { value: 'shortened', count: 1 },
    ]);
    expect(preview?.distinct.map(({ column }) => column)).not.toContain('session_day');
    const [clean] = prepared.clean;
    expect(clean && cleanCsv(clean).split('\r\n')).toHaveLength(6);
    expect(() => cleanCsv({ headers: ['a'], rows: [['1,5']] })).toThrow(RangeError);
  });

  it('shows the first 20 rows only', async () => {
    const rows = Array.from({ length: 30 }, (_, day) => [
      'A1',
      `2024-03-${String(day + 1).padStart(2, '0')}`,
      '1',
      '1',
      'completed',
      '',
      '',
      '',
    ]);
    const prepared = await prepareMonth(month([{ ...sessions, rows }]));
    expect(prepared.clean[0]?.rows).toHaveLength(30);
    expect(prepared.preview[0]?.rows).toHaveLength(20);
  });

  it('goes on from the key of the month before', async () => {
    const first = await prepareMonth(month([participants, sessions]));
    const next = {
      ...sessions,
      rows: [
        ['00482913', '30/04/2024', '1', '1', 'completed', 'manual_bwstt', '0.3', ''],
        ['482914', '30/04/2024', '1', '1', 'completed', '', '', ''],
      ],
    };
    const second = await prepareMonth({ tables: [next], key: first.key });
    expect(cellsOf(second, 0, 'participant')[0]).toBe(cellsOf(first, 0, 'participant')[0]);
    expect(cellsOf(second, 0, 'session_day')).toEqual(['33', '0']);
    // A spreadsheet ate the zeros of the second number: a new person, and the length gives it away.
    expect(second.newParticipants).toHaveLength(1);
    expect(second.lengthChange).toEqual({ ids: 2, newLengths: 1 });
    expect(second.matches[0]?.matches).toEqual(first.matches[1]?.matches);
  });

  it('does not change its input, so that it can be prepared again with other matches', async () => {
    const input = month([participants, sessions]);
    const before = structuredClone(input);
    const first = await prepareMonth(input);
    expect(input).toEqual(before);
    const chosen = first.matches[1]?.matches.map((match) =>
      match.as === 'value' && match.variable === 'status' ? { ...match, codes: { Done: 'completed' } } : match,
    );
    const again = await prepareMonth({ ...input, tables: [participants, { ...sessions, ...(chosen && { matches: chosen }) }] });
    expect(kinds(again)).toEqual([]);
    expect(cellsOf(again, 1, 'status')).toEqual(['cancelled_before', 'completed', 'completed', 'shortened']);
  });
});

describe('dates of a month', () => {
  const ambiguous: RawTable = { ...sessions, rows: [['A1', '05/03/2024', '1', '1', 'completed', '', '', '']] };

  it('are not guessed: without a format nothing is prepared, with one it is', async () => {
    const prepared = await prepareMonth(month([ambiguous]));
    expect(kinds(prepared)).toEqual(['ambiguous-date-format']);
    expect(prepared.clean[0]?.rows).toEqual([]);
    const matches = prepared.matches[0]?.matches.map((match) =>
      match.as === 'study-day' ? { ...match, dateFormat: 'day/month/year' as const } : match,
    );
    const stated = await prepareMonth(month([{ ...ambiguous, ...(matches && { matches }) }]));
    expect(kinds(stated)).toEqual([]);
    expect(cellsOf(stated, 0, 'session_day')).toEqual(['0']);
  });

  it('that cannot be read keep their row behind', async () => {
    const matches = [
      { header: 'MRN', as: 'participant' },
      { header: 'Session date', as: 'study-day', variable: 'session_day', dateFormat: 'day/month/year' },
    ] as const;
    const rows = [
      ['A1', '05/03/2024'],
      ['A1', '31/02/2024'],
      ['A1', '5/3/24'],
      ['A1', '01/03/2090'],
    ];
    const prepared = await prepareMonth(
      month([{ table: 'sessions', headers: ['MRN', 'Session date'], rows, matches, lines: [7, 8, 9, 11] }]),
    );
    expect(prepared.clean[0]?.lines).toEqual([7]);
    expect(prepared.problems.map(({ kind, lines }) => [kind, lines])).toEqual([
      ['unreadable-date', [8]],
      ['unreadable-date', [9]],
      ['value-withheld', [11]],
    ]);
    expect(prepared.problems.every(({ message }) => message.endsWith('The row stays behind.'))).toBe(true);
  });

  const exams: RawTable = {
    table: 'exams',
    headers: ['MRN', 'Exam date'],
    rows: [
      ['A1', '2024-03-01'],
      ['', '2024-03-01'],
      ['B2', '2024-03-01', 'more'],
    ],
  };

  it('need a first training day, which may be stated', async () => {
    const prepared = await prepareMonth(month([exams]));
    expect(kinds(prepared)).toEqual(['index-date-unknown', 'participant-missing', 'long-row']);
    expect(prepared.clean[0]?.rows).toEqual([]);
    expect(prepared.newParticipants[0]?.indexDate).toBe('unknown');

    const stated = await prepareMonth(
      month([exams], {
        indexDates: new Map([
          ['a1', '2024-03-05'],
          ['-', '2024-03-05'],
          ['Z9', '2024-03-05'],
        ]),
      }),
    );
    expect(cellsOf(stated, 0, 'exam_day')).toEqual(['-4']);
    expect(stated.newParticipants[0]?.indexDate).toBe('stated');
    await expect(prepareMonth(month([exams], { indexDates: new Map([['A1', '5/3/2024']]) }))).rejects.toThrow(RangeError);
  });

  it('count from a column of first training days before they count from the first session', async () => {
    const withIndex: RawTable = { table: 'participants', headers: ['MRN', 'First training date'], rows: [['A1', '2024-03-05']] };
    const later: RawTable = { ...sessions, rows: [['A1', '2024-03-12', '1', '1', 'completed', '', '', '']] };
    const prepared = await prepareMonth(month([withIndex, later]));
    expect(cellsOf(prepared, 1, 'session_day')).toEqual(['7']);
    expect(prepared.newParticipants[0]?.indexDate).toBe('index-column');
  });

  it('stay with the first training day of the key file, and say when files disagree with it', async () => {
    const first = await prepareMonth(month([{ ...sessions, rows: [['A1', '2024-03-12', '1', '1', 'completed', '', '', '']] }]));
    const earlier = { ...sessions, rows: [['A1', '2024-03-10', '1', '1', 'completed', '', '', '']] };
    const second = await prepareMonth({ tables: [earlier], key: first.key });
    expect(kinds(second)).toEqual(['index-date-differs']);
    expect(cellsOf(second, 0, 'session_day')).toEqual(['-2']);
    const corrected = await prepareMonth({ tables: [earlier], key: first.key, indexDates: new Map([['A1', '2024-03-10']]) });
    expect(kinds(corrected)).toEqual(['index-date-differs']);
    expect(cellsOf(corrected, 0, 'session_day')).toEqual(['0']);
    const column: RawTable = { table: 'participants', headers: ['MRN', 'First training date'], rows: [['A1', '2024-03-11']] };
    expect(kinds(await prepareMonth({ tables: [column], key: first.key }))).toEqual(['index-date-differs']);
  });

  it('of bouts tell the first training day as well', async () => {
    const bouts: RawTable = {
      table: 'bouts',
      headers: ['MRN', 'Date', 'bout_no'],
      rows: [
        ['A1', '2024-03-14', '1'],
        ['A1', '2024-03-12', '1'],
      ],
    };
    expect(cellsOf(await prepareMonth(month([bouts])), 0, 'session_day')).toEqual(['2', '0']);
  });

  it('of birth and injury must make sense', async () => {
    const headers = ['MRN', 'DOB', 'Injury date', 'First training date'];
    const rows = [
      ['A1', '2025-01-01', '2024-03-06', '2024-03-05'],
      ['B2', '1990-01-01', '1925-01-01', '2024-03-05'],
    ];
    const prepared = await prepareMonth(month([{ table: 'participants', headers, rows }]));
    expect(kinds(prepared)).toEqual(['unreadable-date age_at_index', 'value-withheld days_injury_to_index', 'value-withheld injury_year']);
    expect(cellsOf(prepared, 0, 'age_at_index')).toEqual(['', '34']);
  });
});

describe('ages of a month', () => {
  const person = (age: string): RawTable => ({ table: 'participants', headers: ['MRN', 'age'], rows: [['A1', age]] });
  const session = (date: string): RawTable => ({ ...sessions, rows: [['A1', date, '1', '1', 'completed', '', '', '']] });

  it.each([
    ['89', '89'],
    ['90', '90'],
    ['94', '90'],
    ['90+', '90'],
    ['129', '90'],
  ])('of %s leave the site as %s', async (written, sent) => {
    expect(cellsOf(await prepareMonth(month([person(written)])), 0, 'age_at_index')).toEqual([sent]);
  });

  it('that nobody reaches are typing errors', async () => {
    const prepared = await prepareMonth(month([person('230')]));
    expect(kinds(prepared)).toEqual(['value-withheld age_at_index']);
    expect(cellsOf(prepared, 0, 'age_at_index')).toEqual(['']);
  });

  it('become 90 when a study day tells that the person has been 90', async () => {
    const first = await prepareMonth(month([person('88'), session('2022-03-01')]));
    expect(cellsOf(first, 0, 'age_at_index')).toEqual(['88']);
    // 731 days after the first training day, at 88 + 2.0: the age of two years before must not be known any more.
    const second = await prepareMonth({ tables: [session('2024-03-01')], key: first.key });
    expect(kinds(second)).toEqual(['age-to-correct']);
    const corrected = await prepareMonth({ tables: [person('88'), session('2024-03-01')], key: first.key });
    expect(kinds(corrected)).toEqual([]);
    expect(cellsOf(corrected, 0, 'age_at_index')).toEqual(['90']);
    expect(corrected.agesTopCoded).toBe(1);
    const later = await prepareMonth({ tables: [person('88')], key: corrected.key });
    expect(cellsOf(later, 0, 'age_at_index')).toEqual(['90']);
    expect(cellsOf(await prepareMonth({ tables: [person('58')], key: corrected.key }), 0, 'age_at_index')).toEqual(['58']);
  });
});

describe('cells of a month', () => {
  const bout = (headers: readonly string[], cells: readonly string[], more: Partial<RawTable> = {}): RawTable => ({
    table: 'bouts',
    headers: ['MRN', 'session_day', 'session_no', 'bout_no', ...headers],
    rows: [['A1', '0', '1', '1', ...cells]],
    ...more,
  });

  it('are converted to the unit of the dictionary', async () => {
    // NIST SP 811, B.8: 1 ft = 0.3048 m, 1 mi/h = 0.44704 m/s, exactly.
    const prepared = await prepareMonth(
      month([bout(['distance_ft', 'Treadmill speed (mph)', 'Duration min', 'bws_kg'], ['10', '1.2', '1.5', '7.50'])]),
    );
    expect(kinds(prepared)).toEqual([]);
    expect(['distance_m', 'treadmill_speed_mps', 'duration_s', 'bws_kg'].map((key) => cellsOf(prepared, 0, key)[0])).toEqual([
      '3.048',
      '0.536448',
      '90',
      '7.5',
    ]);
  });

  it('have the decimal mark that the file is said to have', async () => {
    const headers = ['distance_m', 'bws_kg'];
    const comma = await prepareMonth(month([bout(headers, ['12,5', '7.5'], { decimalMark: ',' })]));
    expect(cellsOf(comma, 0, 'distance_m')).toEqual(['12.5']);
    expect(kinds(comma)).toEqual(['unreadable-cell bws_kg']);
    expect(kinds(await prepareMonth(month([bout(headers, ['12,5', '7.5'])])))).toEqual(['unreadable-cell distance_m']);
  });

  it('of results are read by the measure of their row', async () => {
    const headers = ['MRN', 'assessment_day', 'value', 'measure', 'trial_no', 'timepoint'];
    const rows = [
      ['A1', '0', '1+', 'mas', '1', 'baseline'],
      ['A1', '0', '1+', 'tug', '1', 'baseline'],
      ['A1', '0', '31.5', 'tug', '1', 'baseline'],
    ];
    const prepared = await prepareMonth(month([{ table: 'assessments', headers, rows }]));
    expect(cellsOf(prepared, 0, 'value')).toEqual(['1.5', '', '31.5']);
    expect(kinds(prepared)).toEqual(['unreadable-cell value']);
  });

  it('outside the limits of the dictionary stay behind, whatever they are', async () => {
    const prepared = await prepareMonth(month([bout(['steps', 'stop_reason'], ['20240305', 'Pt John Smith tired'])]));
    expect(kinds(prepared)).toEqual(['identifiers-in-column stop_reason', 'value-withheld steps']);
    expect(cellsOf(prepared, 0, 'steps')).toEqual(['']);
    const among = await prepareMonth(
      month([
        bout(['stop_reason'], [], {
          rows: ['fatigue', 'pain', 'Pt John Smith tired'].map((reason, row) => ['A1', '0', '1', String(row + 1), reason]),
        }),
      ]),
    );
    expect(kinds(among)).toEqual(['unreadable-cell stop_reason']);
    expect(cellsOf(among, 0, 'stop_reason')).toEqual(['fatigue', 'pain', '']);
  });

  it('that name the row keep it behind when they cannot be read', async () => {
    const prepared = await prepareMonth(
      month([
        bout([], [], {
          rows: [
            ['A1', '0', 'one', '1'],
            ['A1', '0', '1', '2'],
          ],
        }),
      ]),
    );
    expect(prepared.clean[0]?.lines).toEqual([3]);
  });

  it('keep a participant code that the file has already', async () => {
    const first = await prepareMonth(month([bout([], [])]));
    const [code = ''] = cellsOf(first, 0, 'participant').map(String);
    const again = await prepareMonth({ tables: [bout([], [], { rows: [[code, '0', '1', '1']] })], key: first.key });
    expect(cellsOf(again, 0, 'participant')).toEqual([code]);
    expect(again.newParticipants).toEqual([]);
  });
});

describe('matches that cannot be followed', () => {
  it('are told, and leave nothing half done', async () => {
    const headers = ['MRN', 'Steps', 'Mobile', 'Twice', 'Twice', 'Repeat'];
    const rows = [
      ['48291', '100', '200', '1', '1', '48291'],
      ['48292', '100', '200', '1', '1', '48292'],
    ];
    const matches = [
      { header: 'MRN', as: 'participant' },
      { header: 'Steps', as: 'value', variable: 'steps_total' },
      { header: 'Mobile', as: 'value', variable: 'staff_count' },
      { header: 'Repeat', as: 'value', variable: 'distance_total_m' },
      { header: 'Twice', as: 'value', variable: 'rest_min' },
      { header: 'Gone', as: 'value', variable: 'upright_min' },
      { header: 'Steps', as: 'value', variable: 'steps_total' },
      { header: 'Steps', as: 'value', variable: 'no_such_thing' },
      { header: 'Steps', as: 'value', variable: 'participant' },
      { header: 'Steps', as: 'study-day', variable: 'rest_min' },
      { header: 'Steps', as: 'birth-date' },
    ] as const;
    const prepared = await prepareMonth(month([{ table: 'sessions', headers, rows, matches }]));
    expect(kinds(prepared)).toEqual([
      'repeated-header',
      'no-such-column',
      'column-matched-twice',
      'no-such-variable',
      'identifiers-in-column staff_count',
      'identifiers-in-column distance_total_m',
    ]);
    expect(prepared.clean[0]?.headers).toEqual(['participant', 'steps_total']);
    expect(prepared.dropped.map(({ columnNumber, reason }) => [columnNumber, reason])).toEqual([
      [3, 'holds-identifiers'],
      [4, 'not-in-the-dictionary'],
      [5, 'not-in-the-dictionary'],
      [6, 'holds-identifiers'],
    ]);
    const safe = await prepareMonth(month([{ table: 'sessions', headers, rows, matches }], { safeHeaders: new Set(['Mobile']) }));
    expect(safe.clean[0]?.headers).toContain('staff_count');
  });

  it('without a participant prepare no row', async () => {
    const prepared = await prepareMonth(month([{ table: 'sessions', headers: ['steps_total'], rows: [['5']] }]));
    expect(kinds(prepared)).toEqual(['no-participant-column']);
    expect(prepared.clean[0]?.rows).toEqual([]);
  });
});

describe('a column that was empty when it was first seen', () => {
  const consents = (validUntil: string): RawTable => ({
    table: 'consents',
    headers: ['MRN', 'consent_no', 'Signing date', 'Valid until date'],
    rows: [['A1', '1', '05.03.2024', validUntil]],
  });

  it('is not left behind for good', async () => {
    const matches = [
      { header: 'MRN', as: 'participant' },
      { header: 'consent_no', as: 'value', variable: 'consent_no' },
      { header: 'Signing date', as: 'study-day', variable: 'signed_day' },
      { header: 'Valid until date', as: 'left-out' },
    ] as const;
    const indexDates = new Map([['A1', '2024-03-01']]);
    const first = await prepareMonth({ ...month([{ ...consents(''), matches }]), indexDates });
    const next = await prepareMonth({ ...month([consents('31.12.2027')]), key: first.key });
    const [table] = next.clean;
    expect(table?.headers).toContain('valid_until_day');
    // From 1 March 2024 three years of 365 days to 1 March 2027, and 305 to 31 December.
    expect(table?.rows[0]?.[table.headers.indexOf('valid_until_day')]).toBe('1400');
  });
});
