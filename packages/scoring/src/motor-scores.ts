import type { Totals } from './classification.ts';
import type { Exam } from './exam.ts';
import { readSide } from './read-side.ts';
import { totalsOf } from './totals.ts';

export type MotorScores = Pick<Totals, 'uer' | 'uel' | 'uems' | 'ler' | 'lel' | 'lems'>;

/**
 * The motor scores of an exam, in points: each limb side 0 to 25, upper (UEMS) and lower (LEMS) extremities 0 to 50.
 * Examined grades count, tags ignored; a sum with an NT muscle is `ND`. The two are never added into one score.
 * @throws UnreadableCellError when a cell holds nothing the sheet allows.
 */
export function motorScores(exam: Exam): MotorScores {
  const { uer, uel, uems, ler, lel, lems } = totalsOf(readSide(exam.right, 'right', true), readSide(exam.left, 'left', true));
  return { uer, uel, uems, ler, lel, lems };
}
