import type { Total, Totals } from './classification.ts';
import type { Exam } from './exam.ts';
import type { SideFindings } from './read-side.ts';
import { readSide } from './read-side.ts';

function sum(right: Total, left: Total): Total {
  return right === 'ND' || left === 'ND' ? 'ND' : right + left;
}

export function totalsOf(right: SideFindings, left: SideFindings): Totals {
  return {
    uer: right.arm,
    uel: left.arm,
    uems: sum(right.arm, left.arm),
    ler: right.leg,
    lel: left.leg,
    lems: sum(right.leg, left.leg),
    ltr: right.lightTouch,
    ltl: left.lightTouch,
    lt: sum(right.lightTouch, left.lightTouch),
    ppr: right.pinPrick,
    ppl: left.pinPrick,
    pp: sum(right.pinPrick, left.pinPrick),
  };
}

/**
 * The motor and sensory scores of an exam: sums of examined scores, tags ignored. UEMS and LEMS run 0 to 50, each side's
 * 0 to 25; light touch and pin prick 0 to 112, each side's 0 to 56. A sum with an NT cell is `ND`, and so are its parents.
 * The upper and lower scores are never added into one: they measure different things.
 * @throws UnreadableCellError when a cell holds nothing the sheet allows.
 */
export function examTotals(exam: Exam): Totals {
  return totalsOf(readSide(exam.right, 'right', true), readSide(exam.left, 'left', true));
}
