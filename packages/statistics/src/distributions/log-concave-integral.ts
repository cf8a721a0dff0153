/**
 * Integrals of positive functions with a single peak whose logarithm is concave, such as a density times a tail.
 * The peak is found, the range cut where the function has fallen to e^-40 of it, and Gauss-Legendre panels laid over the rest.
 */

const pointsPerPanel = 16;
const fallen = 40;

interface Nodes {
  readonly at: Float64Array;
  readonly weight: Float64Array;
}

/** Nodes and weights on [-1, 1]: roots of the Legendre polynomial by Newton's method. */
function gaussLegendre(points: number): Nodes {
  const at = new Float64Array(points);
  const weight = new Float64Array(points);
  for (let i = 0; i < points; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (points + 0.5));
    let slope = 0;
    for (let round = 0; round < 100; round++) {
      let before = 1;
      let value = x;
      for (let k = 2; k <= points; k++) [before, value] = [value, ((2 * k - 1) * x * value - (k - 1) * before) / k];
      slope = (points * (x * value - before)) / (x * x - 1);
      const step = value / slope;
      x -= step;
      if (Math.abs(step) < 1e-16) break;
    }
    at[i] = x;
    weight[i] = 2 / ((1 - x * x) * slope * slope);
  }
  return { at, weight };
}

const panel = gaussLegendre(pointsPerPanel);

/** Nodes and weights of `panels` equal panels over [from, to]. */
function panelNodes(from: number, to: number, panels: number): Nodes {
  const at = new Float64Array(panels * pointsPerPanel);
  const weight = new Float64Array(panels * pointsPerPanel);
  const half = (to - from) / panels / 2;
  for (let i = 0; i < panels; i++) {
    const centre = from + (2 * i + 1) * half;
    for (let j = 0; j < pointsPerPanel; j++) {
      at[i * pointsPerPanel + j] = centre + half * (panel.at[j] as number);
      weight[i * pointsPerPanel + j] = half * (panel.weight[j] as number);
    }
  }
  return { at, weight };
}

/** Enough halvings to come from the largest double down to the smallest. */
const mostSteps = 1600;

/**
 * Peak of a concave function on [from, to] by golden section; exactness is not needed, only a place near the top. It may lie very close
 * to `from`, so the bracket is held against its distance from there.
 */
function peakOf(log: (x: number) => number, from: number, to: number): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let a = from;
  let b = to;
  let left = b - golden * (b - a);
  let right = a + golden * (b - a);
  let atLeft = log(left);
  let atRight = log(right);
  for (let i = 0; i < mostSteps && b - a > 1e-4 * (b - from); i++) {
    if (atLeft >= atRight) {
      [b, right, atRight] = [right, left, atLeft];
      left = b - golden * (b - a);
      atLeft = log(left);
    } else {
      [a, left, atLeft] = [left, right, atRight];
      right = a + golden * (b - a);
      atRight = log(right);
    }
  }
  return atLeft >= atRight ? left : right;
}

/** Where the function has fallen far enough between the peak and `end`. */
function cut(log: (x: number) => number, peak: number, end: number, floor: number): number {
  if (log(end) >= floor) return end;
  let inside = peak;
  let outside = end;
  for (let i = 0; i < mostSteps && Math.abs(outside - inside) > 0.02 * Math.abs(outside - peak); i++) {
    const middle = (inside + outside) / 2;
    if (log(middle) >= floor) inside = middle;
    else outside = middle;
  }
  return outside;
}

/** The part of [from, to] that matters for the integral. */
function relevantRange(log: (x: number) => number, from: number, to: number): { from: number; to: number; logPeak: number } {
  const peak = peakOf(log, from, to);
  const logPeak = log(peak);
  return { from: cut(log, peak, from, logPeak - fallen), to: cut(log, peak, to, logPeak - fallen), logPeak };
}

/**
 * ln of the integral of exp(log(x)) over [from, to]. `shape` is a cheaper function that falls off at the same places, used for
 * finding the range.
 */
export function logIntegral(log: (x: number) => number, from: number, to: number, shape = log, panels = 6): number {
  const range = relevantRange(shape, from, to);
  if (range.logPeak === -Infinity) return -Infinity;
  const nodes = panelNodes(range.from, range.to, panels);
  let sum = 0;
  for (let i = 0; i < nodes.at.length; i++) sum += (nodes.weight[i] as number) * Math.exp(log(nodes.at[i] as number) - range.logPeak);
  return range.logPeak + Math.log(sum);
}
