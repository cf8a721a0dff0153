import type { Classification, Determined } from './classification.ts';
import { cellPlaces } from './cell-key.ts';
import { cellName } from './cell-name.ts';
import type { OpenCell } from './deciding-cells.ts';
import { narrowingCells, openCells } from './deciding-cells.ts';
import { completenessReason, gradeConditions, gradeReason } from './explain-grade.ts';
import { motorLevelReason, nliReason, sensoryLevelReason } from './explain-levels.ts';
import type { Reason, Sheet } from './explain-sheet.ts';
import { listed, readSheet } from './explain-sheet.ts';
import { motorZoneReason, sensoryZoneReason } from './explain-zones.ts';
import type { CellKey, Exam } from './exam.ts';
import { sides } from './segments.ts';
import type { TraceStep } from './trace-step.ts';

const cellNames: ReadonlyMap<CellKey, string> = new Map([
  ...cellPlaces.map(({ key, side, modality, segment }): [CellKey, string] => [key, cellName(side, modality, segment)]),
  ['vac', 'voluntary anal contraction'],
  ['dap', 'deep anal pressure'],
]);

function openReason(sheet: Sheet, narrowing: readonly OpenCell[], open: readonly OpenCell[], result: TraceStep['result']): Reason {
  const told = narrowing.length > 0 ? narrowing : open;
  const named = told.map(({ key, written }) => `${cellNames.get(key)!} (${written})`);
  const depends =
    narrowing.length > 0
      ? `Knowing ${listed(named, 'or')} could narrow it.`
      : `Only several of these together could narrow it: ${listed(named)}.`;
  const conditions = result === 'ais' ? ` It is ${sheet.found.ais.values.map((grade) => gradeConditions[grade]).join('; ')}.` : '';
  return { because: `Not determinable. ${depends}${conditions}`, cells: told.map(({ key }) => key) };
}

/**
 * Why each result of `classify` came out: one step for each level, the completeness, the grade and each zone, in plain
 * words with the deciding cells. A result with several possible values names the open cells that could narrow it. Much slower
 * than `classify`, which it calls once for every score of every open cell.
 *
 * @throws UnreadableCellError when a cell holds nothing the sheet allows; check with `validateExam` first.
 */
export function explain(exam: Exam): TraceStep[] {
  const sheet = readSheet(exam);
  const open = openCells(exam);

  function step(
    about: Pick<TraceStep, 'result' | 'side'>,
    pick: (found: Classification) => Determined<string>,
    determinate: () => Reason,
  ): TraceStep {
    const found = pick(sheet.found);
    const isOpen = found.values.length > 1;
    const { because, cells } = isOpen ? openReason(sheet, narrowingCells(open, found, pick), open, about.result) : determinate();
    const tagged = found.tagged ? ' Cells tagged for another condition change this result.' : '';
    return { ...about, value: found.values.join(', '), because: because + tagged, cells: [...new Set(cells)] };
  }

  return [
    ...sides.map((side) =>
      step(
        { result: 'sensoryLevel', side },
        (found) => found.sensoryLevel[side],
        () => sensoryLevelReason(sheet, side),
      ),
    ),
    ...sides.map((side) =>
      step(
        { result: 'motorLevel', side },
        (found) => found.motorLevel[side],
        () => motorLevelReason(sheet, side),
      ),
    ),
    step(
      { result: 'nli' },
      (found) => found.nli,
      () => nliReason(sheet),
    ),
    step(
      { result: 'completeness' },
      (found) => found.completeness,
      () => completenessReason(sheet),
    ),
    step(
      { result: 'ais' },
      (found) => found.ais,
      () => gradeReason(sheet),
    ),
    ...sides.map((side) =>
      step(
        { result: 'zppSensory', side },
        (found) => found.zppSensory[side],
        () => sensoryZoneReason(sheet, side),
      ),
    ),
    ...sides.map((side) =>
      step(
        { result: 'zppMotor', side },
        (found) => found.zppMotor[side],
        () => motorZoneReason(sheet, side),
      ),
    ),
  ];
}
