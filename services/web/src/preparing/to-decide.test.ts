import { describe, expect, it } from 'vitest';
import { countToDecide, hasToDecide } from './to-decide.ts';
import type { ColumnPicture, ProblemPicture } from './worker/protocol.ts';

const column = (number: number, given: Partial<ColumnPicture> = {}): ColumnPicture => ({
  number,
  header: `Column ${number}`,
  examples: [],
  match: { header: `Column ${number}`, as: 'left-out' },
  isNew: true,
  dateFormats: [],
  unknownWords: [],
  isMatchable: true,
  ...given,
});
const sessions = (...columns: ColumnPicture[]) => ({ source: 1, table: 'sessions' as const, columns });
const problem = (given: Partial<ProblemPicture>): ProblemPicture => ({
  kind: 'unreadable-cell',
  table: 'sessions',
  header: 'Column 1',
  columnNumber: 1,
  variable: null,
  lines: [2],
  count: 1,
  message: '',
  ...given,
});

describe('the columns of a table', () => {
  it('need no look where all were matched without a question, be it for the first time or as last month', () => {
    expect(hasToDecide(sessions(column(1), column(2)), [])).toBe(false);
    expect(hasToDecide(sessions(column(1, { isNew: false }), column(2, { isNew: false })), [])).toBe(false);
    expect(hasToDecide(sessions(column(1, { isNew: false }), column(2, { isMatchable: false })), [])).toBe(false);
  });

  it('need a look where words are not known, a problem is open, or some are not as last month', () => {
    expect(hasToDecide(sessions(column(1, { unknownWords: ['done'] })), [])).toBe(true);
    expect(hasToDecide(sessions(column(1)), [problem({})])).toBe(true);
    expect(hasToDecide(sessions(column(1)), [problem({ kind: 'no-participant-column', columnNumber: null })])).toBe(true);
    expect(hasToDecide(sessions(column(1, { isNew: false }), column(2)), [])).toBe(true);
  });

  it('need none for problems of rows, or of another table', () => {
    expect(hasToDecide(sessions(column(1)), [problem({ kind: 'participant-missing', columnNumber: null })])).toBe(false);
    expect(hasToDecide(sessions(column(1)), [problem({ table: 'bouts' })])).toBe(false);
  });
});

it('counts a word that is not known once, though its cells are a problem too', () => {
  const columns = [sessions(column(1, { unknownWords: ['done'] }), column(2, { unknownWords: ['left', 'right'] }), column(3))];
  expect(countToDecide({ columns, problems: [] })).toBe(2);
  expect(countToDecide({ columns, problems: [problem({}), problem({ kind: 'participant-missing', columnNumber: null })] })).toBe(3);
});
