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

/** Which result a step is about. */
export type ResultName = Pick<TraceStep, 'result' | 'side'>;

interface Explained {
  readonly pick: (found: Classification) => Determined<string>;
  /** Why its one value came out. */
  readonly reason: (sheet: Sheet) => Reason;
}

function explained({ result, side = 'right' }: ResultName): Explained {
  switch (result) {
    case 'sensoryLevel':
      return { pick: (found) => found.sensoryLevel[side], reason: (sheet) => sensoryLevelReason(sheet, side) };
    case 'motorLevel':
      return { pick: (found) => found.motorLevel[side], reason: (sheet) => motorLevelReason(sheet, side) };
    case 'nli':
      return { pick: (found) => found.nli, reason: nliReason };
    case 'completeness':
      return { pick: (found) => found.completeness, reason: completenessReason };
    case 'ais':
      return { pick: (found) => found.ais, reason: gradeReason };
    case 'zppSensory':
      return { pick: (found) => found.zppSensory[side], reason: (sheet) => sensoryZoneReason(sheet, side) };
    case 'zppMotor':
      return { pick: (found) => found.zppMotor[side], reason: (sheet) => motorZoneReason(sheet, side) };
  }
}

/** The results of a classification, in the order in which they are explained. */
export const resultNames: readonly ResultName[] = [
  ...sides.map((side) => ({ result: 'sensoryLevel', side }) as const),
  ...sides.map((side) => ({ result: 'motorLevel', side }) as const),
  { result: 'nli' },
  { result: 'completeness' },
  { result: 'ais' },
  ...sides.map((side) => ({ result: 'zppSensory', side }) as const),
  ...sides.map((side) => ({ result: 'zppMotor', side }) as const),
];

/** The value of one result. */
export function resultOf(found: Classification, name: ResultName): Determined<string> {
  return explained(name).pick(found);
}

function explainOn(sheet: Sheet, open: () => readonly OpenCell[], name: ResultName): TraceStep {
  const { pick, reason } = explained(name);
  const found = pick(sheet.found);
  const { because, cells } =
    found.values.length > 1 ? openReason(sheet, narrowingCells(open(), found, pick), open(), name.result) : reason(sheet);
  const tagged = found.tagged ? ' Cells tagged for another condition change this result.' : '';
  return { ...name, value: found.values.join(', '), because: because + tagged, cells: [...new Set(cells)] };
}

/**
 * Why one result of `classify` came out, as in `explain`. Quick where the result has one value.
 *
 * @throws UnreadableCellError when a cell holds nothing the sheet allows; check with `validateExam` first.
 */
export function explainResult(exam: Exam, name: ResultName): TraceStep {
  return explainOn(readSheet(exam), () => openCells(exam), name);
}

/**
 * Why each result of `classify` came out: one step for each level, the completeness, the grade and each zone, in plain
 * words with the deciding cells. A result with several possible values names the open cells that could narrow it, which takes
 * much longer than `classify`: one classification for every score of every open cell.
 *
 * @throws UnreadableCellError when a cell holds nothing the sheet allows; check with `validateExam` first.
 */
export function explain(exam: Exam): TraceStep[] {
  const sheet = readSheet(exam);
  let found: readonly OpenCell[] | undefined;
  const open = () => (found ??= openCells(exam));
  return resultNames.map((name) => explainOn(sheet, open, name));
}
