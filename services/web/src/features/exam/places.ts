/**
 * Where the cells of the sheet stand: a row for each segment from C2 down, touch, prick and strength side by side for the
 * right and the left, and under them a row for each of the two answers.
 */
import { cellKey, cellPlaces, keyMuscles, modalities, sensorySegments, sides } from '@cairnstep/scoring';
import type { CellKey, CellPlace, KeyMuscle, Modality, SensorySegment, Side } from '@cairnstep/scoring';

export interface SheetColumn {
  readonly modality: Modality;
  readonly side: Side;
}

export const sheetColumns: readonly SheetColumn[] = modalities.flatMap((modality) => sides.map((side) => ({ modality, side })));

/** The two answers below the segments: voluntary anal contraction and deep anal pressure. */
export const answerKeys = ['vac', 'dap'] as const;
export type AnswerKey = (typeof answerKeys)[number];

export function isAnswer(key: CellKey): key is AnswerKey {
  return (answerKeys as readonly string[]).includes(key);
}

const isKeyMuscle = (segment: SensorySegment): segment is SensorySegment & KeyMuscle => (keyMuscles as readonly string[]).includes(segment);

/** The cell of a segment in a column; undefined where no key muscle is tested. */
export function cellAt(segment: SensorySegment, { modality, side }: SheetColumn): CellKey | undefined {
  return modality === 'motor' && !isKeyMuscle(segment) ? undefined : cellKey(side, modality, segment);
}

const placesByKey = new Map<CellKey, CellPlace>(cellPlaces.map((place) => [place.key, place]));

/** Side, modality and segment of a score; undefined for the answers. */
export function placeOf(key: CellKey): CellPlace | undefined {
  return placesByKey.get(key);
}

/** Row by row, as the sheet shows them. */
const grid: readonly (readonly (CellKey | undefined)[])[] = [
  ...sensorySegments.map((segment) => sheetColumns.map((column) => cellAt(segment, column))),
  ...answerKeys.map((key) => [key]),
];

const filled = (cells: readonly (CellKey | undefined)[]): CellKey[] => cells.filter((key) => key !== undefined);

const byColumn: readonly (readonly CellKey[])[] = sheetColumns.map((_, index) =>
  filled(grid.slice(0, sensorySegments.length).map((row) => row[index])),
);

/** In which order typing goes on: down each column in turn, or across each row in turn. The answers come last. */
export type EntryOrder = 'down' | 'across';

export const entryOrders: Readonly<Record<EntryOrder, readonly CellKey[]>> = {
  down: [...byColumn.flat(), ...answerKeys],
  across: filled(grid.flat()),
};

/** All cells of the sheet: 132 scores and two answers. */
export const allCells: readonly CellKey[] = entryOrders.down;
export const firstCell: CellKey = 'lt_r_c2';

/** The scores of the column that a cell stands in, from the head down. An answer is a column of its own. */
export function columnOf(key: CellKey): readonly CellKey[] {
  return byColumn.find((column) => column.includes(key)) ?? [key];
}

/** The cells beside a cell, itself included, from the right side's touch on. */
export function rowOf(key: CellKey): readonly CellKey[] {
  return filled(grid.find((row) => row.includes(key)) ?? [key]);
}

/** The runs of segments between which the sheet is divided. */
export const regions = [
  { name: 'Cervical', letter: 'C' },
  { name: 'Thoracic', letter: 'T' },
  { name: 'Lumbar', letter: 'L' },
  { name: 'Sacral', letter: 'S' },
].map(({ name, letter }) => ({ name, segments: sensorySegments.filter((segment) => segment.startsWith(letter)) }));

/** Segment as printed. */
export function segmentName(segment: string): string {
  return segment.replace('_', '-');
}

export type Step = 'up' | 'down' | 'left' | 'right' | 'rowStart' | 'rowEnd' | 'sheetStart' | 'sheetEnd' | 'regionUp' | 'regionDown';

/** Where a step leads from a cell; the cell itself at an edge. */
export function neighbour(key: CellKey, step: Step): CellKey {
  const row = rowOf(key);
  switch (step) {
    case 'left':
      return row[row.indexOf(key) - 1] ?? key;
    case 'right':
      return row[row.indexOf(key) + 1] ?? key;
    case 'rowStart':
      return row[0] ?? key;
    case 'rowEnd':
      return row.at(-1) ?? key;
    case 'sheetStart':
      return firstCell;
    case 'sheetEnd':
      return allCells.at(-1) ?? key;
    case 'up':
      return above(key);
    case 'down':
      return below(key);
    case 'regionUp':
      return regionEdge(key, -1);
    case 'regionDown':
      return regionEdge(key, 1);
  }
}

function above(key: CellKey): CellKey {
  if (key === 'dap') return 'vac';
  if (key === 'vac') return cellKey('right', 'lightTouch', 'S4_5');
  const column = columnOf(key);
  return column[column.indexOf(key) - 1] ?? key;
}

function below(key: CellKey): CellKey {
  if (isAnswer(key)) return 'dap';
  const column = columnOf(key);
  return column[column.indexOf(key) + 1] ?? 'vac';
}

/** The first cell of the region before or after, in the same column. */
function regionEdge(key: CellKey, by: -1 | 1): CellKey {
  const column = columnOf(key);
  const starts = regions.flatMap(({ segments }) => {
    const start = column.find((cell) => (segments as readonly string[]).includes(placeOf(cell)?.segment ?? ''));
    return start === undefined ? [] : [start];
  });
  const at = column.indexOf(key);
  const positions = starts.map((start) => column.indexOf(start));
  const target = by === 1 ? positions.find((position) => position > at) : positions.findLast((position) => position < at);
  if (target !== undefined) return column[target] ?? key;
  return by === 1 ? (isAnswer(key) ? key : 'vac') : isAnswer(key) ? above('vac') : key;
}
