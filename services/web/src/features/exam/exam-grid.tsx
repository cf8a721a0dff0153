/** The sheet: segments down the level column, touch, prick and strength of both sides beside each. One stop for the keyboard. */
import { keyMuscles } from '@cairnstep/dictionary';
import type { CellKey } from '@cairnstep/scoring';
import { Fragment, useLayoutEffect, useRef } from 'react';
import type { ClipboardEvent, FocusEvent, KeyboardEvent, RefObject } from 'react';
import { CellQuestion } from './cell-question.tsx';
import type { Act, Entry } from './entry.ts';
import { cellTitle } from './exam-sheet.ts';
import { actOfKey } from './keys.ts';
import { answerKeys, cellAt, regions, rowOf, segmentName, sheetColumns } from './places.ts';
import type { SheetIssue } from './reading.ts';
import { SheetCell } from './sheet-cell.tsx';

const movements = new Map(keyMuscles.map(({ segment, movement }) => [segment, movement]));
const columnCount = sheetColumns.length + 2;

export interface ExamGridProps {
  readonly entry: Entry;
  readonly act: (act: Act) => void;
  readonly issues: readonly SheetIssue[];
  /** The cells that the chosen result rests on. */
  readonly deciding: ReadonlySet<CellKey>;
  /** The level of injury, once it is settled. */
  readonly level: string | undefined;
  /** Whether the keyboard's focus follows the active cell: while it is in the grid, or was sent back to it. */
  readonly followsRef: RefObject<boolean>;
}

export function ExamGrid({ entry, act, issues, deciding, level, followsRef }: ExamGridProps) {
  const table = useRef<HTMLTableElement>(null);
  const { active, question } = entry;

  useLayoutEffect(() => {
    const cell = table.current?.querySelector<HTMLElement>(`[data-cell="${active}"]`);
    if (question !== null) return;
    if (followsRef.current) cell?.focus();
    else if (entry.before.length > 0) cell?.scrollIntoView({ block: 'nearest' });
  }, [active, question, entry.before.length, followsRef]);

  function onKeyDown(event: KeyboardEvent): void {
    const chosen = actOfKey(event);
    if (chosen === null) return;
    event.preventDefault();
    act(chosen);
  }

  function onPaste(event: ClipboardEvent): void {
    event.preventDefault();
    act({ act: 'paste', text: event.clipboardData.getData('text/plain') });
  }

  function onFocus(event: FocusEvent): void {
    followsRef.current = true;
    const cell = event.target instanceof HTMLElement ? event.target.dataset['cell'] : undefined;
    if (cell !== undefined) act({ act: 'go', to: cell as CellKey });
  }

  function onBlur({ relatedTarget }: FocusEvent): void {
    if (relatedTarget instanceof Node && table.current?.contains(relatedTarget) === false) followsRef.current = false;
  }

  const cell = (key: CellKey, colSpan?: number) => (
    <SheetCell
      key={key}
      cell={key}
      written={entry.sheet.written[key]}
      isActive={key === active}
      decides={deciding.has(key)}
      issue={worstOf(issues, key)}
      {...(colSpan !== undefined && { colSpan })}
    />
  );
  const questionRow = (row: readonly CellKey[]) =>
    question !== null &&
    row.includes(question.key) && (
      <tr className="not-printed">
        <td colSpan={columnCount} className="border-y-2 border-lake bg-sheet p-3">
          <CellQuestion question={question} lastCause={entry.lastCause} act={act} />
        </td>
      </tr>
    );

  return (
    <table
      ref={table}
      role="grid"
      aria-label="Exam sheet"
      className="w-full table-fixed border-collapse"
      onKeyDown={onKeyDown}
      onPaste={onPaste}
      onFocus={onFocus}
      onBlur={onBlur}
    >
      <colgroup>
        <col className="w-11" />
        {sheetColumns.map(({ modality, side }) => (
          <col key={modality + side} />
        ))}
        <col className="w-0 sm:w-40 print:w-0" />
      </colgroup>
      <GridHead />
      {regions.map(({ name, segments }) => (
        <tbody key={name}>
          <tr>
            <th
              colSpan={columnCount}
              scope="rowgroup"
              className="border-b border-edge pt-3 pb-0.5 text-left text-small font-normal text-quiet print:pt-0"
            >
              {name}
            </th>
          </tr>
          {segments.map((segment) => (
            <Fragment key={segment}>
              <tr>
                <th
                  scope="row"
                  className={`border-r border-edge pr-2 text-right text-small font-semibold numbers ${
                    segment === level ? 'border-b-3 border-b-lichen bg-chosen' : ''
                  }`}
                >
                  {segmentName(segment)}
                  {segment === level && <span className="sr-only">, level of injury</span>}
                </th>
                {sheetColumns.map((column) => {
                  const key = cellAt(segment, column);
                  return key === undefined ? <td key={column.modality + column.side} /> : cell(key);
                })}
                <td className="max-sm:hidden pl-3 text-small text-quiet print:hidden">{movements.get(segment)}</td>
              </tr>
              {questionRow(rowOf(cellAt(segment, { modality: 'lightTouch', side: 'right' }) ?? 'vac'))}
            </Fragment>
          ))}
        </tbody>
      ))}
      <tbody>
        <tr>
          <th
            colSpan={columnCount}
            scope="rowgroup"
            className="border-b border-edge pt-3 pb-0.5 text-left text-small font-normal text-quiet print:pt-0"
          >
            Lowest sacral segments
          </th>
        </tr>
        {answerKeys.map((key) => (
          <Fragment key={key}>
            <tr>
              <th scope="row" colSpan={5} className="border-r border-edge pr-2 text-right text-small font-semibold">
                {cellTitle(key)}
              </th>
              {cell(key, 2)}
              <td className="max-sm:hidden print:hidden" />
            </tr>
            {questionRow([key])}
          </Fragment>
        ))}
      </tbody>
    </table>
  );
}

