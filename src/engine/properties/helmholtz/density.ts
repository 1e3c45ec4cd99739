import type { Equation } from './equation';

const mostIterations = 200;
const relativeStep = 1e-13;

/**
 * Molar density with the given pressure between two densities where the pressure rises, by Newton's
 * method with bisection where it would leave the bracket. NaN when there is none.
 */
export function densityBetween(
  equation: Equation,
  T: number,
  p: number,
  from: number,
  to: number,
  start: number,
): number {
  let low = from;
  let high = to;
  let rho = Math.min(high, Math.max(low, start));
  for (let iteration = 0; iteration < mostIterations; iteration += 1) {
    const misfit = equation.pressure(T, rho) - p;
    if (misfit > 0) high = rho;
    else low = rho;
    let next = rho - misfit / equation.slope;
    if (!(equation.slope > 0) || !(next > low) || !(next < high)) next = 0.5 * (low + high);
    const step = Math.abs(next - rho);
    rho = next;
    if (step <= relativeStep * rho) return rho;
  }
  return NaN;
}

/** A density at which the pressure is above the given one, going up from `from`. */
export function denserThan(equation: Equation, T: number, p: number, from: number): number {
  let rho = from;
  for (let step = 0; step < 60 && !(equation.pressure(T, rho) > p); step += 1) rho *= 1.1;
  return rho;
}
