/** An exam laid open for explanation: its findings, its possible outcomes, and its cells in words. */
import { cellKey } from './cell-key.ts';
import type { Classification } from './classification.ts';
import { classify } from './classify.ts';
import type { CellKey, Exam } from './exam.ts';
import type { SideFindings } from './read-side.ts';
import { readSide } from './read-side.ts';
import type { KeyMuscle, SensorySegment, Side } from './segments.ts';
import { sides } from './segments.ts';
import type { SideOutcome } from './side-outcomes.ts';
import { sensoryLevels, sideOutcomes } from './side-outcomes.ts';

export interface Sheet {
  readonly exam: Exam;
  readonly found: Classification;
  readonly findings: Readonly<Record<Side, SideFindings>>;
  readonly outcomes: Readonly<Record<Side, readonly SideOutcome[]>>;
}

/** Why a result came out, and the cells that decided. */
export interface Reason {
  readonly because: string;
  readonly cells: readonly CellKey[];
}

export function readSheet(exam: Exam): Sheet {
  const findings = { right: readSide(exam.right, 'right', false), left: readSide(exam.left, 'left', false) };
  const contractions = exam.vac === 'NT' ? [true, false] : [exam.vac === 'Yes'];
  const outcomesOf = (side: Side) =>
    contractions.flatMap((present) => sideOutcomes(findings[side], sensoryLevels(findings[side]), present));
  return { exam, found: classify(exam), findings, outcomes: { right: outcomesOf('right'), left: outcomesOf('left') } };
}

/** Segment as printed. */
export function segmentName(segment: string): string {
  return segment.replace('_', '-');
}

/** "L4 (grade 3)", "L4 (NT)". */
export function muscleInWords(sheet: Sheet, side: Side, muscle: KeyMuscle): string {
  const written = sheet.exam[side].motor[muscle];
  return `${muscle} (${written.startsWith('NT') ? '' : 'grade '}${written})`;
}

/** "T5 (light touch 1, pin prick 0)". */
export function dermatomeInWords(sheet: Sheet, side: Side, segment: SensorySegment): string {
  const { lightTouch, pinPrick } = sheet.exam[side];
  return `${segmentName(segment)} (light touch ${lightTouch[segment]}, pin prick ${pinPrick[segment]})`;
}

export function dermatomeCells(side: Side, segment: SensorySegment): CellKey[] {
  return [cellKey(side, 'lightTouch', segment), cellKey(side, 'pinPrick', segment)];
}

export const perianalCells: readonly CellKey[] = sides.flatMap((side) => dermatomeCells(side, 'S4_5'));

/** "a", "a and b", "a, b and c". */
export function listed(items: readonly string[], last: 'and' | 'or' = 'and'): string {
  return items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} ${last} ${items.at(-1)}`;
}
