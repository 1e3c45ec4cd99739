/**
 * Error function. |x| < 3: Maclaurin series with all terms of one sign (Abramowitz & Stegun 7.1.6);
 * beyond: one minus `erfc`.
 */
export function erf(x: number): number {
  const size = Math.abs(x);
  if (size >= 3) return Math.sign(x) * (1 - erfc(size));
  let term = size;
  let sum = size;
  for (let n = 1; n < 200 && term > sum * 1e-17; n += 1) {
    term *= (2 * size * size) / (2 * n + 1);
    sum += term;
  }
  return Math.sign(x) * (2 / Math.sqrt(Math.PI)) * Math.exp(-size * size) * sum;
}

/** Complementary error function; for x ≥ 3 by the continued fraction of Abramowitz & Stegun 7.1.14. */
export function erfc(x: number): number {
  if (x < 3) return 1 - erf(x);
  let fraction = 0;
  for (let n = 120; n >= 1; n -= 1) fraction = n / 2 / (x + fraction);
  return Math.exp(-x * x) / Math.sqrt(Math.PI) / (x + fraction);
}
