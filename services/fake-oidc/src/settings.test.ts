import { describe, expect, it } from 'vitest';
import { demonstrationPeople } from './demonstration-people.ts';
import { readSettings } from './settings.ts';

const complete = {
  PORT: '0',
  CLIENT_ID: 'cairnstep',
  CLIENT_SECRET: 'x'.repeat(16),
  REDIRECT_URIS: 'http://127.0.0.1:1/a, http://127.0.0.1:1/b',
};

describe('readSettings', () => {
  it('takes several addresses and the demonstration people unless told otherwise', () => {
    const settings = readSettings(complete);
    expect(settings.redirectUris).toEqual(['http://127.0.0.1:1/a', 'http://127.0.0.1:1/b']);
    expect(settings.people).toBe(demonstrationPeople);
    const person = { subject: 's', name: 'N', email: 'n@site.example', label: '' };
    expect(readSettings({ ...complete, PEOPLE: JSON.stringify([person]) }).people).toEqual([person]);
  });

  it('names every setting that is missing or wrong', () => {
    expect(() =>
      readSettings({ PORT: 'eighty', CLIENT_ID: 'cairnstep', CLIENT_SECRET: 'short', REDIRECT_URIS: 'here', PEOPLE: '{' }),
    ).toThrow(/PORT[^]*CLIENT_SECRET: expected at least 16[^]*REDIRECT_URIS[^]*expected an http[^]*PEOPLE: expected JSON/);
  });
});
