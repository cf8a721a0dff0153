/**
 * Intraclass correlations for the reliability of ratings: every participant rated by the same raters, or measured at the same occasions.
 * The six forms of Shrout and Fleiss with their limits and F tests.
 *
 * (1,·): raters differ from participant to participant. (2,·): raters are a sample of all raters (absolute agreement). (3,·): these
 * raters only (consistency). (·,1): one rating; (·,k): the mean of the k ratings. ICC(2,1) is the one to print for a measure used by many
 * raters.
 *
 * The lower limit of ICC(2,k) is -Infinity where that of ICC(2,1) leaves the mean of k ratings no variance.
 *
 * Source: Shrout & Fleiss (1979) Psychol Bull 86:420-428. Needs at least 5 participants and 2 raters; incomplete participants are left
 * out.
 */

import { completeRows } from '../complete-rows.ts';
import { fQuantile } from '../distributions/f.ts';
import { centredColumn } from '../linear-algebra/centred-column.ts';
import type { Interval, NotEstimable, Provenance, TestFigures } from '../result.ts';
import { notEstimable, reasons, requireLevel } from '../result.ts';
import type { Observation } from '../samples.ts';
import { fFigures, percentText } from '../test-figures.ts';

export type ReliabilityForm = 'ICC(1,1)' | 'ICC(2,1)' | 'ICC(3,1)' | 'ICC(1,k)' | 'ICC(2,k)' | 'ICC(3,k)';

export interface Reliability {
  readonly form: ReliabilityForm;
  /** May be negative, where participants differ less than their ratings do. */
  readonly correlation: number;
  readonly interval: Interval;
  readonly test: TestFigures;
}

export interface RaterAgreement extends Provenance {
  readonly kind: 'rater-agreement';
  readonly raters: number;
  readonly forms: readonly Reliability[];
}

const fewestParticipants = 5;

