import { describe, expect, it } from 'vitest';
import { unknownWords } from './unknown-words.ts';

const status = { header: 'Status', as: 'value', variable: 'status' } as const;

describe('words of a clinic', () => {
  it('are told once each where they stand for no code', () => {
    expect(unknownWords('sessions', status, ['all done', 'completed', '', ' all done ', 'ill', 'Shortened'], 10)).toEqual([
      'all done',
      'ill',
    ]);
    expect(unknownWords('sessions', status, ['a', 'b', 'c'], 2)).toEqual(['a', 'b']);
  });

  it('are known once somebody has said what they mean', () => {
    const match = { ...status, codes: { 'All done': 'completed' } };
    expect(unknownWords('sessions', match, ['all done', 'ill'], 10)).toEqual(['ill']);
  });

  it('do not matter in columns of numbers and in those that stay behind', () => {
    expect(unknownWords('sessions', { header: 'x', as: 'value', variable: 'steps_total' }, ['many'], 10)).toEqual([]);
    expect(unknownWords('sessions', { header: 'x', as: 'left-out' }, ['many'], 10)).toEqual([]);
  });
});
