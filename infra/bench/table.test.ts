import { describe, expect, it } from 'vitest';
import { benchTable, missesGoal } from './table.ts';

const row = { name: 'grid', ours: 12.345, peer: 24.69, unit: 'ms', peerName: 'a named peer 1.2' };

describe('benchTable', () => {
  it('sets ours beside the peer’s, with their ratio and the goal', () => {
    const [, line = '', missed = ''] = benchTable([
      { ...row, goal: 20 },
      { ...row, name: 'upload', goal: 10 },
    ]).split('\n');
    expect(line.split(/ {2,}/)).toEqual(['grid', '12.3 ms', '24.7 ms', '0.5', '20 ms', 'a named peer 1.2']);
    expect(missed).toContain('10 ms, missed');
  });

  it('prints notes below the lines', () => {
    expect(
      benchTable([{ ...row, note: 'warm' }, row])
        .split('\n')
        .slice(3),
    ).toEqual(['', 'grid: warm']);
  });

  it('calls a goal missed only when there is one and ours is above it', () => {
    expect(missesGoal(row)).toBe(false);
    expect(missesGoal({ ...row, goal: 12.345 })).toBe(false);
    expect(missesGoal({ ...row, goal: 12 })).toBe(true);
  });
});