/** `ratings`: one list for each participant, in the same order of raters. */
export function raterAgreement(ratings: readonly (readonly Observation[])[], level = 0.95): RaterAgreement | NotEstimable {
  requireLevel(level);
  const k = ratings[0]?.length ?? 0;
  if (ratings.some((row) => row.length !== k)) throw new RangeError('Each participant needs a place for each rater.');
  const { columns, n, leftOut } = completeRows(Array.from({ length: k }, (_, j) => ratings.map((row) => row[j])));
  const basis = { n, leftOut };
  if (n === 0) return notEstimable(reasons.noData, basis);
  if (k < 2) return notEstimable('one rating for each participant: no agreement can be seen', basis);
  if (n < fewestParticipants) return notEstimable(`n = ${n}: agreement of raters needs at least ${fewestParticipants} participants`, basis);

  const all = new Float64Array(n * k);
  for (const [j, column] of columns.entries()) all.set(column, j * n);
  const { norm, unit } = centredColumn(all, true);
  if (norm === 0) return notEstimable(reasons.allEqual, basis);
  if (!Number.isFinite(norm)) return notEstimable(reasons.tooLarge, basis);
  // Mean squares in units of the total: only their ratios enter.
  const at = (i: number, j: number): number => unit[j * n + i] as number;
  const people = Array.from({ length: n }, (_, i) => i);
  const raters = Array.from({ length: k }, (_, j) => j);
  const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);
  const ofPerson = people.map((i) => sum(raters.map((j) => at(i, j))) / k);
  const ofRater = raters.map((j) => sum(people.map((i) => at(i, j))) / n);
  const between = (k * sum(ofPerson.map((mean) => mean * mean))) / (n - 1);
  const rater = (n * sum(ofRater.map((mean) => mean * mean))) / (k - 1);
  const within = sum(people.map((i) => sum(raters.map((j) => (at(i, j) - (ofPerson[i] as number)) ** 2)))) / (n * (k - 1));
  const error =
    sum(people.map((i) => sum(raters.map((j) => (at(i, j) - (ofPerson[i] as number) - (ofRater[j] as number)) ** 2)))) /
    ((n - 1) * (k - 1));
  const rounding = (n * k * Number.EPSILON) ** 2;
  if (within < rounding || error < rounding)
    return notEstimable('the raters agree exactly: no interval', basis, within < rounding ? 1 : undefined);
  if (between < rounding) return notEstimable('the participants do not differ', basis);

  const tail = (1 - level) / 2;
  const upperPoint = (df1: number, df2: number): number => fQuantile(tail, df1, df2, 'upper');
  const oneWay = ratioForms(between / within, n - 1, n * (k - 1), k, upperPoint, level);
  const consistency = ratioForms(between / error, n - 1, (n - 1) * (k - 1), k, upperPoint, level);

  const agreement = (between - error) / (between + (k - 1) * error + (k * (rater - error)) / n);
  // Below this the mean of k ratings would have no variance left.
  const lowest = -1 / (k - 1);
  if (agreement <= lowest) return notEstimable('the participants differ less than their ratings do: no reliability to estimate', basis);
  const limits = agreementLimits({ between, rater, error, agreement, n, k }, upperPoint, level);
  const ofMean = (single: number): number => (single <= lowest ? -Infinity : (k * single) / (1 + (k - 1) * single));
  const consistencyTest = fFigures(between / error, n - 1, (n - 1) * (k - 1));
  const oneWayTest = fFigures(between / within, n - 1, n * (k - 1));
  return {
    kind: 'rater-agreement',
    ...basis,
    raters: k,
    forms: [
      { form: 'ICC(1,1)', ...oneWay.single, test: oneWayTest },
      { form: 'ICC(2,1)', correlation: agreement, interval: limits, test: consistencyTest },
      { form: 'ICC(3,1)', ...consistency.single, test: consistencyTest },
      { form: 'ICC(1,k)', ...oneWay.mean, test: oneWayTest },
      {
        form: 'ICC(2,k)',
        correlation: ofMean(agreement),
        interval: { lower: ofMean(limits.lower), upper: ofMean(limits.upper), level },
        test: consistencyTest,
      },
      { form: 'ICC(3,k)', ...consistency.mean, test: consistencyTest },
    ],
    method: `Intraclass correlations of Shrout and Fleiss with their limits (two-sided, ${percentText(level)}) and F tests.`,
    failedAssumptions: n < 30 ? [`reliability from n = ${n}: the limits are wide`] : [],
  };
}

type UpperPoint = (df1: number, df2: number) => number;
type Form = Pick<Reliability, 'correlation' | 'interval'>;

/** Forms (1,·) and (3,·): functions of one F ratio. */
function ratioForms(
  ratio: number,
  df1: number,
  df2: number,
  k: number,
  upperPoint: UpperPoint,
  level: number,
): { single: Form; mean: Form } {
  const single = (f: number): number => (f - 1) / (f + k - 1);
  const mean = (f: number): number => 1 - 1 / f;
  const low = ratio / upperPoint(df1, df2);
  const high = ratio * upperPoint(df2, df1);
  const form = (of: (f: number) => number): Form => ({ correlation: of(ratio), interval: { lower: of(low), upper: of(high), level } });
  return { single: form(single), mean: form(mean) };
}

interface AgreementSquares {
  readonly between: number;
  readonly rater: number;
  readonly error: number;
  readonly agreement: number;
  readonly n: number;
  readonly k: number;
}

/** Limits of ICC(2,1), with the approximate degrees of freedom of the paper. */
function agreementLimits({ between, rater, error, agreement, n, k }: AgreementSquares, upperPoint: UpperPoint, level: number): Interval {
  const ratio = rater / error;
  const rest = n * (1 + (k - 1) * agreement) - k * agreement;
  const df = ((k - 1) * (n - 1) * (k * agreement * ratio + rest) ** 2) / ((n - 1) * k ** 2 * agreement ** 2 * ratio ** 2 + rest ** 2);
  const high = upperPoint(n - 1, df);
  const low = upperPoint(df, n - 1);
  const crossed = k * rater + (k * n - k - n) * error;
  return {
    lower: (n * (between - high * error)) / (high * crossed + n * between),
    upper: (n * (low * between - error)) / (crossed + n * low * between),
    level,
  };
}
