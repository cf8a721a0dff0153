/** How to read the marks: where the shared line is, which side is better, how far the scale runs. */
import type { Grid } from '@cairnstep/contract';
import { formatNumber } from '../../lib/format.ts';
import { HiddenMark } from '../../ui/hidden-mark.tsx';
import { decimalsOf, meanText, unitText } from './grid-words.ts';
import { IntervalMark } from './interval-mark.tsx';
import type { IntervalScale } from './interval-scale.ts';

export function IntervalKey({ grid, scale }: { readonly grid: Grid; readonly scale: IntervalScale }) {
  const { total, outcome } = grid;
  const number = (value: number) => formatNumber(value, decimalsOf(grid));
  const unit = unitText(outcome);
  return (
    <div className="flex flex-wrap items-center gap-x-8 gap-y-2 text-small text-quiet">
      <div className="w-72 max-w-full">
        <IntervalMark cell={total} scale={scale} />
        <p className="numbers flex justify-between border-t border-edge pt-0.5">
          <span>{number(scale.lower)}</span>
          <span>
            {number(scale.upper)}
            {unit !== '' && ` ${unit}`}
          </span>
        </p>
      </div>
      <ul className="grid gap-x-6 sm:grid-cols-2">
        <li>{referenceWords(grid)}</li>
        <li>{directionWords(grid)}</li>
        <li>Point: mean. Bar: 95% interval; an arrow head where it runs past the scale.</li>
        <li>
          <HiddenMark /> not shown (fewer than 11, or protecting such a count)
        </li>
      </ul>
    </div>
  );
}

function referenceWords(grid: Grid): string {
  if (grid.statistic === 'change') return 'Dashed line: no change.';
  return grid.total.state === 'shown'
    ? `Dashed line: the mean of everyone, ${meanText(grid.total, grid)}.`
    : 'The mean of everyone is not shown.';
}

function directionWords({ outcome: { better }, statistic }: Grid): string {
  const what = statistic === 'change' ? 'improvement' : 'better';
  if (better === 'higher') return `Right of the line: ${what}.`;
  if (better === 'lower') return `Left of the line: ${what}.`;
  return statistic === 'change'
    ? 'Right of the line: more than before; neither side is better.'
    : 'Right of the line: more; neither side is better.';
}
