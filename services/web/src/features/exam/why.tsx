import type { CellKey, ResultName, TraceStep } from '@cairnstep/scoring';
import { formatCount } from '../../lib/format.ts';
import { cellTitle } from './exam-sheet.ts';
import type { ExamSheet } from './exam-sheet.ts';
import { nameOfResult, valuesInWords } from './result-words.ts';

export interface WhyProps {
  readonly chosen: ResultName | null;
  /** Null: open while cells are blank. */
  readonly step: TraceStep | null;
  readonly sheet: ExamSheet;
  readonly blank: number;
  readonly goTo: (cell: CellKey) => void;
}

/** Why the chosen result came out, in words, with the cells that decided. */
export function Why({ chosen, step, sheet, blank, goTo }: WhyProps) {
  if (chosen === null) return <p className="not-printed text-quiet">Choose a result to see why it came out and which cells decided it.</p>;
  return (
    <div className="grid gap-2 border-l-4 border-lichen pl-4">
      <h3 className="font-semibold">
        Why {nameOfResult(chosen)}
        {step !== null && ` is ${valuesInWords(chosen, step.value.split(', '))}`}
      </h3>
      {step === null ? (
        <p>It is still open: {formatCount(blank, 'cell is', 'cells are')} blank. It settles as they are filled.</p>
      ) : (
        <>
          <p>{step.because}</p>
          {step.cells.length > 0 && <DecidingCells cells={step.cells} sheet={sheet} goTo={goTo} />}
        </>
      )}
    </div>
  );
}

function DecidingCells({
  cells,
  sheet,
  goTo,
}: {
  readonly cells: readonly CellKey[];
  readonly sheet: ExamSheet;
  readonly goTo: (cell: CellKey) => void;
}) {
  return (
    <details className="not-printed">
      <summary className="text-small text-lake">{formatCount(cells.length, 'cell')} marked on the sheet</summary>
      <ul className="flex flex-wrap gap-x-4 text-small">
        {cells.map((cell) => (
          <li key={cell}>
            <button type="button" className="link min-h-6" onClick={() => goTo(cell)}>
              {cellTitle(cell)}: {sheet.written[cell] ?? 'blank'}
            </button>
          </li>
        ))}
      </ul>
    </details>
  );
}
