import type { Total, Totals } from './classification.ts';
import type { SideFindings } from './read-side.ts';

function sum(right: Total, left: Total): Total {
  return right === 'ND' || left === 'ND' ? 'ND' : right + left;
}

/** Sums of both sides. A sum with an NT cell is `ND`, and so are its parents. */
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
