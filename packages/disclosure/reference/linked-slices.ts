/**
 * Two slices and the table of all, with known intervals as [slice, row, column, low, high] for a reader who thinks a hidden cell may be
 * empty. All totals and the table of all are published. Source: constructed; intervals by linear programme (scipy linprog, HiGHS).
 */
export const slices = {
  male: [
    [24, 9],
    [31, 18],
  ],
  female: [
    [15, 12],
    [22, 14],
  ],
};

type KnownInterval = readonly [slice: 'male' | 'female', row: number, column: number, low: number, high: number];

/** Only the slice with the small cell is hidden: subtracting the other slice from all gives every cell back. */
export const oneSliceHidden: readonly KnownInterval[] = [
  ['male', 0, 0, 24, 24],
  ['male', 0, 1, 9, 9],
  ['male', 1, 0, 31, 31],
  ['male', 1, 1, 18, 18],
];

export const bothSlicesHidden: readonly KnownInterval[] = [
  ['male', 0, 0, 12, 33],
  ['male', 0, 1, 0, 21],
  ['male', 1, 0, 22, 43],
  ['male', 1, 1, 6, 27],
  ['female', 0, 0, 6, 27],
  ['female', 0, 1, 0, 21],
  ['female', 1, 0, 10, 31],
  ['female', 1, 1, 5, 26],
];
