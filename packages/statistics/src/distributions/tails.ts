/** Both tails of a distribution at one point. Neither is ever formed as 1 minus the other where that would lose digits. */
export interface Tails {
  /** P(X <= x). */
  readonly lower: number;
  /** P(X > x). */
  readonly upper: number;
  /** Natural logarithms: they stay finite where the probability is below the smallest double. */
  readonly logLower: number;
  readonly logUpper: number;
}

export type Tail = 'lower' | 'upper';

/** From the logarithm of the one tail that was computed directly, at best the smaller. */
export function tailsFrom(direct: Tail, logProbability: number): Tails {
  const log = Math.min(0, logProbability);
  const small = Math.exp(log);
  const rest = -Math.expm1(log);
  // log(1 - e^log), by the form that keeps its digits.
  const logRest = log > -Math.LN2 ? Math.log(rest) : Math.log1p(-small);
  return direct === 'lower'
    ? { lower: small, upper: rest, logLower: log, logUpper: logRest }
    : { lower: rest, upper: small, logLower: logRest, logUpper: log };
}

export function mirrored(tails: Tails): Tails {
  return { lower: tails.upper, upper: tails.lower, logLower: tails.logUpper, logUpper: tails.logLower };
}

/** Below, or above, everything the distribution can give. */
export const noneBelow: Tails = { lower: 0, upper: 1, logLower: -Infinity, logUpper: 0 };
export const noneAbove: Tails = mirrored(noneBelow);

export function requireProbability(p: number): void {
  if (!(p >= 0 && p <= 1)) throw new RangeError('A probability lies between 0 and 1.');
}

export function requirePositive(value: number, name: string): void {
  if (!(value > 0)) throw new RangeError(`${name} is a positive number.`);
}

export function requireNumber(value: number, name: string): void {
  if (Number.isNaN(value)) throw new RangeError(`${name} is a number.`);
}
