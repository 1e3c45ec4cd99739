import {
  region1,
  region2Ideal,
  region2Residual,
  region3,
  region3Logarithm,
  region5Ideal,
  region5Residual,
  type Terms,
} from './coefficients';
import { sumTerms, type TermSum } from './terms';

/** Specific gas constant of R7-97 (2012), J/(kg·K). */
export const gasConstant = 461.526;
export const criticalTemperature = 647.096;
export const criticalPressure = 22.064e6;
export const criticalDensity = 322;

/** Thermodynamic state of one phase, SI units per kg. */
export interface WaterState {
  T: number;
  p: number;
  rho: number;
  h: number;
  u: number;
  s: number;
  cp: number;
  cv: number;
  /** Speed of sound. */
  w: number;
  /** Isobaric expansion coefficient, 1/K. */
  beta: number;
  /** ∂ρ/∂p at constant temperature, kg/(m³·Pa). */
  compressibility: number;
}

/** Gibbs energy γ(π, τ) and its derivatives, for regions 1, 2 and 5. */
type Gibbs = (pi: number, tau: number) => TermSum;

const gibbs1: Gibbs = (pi, tau) => {
  const sum = sumTerms(region1, 7.1 - pi, tau - 1.222);
  return { ...sum, fx: -sum.fx, fxy: -sum.fxy };
};

const idealAndResidual =
  (ideal: Terms, residual: Terms, shift: number): Gibbs =>
  (pi, tau) => {
    const gas = sumTerms(ideal, 1, tau);
    const rest = sumTerms(residual, pi, tau - shift);
    return {
      f: Math.log(pi) + gas.f + rest.f,
      fx: 1 / pi + rest.fx,
      fy: gas.fy + rest.fy,
      fxx: -1 / (pi * pi) + rest.fxx,
      fyy: gas.fyy + rest.fyy,
      fxy: rest.fxy,
    };
  };

const gibbs2 = idealAndResidual(region2Ideal, region2Residual, 0.5);
const gibbs5 = idealAndResidual(region5Ideal, region5Residual, 0);

/** Table 3 of R7-97: properties from the Gibbs energy. */
function fromGibbs(T: number, p: number, pressureScale: number, temperatureScale: number, gibbs: Gibbs): WaterState {
  const pi = p / pressureScale;
  const tau = temperatureScale / T;
  const g = gibbs(pi, tau);
  const RT = gasConstant * T;
  const v = (pi * g.fx * RT) / p;
  const slope = g.fx - tau * g.fxy;
  const cp = -gasConstant * tau * tau * g.fyy;
  return {
    T,
    p,
    rho: 1 / v,
    h: RT * tau * g.fy,
    u: RT * (tau * g.fy - pi * g.fx),
    s: gasConstant * (tau * g.fy - g.f),
    cp,
    cv: gasConstant * (-tau * tau * g.fyy + (slope * slope) / g.fxx),
    w: Math.sqrt((RT * g.fx * g.fx) / ((slope * slope) / (tau * tau * g.fyy) - g.fxx)),
    beta: (1 - (tau * g.fxy) / g.fx) / T,
    compressibility: -g.fxx / (g.fx * pressureScale) / v,
  };
}

export const inRegion1 = (T: number, p: number): WaterState => fromGibbs(T, p, 16.53e6, 1386, gibbs1);
export const inRegion2 = (T: number, p: number): WaterState => fromGibbs(T, p, 1e6, 540, gibbs2);
export const inRegion5 = (T: number, p: number): WaterState => fromGibbs(T, p, 1e6, 1000, gibbs5);

/** Table 31 of R7-97: properties from the Helmholtz energy of region 3, by temperature and density. */
export function inRegion3(T: number, rho: number): WaterState {
  const delta = rho / criticalDensity;
  const tau = criticalTemperature / T;
  const sum = sumTerms(region3, delta, tau);
  const f = sum.f + region3Logarithm * Math.log(delta);
  const fd = sum.fx + region3Logarithm / delta;
  const fdd = sum.fxx - region3Logarithm / (delta * delta);
  const RT = gasConstant * T;
  const slope = delta * fd - delta * tau * sum.fxy;
  const stiffness = 2 * delta * fd + delta * delta * fdd;
  const cv = -gasConstant * tau * tau * sum.fyy;
  return {
    T,
    p: rho * RT * delta * fd,
    rho,
    h: RT * (tau * sum.fy + delta * fd),
    u: RT * tau * sum.fy,
    s: gasConstant * (tau * sum.fy - f),
    cp: cv + (gasConstant * slope * slope) / stiffness,
    cv,
    w: Math.sqrt(RT * (stiffness - (slope * slope) / (tau * tau * sum.fyy))),
    beta: slope / (stiffness * T),
    compressibility: 1 / (RT * stiffness),
  };
}
