/** The search that the journey of the preparing page relies on finds what it looks for. */
import { randomBytes } from 'node:crypto';
import { expect, test } from '@playwright/test';
import { leaksIn } from './support/leaks.ts';

const planted = ['H4829137', '13/06/1950', 'Tamvorzil Kelpolsek', 'Said that tamvorzil hurt', 'SN-tamvorzil-7013'];
const around = (text: string | Buffer): Buffer =>
  Buffer.concat([Buffer.from('participant,session_day\r\nS0001,4\r\n'), Buffer.from(text), Buffer.from('\r\n0,1,2')]);

const disguised: Readonly<Record<string, (value: string) => string | Buffer>> = {
  'as it is': (value) => value,
  'in an address': (value) => `?q=${encodeURIComponent(value)}`,
  'in a form': (value) => new URLSearchParams({ q: value }).toString(),
  'in JSON': (value) => JSON.stringify({ q: value }),
  reversed: (value) => [...value].reverse().join(''),
  'in hexadecimal': (value) => Buffer.from(value).toString('hex'),
  'in UTF-16': (value) => Buffer.from(value, 'utf16le'),
  'in base64': (value) => Buffer.from(value).toString('base64'),
  'in base64, one byte in': (value) => Buffer.from(`x${value}yz`).toString('base64'),
  'in base64, two bytes in': (value) => Buffer.from(`xy${value}z`).toString('base64url'),
  'split over two cells': (value) => `${value.slice(0, 4)},${value.slice(4)}`,
  'split over two fields of JSON': (value) => JSON.stringify([value.slice(0, 5), value.slice(5)]),
};

for (const [how, disguise] of Object.entries(disguised)) {
  test(`finds a value ${how}`, () => {
    for (const value of planted) expect(leaksIn(around(disguise(value)), planted), value).toContain(value);
  });
}

test('finds nothing where nothing is', () => {
  const codes = Array.from({ length: 5_000 }, (_, index) => `S${String(index).padStart(21, '0')},${index % 97},1,completed`).join('\r\n');
  expect(leaksIn(Buffer.concat([Buffer.from(codes), randomBytes(200_000)]), planted)).toEqual([]);
});
