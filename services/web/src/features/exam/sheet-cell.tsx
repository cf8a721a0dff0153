import type { CellKey } from '@cairnstep/scoring';
import { memo } from 'react';
import { cellTitle, meaningOf, normalScore, scoreIn } from './exam-sheet.ts';

export interface SheetCellProps {
  readonly cell: CellKey;
  readonly written: string | undefined;
  readonly isActive: boolean;
  /** The chosen result rests on it. */
  readonly decides: boolean;
  readonly issue: 'error' | 'warning' | null;
  readonly colSpan?: number;
}

/** One cell of the sheet: what is written, a bar as long as the score, and marks for what is to be looked at. */
export const SheetCell = memo(function SheetCell({ cell, written, isActive, decides, issue, colSpan }: SheetCellProps) {
  const look = [
    'relative h-7 border border-hairline text-center text-small numbers focus-visible:-outline-offset-2 focus-visible:z-1',
    'scroll-mt-16 scroll-mb-2 roomy:scroll-mb-[calc(var(--keys-height,0px)+8px)] pointer-coarse:h-9 print:h-[4.4mm] print:text-[8pt]',
    decides ? 'bg-chosen font-semibold outline-2 -outline-offset-2 outline-lichen' : isActive ? 'bg-paper' : '',
    written === normalScore(cell) ? 'text-quiet' : 'font-semibold',
  ];
  return (
    <td
      role="gridcell"
      data-cell={cell}
      tabIndex={isActive ? 0 : -1}
      aria-label={labelOf({ cell, written, decides, issue })}
      aria-invalid={issue === 'error' ? true : undefined}
      colSpan={colSpan}
      className={look.join(' ')}
    >
      {shown(written)}
      <ScoreBar cell={cell} written={written} />
      {issue !== null && (
        <svg aria-hidden="true" width="8" height="8" viewBox="0 0 8 8" className="absolute top-0 right-0">
          <path d="M0 0h8v8z" className={issue === 'error' ? 'fill-oxide' : 'fill-amber'} />
        </svg>
      )}
    </td>
  );
});

function shown(written: string | undefined): string {
  return written === 'yes' ? 'Yes' : written === 'no' ? 'No' : (written ?? '');
}

function labelOf({ cell, written, decides, issue }: Pick<SheetCellProps, 'cell' | 'written' | 'decides' | 'issue'>): string {
  const parts = [
    cellTitle(cell),
    written === undefined ? 'blank' : `${written}, ${meaningOf(cell, written)}`,
    ...(decides ? ['decides the result chosen'] : []),
    ...(issue === null ? [] : [issue === 'error' ? 'needs mending' : 'to be looked at']),
  ];
  return `${parts[0]}: ${parts.slice(1).join('; ')}`;
}

/** As long as the score is high, so that a column shows its course at a glance. */
function ScoreBar({ cell, written }: Pick<SheetCellProps, 'cell' | 'written'>) {
  const score = Number(scoreIn(written ?? ''));
  if (written === undefined || written === '' || !(score > 0)) return null;
  const share = score / Number(normalScore(cell));
  return (
    <svg aria-hidden="true" width="100%" height="3" className="absolute inset-x-0 bottom-0 block">
      <rect x="0" width={`${share * 100}%`} height="3" className="fill-lichen" />
    </svg>
  );
}
