/** Digits agreed with the certified data sets of NIST, set by set: rounding of the data to binary limits what any program can reach. */

import type { CertifiedFigure, CertifiedSet } from '../src/index.ts';
import type { ReferenceCheck, Tolerance } from './agreement.ts';
import { agreement, digitsOfError } from './agreement.ts';
import { referenceChecks } from './evidence.ts';

const prefix = 'NIST ';

/** Members of the expected values as the page names them. Degrees of freedom are whole numbers and tell nothing. */
const figureNames: Readonly<Record<string, string | null>> = {
  mean: 'mean',
  sd: 'SD',
  coefficients: 'coefficients',
  standardErrors: 'standard errors',
  residualSd: 'residual SD',
  residual_sd: 'residual SD',
  rSquared: 'R²',
  r2: 'R²',
  residualSumOfSquares: 'residual sum of squares',
  ss_between: 'sum of squares between',
  ss_within: 'sum of squares within',
  ms_between: 'mean square between',
  ms_within: 'mean square within',
  F: 'F',
  residualDf: null,
  df_between: null,
  df_within: null,
};

function digitsAsked({ rel, fields }: Tolerance, member: string): number {
  return Math.round(-Math.log10(fields?.[member]?.rel ?? rel ?? 1));
}

function figuresOf(check: ReferenceCheck): CertifiedFigure[] {
  return Object.entries(agreement(check).worstByMember).flatMap(([member, error]) => {
    const name = figureNames[member];
    if (name === undefined) throw new Error(`The certified figure "${member}" of ${check.id} has no name yet.`);
    return name === null ? [] : [{ name, digits: digitsOfError(error), asked: digitsAsked(check.tolerance, member) }];
  });
}

export function certifiedSets(checks: readonly ReferenceCheck[] = referenceChecks): CertifiedSet[] {
  return checks
    .filter(({ id }) => id.startsWith(prefix))
    .map((check) => ({ method: check.method, set: check.id.slice(prefix.length), figures: figuresOf(check) }));
}
