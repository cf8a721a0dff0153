/**
 * How far the functions of this package are from published figures: one row per method and source, worked out by running every reference
 * check. The Methods page prints a written copy of it; the unit tests hold each check to its tolerance.
 */

import type { EvidenceRow } from '../src/index.ts';
import type { Disagreement, ReferenceCheck } from './agreement.ts';
import { agreement } from './agreement.ts';
import { anovaChecks } from './analysis-of-variance.checks.ts';
import { correlationChecks } from './correlations.checks.ts';
import { descriptionChecks } from './description.checks.ts';
import { distributionChecks } from './distributions.checks.ts';
import { effectSizeChecks } from './effect-sizes.checks.ts';
import { meanChecks } from './means.checks.ts';
import { modelChecks } from './models.checks.ts';
import { multiplicityChecks } from './multiplicity.checks.ts';
import { nistRegressionChecks } from './nist-linear-regression.checks.ts';
import { pairedCategoryChecks } from './paired-categories.checks.ts';
import { proportionChecks } from './proportions.checks.ts';
import { rankTestChecks } from './rank-tests.checks.ts';
import { resamplingChecks } from './resampling.checks.ts';
import { siteChecks } from './sites.checks.ts';
import { survivalChecks } from './survival.checks.ts';
import { tableChecks } from './tables.checks.ts';

/** In the order of the Methods page. */
export const referenceChecks: readonly ReferenceCheck[] = [
  ...descriptionChecks,
  ...meanChecks,
  ...rankTestChecks,
  ...anovaChecks,
  ...multiplicityChecks,
  ...effectSizeChecks,
  ...proportionChecks,
  ...tableChecks,
  ...pairedCategoryChecks,
  ...correlationChecks,
  ...modelChecks,
  ...nistRegressionChecks,
  ...survivalChecks,
  ...siteChecks,
  ...resamplingChecks,
  ...distributionChecks,
];

export interface CheckedEvidenceRow extends EvidenceRow {
  /** Figures outside the tolerance of their case: a gate that failed. */
  readonly disagreements: readonly (Disagreement & { readonly id: string })[];
}

/** What stands before the data set: up to the first semicolon that is not inside parentheses. */
function sourceWithoutDataSet(source: string): string {
  return source.replace(/;(?![^(]*\)).*$/s, '');
}

export function evidence(checks: readonly ReferenceCheck[] = referenceChecks): CheckedEvidenceRow[] {
  const rows = new Map<string, CheckedEvidenceRow>();
  for (const check of checks) {
    const source = sourceWithoutDataSet(check.source);
    const key = `${check.method}\n${source}`;
    const { compared, disagreements, worstRelativeError } = agreement(check);
    const row = rows.get(key) ?? { method: check.method, source, cases: 0, figures: 0, worstRelativeError: 0, disagreements: [] };
    rows.set(key, {
      ...row,
      cases: row.cases + 1,
      figures: row.figures + compared,
      worstRelativeError: Math.max(row.worstRelativeError, worstRelativeError),
      disagreements: [...row.disagreements, ...disagreements.map((found) => ({ id: check.id, ...found }))],
    });
  }
  return [...rows.values()];
}
