/**
 * u - ln(1 + u), u > -1, without cancellation near 0. The deviance terms of Loader (2000) "Fast and accurate computation of
 * binomial probabilities" are multiples of it: a ln(a/x) + x - a = a (u - ln(1 + u)) with u = (x - a)/a.
 */
export function excessOverLog(u: number): number {
  if (Math.abs(u) > 0.4) return u - Math.log1p(u);
  // ln(1 + u) = 2 artanh r, so the leading terms can be taken off exactly.
  const r = u / (2 + u);
  const r2 = r * r;
  let sum = 0;
  for (let k = 33; k >= 3; k -= 2) sum = sum * r2 + 1 / k;
  return r * (u - 2 * r2 * sum);
}

/** The same given also 1 + u = x/a, which is the better source of the logarithm far from u = 0. */
export function excessOverLogOfRatio(u: number, onePlusU: number): number {
  return u < -0.4 || u > 0.4 ? u - Math.log(onePlusU) : excessOverLog(u);
}
