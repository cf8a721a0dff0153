import { describe, expect, it } from 'vitest';
import { describeMatch, matchOf, meaningOf, meaningsFor, unitsFor } from './meanings.ts';

describe('what a column can become', () => {
  it('is everything its table can take, each once, and to stay behind', () => {
    const values = meaningsFor('participants').map(({ value }) => value);
    expect(new Set(values).size).toBe(values.length);
    expect(values).toEqual(expect.arrayContaining(['left-out', 'participant', 'birth-date', 'injury-date', 'index-date', 'value:sex']));
    expect(values).not.toContain('value:participant');
    const ofSessions = meaningsFor('sessions').map(({ value }) => value);
    expect(ofSessions).toEqual(expect.arrayContaining(['study-day:session_day', 'value:session_day']));
    expect(ofSessions).not.toContain('birth-date');
  });

  it('goes there and back', () => {
    for (const { value } of meaningsFor('sessions')) expect(meaningOf(matchOf(value, { header: 'x', as: 'left-out' }))).toBe(value);
  });

  it('keeps how dates are written when another date is meant, and nothing else', () => {
    const before = { header: 'x', as: 'study-day', variable: 'session_day', dateFormat: 'iso' } as const;
    expect(matchOf('index-date', before)).toEqual({ header: 'x', as: 'index-date', dateFormat: 'iso' });
    expect(matchOf('value:steps_total', before)).toEqual({ header: 'x', as: 'value', variable: 'steps_total' });
  });

  it('is said in words, with the unit it is read in', () => {
    const match = { header: 'x', as: 'value', variable: 'distance_total_m', unit: 'km' } as const;
    expect(describeMatch('sessions', match)).toBe('Distance in the session, m, read in km');
    expect(unitsFor('sessions', match)).toEqual(expect.arrayContaining(['m', 'km']));
    expect(unitsFor('sessions', { header: 'x', as: 'left-out' })).toEqual([]);
  });
});
