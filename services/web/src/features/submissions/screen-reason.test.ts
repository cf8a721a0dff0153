import { describe, expect, it } from 'vitest';
import { identifyingIn } from './screen-reason.ts';

describe('a reason', () => {
  it('of plain words holds nothing that tells who somebody is', () => {
    expect(identifyingIn('Short steps are right for this person, who trained with a walker.')).toEqual([]);
  });

  it('is known by the kinds of things in it, each told once', () => {
    expect(identifyingIn('Ask jane.roe@clinic.example or john.roe@clinic.example')).toEqual(['an e-mail address']);
    expect(identifyingIn('Born on 12/05/1961, call 0161 496 0123')).toEqual(
      expect.arrayContaining(['a calendar date', 'a telephone number']),
    );
  });
});
