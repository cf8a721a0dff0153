/** Exams made for a wanted level and grade, in the dictionary's cells. */
import { dermatomes, keyMuscles, segmentKey } from '../../packages/dictionary/src/index.ts';
import type { Overrides } from './rows.ts';

/** Strength below the level: what makes the grade (motor complete, motor incomplete below and at useful strength). */
const strengthBelow = { A: 0, B: 0, C: 2, D: 3 } as const;

/**
 * Normal down to the level on both sides. Below it: nothing (A), altered sensation down to S4-5 (B, C, D), and in C and D movement
 * of the legs far enough below the level to make the injury motor incomplete.
 */
export function examCells(level: string, grade: keyof typeof strengthBelow): Overrides {
  const last = dermatomes.findIndex((dermatome) => dermatome === level);
  const cells: Record<string, string> = { vac: 'no', dap: grade === 'A' ? 'no' : 'yes', recorded_ais: grade, recorded_nli: level };
  for (const side of ['r', 'l']) {
    dermatomes.forEach((dermatome, index) => {
      for (const modality of ['lt', 'pp'])
        cells[`${modality}_${side}_${segmentKey(dermatome)}`] = index <= last ? '2' : grade === 'A' ? '0' : '1';
    });
    for (const { segment } of keyMuscles) {
      const at = dermatomes.findIndex((dermatome) => dermatome === segment);
      cells[`m_${side}_${segmentKey(segment)}`] = String(at <= last ? 5 : strengthBelow[grade]);
    }
  }
  return cells;
}
