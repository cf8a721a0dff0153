import type { NotDeterminable } from './assign-by-set.ts';
import { notDeterminable } from './assign-by-set.ts';

/** A band of completed years; `from` and `to` belong to it, and the last band has no `to`. */
export interface Band<Id extends string = string> {
  readonly id: Id;
  /** With its edges, as printed. */
  readonly label: string;
  readonly from: number;
  readonly to?: number;
}

/** A versioned set of bands without gaps. A published figure names its id and prints the edges. */
export interface Bands {
  readonly id: string;
  readonly name: string;
  readonly bands: readonly Band[];
}

/** Bands from the first years of each, upwards from 0; `end` closes the last band or leaves it open. */
function defineBands(id: string, name: string, starts: readonly number[], end?: number): Bands {
  const bands = starts.map((from, index): Band => {
    const to = index + 1 < starts.length ? starts[index + 1]! - 1 : end;
    if (to === undefined) return { id: `y${from}plus`, label: `${from} years and over`, from };
    if (from === 0 && to === 0) return { id: 'under1', label: 'Under 1 year', from, to };
    return { id: `y${from}to${to}`, label: `${from}–${to} years`, from, to };
  });
  return { id, name, bands };
}

/** Age at injury, the registry's default. */
export const ageBands = defineBands('age-1', 'Age at injury, in years', [0, 15, 30, 45, 60, 75]);

/** Age at injury by the bands that Hinrichs et al., J Rehabil Med 2016;48:141-8 tested. */
export const societyAgeBands = defineBands('age-2', 'Age at injury, in years', [0, 16, 31, 46, 61, 76]);

export const childAgeBands = defineBands('child-age-1', 'Age at injury of children, in years', [0, 6, 13, 15, 18], 21);

/** Time since injury: the first year, then steps of five years. */
export const timeBands = defineBands('time-1', 'Time since injury, in years', [0, 1, 6, 11, 16, 21, 26, 31, 36, 41, 46, 51]);

const daysPerYear = 365.25;

/** Completed years in a number of days, at 365.25 days a year. */
export function completedYears(days: number): number {
  return Math.floor(days / daysPerYear);
}

/** A number of years, or the least and most it can be. */
export type YearsOrRange = number | readonly [least: number, most: number];

/**
 * The band of an age or time in years. A range falls in a band only as a whole.
 * @throws RangeError for anything that is not a number of years within the bands.
 */
export function bandOf({ bands, name }: Bands, years: YearsOrRange): string | NotDeterminable {
  const [least, most] = typeof years === 'number' ? [years, years] : years;
  const find = (value: number) => bands.find(({ from, to }) => value >= from && (to === undefined || Math.floor(value) <= to));
  const first = find(least);
  const last = find(most);
  if (first === undefined || last === undefined || least > most) throw new RangeError(`${name}: outside the bands.`);
  return first === last ? first.id : notDeterminable;
}

/** The band of age at injury, in years. */
export function ageBand(years: YearsOrRange): string | NotDeterminable {
  return bandOf(ageBands, years);
}

/** The band of time since injury, from days. */
export function timeBand(days: number): string | NotDeterminable {
  return bandOf(timeBands, completedYears(days));
}
