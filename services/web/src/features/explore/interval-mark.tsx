import type { Cell } from '@cairnstep/contract';
import type { Grade } from '../../lib/cohort.ts';
import { positionOn } from './interval-scale.ts';
import type { IntervalScale } from './interval-scale.ts';

/** Point and interval of one group against the line all groups share. Only to look at: the numbers stand beside it. */
export function IntervalMark({ cell, scale, grade }: { readonly cell: Cell; readonly scale: IntervalScale; readonly grade?: Grade }) {
  if (cell.state !== 'shown') return null;
  const at = (value: number) => `${Math.round(positionOn(scale, value) * 10_000) / 100}%`;
  const { mean, interval } = cell;
  return (
    <svg aria-hidden="true" width="100%" height="14" className="block overflow-visible">
      {scale.reference !== undefined && (
        <line x1={at(scale.reference)} x2={at(scale.reference)} y1="0" y2="14" className="stroke-edge" strokeDasharray="2 2" />
      )}
      {interval !== null && (
        <>
          <line x1={at(interval.lower)} x2={at(interval.upper)} y1="7" y2="7" className="stroke-quiet" strokeWidth="3" />
          <IntervalEnd x={at(interval.lower)} isCut={interval.lower < scale.lower} direction={-1} />
          <IntervalEnd x={at(interval.upper)} isCut={interval.upper > scale.upper} direction={1} />
        </>
      )}
      <circle cx={at(mean)} cy="7" r="4.5" strokeWidth="1.5" className={`stroke-ink ${pointLook(grade)}`} />
    </svg>
  );
}

/** A cross stroke where the interval ends, an arrow head where it runs on past the scale. */
function IntervalEnd({ x, isCut, direction }: { readonly x: string; readonly isCut: boolean; readonly direction: 1 | -1 }) {
  return (
    <svg x={x} y="7" className="overflow-visible">
      <path
        d={isCut ? `M${-5 * direction} -5 L0 0 L${-5 * direction} 5` : 'M0 -4 V4'}
        className="stroke-quiet"
        strokeWidth="1.5"
        fill="none"
      />
    </svg>
  );
}

const pointLooks: Readonly<Partial<Record<Grade, string>>> = {
  A: 'fill-ais-a',
  B: 'fill-ais-b',
  C: 'fill-ais-c',
  D: 'fill-ais-d',
  E: 'fill-ais-e',
};
const pointLook = (grade: Grade | undefined): string => (grade === undefined ? 'fill-sheet' : (pointLooks[grade] ?? 'fill-sheet'));
