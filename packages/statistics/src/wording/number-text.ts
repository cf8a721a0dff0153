/** Figures as they are printed on a screen or in a report (SAMPL guidelines: Lang & Altman 2013, in Science Editors' Handbook). */

import type { Interval, TestFigures } from '../result.ts';
import { percentText } from '../test-figures.ts';
import { fixedDecimals } from './rounding.ts';

/** U+2212: as wide as a plus sign, and no line breaks after it. */
const minus = '\u2212';

/** "0.43", "−0.05" with a true minus sign. */
export function numberText(value: number, decimals: number): string {
  return fixedDecimals(value, decimals).replace('-', minus);
}

/** Means, medians, quantiles and SDs carry one decimal more than the data. */
export function summaryDecimals(dataDecimals: number): number {
  if (!(Number.isInteger(dataDecimals) && dataDecimals >= 0)) throw new RangeError('The number of decimals is a whole number from 0 up.');
  return dataDecimals + 1;
}

/** "0.43 (SD 0.12)". */
export function meanSdText(mean: number, sd: number, decimals: number): string {
  return `${numberText(mean, decimals)} (SD ${numberText(sd, decimals)})`;
}

/** "0.21 (Q1 to Q3: 0.10 to 0.34)". */
export function medianQuartilesText(
  median: number,
  quartiles: { readonly lower: number; readonly upper: number },
  decimals: number,
): string {
  return `${numberText(median, decimals)} (Q1 to Q3: ${numberText(quartiles.lower, decimals)} to ${numberText(quartiles.upper, decimals)})`;
}

/** A limit that is infinite has its word: "0.05 to unlimited". */
export function limitText(limit: number, decimals: number): string {
  return Number.isFinite(limit) ? numberText(limit, decimals) : 'unlimited';
}

/** "0.05 to 0.33". */
export function rangeText(lower: number, upper: number, decimals: number): string {
  return `${limitText(lower, decimals)} to ${limitText(upper, decimals)}`;
}

/** "95% CI 0.05 to 0.33", with the decimals of its estimate. */
export function intervalText({ lower, upper, level }: Interval, decimals: number): string {
  return `${percentText(level)} CI ${rangeText(lower, upper, decimals)}`;
}

/** "0.19 (95% CI 0.05 to 0.33)". */
export function estimateText(estimate: number, interval: Interval, decimals: number): string {
  return `${numberText(estimate, decimals)} (${intervalText(interval, decimals)})`;
}

/** "12 of 41 (29%)": no decimals below 100, one from there on. The percent never stands without its count; of nobody there is none. */
export function shareText(count: number, total: number): string {
  for (const value of [count, total]) {
    if (!(Number.isSafeInteger(value) && value >= 0)) throw new RangeError('Counts are whole numbers from 0 up.');
  }
  if (count > total) throw new RangeError('A part is at most the whole.');
  return total === 0 ? '0 of 0' : `${count} of ${total} (${percentOfText(count, total)})`;
}

/** "29%", "25.2%": for a table whose heading gives n. From 20 people up only; below that print `shareText`. */
export function percentOfText(count: number, total: number): string {
  return `${numberText((100 * count) / total, total < 100 ? 0 : 1)}%`;
}

/** "n = 41, 6 missing, 2 unable": what a figure was computed from, and what was left out. */
export function basisText(n: number, leftOut: { readonly missing: number; readonly nonFinite: number; readonly unable: number }): string {
  const parts = [
    [leftOut.missing, 'missing'],
    [leftOut.unable, 'unable'],
    [leftOut.nonFinite, 'not a number'],
  ] as const;
  return [`n = ${n}`, ...parts.flatMap(([count, word]) => (count > 0 ? [`${count} ${word}`] : []))].join(', ');
}

const symbols: Readonly<Record<TestFigures['statisticName'], string>> = {
  t: 't',
  F: 'F',
  z: 'z',
  'chi-square': 'χ²',
  V: 'V',
  U: 'U',
  J: 'J',
  H: 'H',
  r: 'r',
  rho: 'ρ',
  tau: 'τ',
  count: 'count',
  'table probability': 'table probability',
};

/** Counts of ranks or events: whole or half numbers by nature, so two decimals would pretend. */
const counted: readonly TestFigures['statisticName'][] = ['V', 'U', 'J', 'count'];

/** "t(17.8) = −1.86", "F(2, 27) = 4.85", "V = 40": two decimals, whole degrees of freedom without, fractional ones with one decimal. */
export function statisticText({ statisticName, statistic, df }: TestFigures): string {
  const freedom = df.map((value) => numberText(value, Number.isInteger(value) ? 0 : 1)).join(', ');
  const decimals = counted.includes(statisticName) ? (Number.isInteger(statistic) ? 0 : 1) : 2;
  return `${symbols[statisticName]}${freedom === '' ? '' : `(${freedom})`} = ${numberText(statistic, decimals)}`;
}
