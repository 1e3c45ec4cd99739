/** What a bracketed search found, and why it stopped. */
export interface RootResult {
  converged: boolean;
  root: number;
  /** Value of the function at `root`; NaN where it has none. */
  residual: number;
  iterations: number;
  evaluations: number;
  /** `jump`: the sign changes at a pole or a step, where the function has no zero. */
  reason: 'converged' | 'no sign change' | 'no value' | 'jump' | 'too many iterations';
}

const mostIterations = 200;
const relativeTolerance = 4 * Number.EPSILON;
/** A root nearer to zero than this share of the ends is zero. */
const zeroTolerance = 1e-20;
/** A value at the end of the search above this share of those at the ends is no zero. */
const largestResidual = 1e-6;

interface Point {
  x: number;
  f: number;
}

/** The bracket: b is the best point, c lies on the other side of the zero, a is the point before b. */
interface Bracket {
  a: Point;
  b: Point;
  c: Point;
  step: number;
  before: number;
}

function bestFirst(bracket: Bracket): void {
  const { b, c } = bracket;
  if (Math.abs(c.f) >= Math.abs(b.f)) return;
  bracket.a = b;
  bracket.b = c;
  bracket.c = b;
}

/** Numerator and denominator of the step by inverse quadratic interpolation, or the secant where two points coincide. */
function interpolated({ a, b, c }: Bracket, half: number): [p: number, q: number] {
  const s = b.f / a.f;
  if (a.x === c.x) return [2 * half * s, 1 - s];
  const t = a.f / c.f;
  const r = b.f / c.f;
  return [s * (2 * half * t * (t - r) - (b.x - a.x) * (r - 1)), (t - 1) * (r - 1) * (s - 1)];
}

/** Chooses the next step: interpolation while it converges fast enough, else the middle. */
function chooseStep(bracket: Bracket, half: number, tolerance: number): void {
  const { a, b } = bracket;
  if (Math.abs(bracket.before) >= tolerance && Math.abs(a.f) > Math.abs(b.f)) {
    let [p, q] = interpolated(bracket, half);
    if (p > 0) q = -q;
    else p = -p;
    if (2 * p < Math.min(3 * half * q - Math.abs(tolerance * q), Math.abs(bracket.before * q))) {
      bracket.before = bracket.step;
      bracket.step = p / q;
      return;
    }
  }
  bracket.step = half;
  bracket.before = half;
}

/**
 * Root of a continuous function between two ends of opposite sign.
 * Brent, R. P. (1973): Algorithms for Minimization without Derivatives, ch. 4 (zeroin).
 * `evaluate` answers undefined where the function has no value.
 */
export function findRoot(evaluate: (x: number) => number | undefined, low: number, high: number): RootResult {
  const fLow = evaluate(low);
  const fHigh = evaluate(high);
  let evaluations = 2;
  const stop = (reason: RootResult['reason'], { x, f }: Point, iterations: number): RootResult => ({
    converged: reason === 'converged',
    root: x,
    residual: f,
    iterations,
    evaluations,
    reason,
  });
  if (fLow === undefined || fHigh === undefined) return stop('no value', { x: high, f: fHigh ?? NaN }, 0);
  const first = { x: low, f: fLow };
  const last = { x: high, f: fHigh };
  if (fLow === 0) return stop('converged', first, 0);
  if (fHigh === 0) return stop('converged', last, 0);
  if (fLow > 0 === fHigh > 0) return stop('no sign change', last, 0);
  const isZero = ({ f }: Point) =>
    Math.abs(f) < Math.min(Math.abs(fLow), Math.abs(fHigh)) ||
    Math.abs(f) <= largestResidual * Math.max(Math.abs(fLow), Math.abs(fHigh));

  const nearZero = zeroTolerance * (Math.abs(low) + Math.abs(high));
  const bracket: Bracket = { a: first, b: last, c: first, step: high - low, before: high - low };
  for (let iterations = 1; iterations <= mostIterations; iterations += 1) {
    bestFirst(bracket);
    const { b, c } = bracket;
    const tolerance = relativeTolerance * Math.abs(b.x) + nearZero;
    const half = 0.5 * (c.x - b.x);
    if (b.f === 0 || Math.abs(half) <= tolerance) return stop(isZero(b) ? 'converged' : 'jump', b, iterations);
    chooseStep(bracket, half, tolerance);
    const x = b.x + (Math.abs(bracket.step) > tolerance ? bracket.step : half > 0 ? tolerance : -tolerance);
    const f = evaluate(x);
    evaluations += 1;
    if (f === undefined) return stop('no value', { x, f: NaN }, iterations);
    bracket.a = b;
    bracket.b = { x, f };
    if (f > 0 === c.f > 0) {
      bracket.c = b;
      bracket.step = x - b.x;
      bracket.before = bracket.step;
    }
  }
  return stop('too many iterations', bracket.b, mostIterations);
}
