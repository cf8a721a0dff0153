/** Logarithm of the gamma function and its Stirling error, to about 15 digits. */

/** ln(2 pi)/2. */
export const halfLogTwoPi = 0.9189385332046728;
const eulerGamma = 0.5772156649015329;

/** zeta(k) - 1 for k = 2, 3, …: Abramowitz & Stegun (1964) table 23.3, computed here to 20 digits with mpmath. */
const zetaMinusOne = [
  0.6449340668482264, 0.2020569031595943, 0.08232323371113819, 0.03692775514336993, 0.01734306198444914, 0.008349277381922827,
  0.00407735619794434, 0.0020083928260822143, 0.0009945751278180853, 0.0004941886041194645, 0.0002460865533080483, 0.00012271334757848915,
  6.124813505870483e-5, 3.058823630702049e-5, 1.528225940865187e-5, 7.637197637899763e-6, 3.81729326499984e-6, 1.908212716553939e-6,
  9.539620338727962e-7, 4.769329867878064e-7, 2.38450502727733e-7, 1.1921992596531106e-7, 5.960818905125948e-8, 2.980350351465228e-8,
  1.4901554828365043e-8, 7.45071178983543e-9, 3.725334024788457e-9, 1.862659723513049e-9,
] as const;

/** ln Gamma(1 + x) + ln(1 + x) for |x| <= 1/2: Abramowitz & Stegun 6.1.33. */
function logGammaOnePlusShifted(x: number): number {
  let sum = 0;
  for (let i = zetaMinusOne.length - 1; i >= 0; i--) sum = sum * -x + (zetaMinusOne[i] as number) / (i + 2);
  return x * (1 - eulerGamma) + x * x * sum;
}

/** ln Gamma(1 + x) for -1/2 <= x <= 1/2, with full relative accuracy near 0. */
export function logGammaOnePlus(x: number): number {
  return logGammaOnePlusShifted(x) - Math.log1p(x);
}

/** ln Gamma(x), x > 0; Infinity where it leaves the range of a double. */
export function logGamma(x: number): number {
  if (!(x > 0)) throw new RangeError('The gamma function is used for positive numbers only.');
  if (x > 1e300) return (Math.log(x) - 1) * x;
  if (x < 0.5) return logGammaOnePlus(x) - Math.log(x);
  if (x <= 1.5) return logGammaOnePlus(x - 1);
  if (x >= 10) return (x - 0.5) * Math.log(x) - x + halfLogTwoPi + stirlingError(x);
  let product = 1;
  let rest = x;
  while (rest > 2.5) {
    rest -= 1;
    product *= rest;
  }
  return Math.log(product) + logGammaOnePlusShifted(rest - 2);
}

/**
 * ln Gamma(x + 1) - [(x + 1/2) ln x - x + ln(2 pi)/2], x > 0: what Stirling's formula leaves out.
 * Asymptotic series (Abramowitz & Stegun 6.1.42) from 10 upwards, recurrence below.
 */
export function stirlingError(x: number): number {
  let added = 0;
  let at = x;
  while (at < 10) {
    added += (at + 0.5) * Math.log1p(1 / at) - 1;
    at += 1;
  }
  const s = 1 / (at * at);
  const series =
    (1 / 12 - s * (1 / 360 - s * (1 / 1260 - s * (1 / 1680 - s * (1 / 1188 - s * (691 / 360360 - s * (1 / 156 - (s * 3617) / 122400))))))) /
    at;
  return added + series;
}

/** ln B(a, b), a and b > 0, up to 1e300. */
export function logBeta(a: number, b: number): number {
  if (Math.max(a, b) > 1e300) throw new RangeError('The beta function is used for numbers up to 1e300.');
  return logGamma(a) + logGamma(b) - logGamma(a + b);
}
