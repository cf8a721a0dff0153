/** The level column and the grid side by side, each row of the grid as high as the segments of its level group. */
import type { Grid } from '@cairnstep/contract';
import { useState } from 'react';
import type { CSSProperties } from 'react';
import type { LevelRange, Segment } from '../../lib/level-range.ts';
import { segmentNamed } from '../../lib/level-range.ts';
import { LevelColumn } from '../../ui/level-column.tsx';
import { IntervalKey } from './interval-key.tsx';
import { LevelGradeGrid } from './level-grade-grid.tsx';
import type { LevelGradeGridProps } from './level-grade-grid.tsx';
import { chooseLevels, rangeOf, segmentsByGroup } from './selection.ts';

/** Heights in the level column: a segment, and the line on top of the column and of each region. */
const segmentHeight = 24;
const line = 1;

export function GridWithLevels(props: LevelGradeGridProps) {
  const { grid, scale, chosen, onChoose } = props;
  const [columnOpen, setColumnOpen] = useState(false);
  const runs = segmentsByGroup(grid.levels);
  const rows = grid.rows.map(({ levelGroup }) => {
    const run = runs.find((group) => group.levelGroup === levelGroup);
    return run === undefined ? 'auto' : `minmax(${heightOf(run.segments)}px, auto)`;
  });
  const layout = { '--grid-rows': `auto auto ${rows.join(' ')} auto`, '--level-rows': runs.length } as CSSProperties;
  return (
    <div
      style={layout}
      className="beside:grid beside:grid-cols-[156px_94px_repeat(7,minmax(0,1fr))] beside:[grid-template-rows:var(--grid-rows)]"
    >
      {scale !== null && (
        <div className="mb-4 beside:col-start-2 beside:col-end-[-1] beside:row-start-1 beside:self-end">
          <IntervalKey grid={grid} scale={scale} />
        </div>
      )}
      <button
        type="button"
        aria-expanded={columnOpen}
        aria-controls="level-column"
        onClick={() => setColumnOpen(!columnOpen)}
        className="not-printed mb-3 min-h-10 rounded-sm border border-edge px-4 font-semibold beside:hidden"
      >
        {columnOpen ? 'Close the level column' : 'Choose by level'}
      </button>
      {/* Its two parts, the typed range and the column, take their places above and beside the rows of the grid. */}
      <div
        id="level-column"
        className={`${columnOpen ? 'mb-6' : 'hidden'} not-printed beside:contents beside:[&_form]:col-start-1 beside:[&_form]:row-start-1 beside:[&_form]:mr-4 beside:[&_form]:mb-4 beside:[&_form]:self-end beside:[&_ul]:col-start-1 beside:[&_ul]:mr-4 beside:[&_ul]:self-start beside:[&_ul]:[grid-row:3/span_var(--level-rows)] beside:[&>div]:contents`}
      >
        <LevelColumn
          label="Participants by level of injury"
          counts={countsOf(grid)}
          range={rangeOf(grid, chosen)}
          onRangeChange={(range: LevelRange | null) => onChoose((before) => chooseLevels(grid, before, range))}
        />
        <p className="mt-1 text-small text-quiet beside:col-start-1 beside:row-start-2 beside:mt-0 beside:mr-4 beside:mb-2 beside:self-end">
          People at each level{grid.site === null && ', to the nearest 5'}
        </p>
      </div>
      <div className="scrolls overflow-x-auto beside:contents">
        <LevelGradeGrid {...props} />
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
