/** One line of the table of a model. */

import { normalMultiplier } from '../distributions/normal.ts';
import { tMultiplier } from '../distributions/student-t.ts';
import type { Interval, TestFigures } from '../result.ts';
import { tFigures, zFigures } from '../test-figures.ts';

export interface Coefficient {
  readonly name: string;
  readonly estimate: number;
  readonly standardError: number;
  readonly interval: Interval;
  /** Absent where the model rests on too few participants to show p, or where there is no error to test against. */
  readonly test?: TestFigures;
}

export const interceptName = '(Intercept)';

/** Participants (or events) per coefficient that a model needs before its p-values are shown. */
export const neededPerCoefficient = 10;

export interface Uncertain {
  readonly name: string;
  readonly estimate: number;
  readonly standardError: number;
}

/** Interval and test by t; the test only when `tested`. */
export function tCoefficient({ name, estimate, standardError }: Uncertain, df: number, level: number, tested: boolean): Coefficient {
  const half = tMultiplier(level, df) * standardError;
  return {
    name,
    estimate,
    standardError,
    interval: { lower: estimate - half, upper: estimate + half, level },
    ...(tested && standardError > 0 ? { test: tFigures(estimate / standardError, df) } : {}),
  };
}

/** Interval and test by the normal distribution (Wald). */
export function waldCoefficient({ name, estimate, standardError }: Uncertain, level: number): Coefficient & { readonly test: TestFigures } {
  const half = normalMultiplier(level) * standardError;
  return {
    name,
    estimate,
    standardError,
    interval: { lower: estimate - half, upper: estimate + half, level },
    test: zFigures(estimate / standardError),
  };
}
