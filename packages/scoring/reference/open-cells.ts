/** Every score an NT or tagged cell can stand for, written out as the standard's tables state it, for enumeration in tests. */
import type { CellPlace } from '../src/cell-key.ts';
import { cellPlaces, writtenIn } from '../src/cell-key.ts';
import type { Exam } from '../src/exam.ts';

const sensoryScores: Readonly<Record<string, readonly string[]>> = {
  NT: ['0', '1', '2'],
  'NT*': ['0', '1'],
  'NT**': ['2'],
  '0*': ['0', '1'],
  '0**': ['2'],
  '1*': ['1'],
  '1**': ['2'],
};

const motorGrades: Readonly<Record<string, readonly string[]>> = {
  NT: ['0', '1', '2', '3', '4', '5'],
  'NT*': ['0', '1', '2', '3', '4'],
  'NT**': ['5'],
  '0*': ['0', '1', '2', '3', '4'],
  '0**': ['5'],
  '1*': ['1', '2', '3', '4'],
  '1**': ['5'],
  '2*': ['2', '3', '4'],
  '2**': ['5'],
  '3*': ['3', '4'],
  '3**': ['5'],
  '4*': ['4'],
  '4**': ['5'],
};

export const sensoryTags = Object.keys(sensoryScores).filter((cell) => cell.endsWith('*'));
export const motorTags = Object.keys(motorGrades).filter((cell) => cell.endsWith('*'));

/** The same exam with one cell written anew. */
export function withCell(exam: Exam, place: CellPlace, written: string): Exam {
  const side = exam[place.side];
  return { ...exam, [place.side]: { ...side, [place.modality]: { ...side[place.modality], [place.segment]: written } } };
}

export function withoutTags(exam: Exam): Exam {
  return cellPlaces.reduce((stripped, place) => {
    const written = writtenIn(stripped, place);
    return written.includes('*') ? withCell(stripped, place, written.replace(/\*+$/, '')) : stripped;
  }, exam);
}

/** Calls `visit` with every determinate exam that an exam with NT or tagged cells can stand for. */
export function eachPossibleExam(exam: Exam, visit: (determinate: Exam) => void): void {
  const open = cellPlaces.find((place) => writtenIn(exam, place).length > 1);
  if (open !== undefined) {
    const scores = (open.modality === 'motor' ? motorGrades : sensoryScores)[writtenIn(exam, open)] as readonly string[];
    for (const score of scores) eachPossibleExam(withCell(exam, open, score), visit);
  } else if (exam.vac === 'NT') {
    for (const vac of ['Yes', 'No'] as const) eachPossibleExam({ ...exam, vac }, visit);
  } else if (exam.dap === 'NT') {
    for (const dap of ['Yes', 'No'] as const) eachPossibleExam({ ...exam, dap }, visit);
  } else {
    visit(exam);
  }
}
