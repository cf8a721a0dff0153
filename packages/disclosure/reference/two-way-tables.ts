/**
 * Two-way tables with known answers. Cells are [row, column] from 0; an interval is [row, column, low, high] for a reader who knows the
 * published cells and totals and that counts are not negative (0 is possible for a hidden cell, unless a case says otherwise).
 * `integerTables` is how many whole-number tables fit what is published. `leastCost` is the fewest people in complementary cells,
 * found by exhaustive search over all patterns in which every small cell keeps an interval at least 10 wide.
 */
export interface KnownAudit {
  readonly says: string;
  readonly hidden: readonly (readonly [number, number])[];
  readonly intervals: readonly (readonly [number, number, number, number])[];
  readonly integerTables?: number;
  /** Column totals that are not published; in a one-row table they repeat the cells. */
  readonly hiddenColumnTotals?: readonly number[];
  /** Cells the reader is told hold 1 to 10 people. */
  readonly knownOneToTen?: readonly (readonly [number, number])[];
  /** Hidden cells the reader knows to be empty. */
  readonly knownZero?: readonly (readonly [number, number])[];
}

export interface KnownTable {
  readonly id: string;
  readonly source: string;
  readonly counts: readonly (readonly number[])[];
  readonly audits: readonly KnownAudit[];
  readonly leastCost?: number;
}

