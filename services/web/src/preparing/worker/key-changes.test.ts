// @vitest-environment node
import { createKeyFile, joinLocalIds, rotateKey } from '@cairnstep/deidentification';
import type { ColumnMatch, SiteKey } from '@cairnstep/deidentification';
import { beforeAll, describe, expect, it } from 'vitest';
import { passphrase } from '../sample-month.ts';
import { keyChanges as changesAfter, noActs } from './key-changes.ts';

const known = 'S0000000000000000000A1';
const other = 'S0000000000000000000B2';
const sex: ColumnMatch = { header: 'Sex', as: 'value', variable: 'sex', codes: { f: 'female', m: 'male' } };
const date: ColumnMatch = { header: 'Date', as: 'study-day', variable: 'session_day' };

let saved: SiteKey;
beforeAll(async () => {
  const { key } = await createKeyFile({ site: 'S01', keyId: '2026-12' }, passphrase);
  saved = {
    ...key,
    generations: [{ ...key.generations[0], codes: new Map([['look-up', known]]) }],
    people: new Map([[known, { indexDate: '2026-01-05', lastDay: 30 }]]),
    matches: new Map([['participants', [sex, date]]]),
    idLengths: new Map([
      [7, 3],
      [8, 12],
    ]),
  };
});
const nothing = { newPeople: 0, changedPeople: 0, columns: [], hasNewLength: false, hasOtherCodes: false, hasNewPassphrase: false };
const keyChanges = (before: SiteKey, after: SiteKey) => changesAfter(before, after, noActs);

describe('a key that holds no more than its file', () => {
  it('is not changed by being saved, by fewer people and columns, or by another order of them', () => {
    expect(keyChanges(saved, { ...saved, revision: 9 })).toBeNull();
    const { header, ...rest } = sex;
    const reordered = new Map([['participants', [date, { ...rest, header, codes: { m: 'male', f: 'female' } } as ColumnMatch]]] as const);
    expect(keyChanges(saved, { ...saved, matches: reordered })).toBeNull();
    expect(keyChanges(saved, { ...saved, matches: new Map([['participants', [date]]]), idLengths: new Map([[8, 1]]) })).toBeNull();
  });
});

describe('a key that holds more than its file', () => {
  it('tells of new people, and of days that moved', () => {
    const people = new Map([
      [known, { indexDate: '2026-01-05', lastDay: 44 }],
      [other, {}],
    ]);
    const codes = new Map([...saved.generations[0].codes, ['another look-up', other]]);
    const current: SiteKey = { ...saved, people, generations: [{ ...saved.generations[0], codes }] };
    expect(keyChanges(saved, current)).toEqual({ ...nothing, newPeople: 1, changedPeople: 1 });
  });

  it('tells of columns that are read in another way, and of another length of record numbers', () => {
    const matches = new Map([
      ['participants', [sex, { ...date, dateFormat: 'iso' as const }]],
      ['bouts', [date]],
    ] as const);
    const idLengths = new Map([
      [8, 12],
      [6, 1],
    ]);
    expect(keyChanges(saved, { ...saved, matches, idLengths })).toEqual({
      ...nothing,
      columns: ['participants', 'bouts'],
      hasNewLength: true,
    });
  });

  it('tells of a new secret and of codes that lead to somebody else', async () => {
    const { key: rotated } = await rotateKey(saved, '2026-12-2', []);
    expect(keyChanges(saved, rotated)).toEqual({ ...nothing, hasOtherCodes: true });
    const { key: one } = await joinLocalIds(saved, '0042', '0042');
    const { key: joined } = await joinLocalIds(one, '0042', '0043');
    expect(keyChanges(one, joined)).toEqual({ ...nothing, hasOtherCodes: true });
  });

  it('tells of an act on the key, whatever came of it', () => {
    expect(changesAfter(saved, saved, { ...noActs, hasOtherCodes: true })).toEqual({ ...nothing, hasOtherCodes: true });
    expect(changesAfter(saved, saved, { ...noActs, hasNewPassphrase: true })).toEqual({ ...nothing, hasNewPassphrase: true });
  });
});
