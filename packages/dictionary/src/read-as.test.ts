import { describe, expect, it } from 'vitest';
import type { Revision } from './history.ts';
import { readAs } from './read-as.ts';

/** A constructed past: in 0.2 a column got its unit, in 0.3 a code was split from its old spelling and the column renamed again. */
const past: readonly Revision[] = [
  { version: '0.1', notes: ['First draft.'], changes: [] },
  { version: '0.2', notes: ['Speed carries its unit.'], changes: [{ kind: 'renamed', table: 'bouts', from: 'speed', to: 'speed_mps' }] },
  {
    version: '0.3',
    notes: ['Bars are named in full.', 'The speed is that of the belt.'],
    changes: [
      { kind: 'recoded', table: 'bouts', column: 'aid', codes: { parallel: 'bars' } },
      { kind: 'renamed', table: 'bouts', from: 'speed_mps', to: 'belt_speed_mps' },
    ],
  },
];

describe('readAs', () => {
  it('applies every later revision in order', () => {
    expect(readAs('0.1', 'bouts', { bout_no: 1, speed: 0.5, aid: 'parallel' }, past)).toEqual({
      bout_no: 1,
      belt_speed_mps: 0.5,
      aid: 'bars',
    });
    expect(readAs('0.2', 'bouts', { speed_mps: 0.5, aid: 'walker' }, past)).toEqual({ belt_speed_mps: 0.5, aid: 'walker' });
  });

  it('leaves a row of the newest version, and rows of other tables, as they are', () => {
    const newest = { belt_speed_mps: 0.5, aid: 'parallel' };
    expect(readAs('0.3', 'bouts', newest, past)).toBe(newest);
    expect(readAs('0.1', 'sessions', { speed: 1, aid: 'parallel' }, past)).toEqual({ speed: 1, aid: 'parallel' });
    expect(readAs('1.0', 'bouts', newest)).toBe(newest);
  });

  it('leaves empty cells empty and codes of no revision alone', () => {
    expect(readAs('0.1', 'bouts', { bout_no: 1, aid: 'constructor' }, past)).toEqual({ bout_no: 1, aid: 'constructor' });
  });

  it('does not alter the row it was given', () => {
    const row = Object.freeze({ speed: 0.5 });
    readAs('0.1', 'bouts', row, past);
    expect(row).toEqual({ speed: 0.5 });
  });

  it('refuses a version it does not know, and a row under two names at once', () => {
    expect(() => readAs('9.9', 'bouts', {}, past)).toThrow(RangeError);
    expect(() => readAs('0.1', 'bouts', { speed: 0.5, speed_mps: 0.6 }, past)).toThrow(RangeError);
  });
});
