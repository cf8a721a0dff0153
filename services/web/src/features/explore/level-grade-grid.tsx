/**
 * The grid: level groups down, AIS grades across. Choosing cells is defining the cohort. On wide screens the level column
 * stands beside it, each row as high as the segments it groups; on narrow ones every row becomes a list of its grades.
 */
import type { Cell, Grid } from '@cairnstep/contract';
import { useRef, useState } from 'react';
import type { KeyboardEvent, ReactNode } from 'react';
import type { CohortCell, Grade } from '../../lib/cohort.ts';
import { formatNumber } from '../../lib/format.ts';
import { HiddenMark } from '../../ui/hidden-mark.tsx';
import { gradeInWords, intervalText, meanText, unitText } from './grid-words.ts';
import { IntervalMark } from './interval-mark.tsx';
import type { IntervalScale } from './interval-scale.ts';
import { isChosen, toggle } from './selection.ts';
import type { ChooseCells } from './use-grid-address.ts';

export interface LevelGradeGridProps {
  readonly grid: Grid;
  readonly scale: IntervalScale | null;
  /** Id of what names the grid. */
  readonly labelledBy: string;
  readonly chosen: readonly CohortCell[];
  readonly onChoose: ChooseCells;
}

/** -1 is the header, the row after the last holds the totals. */
interface Place {
  readonly row: number;
  readonly column: number;
}

