import { expect, it } from 'vitest';
import { chainCodes } from './chain-codes.ts';

it('leads a code that was replaced twice straight to the last one', () => {
  expect(
    chainCodes(
      [
        { from: 'A', to: 'B' },
        { from: 'C', to: 'D' },
      ],
      [
        { from: 'B', to: 'E' },
        { from: 'F', to: 'G' },
      ],
    ),
  ).toEqual([
    { from: 'A', to: 'E' },
    { from: 'C', to: 'D' },
    { from: 'B', to: 'E' },
    { from: 'F', to: 'G' },
  ]);
});

it('forgets a replacement that leads back to where it began', () => {
  expect(chainCodes([{ from: 'A', to: 'B' }], [{ from: 'B', to: 'A' }])).toEqual([{ from: 'B', to: 'A' }]);
});
