/**
 * Bessel functions of whole order n ≥ 0.
 *
 * J and I: backward recurrence (Miller's method, NIST Digital Library of Mathematical Functions
 * 3.6(ii) and 10.74(iv)), normalised by the generating functions DLMF 10.12.4 and 10.35.5.
 * J for large arguments: Hankel's expansion, DLMF 10.17.3.
 * K: the integral DLMF 10.32.9 by the trapezium rule, which converges to rounding error where the
 * integrand falls off doubly exponentially (Trefethen & Weideman, SIAM Review 56 (2014) 385).
 */

/** Beyond this argument e^x is no float64. */
const largestExponent = 709;

/** Unnormalised values of orders 0 … top, from a start far above where they vanish, kept in scale. */
function backward(order: number, top: number, next: (k: number, upper: number, lower: number) => number) {
  let upper = 0;
  let current = 1e-300;
  let wanted = order === top ? current : 0;
  let evenSum = 0;
  let allSum = 0;
  for (let k = top; k > 0; k -= 1) {
    if (k % 2 === 0) evenSum += current;
    allSum += current;
    const lower = next(k, upper, current);
    upper = current;
    current = lower;
    if (k - 1 === order) wanted = current;
    if (Math.abs(current) > 1e250) {
      upper *= 1e-250;
      current *= 1e-250;
      wanted *= 1e-250;
      evenSum *= 1e-250;
      allSum *= 1e-250;
    }
  }
  return { wanted, zero: current, evenSum, allSum };
}

/** Where to begin: orders from here on are below rounding error beside those that count. */
function topOrder(order: number, x: number): number {
  const size = Math.max(order, x);
  return 2 * Math.ceil((size + 20 + 6 * Math.cbrt(size + 1) + Math.sqrt(40 * size)) / 2);
}

/** J_n(x) for x far above n²: amplitude and phase by Hankel's expansion. */
function hankelJ(order: number, x: number): number {
  const mu = 4 * order * order;
  let term = 1;
  let p = 1;
  let q = 0;
  for (let k = 1; k < 60; k += 1) {
    const next = (term * (mu - (2 * k - 1) ** 2)) / (k * 8 * x);
    if (Math.abs(next) > Math.abs(term)) break;
    term = next;
    // Odd terms belong to q, even ones to p, each with signs that alternate.
    if (k % 2 === 1) q += k % 4 === 1 ? term : -term;
    else p += k % 4 === 0 ? term : -term;
    if (Math.abs(term) < 1e-17) break;
  }
  const quarter = Math.PI / 4;
  // cos(x − (2n+1)π/4) by sums, since x itself is large against the phase.
  const phase = (2 * order + 1) * quarter;
  const cosine = Math.cos(x) * Math.cos(phase) + Math.sin(x) * Math.sin(phase);
  const sine = Math.sin(x) * Math.cos(phase) - Math.cos(x) * Math.sin(phase);
  return Math.sqrt(2 / (Math.PI * x)) * (p * cosine - q * sine);
}

/** J_n(x) of the first kind; J_n(−x) = (−1)^n J_n(x). */
export function besselJ(order: number, x: number): number {
  if (x < 0) return (order % 2 === 0 ? 1 : -1) * besselJ(order, -x);
  if (x === 0) return order === 0 ? 1 : 0;
  if (x > 50 + order * order) return hankelJ(order, x);
  const { wanted, zero, evenSum } = backward(
    order,
    topOrder(order, x),
    (k, upper, current) => ((2 * k) / x) * current - upper,
  );
  return wanted / (zero + 2 * evenSum);
}

/** I_n(x), modified of the first kind; Infinity where it exceeds float64. */
export function besselI(order: number, x: number): number {
  if (x < 0) return (order % 2 === 0 ? 1 : -1) * besselI(order, -x);
  if (x === 0) return order === 0 ? 1 : 0;
  if (x > 800) return Infinity;
  const { wanted, zero, allSum } = backward(
    order,
    topOrder(order, x),
    (k, upper, current) => ((2 * k) / x) * current + upper,
  );
  const share = wanted / (zero + 2 * allSum);
  return x < largestExponent ? share * Math.exp(x) : share * Math.exp(x / 2) * Math.exp(x / 2);
}

/** K_n(x), modified of the second kind, x > 0; Infinity where it exceeds float64. */
export function besselK(order: number, x: number): number {
  // cosh(n t) grows, e^(−x cosh t) falls: their product is formed in the exponent.
  const integrand = (t: number) =>
    0.5 * (Math.exp(order * t - x * Math.cosh(t)) + Math.exp(-order * t - x * Math.cosh(t)));
  const step = 1 / 64;
  let sum = 0.5 * integrand(0);
  for (let index = 1; index * step < 720; index += 1) {
    const t = index * step;
    const term = integrand(t);
    sum += term;
    if (term <= sum * 1e-18 && x * Math.sinh(t) > order) break;
  }
  return sum * step;
}
