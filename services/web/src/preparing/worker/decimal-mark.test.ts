import { expect, it } from 'vitest';
import { decimalMarkOf } from './decimal-mark.ts';

it('finds how a file writes its numbers; a date with points is no number', () => {
  expect(
    decimalMarkOf([
      ['1,5', '28.03.2026'],
      ['2,75', '3'],
    ]),
  ).toEqual({ mark: ',', hasBoth: false });
  expect(decimalMarkOf([['1.5', 'a, b']])).toEqual({ mark: '.', hasBoth: false });
  expect(decimalMarkOf([['1.5', '−2,5', '3,5']])).toEqual({ mark: ',', hasBoth: true });
  expect(decimalMarkOf([['1', '']])).toEqual({ mark: '.', hasBoth: false });
});
