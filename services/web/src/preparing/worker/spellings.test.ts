import { expect, it } from 'vitest';
import { passphrase } from '../sample-month.ts';
import { spellingsOf } from './spellings.ts';

it('tries a passphrase as it is typed, and nothing else where that is how it was drawn', () => {
  expect(spellingsOf(passphrase)).toEqual([passphrase]);
});

it('takes drawn words for the same in capital letters and with other blanks', () => {
  expect(spellingsOf(' Bafo rina  TUKE\u00A0sobi malu pegi\n').at(-1)).toBe(passphrase);
  expect(spellingsOf(' Bafo rina  TUKE\u00A0sobi malu pegi\n')[0]).toBe(' Bafo rina  TUKE\u00A0sobi malu pegi\n');
});

it('leaves the letters of a passphrase that somebody made up as they are', () => {
  expect(spellingsOf('Bafo rina quay sobi  malu pegi')).toEqual(['Bafo rina quay sobi  malu pegi', 'Bafo rina quay sobi malu pegi']);
});
