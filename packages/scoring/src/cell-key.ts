import type { CellKey, Exam, SideExam } from './exam.ts';
import type { KeyMuscle, Modality, SensorySegment, Side } from './segments.ts';
import { keyMuscles, modalities, sensorySegments, sides } from './segments.ts';

/** Where a score stands on the sheet. */
export interface CellPlace {
  readonly key: CellKey;
  readonly side: Side;
  readonly modality: Modality;
  readonly segment: SensorySegment | KeyMuscle;
}

const modalityPrefix = { lightTouch: 'lt', pinPrick: 'pp', motor: 'm' } as const;

/** The column key of a score, such as `lt_r_c2`. */
export function cellKey(side: Side, modality: Modality, segment: SensorySegment | KeyMuscle): CellKey {
  return `${modalityPrefix[modality]}_${side === 'right' ? 'r' : 'l'}_${segment.toLowerCase()}` as CellKey;
}

function segmentsOf(modality: Modality): readonly (SensorySegment | KeyMuscle)[] {
  return modality === 'motor' ? keyMuscles : sensorySegments;
}

/** The 132 scores of an exam in the order of the sheet: right side first, each side touch, prick, then key muscles. */
export const cellPlaces: readonly CellPlace[] = sides.flatMap((side) =>
  modalities.flatMap((modality) =>
    segmentsOf(modality).map((segment) => ({ key: cellKey(side, modality, segment), side, modality, segment })),
  ),
);

/** What is written in a cell. */
export function writtenIn(exam: Pick<Exam, Side>, place: CellPlace): string {
  const side: SideExam = exam[place.side];
  return place.modality === 'motor' ? side.motor[place.segment as KeyMuscle] : side[place.modality][place.segment as SensorySegment];
}
