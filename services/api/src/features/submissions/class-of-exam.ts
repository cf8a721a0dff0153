/** The class of an exam as the registry stores it beside the cells. Every possible value is kept, so that "not determinable" stays exact. */
import { classify, examFromCells, levelGroups, notDeterminable, validateExam } from '@cairnstep/scoring';
import type { TypedTable } from '@cairnstep/submission-files';

/** In the order of `classColumns`: possible levels, possible grades, level group, upper and lower extremity motor score. */
export type ExamClass = readonly [
  nli: readonly string[],
  ais: readonly string[],
  levelGroup: string,
  uems: number | null,
  lems: number | null,
];

const scoreOrNull = (total: number | 'ND'): number | null => (total === 'ND' ? null : total);

/** @throws Error for an exam that did not pass its checks; only checked exams come here. */
export function classOfExam(table: TypedTable, row: number): ExamClass {
  const read = validateExam(
    examFromCells((key) => {
      const cell = table.column(key).cell(row);
      return cell === null ? undefined : String(cell);
    }),
  );
  if (!('exam' in read)) throw new Error('An exam that cannot be classified reached staging.');
  const { nli, ais, totals } = classify(read.exam);
  const group = levelGroups.assign(nli.values);
  return [nli.values, ais.values, group === notDeterminable ? 'ND' : group, scoreOrNull(totals.uems), scoreOrNull(totals.lems)];
}
