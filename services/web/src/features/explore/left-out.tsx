import type { Grid } from '@cairnstep/contract';
import { formatNumber } from '../../lib/format.ts';
import { HiddenMark } from '../../ui/hidden-mark.tsx';

/** Who is not in the figures, and why; and whose place in the grid cannot be determined. */
export function LeftOut({ grid: { leftOut, site } }: { readonly grid: Grid }) {
  return (
    <>
      <p>
        Left out{site === null && ' (to the nearest 5)'}: <Count of={leftOut.noBaseline} /> without a value at baseline,{' '}
        <Count of={leftOut.noEndOfCourse} /> without one at the end of the course, <Count of={leftOut.unable} /> who tried and were unable.
      </p>
      <p>
        Of those in the grid, <Count of={leftOut.levelOrGradeNotDeterminable} /> have a level or grade that cannot be determined.
      </p>
    </>
  );
}

function Count({ of }: { readonly of: number | null }) {
  return of === null ? <HiddenMark /> : <span className="numbers">{formatNumber(of)}</span>;
}
