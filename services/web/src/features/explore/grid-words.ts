/** The figures of a grid as they are written: in a cell, in a sentence, in a file. Nothing of a hidden cell but that it is hidden. */
import type { Cell, Grid } from '@cairnstep/contract';
import { levelGroupLabel } from '../../lib/cohort.ts';
import type { CohortCell, Grade } from '../../lib/cohort.ts';
import { formatChange, formatCount, formatInterval, formatNumber, formatShare } from '../../lib/format.ts';
import { isChosen } from './selection.ts';

type Shown = Extract<Cell, { state: 'shown' }>;

/** Means and their intervals carry one decimal more than the data. */
export const decimalsOf = ({ outcome }: Pick<Grid, 'outcome'>): number => outcome.decimals + 1;

export function meanText({ mean }: Pick<Shown, 'mean'>, grid: Pick<Grid, 'outcome' | 'statistic'>): string {
  return grid.statistic === 'change' ? formatChange(mean, decimalsOf(grid)) : formatNumber(mean, decimalsOf(grid));
}

/** "0.05 to 0.33"; for one person, or where all have the same value, there is none. */
export function intervalText({ interval }: Pick<Shown, 'interval'>, grid: Pick<Grid, 'outcome'>): string {
  return interval === null ? 'no interval' : formatInterval(interval, decimalsOf(grid));
}

/** '' where the unit has no name. */
export const unitText = ({ unit }: Grid['outcome']): string => (unit === '1' ? '' : unit);

/** "AIS D", "grade not determinable" */
export const gradeInWords = (grade: Grade): string => (grade === 'ND' ? 'grade not determinable' : `AIS ${grade}`);

export const statisticNames: Readonly<Record<Grid['statistic'], string>> = {
  change: 'Mean change from baseline to end of course',
  baseline: 'Mean at baseline',
  end: 'Mean at end of course',
};

/** Which people a figure rests on. */
export const basisOf = ({ statistic, site }: Grid): string =>
  site !== null && statistic !== 'change' ? 'with the value' : 'with both values';

/** Where the figures come from: "Release 3", "Alder Ridge (S01), live". */
export function sourceOf({ release, site }: Pick<Grid, 'release' | 'site'>): string {
  if (site !== null) return `${site.name} (${site.code}), exact and live`;
  return release === null ? 'the registry' : `release ${release.number}`;
}

export interface GroupFigure {
  readonly levelGroup: string;
  readonly grade: Grade | null;
  readonly cell: Cell;
}

/** Every group, then the totals; null stands for all grades, '' for all levels. */
export function groupFigures(grid: Grid): GroupFigure[] {
  const rows = grid.rows.flatMap(({ levelGroup, cells, total }) => [
    ...grid.grades.map((grade, index): GroupFigure => ({ levelGroup, grade, cell: cells[index] ?? { state: 'empty' } })),
    { levelGroup, grade: null, cell: total },
  ]);
  return [
    ...rows,
    ...grid.grades.map((grade, index): GroupFigure => ({ levelGroup: '', grade, cell: grid.columnTotals[index] ?? { state: 'empty' } })),
    { levelGroup: '', grade: null, cell: grid.total },
  ];
}

/** The grid in a few sentences. */
export function gridInWords(grid: Grid): string {
  const { outcome, total } = grid;
  const unit = unitText(outcome);
  const figure = (cell: Shown) =>
    `${meanText(cell, grid)}${unit === '' ? '' : `\u00A0${unit}`}` +
    (cell.interval === null
      ? ` (n\u00A0=\u00A0${formatNumber(cell.n)})`
      : ` (95% CI ${intervalText(cell, grid)}; n\u00A0=\u00A0${formatNumber(cell.n)})`);
  const subject = `${statisticNames[grid.statistic]} in ${outcome.name}, ${outcome.inDevice ? 'measured in the training device' : 'without the training device'}`;
  const groups = groupFigures(grid).filter(({ levelGroup, grade }) => levelGroup !== '' && grade !== null);
  const shown = groups.filter((group): group is GroupFigure & { cell: Shown } => group.cell.state === 'shown');
  const hidden = groups.filter(({ cell }) => cell.state === 'hidden').length;
  const everyone = total.state === 'shown' ? figure(total) : total.state === 'hidden' ? 'not shown' : 'nobody has been measured';
  const sentences = [`${subject}: ${everyone} for everyone in ${sourceOf(grid)}.`];
  const ordered = [...shown].sort((a, b) => a.cell.mean - b.cell.mean);
  const [least, most] = [ordered[0], ordered.at(-1)];
  if (least !== undefined && most !== undefined && least !== most) {
    const named = ({ levelGroup, grade, cell }: (typeof shown)[number]) =>
      `${figure(cell)} in ${levelGroupLabel(levelGroup)}, ${gradeInWords(grade ?? 'ND')}`;
    sentences.push(`Group means run from ${named(least)}, to ${named(most)}.`);
  }
  sentences.push(
    `Of ${formatCount(groups.length, 'group')}, ${formatNumber(shown.length)} can be shown` +
      (hidden === 0 ? '.' : ` and ${formatNumber(hidden)} ${hidden === 1 ? 'is' : 'are'} not shown.`),
  );
  return sentences.join(' ');
}

/** "123 of 870 people with both values, and those in 2 groups that are not shown": counted from shown cells alone. */
export function cohortCount(grid: Grid, chosen: readonly CohortCell[]): string {
  const total = grid.total.state === 'shown' ? grid.total.n : grid.total.state === 'empty' ? 0 : null;
  const basis = basisOf(grid);
  if (chosen.length === 0) return total === null ? `Everyone ${basis}` : `Everyone: ${formatCount(total, 'person', 'people')} ${basis}`;
  const cells = groupFigures(grid).flatMap(({ levelGroup, grade, cell }) =>
    levelGroup !== '' && grade !== null && isChosen(chosen, { levelGroup, grade }) ? [cell] : [],
  );
  const counted = cells.reduce((sum, cell) => sum + (cell.state === 'shown' ? cell.n : 0), 0);
  const hidden = cells.filter(({ state }) => state === 'hidden').length;
  const hiddenGroups = `${formatCount(hidden, 'group')} that ${hidden === 1 ? 'is' : 'are'} not shown`;
  if (hidden === cells.length) return `People in ${hiddenGroups}`;
  const count = total === null ? formatCount(counted, 'person', 'people') : `${formatShare(counted, total)} people`;
  return `${count} ${basis}${hidden === 0 ? '' : `, and those in ${hiddenGroups}`}`;
}
