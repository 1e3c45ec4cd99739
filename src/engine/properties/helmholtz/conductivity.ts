import { equationOf, type HelmholtzState } from './equation';
import type { ConductivityEquation, HelmholtzFluid } from './types';
import { diluteViscosity, transportSum, type DiluteGas, type TransportTerm } from './viscosity';

/** Constants of the simplified crossover of Olchowy & Sengers, Int. J. Thermophys. 10 (1989) 417. */
export interface CriticalEnhancement {
  /** ξ₀ and 1/q_D in nm. */
  xi0: number;
  cutoff: number;
  gamma0: number;
  R0: number;
  nu: number;
  gamma: number;
  /** K, where the enhancement is taken to vanish. */
  referenceT: number;
  /** J/K, the authors' value. */
  boltzmann: number;
}

/** Universal values as in most papers since 2000. */
export const olchowySengers = {
  R0: 1.03,
  gamma0: 0.0496,
  nu: 0.63,
  gamma: 1.239,
  xi0: 0.194,
  boltzmann: 1.3806488e-23,
};

/** Critical enhancement in W/(m·K). */
export function criticalEnhancement(
  fluid: HelmholtzFluid,
  constants: CriticalEnhancement,
  state: HelmholtzState,
  mu: number,
): number {
  const { T, molarDensity, cp, cv, rho } = state;
  const { xi0, cutoff, gamma0, R0, nu, gamma, referenceT, boltzmann } = constants;
  if (molarDensity === 0) return 0;
  const scale = (fluid.reducing.p * molarDensity) / fluid.reducing.rho ** 2;
  const reference = equationOf(fluid).referenceCompressibility(referenceT, molarDensity);
  const excess = (scale * (state.compressibility - (reference * referenceT) / T)) / gamma0;
  // At a tiny excess the crossover would be the difference of two equal numbers.
  if (!(excess > 1e-12)) return 0;
  const xi = xi0 * excess ** (nu / gamma);
  const y = xi / cutoff;
  const delta = molarDensity / fluid.reducing.rho;
  const omega = ((cp - cv) / cp) * Math.atan(y) + (cv / cp) * y;
  const background = 1 - Math.exp(-1 / (1 / y + (y * y) / (3 * delta * delta)));
  return ((rho * cp * R0 * boltzmann * T) / (6 * Math.PI * xi * 1e-9 * mu)) * (2 / Math.PI) * (omega - background);
}

export interface LemmonJacobsenConductivity {
  gas: DiluteGas;
  /** Dilute part in mW/(m·K): factor of the dilute viscosity in µPa·s, then n·τ^t. */
  factor: number;
  dilute: readonly (readonly [n: number, t: number])[];
  /** mW/(m·K) */
  terms: readonly TransportTerm[];
  critical: CriticalEnhancement;
}

/** Lemmon & Jacobsen, Int. J. Thermophys. 25 (2004) 21, eqs. 4–11. */
export function lemmonJacobsenConductivity(equation: LemmonJacobsenConductivity): ConductivityEquation {
  return {
    value(state, fluid, mu) {
      const { reducing } = fluid;
      const tau = reducing.T / state.T;
      let k = equation.factor * diluteViscosity(equation.gas, state.T);
      for (const [n, t] of equation.dilute) k += n * tau ** t;
      k += transportSum(equation.terms, state.molarDensity / reducing.rho, tau);
      return k * 1e-3 + criticalEnhancement(fluid, equation.critical, state, mu);
    },
  };
}

export interface PolynomialConductivity {
  /** Dilute gas in W/(m·K): Σ A·(T/T₀)^n / Σ B·(T/T₀)^m. */
  dilute: {
    T: number;
    above: readonly (readonly [A: number, n: number])[];
    below?: readonly (readonly [B: number, m: number])[];
  };
  /** Σ B·δ^d·(T₀/T)^t in W/(m·K), δ = ρ/ρ₀ with ρ₀ in kg/m³. */
  residual: { T: number; rho: number; terms: readonly (readonly [B: number, d: number, t: number])[] };
  critical?: CriticalEnhancement;
  temperature?: readonly [number, number];
}

/** Dilute gas by a polynomial or a ratio of two, residual by powers, and the critical enhancement. */
export function polynomialConductivity({
  dilute,
  residual,
  critical,
  temperature,
}: PolynomialConductivity): ConductivityEquation {
  return {
    value(state, fluid, mu) {
      const reduced = state.T / dilute.T;
      let k = 0;
      for (const [A, n] of dilute.above) k += A * reduced ** n;
      if (dilute.below !== undefined) {
        let divisor = 0;
        for (const [B, m] of dilute.below) divisor += B * reduced ** m;
        k /= divisor;
      }
      k += residualConductivity(residual, state);
      return critical === undefined ? k : k + criticalEnhancement(fluid, critical, state, mu);
    },
    ...(temperature === undefined ? {} : { temperature }),
  };
}

export function residualConductivity(
  { T, rho, terms }: PolynomialConductivity['residual'],
  state: HelmholtzState,
): number {
  const tau = T / state.T;
  const delta = state.rho / rho;
  let sum = 0;
  for (const [B, d, t] of terms) sum += B * delta ** d * tau ** t;
  return sum;
}
