/** A small grid as the API answers it, for component tests: shown, hidden and empty groups, totals among them. */
import type { Cell, Grid } from '@cairnstep/contract';
import { levelGroups } from '@cairnstep/scoring';

export const hidden: Cell = { state: 'hidden' };
export const empty: Cell = { state: 'empty' };
export const shown = (n: number, mean: number, half = 0.05): Cell => ({
  state: 'shown',
  n,
  mean,
  sd: 0.1,
  interval: { lower: mean - half, upper: mean + half },
});

export const speed: Grid['outcome'] = {
  key: 'tmwt_ss',
  name: 'Walking speed',
  unit: 'm/s',
  better: 'higher',
  decimals: 2,
  inDevice: false,
};

export const release = {
  id: '6f1de0c4-52f6-4f3a-9d0e-2b7f3f1c8a31',
  number: 3,
  madeAt: '2026-11-02T09:00:00.000Z',
  participants: 420,
  note: 'Autumn',
};

/** By level group: cells of A, B, C, D, E and not determinable, then the row's total. */
const figures: Readonly<Record<string, readonly Cell[]>> = {
  c5_c8: [empty, empty, shown(26, 0.09), shown(51, 0.13), empty, empty, shown(77, 0.115)],
  t1_t9: [empty, hidden, shown(17, 0.15), hidden, empty, hidden, shown(35, 0.166)],
};
const nobody: readonly Cell[] = Array.from({ length: 7 }, () => empty);

const levels: Grid['levels'] = levelGroups.groups.flatMap(({ id, first, last }) => {
  const spine = ['C', 'T', 'L', 'S'].flatMap((letter) =>
    Array.from({ length: { C: 8, T: 12, L: 5, S: 3 }[letter] ?? 0 }, (_, index) => `${letter}${index + 1}`),
  );
  return spine.slice(spine.indexOf(first), spine.indexOf(last) + 1).map((level) => ({
    level,
    levelGroup: id,
    participants: level === 'C6' ? 40 : level === 'T4' ? null : 0,
  }));
});

export const exampleGrid: Grid = {
  release,
  site: null,
  statistic: 'change',
  outcome: speed,
  grades: ['A', 'B', 'C', 'D', 'E', 'ND'],
  rows: [...levelGroups.groups, { id: 'ND', label: 'Not determinable' }].map(({ id, label }) => {
    const cells = figures[id] ?? nobody;
    return { levelGroup: id, label, cells: cells.slice(0, 6), total: cells[6] ?? empty };
  }),
  columnTotals: [empty, hidden, shown(43, 0.114), hidden, empty, hidden],
  total: shown(112, 0.131),
  leftOut: { noBaseline: 25, noEndOfCourse: 95, unable: null, levelOrGradeNotDeterminable: 0 },
  levels,
  method: 'Mean change, end of course minus baseline.',
  notes: ['Measured without the training device.'],
};

export const knownOutcomes = {
  outcomes: [speed, { ...speed, inDevice: true }, { ...speed, key: 'bbs', name: 'Balance', unit: '1' }],
  releases: [release],
};
