import { findRoot } from '../../numerics/roots';
import type { Equation } from './equation';
import type { Ancillary, SaturationAncillaries } from './types';

const sum = (terms: Ancillary['terms'], theta: number): number => {
  let total = 0;
  for (const [n, t] of terms) total += n * theta ** t;
  return total;
};

/** value·exp(T₀/T·Σ n·θ^t) */
export const exponentialAncillary = ({ T: T0, value, unscaled, terms }: Ancillary, T: number): number =>
  value * Math.exp((unscaled === true ? 1 : T0 / T) * sum(terms, Math.max(0, 1 - T / T0)));

/** value·(1 + Σ n·θ^t) */
export const linearAncillary = ({ T: T0, value, terms }: Ancillary, T: number): number =>
  value * (1 + sum(terms, Math.max(0, 1 - T / T0)));

/** The saturation line of a pure fluid, by temperature. Densities in mol/m³. */
export interface SaturationPoint {
  T: number;
  p: number;
  liquid: number;
  vapour: number;
  /** Clapeyron's dp/dT, Pa/K. */
  slope: number;
}

const mostIterations = 100;
const tolerance = 1e-13;

/** Reduced densities of both phases. */
interface Pair {
  liquid: number;
  vapour: number;
}

/**
 * Both densities at which pressure and Gibbs energy of the phases agree, by Newton's method on
 * J = δ(1 + δ·α_δ) and K = δ·α_δ + α + ln δ. Akasaka, R. (2008): A reliable and useful method to
 * determine the saturation state from Helmholtz energy equations of state. J. Thermal Sci. Technol.
 * 3, 442. Undefined where it does not converge from the start given.
 */
function equilibrium(equation: Equation, T: number, start: Pair): Pair | undefined {
  const { reducing } = equation.fluid;
  let { liquid, vapour } = start;
  let damping = 1;
  let before = Infinity;
  for (let iteration = 0; iteration < mostIterations; iteration += 1) {
    let r = equation.residualAt(T, liquid * reducing.rho);
    const jl = liquid * (1 + r.ad);
    const kl = r.ad + r.a + Math.log(liquid);
    const jl1 = 1 + 2 * r.ad + r.add;
    const kl1 = jl1 / liquid;
    r = equation.residualAt(T, vapour * reducing.rho);
    const jv = vapour * (1 + r.ad);
    const kv = r.ad + r.a + Math.log(vapour);
    const jv1 = 1 + 2 * r.ad + r.add;
    const kv1 = jv1 / vapour;
    const determinant = jv1 * kl1 - jl1 * kv1;
    const stepLiquid = ((kv - kl) * jv1 - (jv - jl) * kv1) / determinant;
    const stepVapour = ((kv - kl) * jl1 - (jv - jl) * kl1) / determinant;
    const size = Math.abs(stepLiquid / liquid) + Math.abs(stepVapour / vapour);
    if (!Number.isFinite(size)) return undefined;
    if (size > before) damping = Math.max(0.1, damping / 2);
    before = size;
    const factor = Math.min(damping, 0.3 / size);
    liquid += factor * stepLiquid;
    vapour += factor * stepVapour;
    // Close to the critical point rounding keeps the steps from vanishing.
    if (size < tolerance || (iteration > 8 && size < 1e-11) || (iteration > 20 && size < 1e-8))
      return liquid > vapour * (1 + 1e-7) ? { liquid, vapour } : undefined;
  }
  return undefined;
}

/** Closer to the critical point than this the ancillary densities may be no start; θ = 1 − T/T_c. */
const criticalReach = 5e-3;

/**
 * The pair at T; close to the critical point from the pair at twice the distance, whose difference
 * shrinks about as θ^0.4 while the mean stays.
 */
function pairAt(equation: Equation, ancillaries: SaturationAncillaries, T: number, depth = 0): Pair | undefined {
  const { reducing, critical } = equation.fluid;
  const found = equilibrium(equation, T, {
    liquid: linearAncillary(ancillaries.liquid, T) / reducing.rho,
    vapour: exponentialAncillary(ancillaries.vapour, T) / reducing.rho,
  });
  if (found !== undefined || depth > 30 || 1 - T / critical.T > criticalReach) return found;
  const farther = pairAt(equation, ancillaries, critical.T - 2 * (critical.T - T), depth + 1);
  if (farther === undefined) return undefined;
  const mean = (farther.liquid + farther.vapour) / 2;
  const half = ((farther.liquid - farther.vapour) / 2) * 0.5 ** 0.4;
  return equilibrium(equation, T, { liquid: mean + half, vapour: mean - half });
}

/** The saturation of a pure fluid at a temperature; undefined very close to the critical point. */
export function saturationAtTemperature(
  equation: Equation,
  ancillaries: SaturationAncillaries,
  T: number,
): SaturationPoint | undefined {
  const pair = pairAt(equation, ancillaries, T);
  if (pair === undefined) return undefined;
  const { reducing, gasConstant } = equation.fluid;
  const vapour = pair.vapour * reducing.rho;
  // The vapour's pressure: that of a cold liquid is a small difference of large numbers.
  const p = vapour * gasConstant * T * (1 + equation.residualAt(T, vapour).ad);
  const liquid = pair.liquid * reducing.rho;
  return { T, p, liquid, vapour, slope: clapeyron(equation, T, pair.liquid, pair.vapour) };
}

/** dp/dT = Δs/Δv, with molar quantities and reduced densities. */
function clapeyron(equation: Equation, T: number, liquid: number, vapour: number): number {
  const { reducing, molarMass } = equation.fluid;
  const rise = equation.state(T, vapour * reducing.rho).s - equation.state(T, liquid * reducing.rho).s;
  return (rise * molarMass) / (1 / (vapour * reducing.rho) - 1 / (liquid * reducing.rho));
}

/** The same by pressure: the ancillary equation is inverted, then corrected by Clapeyron's slope. */
export function saturationAtPressure(
  equation: Equation,
  ancillaries: SaturationAncillaries,
  p: number,
): SaturationPoint | undefined {
  const { fluid } = equation;
  const wanted = Math.log(p);
  const guess = findRoot(
    (T) => Math.log(exponentialAncillary(ancillaries.pressure, T)) - wanted,
    fluid.temperature[0] * 0.98,
    fluid.critical.T,
  );
  const end = p < ancillaries.pressure.value / 2 ? fluid.temperature[0] : fluid.critical.T * 0.9999;
  let T = guess.converged ? guess.root : end;
  for (let iteration = 0; iteration < 30; iteration += 1) {
    const point = saturationAtTemperature(equation, ancillaries, T);
    if (point === undefined) return undefined;
    const step = ((wanted - Math.log(point.p)) * point.p) / point.slope;
    if (Math.abs(step) <= 1e-12 * T) return point;
    // Never past the critical point, where there is no pair.
    T = Math.min(T + step, 0.5 * (T + fluid.critical.T));
  }
  return saturationAtTemperature(equation, ancillaries, T);
}
