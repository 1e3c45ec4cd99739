/** From here on the complement is computed by itself: one minus erf would lose its digits. */
const tail = 2;

/**
 * Error function. |x| < 2: Maclaurin series with all terms of one sign (Abramowitz & Stegun 7.1.6);
 * beyond: one minus `erfc`.
 */
export function erf(x: number): number {
  const size = Math.abs(x);
  if (size >= tail) return Math.sign(x) * (1 - erfc(size));
  let term = size;
  let sum = size;
  for (let n = 1; n < 200 && term > sum * 1e-17; n += 1) {
    term *= (2 * size * size) / (2 * n + 1);
    sum += term;
  }
  return Math.sign(x) * (2 / Math.sqrt(Math.PI)) * Math.exp(-size * size) * sum;
}

/**
 * Complementary error function; for x ≥ 2 by the continued fraction of Abramowitz & Stegun 7.1.14,
 * whose 150 terms are enough for all digits there.
 */
export function erfc(x: number): number {
  if (x < tail) return 1 - erf(x);
  let fraction = 0;
  for (let n = 150; n >= 1; n -= 1) fraction = n / 2 / (x + fraction);
  return scaledGauss(x) / Math.sqrt(Math.PI) / (x + fraction);
}

/** e^(−x²) with x² formed in two parts, so that its rounding is not raised to a relative error of x². */
function scaledGauss(x: number): number {
  const high = Math.round(x * 4096) / 4096;
  return Math.exp(-high * high) * Math.exp(-(x - high) * (x + high));
}
