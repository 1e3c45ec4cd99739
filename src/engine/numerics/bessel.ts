/**
 * Bessel functions of whole order by quadrature of their integral representations (Abramowitz &
 * Stegun 9.1.21, 9.6.19, 9.6.24). The integrands are periodic or fall off doubly exponentially, so
 * that the trapezium rule converges to rounding error (Trefethen & Weideman, SIAM Review 56 (2014)
 * 385).
 */
function periodicMean(integrand: (angle: number) => number, points: number): number {
  // Half the period is enough: the integrands are even in the angle.
  let sum = 0.5 * (integrand(0) + integrand(Math.PI));
  for (let index = 1; index < points; index += 1) sum += integrand((Math.PI * index) / points);
  return sum / points;
}

function pointsFor(order: number, x: number): number {
  return 40 + 2 * Math.ceil(order + Math.abs(x));
}

/** J_n(x) */
export function besselJ(order: number, x: number): number {
  return periodicMean((angle) => Math.cos(order * angle - x * Math.sin(angle)), pointsFor(order, x));
}

/** I_n(x); for small x and high order the ascending series (9.6.10), where the integral would cancel. */
export function besselI(order: number, x: number): number {
  if (Math.abs(x) < 12) {
    let term = 1;
    for (let n = 1; n <= order; n += 1) term *= x / 2 / n;
    let sum = term;
    for (let k = 1; k < 300 && Math.abs(term) > Math.abs(sum) * 1e-17; k += 1) {
      term *= (x * x) / 4 / (k * (k + order));
      sum += term;
    }
    return sum;
  }
  return periodicMean((angle) => Math.exp(x * Math.cos(angle)) * Math.cos(order * angle), pointsFor(order, x));
}

/** K_n(x), x > 0 */
export function besselK(order: number, x: number): number {
  const step = 1 / 64;
  let sum = 0.5 * Math.exp(-x);
  for (let index = 1; index < 4000; index += 1) {
    const t = index * step;
    const term = Math.exp(-x * Math.cosh(t)) * Math.cosh(order * t);
    sum += term;
    if (term < sum * 1e-18 && x * Math.sinh(t) > order) break;
  }
  return sum * step;
}