export function LevelGradeGrid({ grid, scale, labelledBy, chosen, onChoose }: LevelGradeGridProps) {
  const table = useRef<HTMLTableElement>(null);
  const [active, setActive] = useState<Place>({ row: 0, column: 0 });
  const { grades, rows } = grid;

  /** The cells that a press at a place chooses: one, a whole row or a whole column; a total chooses none. */
  function cellsAt({ row, column }: Place): CohortCell[] {
    if (column >= grades.length || row >= rows.length) return [];
    const inRows = row === -1 ? rows : rows.slice(row, row + 1);
    const inGrades = column === -1 ? grades : grades.slice(column, column + 1);
    return inRows.flatMap(({ levelGroup }) => inGrades.map((grade) => ({ levelGroup, grade })));
  }

  function press(place: Place): void {
    const cells = cellsAt(place);
    if (cells.length > 0) onChoose((before) => toggle(before, cells));
  }

  function move(event: KeyboardEvent, { row, column }: Place): void {
    const target: Place = { row: Math.min(rows.length, Math.max(-1, row)), column: Math.min(grades.length, Math.max(-1, column)) };
    event.preventDefault();
    table.current?.querySelector<HTMLElement>(`[data-place="${target.row} ${target.column}"]`)?.focus();
    if (event.shiftKey) {
      const passed = [...cellsAt(active), ...cellsAt(target)];
      onChoose((before) => [...before, ...passed]);
    }
  }

  function onKeyDown(event: KeyboardEvent): void {
    const { row, column } = active;
    const control = event.ctrlKey || event.metaKey;
    switch (event.key) {
      case 'ArrowUp':
        return move(event, { row: row - 1, column });
      case 'ArrowDown':
        return move(event, { row: row + 1, column });
      case 'ArrowLeft':
        return move(event, { row, column: column - 1 });
      case 'ArrowRight':
        return move(event, { row, column: column + 1 });
      case 'Home':
        return move(event, { row: control ? 0 : row, column: 0 });
      case 'End':
        return move(event, { row: control ? rows.length - 1 : row, column: grades.length - 1 });
      case ' ':
      case 'Enter':
        event.preventDefault();
        return press(active);
      case 'Escape':
        return onChoose(() => []);
      case 'a':
        if (!control) return;
        event.preventDefault();
        return onChoose(() => cellsAt({ row: -1, column: -1 }));
    }
  }

  /** What every cell that can be gone to has in common. */
  const at = (place: Place) => ({
    'data-place': `${place.row} ${place.column}`,
    tabIndex: place.row === active.row && place.column === active.column ? 0 : -1,
    onFocus: () => setActive(place),
    onClick: () => press(place),
  });
  const allChosen = (place: Place) => cellsAt(place).every((cell) => isChosen(chosen, cell));
  const shared = { grid, scale };

  return (
    <table
      ref={table}
      role="grid"
      aria-labelledby={labelledBy}
      aria-multiselectable="true"
      onKeyDown={onKeyDown}
      className="block w-full border-separate border-spacing-0 columns:table columns:table-fixed beside:col-start-2 beside:col-end-[-1] beside:row-start-2 beside:row-end-[-1] beside:grid beside:grid-cols-subgrid beside:grid-rows-subgrid"
    >
      <thead
        role="rowgroup"
        className="hidden columns:table-header-group beside:sticky beside:top-0 beside:z-10 beside:col-span-full beside:row-start-1 beside:grid beside:grid-cols-subgrid"
      >
        <tr role="row" className="beside:col-span-full beside:grid beside:grid-cols-subgrid">
          <td role="gridcell" className={`${headLook} columns:w-22 beside:w-auto`}>
            <span className="text-small text-quiet">Level</span>
          </td>
          {grades.map((grade, column) => (
            <th
              key={grade}
              {...at({ row: -1, column })}
              role="columnheader"
              scope="col"
              aria-selected={allChosen({ row: -1, column })}
              className={`${headLook} cursor-pointer border-l border-l-hairline hover:bg-paper`}
            >
              <GradeHead grade={grade} />
            </th>
          ))}
          <th role="columnheader" scope="col" className={`${headLook} border-l border-l-edge`}>
            <span className="font-semibold">All grades</span>
          </th>
        </tr>
      </thead>
      <tbody
        role="rowgroup"
        className="block columns:table-row-group beside:col-span-full beside:[grid-row:2/-1] beside:grid beside:grid-cols-subgrid beside:grid-rows-subgrid"
      >
        {rows.map(({ levelGroup, label, cells, total }, row) => (
          <tr key={levelGroup} role="row" className={rowLook}>
            <th
              {...at({ row, column: -1 })}
              role="rowheader"
              scope="row"
              aria-selected={allChosen({ row, column: -1 })}
              className={`${rowHeadLook} cursor-pointer hover:bg-paper`}
            >
              {label}
            </th>
            {grades.map((grade, column) => {
              const cell = cells[column] ?? { state: 'empty' };
              const selected = isChosen(chosen, { levelGroup, grade });
              return (
                <td
                  key={grade}
                  {...at({ row, column })}
                  role="gridcell"
                  aria-selected={selected}
                  className={`${cellLook} cursor-pointer focus-visible:-outline-offset-2 ${
                    selected ? 'bg-chosen before:absolute before:inset-y-0 before:left-0 before:w-1 before:bg-lichen' : 'hover:bg-paper'
                  }`}
                >
                  <Figures {...shared} cell={cell} grade={grade} label={gradeChip(grade)} />
                </td>
              );
            })}
            <td {...at({ row, column: grades.length })} role="gridcell" className={`${cellLook} ${totalColumnLook}`}>
              <Figures {...shared} cell={total} label="all" />
            </td>
          </tr>
        ))}
        <tr role="row" className={rowLook}>
          <th role="rowheader" scope="row" className={`${rowHeadLook} columns:border-t columns:border-t-edge`}>
            All levels
          </th>
          {grades.map((grade, column) => (
            <td key={grade} {...at({ row: rows.length, column })} role="gridcell" className={`${cellLook} ${totalRowLook}`}>
              <Figures {...shared} cell={grid.columnTotals[column] ?? { state: 'empty' }} grade={grade} label={gradeChip(grade)} />
            </td>
          ))}
          <td
            {...at({ row: rows.length, column: grades.length })}
            role="gridcell"
            className={`${cellLook} ${totalColumnLook} columns:border-t columns:border-t-edge`}
          >
            <Figures {...shared} cell={grid.total} label="all" />
          </td>
        </tr>
      </tbody>
    </table>
  );
}

