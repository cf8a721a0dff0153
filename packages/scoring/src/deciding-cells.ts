/** Which open cells keep a result from being determinate. */
import type { CellPlace } from './cell-key.ts';
import { cellPlaces, writtenIn } from './cell-key.ts';
import { motorReadings, readCell, scoresOf, sensoryReadings } from './cell-reading.ts';
import type { Classification, Determined } from './classification.ts';
import { classify } from './classify.ts';
import type { CellKey, Exam } from './exam.ts';

/** A cell with more than one possible score, and the classification with each of them. */
export interface OpenCell {
  readonly key: CellKey;
  readonly written: string;
  readonly settled: readonly Classification[];
}

function withScore(exam: Exam, { side, modality, segment }: CellPlace, score: string): Exam {
  return { ...exam, [side]: { ...exam[side], [modality]: { ...exam[side][modality], [segment]: score } } };
}

function possibleScores(exam: Exam, place: CellPlace): string[] {
  const readings = place.modality === 'motor' ? motorReadings : sensoryReadings;
  const reading = readCell(readings, writtenIn(exam, place));
  if (reading === undefined) return [];
  const scores = scoresOf(reading, false);
  return readings.plain.flatMap((_, score) => (scores & (1 << score) ? [`${score}`] : []));
}

/** Every cell of an exam that can stand for more than one score, each settled to all of them in turn. */
export function openCells(exam: Exam): OpenCell[] {
  const scores = cellPlaces.flatMap((place): OpenCell[] => {
    const possible = possibleScores(exam, place);
    if (possible.length < 2) return [];
    return [{ key: place.key, written: writtenIn(exam, place), settled: possible.map((score) => classify(withScore(exam, place, score))) }];
  });
  const answers = (['vac', 'dap'] as const).flatMap((key): OpenCell[] => {
    if (exam[key] !== 'NT') return [];
    return [{ key, written: 'NT', settled: (['Yes', 'No'] as const).map((answer) => classify({ ...exam, [key]: answer })) }];
  });
  return [...scores, ...answers];
}

/**
 * The open cells of which some score would narrow a result. Empty when only several of them together would.
 */
export function narrowingCells(
  open: readonly OpenCell[],
  result: Determined<string>,
  pick: (found: Classification) => Determined<string>,
): readonly OpenCell[] {
  return open.filter(({ settled }) => settled.some((found) => pick(found).values.length < result.values.length));
}
