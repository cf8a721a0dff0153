/** The grid: one statistic of one outcome by level group and AIS grade. Pure: facts in, cells out. */
import { grades, type Cell } from '@cairnstep/contract';
import { protectTable, siteDominance, type HiddenPattern, type Place } from '@cairnstep/disclosure';
import { meanWithInterval } from '@cairnstep/statistics';
import { publicCount } from './public-count.ts';
import type { OutcomeFact } from './facts.ts';

export type Statistic = 'change' | 'baseline' | 'end';
type Grade = (typeof grades)[number];

/** `registry`: protected, from people with both values, rounded. `site`: one's own people, exact, everyone who has the value. */
export type View = 'registry' | 'site';

export interface GridCells {
  readonly cells: readonly (readonly Cell[])[];
  readonly rowTotals: readonly Cell[];
  readonly columnTotals: readonly Cell[];
  readonly total: Cell;
}

export interface LeftOutCounts {
  readonly noBaseline: number | null;
  readonly noEndOfCourse: number | null;
  readonly unable: number | null;
  readonly levelOrGradeNotDeterminable: number | null;
}

interface Options {
  readonly rows: readonly string[];
  readonly statistic: Statistic;
  readonly view: View;
  /** Digits the instrument is recorded with. */
  readonly decimals: number;
}

const unable = (status: string | null): boolean => status === 'unable_physical' || status === 'unable_other';

/** Removes the dust of binary subtraction (0.7 - 0.4) before anything is computed from a difference. */
const settle = (value: number): number => Math.round(value * 1e9) / 1e9;

/**
 * In the registry's view all three statistics rest on the same people, those with both values: figures over sets that
 * differ by a few people would give those few away.
 */
function valueOf(fact: OutcomeFact, statistic: Statistic, view: View): number | null {
  const { baseline, end } = fact;
  if (statistic !== 'change' && view === 'site') return statistic === 'baseline' ? baseline : end;
  if (baseline === null || end === null) return null;
  return statistic === 'change' ? settle(end - baseline) : statistic === 'baseline' ? baseline : end;
}

/** A group that comes mostly from one clinic is that clinic's figure; an empty one needs no protection. */
const isOneClinics = (sites: ReadonlyMap<string, number>): boolean => sites.size > 0 && siteDominance([...sites.values()]).unsafe;

class Group {
  readonly values: number[] = [];
  readonly sites = new Map<string, number>();

  add(value: number, siteId: string): void {
    this.values.push(value);
    this.sites.set(siteId, (this.sites.get(siteId) ?? 0) + 1);
  }
}

const rounded = (value: number, decimals: number): number => Number(value.toFixed(decimals));

function shownCell(values: readonly number[], { view, decimals }: Options): Cell {
  if (values.length === 0) return { state: 'empty' };
  const result = meanWithInterval(values);
  const digits = (value: number) => (view === 'registry' ? rounded(value, decimals + 1) : value);
  if (result.kind === 'not-estimable') {
    const mean = result.pointEstimate ?? values[0];
    return mean === undefined ? { state: 'empty' } : { state: 'shown', n: values.length, mean: digits(mean), sd: null, interval: null };
  }
  return {
    state: 'shown',
    n: result.n,
    mean: digits(result.estimate),
    sd: digits(result.sd),
    interval: { lower: digits(result.interval.lower), upper: digits(result.interval.upper) },
  };
}

export function gridCells(facts: readonly OutcomeFact[], options: Options): GridCells {
  const { rows, statistic, view } = options;
  const height = rows.length;
  const width = grades.length;
  const groups = Array.from({ length: (height + 1) * (width + 1) }, () => new Group());
  const groupAt = (row: number, column: number): Group => groups[row * (width + 1) + column] as Group;
  for (const fact of facts) {
    const value = valueOf(fact, statistic, view);
    if (value === null) continue;
    // The last row and column hold whoever has no determinable place.
    const row = rows.includes(fact.levelGroup) ? rows.indexOf(fact.levelGroup) : height - 1;
    const column = grades.includes(fact.ais as Grade) ? grades.indexOf(fact.ais as Grade) : width - 1;
    for (const r of [row, height]) for (const c of [column, width]) groupAt(r, c).add(value, fact.siteId);
  }
  const indexOf = (place: Place) => ({
    row: place.row === 'total' ? height : place.row,
    column: place.column === 'total' ? width : place.column,
  });
  const perPlace = <T>(of: (place: Place) => T) => ({
    cells: rows.map((_, row) => grades.map((_grade, column) => of({ row, column }))),
    rowTotals: rows.map((_, row) => of({ row, column: 'total' })),
    columnTotals: grades.map((_grade, column) => of({ row: 'total', column })),
    grandTotal: of({ row: 'total', column: 'total' }),
  });
  const at = (place: Place): Group => {
    const { row, column } = indexOf(place);
    return groupAt(row, column);
  };
  let hidden: HiddenPattern | null = null;
  if (view === 'registry') {
    const counts = rows.map((_, row) => grades.map((_grade, column) => groupAt(row, column).values.length));
    const alsoHide = perPlace((place) => isOneClinics(at(place).sites));
    hidden = protectTable({ counts }, { alsoHide }).hidden;
  }
  const isHidden = ({ row, column }: Place): boolean => {
    if (hidden === null) return false;
    if (row === 'total') return column === 'total' ? hidden.grandTotal : hidden.columnTotals[column] === true;
    return column === 'total' ? hidden.rowTotals[row] === true : hidden.cells[row]?.[column] === true;
  };
  const result = perPlace((place): Cell => (isHidden(place) ? { state: 'hidden' } : shownCell(at(place).values, options)));
  return { cells: result.cells, rowTotals: result.rowTotals, columnTotals: result.columnTotals, total: result.grandTotal };
}

/** Why people are not in the grid, each person counted once; and how many of those in it have no determinable place. */
export function leftOutCounts(facts: readonly OutcomeFact[], { statistic, view }: Pick<Options, 'statistic' | 'view'>): LeftOutCounts {
  let noBaseline = 0;
  let noEndOfCourse = 0;
  let notAble = 0;
  let notDeterminable = 0;
  for (const fact of facts) {
    if (valueOf(fact, statistic, view) !== null) {
      if (fact.levelGroup === 'ND' || fact.ais === 'ND') notDeterminable += 1;
    } else if (unable(fact.baselineStatus) || unable(fact.endStatus)) notAble += 1;
    else if (fact.baseline === null) noBaseline += 1;
    else noEndOfCourse += 1;
  }
  const shown = (count: number): number | null => (view === 'site' ? count : publicCount(count));
  return {
    noBaseline: shown(noBaseline),
    noEndOfCourse: shown(noEndOfCourse),
    unable: shown(notAble),
    levelOrGradeNotDeterminable: shown(notDeterminable),
  };
}
