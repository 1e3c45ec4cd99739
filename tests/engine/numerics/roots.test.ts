import { describe, expect, it } from 'vitest';
import { findRoot } from '../../../src/engine/numerics/roots';

/** Roots known in closed form, or by their printed digits (named). */
const cases: readonly [name: string, f: (x: number) => number, low: number, high: number, root: number][] = [
  ['√2', (x) => x * x - 2, 0, 2, Math.SQRT2],
  // Brent (1973) and others print x³ − 2x − 5 = 0 (Wallis): 2.094 551 481 542 326 59 (from memory).
  ['Wallis', (x) => x ** 3 - 2 * x - 5, 2, 3, 2.0945514815423265],
  // Dottie number, OEIS A003957: 0.739 085 133 215 160 641 655 (from memory).
  ['cos x = x', (x) => Math.cos(x) - x, 0, 1, 0.7390851332151607],
  ['e^-x = 1e-8', (x) => Math.exp(-x) - 1e-8, 0, 100, 8 * Math.LN10],
  ['a root at an end', (x) => x - 3, 3, 9, 3],
  ['ends the wrong way round', (x) => x * x - 2, 2, 0, Math.SQRT2],
  ['a flat root', (x) => x ** 9, -1, 1.5, 0],
  ['very small values', (x) => 1e-200 * (x - 0.1), -1, 1.5, 0.1],
  ['a very wide bracket', (x) => Math.sqrt(x) - 3e5, 0, 1e12, 9e10],
  // Colebrook (1939) for a smooth tube at Re = 1e5, x = 1/√f: root by mpmath 1.3.0.
  ['Colebrook', (x) => x - 2 * Math.log10(1e5 / (2.51 * x)), 1, 50, 7.455678242402973],
];

describe('a root in a bracket', () => {
  it.each(cases)('%s', (_, f, low, high, root) => {
    const found = findRoot(f, low, high);
    expect(found).toMatchObject({ converged: true, reason: 'converged' });
    expect(Math.abs(found.root - root)).toBeLessThanOrEqual(4e-15 * Math.max(1, Math.abs(root)));
    expect(found.evaluations).toBeGreaterThan(0);
    expect(found.iterations).toBeLessThan(200);
  });

  it('needs a change of sign', () => {
    expect(findRoot((x) => x * x + 1, 0, 5)).toMatchObject({
      converged: false,
      reason: 'no sign change',
      evaluations: 2,
    });
  });

  it('is not taken where the function jumps or has a pole', () => {
    expect(findRoot((x) => (x < 0.3 ? -1 : 1), -1, 2)).toMatchObject({ converged: false, reason: 'jump' });
    expect(findRoot((x) => 1 / (x - 0.3), -1, 2)).toMatchObject({ converged: false, reason: 'jump' });
    expect(findRoot(Math.tan, 1, 2)).toMatchObject({ converged: false, reason: 'jump' });
  });

  it('ends where the function has no value', () => {
    expect(findRoot((x) => (x < 0 ? undefined : x - 1), -1, 2)).toMatchObject({ converged: false, reason: 'no value' });
    expect(findRoot((x) => (Math.abs(x) < 0.5 ? undefined : x), -1, 2)).toMatchObject({
      converged: false,
      reason: 'no value',
    });
  });
});