export const knownTables: readonly KnownTable[] = [
  {
    id: 'block-of-four',
    source:
      'Geurts J (1992), Heuristics for cell suppression in tables, table 10, as given in the Handbook on Statistical Disclosure Control (sdcTools), chapter 4, example 3, which states 3 to 6 for the first cell; the inner counts are one table that fits the printed totals.',
    counts: [
      [5, 2],
      [1, 2],
      [3, 3],
    ],
    audits: [
      {
        says: 'two by two block hidden',
        hidden: [
          [0, 0],
          [0, 1],
          [1, 0],
          [1, 1],
        ],
        intervals: [
          [0, 0, 3, 6],
          [0, 1, 1, 4],
          [1, 0, 0, 3],
          [1, 1, 0, 3],
        ],
        integerTables: 4,
      },
    ],
  },
  {
    id: 'one-row',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [[23, 14, 4, 31]],
    audits: [
      {
        says: 'the cheapest complement',
        hidden: [
          [0, 2],
          [0, 1],
        ],
        hiddenColumnTotals: [1, 2],
        intervals: [
          [0, 2, 0, 18],
          [0, 1, 0, 18],
        ],
      },
    ],
    leastCost: 14,
  },
  {
    id: 'level-by-grade',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [
      [22, 12, 6, 19],
      [31, 18, 25, 40],
      [44, 13, 15, 12],
      [35, 9, 17, 21],
      [12, 14, 20, 33],
    ],
    audits: [
      {
        says: 'only the small cells hidden',
        hidden: [
          [0, 2],
          [3, 1],
        ],
        intervals: [
          [0, 2, 6, 6],
          [3, 1, 9, 9],
        ],
        integerTables: 1,
      },
      {
        says: 'with the cheapest complement',
        hidden: [
          [0, 2],
          [3, 1],
          [0, 1],
          [3, 2],
        ],
        intervals: [
          [0, 2, 0, 18],
          [3, 1, 3, 21],
          [0, 1, 0, 18],
          [3, 2, 5, 23],
        ],
        integerTables: 19,
      },
    ],
    leastCost: 29,
  },
  {
    id: 'one-small-cell',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [
      [30, 14, 25],
      [16, 4, 19],
      [40, 22, 13],
    ],
    audits: [
      { says: 'only the small cell hidden', hidden: [[1, 1]], intervals: [[1, 1, 4, 4]], integerTables: 1 },
      {
        says: 'a second cell in the row only',
        hidden: [
          [1, 1],
          [1, 0],
        ],
        intervals: [
          [1, 1, 4, 4],
          [1, 0, 16, 16],
        ],
        integerTables: 1,
      },
      {
        says: 'with the cheapest complement',
        hidden: [
          [1, 1],
          [1, 2],
          [2, 1],
          [2, 2],
        ],
        intervals: [
          [1, 1, 0, 23],
          [1, 2, 0, 23],
          [2, 1, 3, 26],
          [2, 2, 9, 32],
        ],
        integerTables: 24,
      },
    ],
    leastCost: 54,
  },
  {
    id: 'bridge',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [
      [20, 15, 30, 41],
      [17, 25, 7, 22],
      [33, 28, 21, 16],
      [26, 37, 18, 24],
    ],
    audits: [
      {
        says: 'two hidden cells in every line, yet one is a bridge between two cycles',
        hidden: [
          [0, 0],
          [0, 1],
          [1, 0],
          [1, 1],
          [1, 2],
          [2, 2],
          [2, 3],
          [3, 2],
          [3, 3],
        ],
        intervals: [
          [0, 0, 0, 35],
          [0, 1, 0, 35],
          [1, 0, 2, 37],
          [1, 1, 5, 40],
          [1, 2, 7, 7],
          [2, 2, 0, 37],
          [2, 3, 0, 37],
          [3, 2, 2, 39],
          [3, 3, 3, 40],
        ],
        integerTables: 1368,
      },
      {
        says: 'one more cell closes a third cycle',
        hidden: [
          [0, 0],
          [0, 1],
          [1, 0],
          [1, 1],
          [1, 2],
          [2, 2],
          [2, 3],
          [3, 2],
          [3, 3],
          [0, 2],
        ],
        intervals: [
          [0, 0, 0, 37],
          [0, 1, 0, 40],
          [1, 0, 0, 37],
          [1, 1, 0, 40],
          [1, 2, 0, 37],
          [2, 2, 0, 37],
          [2, 3, 0, 37],
          [3, 2, 2, 39],
          [3, 3, 3, 40],
          [0, 2, 0, 37],
        ],
        integerTables: 40812,
      },
    ],
  },
  {
    id: 'mark-leak',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [
      [10, 10, 40],
      [14, 21, 30],
      [25, 33, 28],
    ],
    audits: [
      {
        says: 'one neutral mark',
        hidden: [
          [0, 0],
          [0, 1],
          [1, 0],
          [1, 1],
        ],
        intervals: [
          [0, 0, 0, 20],
          [0, 1, 0, 20],
          [1, 0, 4, 24],
          [1, 1, 11, 31],
        ],
        integerTables: 21,
      },
      {
        says: 'small cells marked as below 11',
        hidden: [
          [0, 0],
          [0, 1],
          [1, 0],
          [1, 1],
        ],
        intervals: [
          [0, 0, 10, 10],
          [0, 1, 10, 10],
          [1, 0, 14, 14],
          [1, 1, 21, 21],
        ],
        integerTables: 1,
        knownOneToTen: [
          [0, 0],
          [0, 1],
        ],
      },
    ],
  },
  {
    id: 'low-sum',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [
      [1, 1, 40],
      [14, 21, 30],
      [25, 33, 28],
    ],
    audits: [
      {
        says: 'one neutral mark',
        hidden: [
          [0, 0],
          [0, 1],
          [1, 0],
          [1, 1],
        ],
        intervals: [
          [0, 0, 0, 2],
          [0, 1, 0, 2],
          [1, 0, 13, 15],
          [1, 1, 20, 22],
        ],
        integerTables: 3,
      },
      {
        says: 'small cells marked as 1 to 10',
        hidden: [
          [0, 0],
          [0, 1],
          [1, 0],
          [1, 1],
        ],
        intervals: [
          [0, 0, 1, 1],
          [0, 1, 1, 1],
          [1, 0, 14, 14],
          [1, 1, 21, 21],
        ],
        integerTables: 1,
        knownOneToTen: [
          [0, 0],
          [0, 1],
        ],
      },
    ],
  },
  {
    id: 'impossible-cells',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [
      [0, 12, 5, 0],
      [30, 0, 16, 11],
      [18, 24, 0, 37],
    ],
    audits: [
      {
        says: 'zeros hidden as cover, reader thinks them possible',
        hidden: [
          [0, 2],
          [0, 0],
          [2, 2],
          [2, 0],
        ],
        intervals: [
          [0, 2, 0, 5],
          [0, 0, 0, 5],
          [2, 2, 0, 5],
          [2, 0, 13, 18],
        ],
        integerTables: 6,
      },
      {
        says: 'zeros hidden as cover, reader knows them impossible',
        hidden: [
          [0, 2],
          [0, 0],
          [2, 2],
          [2, 0],
        ],
        intervals: [
          [0, 2, 5, 5],
          [0, 0, 0, 0],
          [2, 2, 0, 0],
          [2, 0, 18, 18],
        ],
        integerTables: 1,
        knownZero: [
          [0, 0],
          [2, 2],
        ],
      },
      {
        says: 'cover by non-zero cells',
        hidden: [
          [0, 2],
          [0, 1],
          [1, 2],
          [1, 3],
          [2, 1],
          [2, 3],
        ],
        intervals: [
          [0, 2, 0, 17],
          [0, 1, 0, 17],
          [1, 2, 4, 21],
          [1, 3, 6, 23],
          [2, 1, 19, 36],
          [2, 3, 25, 42],
        ],
        integerTables: 18,
      },
    ],
  },
  {
    id: 'two-by-two',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [
      [3, 20],
      [15, 28],
    ],
    audits: [
      {
        says: 'all four hidden',
        hidden: [
          [0, 0],
          [0, 1],
          [1, 0],
          [1, 1],
        ],
        intervals: [
          [0, 0, 0, 18],
          [0, 1, 5, 23],
          [1, 0, 0, 18],
          [1, 1, 25, 43],
        ],
        integerTables: 19,
      },
    ],
  },
  {
    id: 'diagonal',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [
      [8, 19, 27, 33],
      [21, 3, 15, 40],
      [36, 24, 5, 17],
      [13, 29, 31, 9],
    ],
    audits: [
      {
        says: 'only the small cells hidden',
        hidden: [
          [0, 0],
          [1, 1],
          [2, 2],
          [3, 3],
        ],
        intervals: [
          [0, 0, 8, 8],
          [1, 1, 3, 3],
          [2, 2, 5, 5],
          [3, 3, 9, 9],
        ],
        integerTables: 1,
      },
      {
        says: 'with the cheapest complement',
        hidden: [
          [0, 0],
          [1, 1],
          [2, 2],
          [3, 3],
          [0, 1],
          [1, 2],
          [2, 3],
          [3, 0],
        ],
        intervals: [
          [0, 0, 5, 21],
          [1, 1, 0, 16],
          [2, 2, 2, 18],
          [3, 3, 6, 22],
          [0, 1, 6, 22],
          [1, 2, 2, 18],
          [2, 3, 4, 20],
          [3, 0, 0, 16],
        ],
        integerTables: 17,
      },
    ],
    leastCost: 64,
  },
  {
    id: 'nothing-small',
    source: 'Constructed table; intervals by linear programme (scipy linprog, HiGHS), confirmed by enumerating all integer tables.',
    counts: [
      [12, 30],
      [25, 18],
    ],
    audits: [],
    leastCost: 0,
  },
];