const modalityHeads = [
  { name: 'Light touch', short: 'Touch' },
  { name: 'Pin prick', short: 'Prick' },
  { name: 'Strength', short: 'Strength' },
] as const;

/** Stays in sight, so that a narrow screen never loses which column is which. */
function GridHead() {
  return (
    <thead className="sticky top-0 z-2 bg-sheet text-small">
      <tr>
        <th scope="col" rowSpan={2} className="align-bottom font-normal text-quiet">
          <span className="sr-only">Segment</span>
        </th>
        {modalityHeads.map(({ name, short }) => (
          <th key={name} scope="colgroup" colSpan={2} className="border-l border-edge px-1 pt-1 text-left font-semibold">
            <span className="sm:hidden" aria-hidden="true">
              {short}
            </span>
            <span className="max-sm:sr-only">{name}</span>
          </th>
        ))}
        <th scope="col" rowSpan={2} className="max-sm:hidden pl-3 text-left align-bottom font-normal text-quiet print:hidden">
          Key muscle
        </th>
      </tr>
      <tr>
        {sheetColumns.map(({ modality, side }) => (
          <th
            key={modality + side}
            scope="col"
            className={`border-b border-edge px-1 pb-1 text-left font-normal text-quiet ${side === 'right' ? 'border-l' : ''}`}
          >
            <span className="sm:hidden" aria-hidden="true">
              {side === 'right' ? 'R' : 'L'}
            </span>
            <span className="max-sm:sr-only">{side === 'right' ? 'Right' : 'Left'}</span>
          </th>
        ))}
      </tr>
    </thead>
  );
}

function worstOf(issues: readonly SheetIssue[], key: CellKey): 'error' | 'warning' | null {
  const here = issues.filter(({ cell }) => cell === key);
  if (here.length === 0) return null;
  return here.some(({ severity }) => severity === 'error') ? 'error' : 'warning';
}
