import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, expect, it } from 'vitest';
import { StayingBehind } from './staying-behind.tsx';
import type { ColumnPicture, FindingPicture, ProblemPicture } from './worker/protocol.ts';

afterEach(() => cleanup());

const column = (number: number, header: string, given: Partial<ColumnPicture> = {}): ColumnPicture => ({
  number,
  header,
  examples: [],
  match: { header, as: 'left-out' },
  isNew: false,
  dateFormats: [],
  unknownWords: [],
  isMatchable: true,
  ...given,
});
const value = (header: string): Pick<ColumnPicture, 'match'> => ({ match: { header, as: 'value', variable: 'steps_total' } });
const finding = (header: string): FindingPicture => ({ class: 'phone', strength: 'block', table: 'sessions', header, line: 3, count: 2 });
const withheld: ProblemPicture = {
  kind: 'identifiers-in-column',
  table: 'sessions',
  header: 'Steps',
  columnNumber: 2,
  variable: 'steps_total',
  lines: [],
  count: 0,
  message: '',
};

const columns = [
  {
    source: 1,
    table: 'sessions' as const,
    columns: [
      column(1, 'Notes'),
      column(2, 'Steps', value('Steps')),
      column(3, '', { isMatchable: false }),
      column(4, 'Distance', value('Distance')),
    ],
  },
];
const items = () => screen.getAllByRole('listitem').map(({ textContent }) => textContent);

it('names the columns that stay behind, each with its reason', () => {
  render(<StayingBehind columns={columns} problems={[withheld]} findings={[]} />);
  expect(items()).toEqual([
    'Sessions, not asked for: Notes',
    'Sessions, cells that seem to identify people: Steps',
    'Sessions, no header of their own: column 3',
  ]);
});

it('says of what the detectors saw whether it stays behind, and never shows a cell', () => {
  render(<StayingBehind columns={columns} problems={[withheld]} findings={[finding('Steps'), finding('Distance')]} />);
  expect(items().slice(3)).toEqual([
    'Sessions, Steps: a telephone number, 2 cells, first on line 3. The column stays behind.',
    'Sessions, Distance: a telephone number, 2 cells, first on line 3. The column is used: look whether these cells may be sent.',
  ]);
});
