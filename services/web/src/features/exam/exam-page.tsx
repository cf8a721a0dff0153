import type { CellKey, ResultName } from '@cairnstep/scoring';
import { useDeferredValue, useEffect, useMemo, useReducer, useRef, useState } from 'react';
import { formatShare } from '../../lib/format.ts';
import { announce } from '../../ui/announcer.tsx';
import { Button } from '../../ui/button.tsx';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { LeaveQuestion } from '../../ui/leave-question.tsx';
import { Page } from '../../ui/page.tsx';
import { TextLink } from '../../ui/text-link.tsx';
import { CellLine } from './cell-line.tsx';
import { firstEntry, nextEntry } from './entry.ts';
import type { Entry } from './entry.ts';
import { Explanations } from './explanations.tsx';
import { OrderChoice } from './order-choice.tsx';
import { ExamGrid } from './exam-grid.tsx';
import { isBlankSheet } from './exam-sheet.ts';
import { IssueList } from './issue-list.tsx';
import { allCells } from './places.ts';
import { readSheet, whyOf } from './reading.ts';
import type { Reading } from './reading.ts';
import { Remarks } from './remarks.tsx';
import { RestOfExam } from './rest-of-exam.tsx';
import { shownResult } from './result-words.ts';
import { Results } from './results.tsx';
import { Why } from './why.tsx';

const noCells: ReadonlySet<CellKey> = new Set();

export default function ExamPage() {
  const [entry, act] = useReducer(nextEntry, firstEntry);
  const { sheet } = entry;
  const reading = useMemo(() => readSheet(sheet), [sheet]);
  const [chosen, choose] = useState<ResultName | null>(null);
  // Looking into open results takes a moment; typing does not wait for it.
  const settled = useDeferredValue(reading);
  const step = useMemo(() => (chosen === null ? null : whyOf(settled, chosen)), [settled, chosen]);
  const deciding = useMemo(() => (step === null ? noCells : new Set(step.cells)), [step]);
  const followsRef = useRef(false);
  const grid = useRef<HTMLDivElement>(null);
  const { values } = reading.classification.nli;
  const level = values.length === 1 ? values[0] : undefined;
  const isBlank = isBlankSheet(sheet);
  useSaid(entry);
  useResultsSaid(reading, isBlank);

  const goTo = (cell: CellKey): void => {
    followsRef.current = true;
    act({ act: 'go', to: cell });
    document.querySelector<HTMLElement>(`[data-cell="${cell}"]`)?.focus();
  };

  const chooseResult = (name: ResultName | null): void => {
    choose(name);
    const why = name === null ? null : whyOf(reading, name);
    if (why !== null) announce(why.because);
  };

  return (
    <Page
      title="Exam sheet"
      lead={<p className="print:hidden">Type a neurological exam and see its levels, grade and zones, and why they came out.</p>}
      note={
        <>
          <p className="print:hidden">
            Nothing typed here is stored or sent. It stays in this page until you leave it. Print it to keep it.
          </p>
          <p>
            Classified by the international standard (ISNCSCI), 2019 revision, as the registry classifies the exams it receives.
            <span className="print:hidden">
              {' '}
              <TextLink to="/methods/classification">How injuries are classified</TextLink> says more; where the standard leaves a choice,
              ours is <a href="#readings">stated below</a>.
            </span>
          </p>
          <p>It supports the examiner’s judgement and does not replace it.</p>
        </>
      }
      actions={
        <>
          <Button onPress={() => window.print()}>Print</Button>
          {!isBlank && (
            <ConfirmDialog
              trigger={<Button>Start a new exam</Button>}
              title="Start a new exam?"
              consequence={<p>The sheet is emptied. What you typed is kept nowhere.</p>}
              confirm="Empty the sheet"
              danger
              onConfirm={async () => act({ act: 'start-anew' })}
            />
          )}
        </>
      }
    >
      <section aria-label="Exam" className="relative border-t border-hairline bg-sheet print:border-0 print:bg-transparent">
        <div className="grid items-start gap-x-10 gap-y-8 px-4 py-6 md:px-8 lg:grid-cols-[minmax(0,36rem)_minmax(0,1fr)] print:grid-cols-[10fr_11fr] print:gap-x-6 print:gap-y-2 print:py-0 print:text-[8.5pt] print:leading-snug print:[&_.text-section]:text-[11pt] print:[&_.text-small]:text-[8pt] print:[&_.text-small]:leading-snug">
          <div className="grid min-w-0 gap-4">
            <OrderChoice order={entry.order} act={act} />
            <div ref={grid} className="group/sheet grid gap-4">
              <ExamGrid entry={entry} act={act} issues={reading.issues} deciding={deciding} level={level} followsRef={followsRef} />
              <CellLine entry={entry} reading={reading} act={act} followsRef={followsRef} roomIn={grid} />
            </div>
            <RestOfExam
              nonKey={sheet.nonKey}
              earlierDeficit={sheet.earlierDeficit}
              ntReason={sheet.ntReason}
              anyNotTested={Object.values(sheet.written).some((code) => code.startsWith('NT'))}
              act={act}
            />
          </div>
          <div className="grid min-w-0 gap-6 lg:sticky lg:top-4 print:gap-3">
            <section aria-labelledby="result-title" className="grid gap-3 print:gap-1">
              <h2 id="result-title" className="text-section font-semibold">
                Result
              </h2>
              <Progress reading={reading} />
              <Results reading={reading} chosen={chosen} choose={chooseResult} />
              <Why chosen={chosen} step={step} sheet={sheet} blank={reading.blank.length} goTo={goTo} />
            </section>
            <section aria-labelledby="issues-title" className="grid gap-2">
              <h2 id="issues-title" className="text-section font-semibold">
                To look at
              </h2>
              <IssueList reading={reading} goTo={goTo} />
            </section>
            <section aria-labelledby="remarks-title" className="grid gap-2">
              <h2 id="remarks-title" className="text-section font-semibold">
                Remarks
              </h2>
              <Remarks sheet={sheet} />
            </section>
          </div>
        </div>
      </section>
      <Explanations />
      <LeaveQuestion
        isNeeded={!isBlank}
        title="Leave this exam?"
        consequence="What you typed is kept nowhere. When you leave, it is gone."
        leave="Leave and forget it"
        stay="Stay with the exam"
      />
    </Page>
  );
}

function Progress({ reading }: { readonly reading: Reading }) {
  const written = allCells.length - reading.blank.length;
  return (
    <p className="text-small text-quiet">
      {formatShare(written, allCells.length)} cells are written.
      {reading.blank.length > 0 && ' Blank ones are read as NT, any score: what is settled does not depend on them.'}
    </p>
  );
}

/** Passes on what an act of typing said. */
function useSaid({ said }: Entry): void {
  useEffect(() => {
    if (said !== null) announce(said.words);
  }, [said]);
}

/** Says level and grade once they are settled and have rested a moment, so that typing is not talked over. */
function useResultsSaid({ classification, blank }: Reading, isBlank: boolean): void {
  const isFull = blank.length === 0;
  const level = shownResult(classification, { result: 'nli' }, isFull);
  const grade = shownResult(classification, { result: 'ais' }, isFull);
  const words = [
    ...(level.state === 'open' ? [] : [`Level of injury ${level.words}.`]),
    ...(grade.state === 'open' ? [] : [`AIS grade ${grade.words}.`]),
  ].join(' ');
  useEffect(() => {
    if (isBlank || words === '') return;
    const rested = setTimeout(() => announce(words), 1000);
    return () => clearTimeout(rested);
  }, [words, isBlank]);
}
