/** Which cells of the grid are chosen, and how the level column and the headers choose many at once. */
import type { Grid } from '@cairnstep/contract';
import type { CohortCell, Grade } from '../../lib/cohort.ts';
import { rangeBetween, segments } from '../../lib/level-range.ts';
import type { LevelRange, Segment } from '../../lib/level-range.ts';

type Levels = Grid['levels'];

export const isChosen = (chosen: readonly CohortCell[], cell: CohortCell): boolean =>
  chosen.some(({ levelGroup, grade }) => levelGroup === cell.levelGroup && grade === cell.grade);

/** Takes the cells out when all of them are chosen, and adds them otherwise. */
export function toggle(chosen: readonly CohortCell[], cells: readonly CohortCell[]): CohortCell[] {
  const others = chosen.filter((cell) => !isChosen(cells, cell));
  return cells.every((cell) => isChosen(chosen, cell)) ? others : [...others, ...cells];
}

export interface LevelGroupSegments {
  readonly levelGroup: string;
  readonly segments: readonly Segment[];
}

/** The run of segments of each level group, top down. A segment the registry does not group (S4-5 is never a level) joins the one above. */
export function segmentsByGroup(levels: Levels): LevelGroupSegments[] {
  const groupOf = new Map(levels.map(({ level, levelGroup }) => [level, levelGroup]));
  const runs: { levelGroup: string; segments: Segment[] }[] = [];
  for (const segment of segments) {
    const last = runs.at(-1);
    const levelGroup = groupOf.get(segment) ?? last?.levelGroup;
    if (levelGroup === undefined) continue;
    if (last?.levelGroup === levelGroup) last.segments.push(segment);
    else runs.push({ levelGroup, segments: [segment] });
  }
  return runs;
}

/** All of each level group that the range touches, in the grades chosen before where these were the same in every row. */
export function chooseLevels(grid: Grid, chosen: readonly CohortCell[], range: LevelRange | null): CohortCell[] {
  if (range === null) return [];
  const [from, to] = [segments.indexOf(range.from), segments.indexOf(range.to)];
  const touched = segmentsByGroup(grid.levels).filter(({ segments: run }) =>
    run.some((segment) => from <= segments.indexOf(segment) && segments.indexOf(segment) <= to),
  );
  const grades = commonGrades(chosen) ?? grid.grades;
  return touched.flatMap(({ levelGroup }) => grades.map((grade) => ({ levelGroup, grade })));
}

/** The levels of the chosen rows, when they lie in one run; otherwise the column shows no range. */
export function rangeOf(grid: Grid, chosen: readonly CohortCell[]): LevelRange | null {
  const rows = new Set(chosen.map(({ levelGroup }) => levelGroup));
  const runs = segmentsByGroup(grid.levels);
  const touched = runs.filter(({ levelGroup }) => rows.has(levelGroup));
  const [first, last] = [touched[0], touched.at(-1)];
  if (first === undefined || last === undefined) return null;
  const isOneRun = runs.indexOf(last) - runs.indexOf(first) + 1 === touched.length;
  const [from, to] = [first.segments[0], last.segments.at(-1)];
  return isOneRun && from !== undefined && to !== undefined ? rangeBetween(from, to) : null;
}

function commonGrades(chosen: readonly CohortCell[]): readonly Grade[] | null {
  const byRow = new Map<string, Grade[]>();
  for (const { levelGroup, grade } of chosen) byRow.set(levelGroup, [...(byRow.get(levelGroup) ?? []), grade]);
  const [first, ...others] = byRow.values();
  if (first === undefined) return null;
  return others.every((row) => row.length === first.length && first.every((grade) => row.includes(grade))) ? first : null;
}
