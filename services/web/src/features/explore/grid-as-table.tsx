/** The grid as a plain table and as a file: one line for each group, then the totals; nothing but what the grid shows. */
import type { Cell, Grid } from '@cairnstep/contract';
import { levelGroupLabel } from '../../lib/cohort.ts';
import { toCsv } from '../../lib/csv.ts';
import { saveFile } from '../../lib/save-file.ts';
import { formatNumber } from '../../lib/format.ts';
import { HiddenMark } from '../../ui/hidden-mark.tsx';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';
import { decimalsOf, groupFigures, meanText, statisticNames, unitText } from './grid-words.ts';
import type { GroupFigure } from './grid-words.ts';

type Shown = Extract<Cell, { state: 'shown' }>;

const states: Readonly<Record<Cell['state'], string>> = { shown: 'shown', hidden: 'not shown', empty: 'nobody' };

function columnsOf(grid: Grid): Column<GroupFigure>[] {
  const decimals = decimalsOf(grid);
  const unit = unitText(grid.outcome);
  const measured = { kind: 'number', ...(unit !== '' && { unit }) } as const;
  const figure = (of: (cell: Shown) => number | null) => ({
    ...measured,
    value: ({ cell }: GroupFigure) => (cell.state === 'shown' ? of(cell) : null),
    cell: ({ cell }: GroupFigure) => {
      const value = cell.state === 'shown' ? of(cell) : null;
      return value === null ? <Absent cell={cell} /> : formatNumber(value, decimals);
    },
  });
  return [
    {
      key: 'level',
      header: 'Level',
      isRowHeader: true,
      value: ({ levelGroup }) => (levelGroup === '' ? 'All levels' : levelGroupLabel(levelGroup)),
    },
    {
      key: 'grade',
      header: 'AIS grade',
      value: ({ grade }) => (grade === null ? 'All grades' : grade === 'ND' ? 'not determinable' : grade),
    },
    {
      key: 'n',
      header: 'People',
      kind: 'number',
      value: ({ cell }) => (cell.state === 'shown' ? cell.n : cell.state === 'empty' ? 0 : null),
      cell: ({ cell }) => (cell.state === 'hidden' ? <HiddenMark /> : formatNumber(cell.state === 'shown' ? cell.n : 0)),
    },
    {
      ...figure(({ mean }) => mean),
      key: 'mean',
      header: grid.statistic === 'change' ? 'Mean change' : 'Mean',
      cell: ({ cell }) => (cell.state === 'shown' ? meanText(cell, grid) : <Absent cell={cell} />),
    },
    { ...figure(({ sd }) => sd), key: 'sd', header: 'SD' },
    {
      ...figure(({ interval }) => interval?.lower ?? null),
      key: 'lower',
      header: '95% from',
    },
    { ...figure(({ interval }) => interval?.upper ?? null), key: 'upper', header: '95% to' },
    { key: 'state', header: 'State', value: ({ cell }) => states[cell.state] },
  ];
}

function Absent({ cell }: { readonly cell: Cell }) {
  return cell.state === 'hidden' ? <HiddenMark /> : <span className="text-quiet">none</span>;
}

/** "cairnstep-release-3-tmwt_ss-without-device-change" */
export function fileNameOf({ release, site, outcome, statistic }: Grid): string {
  const source = site !== null ? `site-${site.code}` : `release-${release?.number ?? 'none'}`;
  return ['cairnstep', source, outcome.key, outcome.inDevice ? 'in-device' : 'without-device', statistic].join('-');
}

const keyOf = ({ levelGroup, grade }: GroupFigure) => `${levelGroup} ${grade ?? ''}`;

export function GridAsTable({ grid }: { readonly grid: Grid }) {
  return (
    <Table
      id="grid"
      caption={`${statisticNames[grid.statistic]}, ${grid.outcome.name}, by level and grade`}
      columns={columnsOf(grid)}
      rows={groupFigures(grid)}
      rowKey={keyOf}
      empty="Nobody has been measured yet."
      fileName={fileNameOf(grid)}
    />
  );
}

export function downloadGrid(grid: Grid): void {
  const columns = columnsOf(grid);
  const lines = [
    columns.map(({ header, unit }) => (unit === undefined ? header : `${header}, ${unit}`)),
    ...groupFigures(grid).map((figure) => columns.map(({ value }) => value(figure))),
  ];
  saveFile(`${fileNameOf(grid)}.csv`, toCsv(lines), 'text/csv;charset=utf-8');
}
