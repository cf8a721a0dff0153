/** Test figures from a statistic whose distribution is known: two-sided p from the tail itself, never as one minus the other. */

import { chiSquareTails } from './distributions/chi-square.ts';
import { fTails } from './distributions/f.ts';
import { normalUpper } from './distributions/normal.ts';
import { tTwoSided } from './distributions/student-t.ts';
import type { TestFigures } from './result.ts';

export function zFigures(z: number): TestFigures {
  return { statisticName: 'z', statistic: z, df: [], p: 2 * normalUpper(Math.abs(z)) };
}

export function tFigures(t: number, df: number): TestFigures {
  return { statisticName: 't', statistic: t, df: [df], p: tTwoSided(t, df) };
}

export function chiSquareFigures(chiSquare: number, df: number): TestFigures {
  return { statisticName: 'chi-square', statistic: chiSquare, df: [df], p: chiSquareTails(chiSquare, df).upper };
}

export function fFigures(f: number, df1: number, df2: number): TestFigures {
  return { statisticName: 'F', statistic: f, df: [df1, df2], p: fTails(f, df1, df2).upper };
}

/** "95%" for 0.95, for the sentence that states the method. */
export function percentText(level: number): string {
  return `${Number((level * 100).toPrecision(10))}%`;
}
