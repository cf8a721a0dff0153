/**
 * Root of a continuous function between two points where its sign differs.
 * Brent (1973) Algorithms for Minimization without Derivatives, chapter 4: inverse quadratic steps, secant steps and bisection.
 * `tolerance` is absolute in x; the answer is also never worse than a few units in the last place of x.
 */
export function findRoot(f: (x: number) => number, lower: number, upper: number, tolerance = 0): number {
  let a = lower;
  let b = upper;
  let fa = f(a);
  let fb = f(b);
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (!(fa < 0 !== fb < 0) || Number.isNaN(fa + fb)) throw new RangeError('A root is sought where the function changes its sign.');
  let c = a;
  let fc = fa;
  let step = b - a;
  let stepBefore = step;
  for (let i = 0; i < 300; i++) {
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, b, c] = [b, c, b];
      [fa, fb, fc] = [fb, fc, fb];
    }
    const smallest = 2 * Number.EPSILON * Math.abs(b) + tolerance / 2;
    const half = (c - b) / 2;
    if (Math.abs(half) <= smallest || fb === 0) return b;
    if (Math.abs(stepBefore) < smallest || Math.abs(fa) <= Math.abs(fb)) {
      step = stepBefore = half;
    } else {
      const s = fb / fa;
      let p: number;
      let q: number;
      if (a === c) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const r = fb / fc;
        q = fa / fc;
        p = s * (2 * half * q * (q - r) - (b - a) * (r - 1));
        q = (q - 1) * (r - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      else p = -p;
      const accept = 2 * p < Math.min(3 * half * q - Math.abs(smallest * q), Math.abs(stepBefore * q));
      stepBefore = accept ? step : half;
      step = accept ? p / q : half;
    }
    a = b;
    fa = fb;
    b += Math.abs(step) > smallest ? step : Math.sign(half) * smallest;
    fb = f(b);
    if (fb > 0 === fc > 0) {
      c = a;
      fc = fa;
      step = stepBefore = b - a;
    }
  }
  return b;
}

/**
 * Root of an increasing function, looked for outwards from `start` with doubling steps and then by `findRoot`.
 * A root beyond the numbers a double can hold is answered by the last bound tried.
 */
export function findRootOfIncreasing(f: (x: number) => number, start: number, firstStep: number): number {
  let inner = start;
  const atStart = f(start);
  if (atStart === 0) return start;
  const direction = atStart < 0 ? 1 : -1;
  let step = firstStep * direction;
  for (let i = 0; i < 1100; i++) {
    const outer = inner + step;
    if (!Number.isFinite(outer)) return inner;
    const value = f(outer);
    if (value === 0) return outer;
    if (value > 0 === direction > 0) return findRoot(f, Math.min(inner, outer), Math.max(inner, outer));
    inner = outer;
    step *= 2;
  }
  return inner;
}
