/** How units stand in the names of columns. */
import type { Variable } from './types.ts';

/** Other spellings of the units that the dictionary stores or accepts. */
export const unitSpellings: Readonly<Record<string, readonly string[]>> = {
  'm/s': ['mps', 'm/sec', 'm per sec', 'ms-1'],
  'km/h': ['kph', 'km/hr'],
  mph: ['mi/h', 'miles/h'],
  m: ['metre', 'metres', 'meter', 'meters'],
  ft: ['foot', 'feet'],
  km: ['kilometre', 'kilometres', 'kilometer', 'kilometers'],
  kg: ['kilogram', 'kilograms'],
  lb: ['lbs', 'pound', 'pounds'],
  s: ['sec', 'secs', 'second', 'seconds'],
  min: ['mins', 'minute', 'minutes'],
  h: ['hr', 'hrs', 'hour', 'hours'],
  '%': ['pct', 'percent'],
  'beats/min': ['bpm'],
};

const inKeys: Readonly<Record<string, string>> = { 'm/s': 'mps', '%': 'pct' };

/** `distance` for `distance_m`; null where no unit stands at the end. A word there is part of the name: `bp_min_minute` is no lowest pressure. */
export function keyWithoutUnit({ key, unit }: Pick<Variable, 'key' | 'unit'>): string | null {
  if (unit === undefined) return null;
  const ending = `_${inKeys[unit] ?? unit}`;
  return key.endsWith(ending) ? key.slice(0, -ending.length) : null;
}
