import { exponentialAncillary } from '../saturation';
import type { HelmholtzState } from '../equation';
import type { ConductivityEquation, HelmholtzFluid, ViscosityEquation } from '../types';

/** Friction coefficients (a0 + a1·ψ1 + a2·ψ2)·τ^n with ψ1 = exp τ − 1, ψ2 = exp τ² − 1; a2 is zero for methane. */
const friction = (a0: number, a1: number, psi: number): number => a0 + a1 * psi;

/** Viscosity of methane: Quiñones-Cisneros & Deiters, J. Phys. Chem. B 110 (2006) 12820; pressures in bar. */
export const methaneViscosity: ViscosityEquation = {
  value({ T, p, molarDensity, pressureSlope }, { gasConstant }) {
    const t = T / 190.564;
    const tau = 1 / t;
    const psi = Math.exp(tau) - 1;
    const dilute = 2.60536e-6 - 1.85247e-5 * t ** 0.25 + 2.34216e-5 * Math.sqrt(t);
    const repulsive = (T * pressureSlope) / 1e5;
    const attractive = p / 1e5 - repulsive;
    const ideal = (molarDensity * gasConstant * T) / 1e5;
    const excess = repulsive - ideal;
    const cubed = tau ** 3;
    return (
      dilute +
      friction(-3.12118e-8, 1.99422e-10, psi) * tau * attractive +
      friction(5.98858e-8, -4.91143e-8, psi) * tau * excess +
      friction(3.49668e-8, -1.73176e-8, psi) * tau * ideal +
      friction(-8.52992e-13, -3.58009e-13, psi) * cubed * attractive ** 2 +
      friction(1.60099e-11, 8.50221e-13, psi) * cubed * excess ** 2 +
      friction(-3.55631e-10, 2.80326e-10, psi) * cubed * ideal ** 2
    );
  },
};

/** Friend et al. 1989, table 6: collision integral of the dilute gas, powers (i − 1)/3 − 1 of T*. */
const collision = [
  -3.0328138281, 16.918880086, -37.189364917, 41.288861858, -24.61592114, 8.9488430959, -1.8739245042, 0.2096610139,
  -9.6570437074e-3,
];
/** Terms g·δ^r·τ^s of the viscosity's excess above and below its fraction bar. */
const viscosityAbove = [
  [0.41250137, 1, 0],
  [-0.14390912, 1, 1],
  [0.10366993, 2, 0],
  [0.40287464, 2, 1],
  [-0.24903524, 2, 1.5],
  [-0.12953131, 3, 0],
  [0.06575776, 3, 2],
  [0.02566628, 4, 0],
  [-0.03716526, 4, 1],
] as const;
/** Terms j·δ^r·τ^s of the conductivity's excess. */
const conductivityTerms = [
  [2.4149207, 1, 0],
  [0.55166331, 3, 0],
  [-0.52837734, 4, 0],
  [0.073809553, 4, 1],
  [0.24465507, 5, 0],
  [-0.047613626, 5, 1],
] as const;

const sum = (terms: readonly (readonly [number, number, number])[], delta: number, tau: number): number =>
  terms.reduce((total, [n, r, s]) => total + n * delta ** r * tau ** s, 0);

/** The paper's own viscosities in µPa·s, on which its conductivity rests: dilute, and whole. */
function friendViscosity(T: number, delta: number, tau: number): { dilute: number; whole: number } {
  const t = T / 174;
  const omega = collision.reduce((total, c, i) => total + c * t ** (i / 3 - 1), 0);
  const dilute = 10.5 * Math.sqrt(t) * omega;
  const below = 1 + delta * (-0.38798341 + 0.03533815 * tau);
  return { dilute, whole: dilute + (12.149 * sum(viscosityAbove, delta, tau)) / below };
}

/** Reduced susceptibility: that of the equation of state, close to the critical point the scaled one (eqs. 19–26). */
function susceptibility(state: HelmholtzState, fluid: HelmholtzFluid, dT: number, dRho: number): number {
  const distance = Math.abs(dRho);
  if (Math.abs(dT) >= 0.03 || distance >= 0.03) {
    const delta = state.molarDensity / fluid.reducing.rho;
    return 0.28631 * delta * (fluid.reducing.T / state.T) * fluid.gasConstant * state.T * state.compressibility;
  }
  if (distance < 1e-16) return 0.0801 * Math.abs(dT) ** -1.19;
  const scaled = dT * distance ** (-1 / 0.355);
  const below = scaled < 1 / 6.098;
  const theta = below ? 1 + 0.287 * Math.max(0, 1 - 6.098 * scaled) ** (2 * 0.355) : 1;
  return (0.1133 * distance ** -3.352 * theta ** 0.732) / (theta - 1.401 * scaled * (theta + 0.535));
}

/** Conductivity of methane: Friend, Ely & Ingham, J. Phys. Chem. Ref. Data 18 (1989) 583. */
export const methaneConductivity: ConductivityEquation = {
  value(state, fluid) {
    const { T, molarDensity } = state;
    const delta = molarDensity / 10139;
    const tau = 190.55 / T;
    const { dilute, whole } = friendViscosity(T, delta, tau);
    const R = fluid.gasConstant / fluid.molarMass;
    const internal = 1.45885 - (0.4377162 * 174) / T;
    const gas = 0.51828 * dilute * (3.75 - internal * (1.5 - state.idealCv / R));
    const reduced = residualDensity(state, fluid);
    const residual = 6.29638 * (sum(conductivityTerms, delta, tau) + (1.5554612 * delta * delta) / reduced);
    const dT = 1 - 1 / tau;
    const dRho = 1 - delta;
    const decay = Math.exp(-2.646 * Math.sqrt(Math.abs(dT)) - 2.678 * dRho * dRho + 0.637 * dRho);
    const slope = molarDensity === 0 ? 1 : state.pressureSlope / (molarDensity * fluid.gasConstant);
    const critical =
      (91.855 / (whole * tau * tau)) * slope * slope * susceptibility(state, fluid, dT, dRho) ** 0.4681 * decay;
    return (gas + residual + critical) * 1e-3;
  },
};

/** Saturated vapour's reduced density below the critical temperature and density, otherwise one. */
function residualDensity(
  { T, molarDensity }: HelmholtzState,
  { saturation, critical, reducing }: HelmholtzFluid,
): number {
  if (T >= critical.T || molarDensity >= reducing.rho || !('vapour' in saturation)) return 1;
  return exponentialAncillary(saturation.vapour, T) / reducing.rho;
}