const headLook =
  'border-b border-edge bg-sheet pr-2 pb-2 pl-3 text-left align-bottom font-normal focus-visible:-outline-offset-2 beside:flex beside:flex-col beside:justify-end';
const rowLook = 'block border-b border-hairline columns:table-row beside:col-span-full beside:grid beside:grid-cols-subgrid';
const rowHeadLook =
  'block bg-sheet pt-4 pb-1 text-left font-semibold wrap-normal columns:text-small print:text-[9pt] focus-visible:-outline-offset-2 columns:table-cell columns:border-b columns:border-hairline columns:py-2 columns:pr-1 columns:align-top beside:border-0';
const cellLook =
  'relative block scroll-mt-28 scroll-mb-32 py-1.5 pr-0.5 pl-2.5 columns:table-cell columns:border-b columns:border-b-hairline columns:align-top beside:block beside:border-b-0';
const totalRowLook = 'columns:border-t columns:border-t-edge';
const totalColumnLook = 'columns:border-l columns:border-l-edge';

const bands: Readonly<Record<Grade, string>> = {
  A: 'bg-ais-a',
  B: 'bg-ais-b',
  C: 'bg-ais-c',
  D: 'bg-ais-d',
  E: 'bg-ais-e',
  ND: 'bg-sheet',
};
const completeness: Readonly<Record<Grade, string>> = {
  A: 'complete',
  B: 'incomplete',
  C: 'incomplete',
  D: 'incomplete',
  E: 'normal',
  ND: 'not determinable',
};

function GradeHead({ grade }: { readonly grade: Grade }) {
  return (
    <>
      <span aria-hidden="true" className={`mb-1 block h-2 border border-edge ${bands[grade]}`} />
      <span className="sr-only">AIS </span>
      <span className="block text-lead font-semibold">{grade}</span>
      <span className="block text-small text-quiet print:text-[8pt]">{completeness[grade]}</span>
    </>
  );
}

/** The grade within a cell, where the columns have become lines. */
function gradeChip(grade: Grade): ReactNode {
  return (
    <>
      <span className="sr-only">{gradeInWords(grade)}</span>
      <span aria-hidden="true" className="flex items-center gap-2">
        <span className={`block h-3 w-5 border border-edge ${bands[grade]}`} />
        <span className="font-semibold">{grade}</span>
      </span>
    </>
  );
}

interface FiguresProps {
  readonly grid: Grid;
  readonly cell: Cell;
  readonly scale: IntervalScale | null;
  readonly grade?: Grade;
  readonly label: ReactNode;
}

function Figures({ grid, cell, scale, grade, label }: FiguresProps) {
  const unit = unitText(grid.outcome);
  return (
    <div className="grid grid-cols-[48px_minmax(0,1fr)_30%] items-start gap-x-3 columns:grid-cols-1">
      <span className="row-span-2 columns:hidden">{label}</span>
      {cell.state === 'shown' ? (
        <>
          <span className="flex flex-wrap items-baseline justify-between gap-x-2">
            <span className="numbers font-semibold">
              {meanText(cell, grid)}
              <span className="sr-only"> {unit}</span>
            </span>
            <span className="numbers order-last text-small text-quiet">
              n <span className="text-ink">{formatNumber(cell.n)}</span>
            </span>
          </span>
          <span className="col-start-3 row-span-2 row-start-1 self-center columns:col-start-auto columns:row-span-1 columns:row-start-auto">
            {scale !== null && <IntervalMark cell={cell} scale={scale} {...(grade !== undefined && { grade })} />}
          </span>
          <span className="numbers text-small text-quiet">
            <span className="sr-only">95% interval </span>
            {intervalText(cell, grid)}
          </span>
        </>
      ) : (
        <span className="text-quiet">{cell.state === 'hidden' ? <HiddenMark /> : <span className="text-small">none</span>}</span>
      )}
    </div>
  );
}
