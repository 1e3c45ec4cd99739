/** What a bracketed search found, and why it stopped. */
export interface RootResult {
  converged: boolean;
  root: number;
  residual: number;
  iterations: number;
  evaluations: number;
  reason: 'converged' | 'no sign change' | 'no value' | 'too many iterations';
}

const mostIterations = 200;
const relativeTolerance = 4 * Number.EPSILON;

/**
 * Root of a continuous function between two ends of opposite sign.
 * Brent, R. P. (1973): Algorithms for Minimization without Derivatives, ch. 4 (zeroin).
 * `evaluate` answers undefined where the function has no value.
 */
export function findRoot(evaluate: (x: number) => number | undefined, low: number, high: number): RootResult {
  let [a, b] = [low, high];
  let fa = evaluate(a);
  let fb = evaluate(b);
  let evaluations = 2;
  const stop = (reason: RootResult['reason'], iterations: number): RootResult => ({
    converged: reason === 'converged',
    root: b,
    residual: fb ?? NaN,
    iterations,
    evaluations,
    reason,
  });
  if (fa === undefined || fb === undefined) return stop('no value', 0);
  if (fa === 0) {
    b = a;
    fb = 0;
    return stop('converged', 0);
  }
  if (fb !== 0 && fa > 0 === fb > 0) return stop('no sign change', 0);
  let c = a;
  let fc = fa;
  let step = b - a;
  let before = step;
  for (let iterations = 1; iterations <= mostIterations; iterations += 1) {
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, b, c] = [b, c, b];
      [fa, fb, fc] = [fb, fc, fb];
    }
    const tolerance = relativeTolerance * Math.abs(b) + Number.MIN_VALUE;
    const half = 0.5 * (c - b);
    if (fb === 0 || Math.abs(half) <= tolerance) return stop('converged', iterations);
    if (Math.abs(before) < tolerance || Math.abs(fa) <= Math.abs(fb)) {
      step = half;
      before = half;
    } else {
      // Inverse quadratic interpolation, or the secant when two points coincide.
      const s: number = fb / fa;
      let p: number;
      let q: number;
      if (a === c) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const t = fa / fc;
        const r = fb / fc;
        p = s * (2 * half * t * (t - r) - (b - a) * (r - 1));
        q = (t - 1) * (r - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      else p = -p;
      const good = 2 * p < Math.min(3 * half * q - Math.abs(tolerance * q), Math.abs(before * q));
      before = good ? step : half;
      step = good ? p / q : half;
    }
    a = b;
    fa = fb;
    b += Math.abs(step) > tolerance ? step : half > 0 ? tolerance : -tolerance;
    fb = evaluate(b);
    evaluations += 1;
    if (fb === undefined) return stop('no value', iterations);
    if (fb > 0 === fc > 0) {
      c = a;
      fc = fa;
      step = b - a;
      before = step;
    }
  }
  return stop('too many iterations', mostIterations);
}
