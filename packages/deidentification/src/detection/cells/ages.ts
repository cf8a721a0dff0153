/** Ages of 90 and more, which Safe Harbor makes one class. */
import { boundedPattern } from '../bounded-pattern.ts';
import type { ColumnTraits } from '../column-traits.ts';
import type { CellScan, Judgement } from './cell-scan.ts';

const statedAge = boundedPattern(
  '(?<![\\p{L}\\d.,-])(\\d{2,3})(?:\\.\\d)?[ -]?(?:years?|yrs?|y|jahre?|ans|años|jaar)[ ./-]{0,2}(?:of age|old|o(?!\\p{L})|alt|oud)|(?<!\\p{L})(?:aged|age:?|alter:?) ?(\\d{2,3})(?![\\d+%./]|-\\d)',
  'i',
);
const bareAge = boundedPattern('^(\\d{2,3})(?:[.,]\\d{1,3})?(?: ?(?:years?|yrs?|y))?$', 'i');

/** Nobody on record has reached 130. */
const judge = (_: string, [one, other]: readonly (string | undefined)[]): Judgement => {
  const age = Number(one ?? other);
  return age >= 90 && age < 130 ? 'block' : 'not-it';
};

export function detectAges(scan: CellScan, { isAge }: ColumnTraits): void {
  scan.take('age_over_89', statedAge, judge);
  if (isAge) scan.take('age_over_89', bareAge, judge);
}
