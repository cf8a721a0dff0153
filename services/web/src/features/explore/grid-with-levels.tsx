/** The level column and the grid side by side, each row of the grid as high as the segments of its level group. */
import type { Grid } from '@cairnstep/contract';
import { useState } from 'react';
import type { CSSProperties } from 'react';
import type { LevelRange, Segment } from '../../lib/level-range.ts';
import { segmentNamed } from '../../lib/level-range.ts';
import { LevelColumn } from '../../ui/level-column.tsx';
import { intervalScale } from './interval-scale.ts';
import { LevelGradeGrid } from './level-grade-grid.tsx';
import type { LevelGradeGridProps } from './level-grade-grid.tsx';
import { chooseLevels, rangeOf, segmentsByGroup } from './selection.ts';

/** Heights in the level column: a segment, and the line on top of the column and of each region. */
const segmentHeight = 24;
const line = 1;

export function GridWithLevels(props: Omit<LevelGradeGridProps, 'scale'>) {
  const { grid, chosen, onChoose } = props;
  const [columnOpen, setColumnOpen] = useState(false);
  const runs = segmentsByGroup(grid.levels);
  const rows = grid.rows.map(({ levelGroup }) => {
    const run = runs.find((group) => group.levelGroup === levelGroup);
    return run === undefined ? 'auto' : `minmax(${heightOf(run.segments)}px, auto)`;
  });
  const layout = { '--grid-rows': `auto ${rows.join(' ')} auto`, '--level-rows': runs.length } as CSSProperties;
  return (
    <div
      style={layout}
      className="lg:grid lg:grid-cols-[168px_68px_repeat(7,minmax(0,1fr))] lg:gap-x-0 lg:[grid-template-rows:var(--grid-rows)]"
    >
      <div className="lg:contents">
        <button
          type="button"
          aria-expanded={columnOpen}
          aria-controls="level-column"
          onClick={() => setColumnOpen(!columnOpen)}
          className="mb-3 min-h-10 rounded-sm border border-edge px-4 font-semibold lg:hidden"
        >
          {columnOpen ? 'Close the level column' : 'Choose by level'}
        </button>
        {/* Its two parts, the typed range and the column, take their places beside the head and the rows of the grid. */}
        <div
          id="level-column"
          className={`${columnOpen ? 'mb-6' : 'hidden'} not-printed lg:contents lg:[&_form]:col-start-1 lg:[&_form]:row-start-1 lg:[&_form]:mr-4 lg:[&_form]:mb-2 lg:[&_form]:self-end lg:[&_ul]:col-start-1 lg:[&_ul]:mr-4 lg:[&_ul]:self-start lg:[&_ul]:[grid-row:2/span_var(--level-rows)] lg:[&>div]:contents`}
        >
          <LevelColumn
            label="Participants by level of injury"
            counts={countsOf(grid)}
            range={rangeOf(grid, chosen)}
            onRangeChange={(range: LevelRange | null) => onChoose(chooseLevels(grid, chosen, range))}
          />
        </div>
      </div>
      <div className="scrolls overflow-x-auto lg:contents">
        <LevelGradeGrid {...props} scale={intervalScale(grid)} />
      </div>
    </div>
  );
}

function heightOf(run: readonly Segment[]): number {
  const regions = run.filter((segment) => segment === 'C1' || segment === 'T1' || segment === 'L1' || segment === 'S1').length;
  return run.length * segmentHeight + regions * line;
}

function countsOf({ levels }: Grid): Map<Segment, number | null> {
  return new Map(
    levels.flatMap(({ level, participants }) => {
      const segment = segmentNamed(level);
      return segment === null ? [] : [[segment, participants] as const];
    }),
  );
}
