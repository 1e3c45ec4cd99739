import type { Terms } from './coefficients';

/** A sum of terms n·x^i·y^j and its derivatives up to the second order. */
export interface TermSum {
  f: number;
  fx: number;
  fy: number;
  fxx: number;
  fyy: number;
  fxy: number;
}

/** Least and greatest exponents of a set of terms, for their tables of powers. */
const spans = new WeakMap<Terms, { least: [number, number]; most: [number, number] }>();

function spanOf(terms: Terms): { least: [number, number]; most: [number, number] } {
  let span = spans.get(terms);
  if (span === undefined) {
    // Two below the least exponent, since derivatives lower it twice; zero always among them.
    span = {
      least: [Math.min(0, ...terms.i) - 2, Math.min(0, ...terms.j) - 2],
      most: [Math.max(0, ...terms.i), Math.max(0, ...terms.j)],
    };
    spans.set(terms, span);
  }
  return span;
}

const powersOfX = new Float64Array(128);
const powersOfY = new Float64Array(128);

/** Fills a table with base^least … base^most by multiplication. */
function fillPowers(table: Float64Array, base: number, least: number, most: number): void {
  table[-least] = 1;
  for (let power = 1; power <= most; power += 1) table[power - least] = (table[power - 1 - least] ?? 0) * base;
  const reciprocal = 1 / base;
  for (let power = -1; power >= least; power -= 1) table[power - least] = (table[power + 1 - least] ?? 0) * reciprocal;
}

/** Sums the terms at one point; neither x nor y may be zero. */
export function sumTerms(terms: Terms, x: number, y: number): TermSum {
  const { least, most } = spanOf(terms);
  fillPowers(powersOfX, x, least[0], most[0]);
  fillPowers(powersOfY, y, least[1], most[1]);
  const { i, j, n } = terms;
  let [f, fx, fy, fxx, fyy, fxy] = [0, 0, 0, 0, 0, 0];
  for (let at = 0; at < n.length; at += 1) {
    const a = i[at] ?? 0;
    const b = j[at] ?? 0;
    const coefficient = n[at] ?? 0;
    const atX = a - least[0];
    const atY = b - least[1];
    const x0 = powersOfX[atX] ?? 0;
    const x1 = (powersOfX[atX - 1] ?? 0) * a;
    const y0 = (powersOfY[atY] ?? 0) * coefficient;
    const y1 = (powersOfY[atY - 1] ?? 0) * b * coefficient;
    f += x0 * y0;
    fx += x1 * y0;
    fy += x0 * y1;
    fxy += x1 * y1;
    fxx += (powersOfX[atX - 2] ?? 0) * a * (a - 1) * y0;
    fyy += x0 * (powersOfY[atY - 2] ?? 0) * b * (b - 1) * coefficient;
  }
  return { f, fx, fy, fxx, fyy, fxy };
}
