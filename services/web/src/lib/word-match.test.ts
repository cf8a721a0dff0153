import { describe, expect, it } from 'vitest';
import { foldText, wordMatcher } from './word-match.ts';

describe('searching words', () => {
  const text = foldText('Two groups: Mann-Whitney test, Fisher’s, lt_r_s4_5');

  it('finds an entry by the beginnings of its words, in any order and case', () => {
    for (const query of ['mann', 'WHIT two', 'S4-5', 'mann-whitney', "fisher's", 'fisher’s', '  test  ', ''])
      expect([query, wordMatcher(query)(text)]).toEqual([query, true]);
  });

  it('passes over an entry that lacks one of the words', () => {
    for (const query of ['hitney', 'mann kendall', 'groups x']) expect([query, wordMatcher(query)(text)]).toEqual([query, false]);
  });
});
