/** Columns of a model as callers give them, and the columns made from labels and products. */

import type { Label } from '../complete-rows.ts';
import type { Observation } from '../samples.ts';
import { fitness } from '../samples.ts';

export interface Predictor {
  readonly name: string;
  readonly values: ArrayLike<Observation>;
}

/**
 * One column of 0 and 1 for each level but the first, which is the reference (treatment coding). A missing label stays missing; a label
 * that is not among the levels is a mistake of the caller.
 */
export function indicatorPredictors(name: string, labels: ArrayLike<Label>, levels: readonly string[]): Predictor[] {
  const known = new Set(levels);
  const texts = Array.from(labels, (label) => (label === null || label === undefined || label === '' ? undefined : String(label)));
  if (texts.some((text) => text !== undefined && !known.has(text))) throw new RangeError(`A label of ${name} is not among its levels.`);
  return levels.slice(1).map((level) => ({
    name: `${name}: ${level}`,
    values: texts.map((text) => (text === undefined ? null : text === level ? 1 : 0)),
  }));
}

/** The product of two columns (an interaction); what is not usable in either stays so. */
export function productPredictor(first: Predictor, second: Predictor): Predictor {
  if (first.values.length !== second.values.length) throw new RangeError('The columns of a model need the same length.');
  return {
    name: `${first.name} x ${second.name}`,
    values: Array.from({ length: first.values.length }, (_, i) => {
      const [a, b] = [first.values[i], second.values[i]];
      if (fitness(a) !== 'usable') return a;
      return fitness(b) === 'usable' ? (a as number) * (b as number) : b;
    }),
  };
}
