/** Kinds and classes of the dictionary in words. */
import type { Confidence, Direction, Exposure, RuleScope, Scale, Severity, ValueType } from '@cairnstep/dictionary';

export const typeWords: Readonly<Record<ValueType, string>> = {
  code: 'One of a list of codes',
  flag: 'Yes or no',
  integer: 'Whole number',
  decimal: 'Number',
  pseudonym: 'Code that a site made for a participant',
};

export const exposureWords: Readonly<Record<Exposure, string>> = {
  identifier: 'Names a participant. Every export has new codes in its place.',
  'quasi-identifier': 'Could single a person out together with other facts. Exports coarsen it as far as the risk asks for.',
  time: 'A point in time. Exports carry blocks and order instead, unless a decision allows more.',
  measurement: 'A measurement. Exported as it is.',
};

export const directionWords: Readonly<Record<Direction, string>> = {
  higher: 'Higher is better',
  lower: 'Lower is better',
  neutral: 'Neither direction is better in itself',
};

export const scaleWords: Readonly<Record<Scale, string>> = {
  ratio: 'Ratio scale: differences and ratios mean the same everywhere',
  ordinal: 'Ordinal scale: grades have an order, not equal distances',
  count: 'Count of events',
};

export const confidenceWords: Readonly<Record<Confidence, string>> = {
  'looked-up': 'seen in print',
  'from-memory': 'from memory, to be confirmed',
  'paper-looked-up-figure-from-memory': 'paper seen, figure from memory',
};

export const severityWords: Readonly<Record<Severity, string>> = {
  error: 'Error: the month is not accepted until it is mended',
  warning: 'Warning: to be looked at',
};

export const ruleScopeWords: Readonly<Record<RuleScope, string>> = {
  row: 'within a row',
  day: 'within a day of a participant',
  participant: 'over all rows of a participant',
  statistic: 'for every statistic',
};
