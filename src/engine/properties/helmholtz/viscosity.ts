import type { HelmholtzState } from './equation';
import type { ViscosityEquation } from './types';

const avogadro = 6.02214129e23;

/** Chapman–Enskog viscosity of the dilute gas. */
export interface DiluteGas {
  /** Of √(M·T)/(σ²·Ω) in µPa·s, with M in g/mol and σ in nm. */
  factor: number;
  molarMass: number;
  /** Lennard-Jones ε/k in K and σ in nm. */
  energy: number;
  size: number;
  /** ln Ω = Σ a·(ln T*)^t */
  collision: readonly (readonly [a: number, t: number])[];
}

/** n·δ^d·τ^t·exp(−δ^l); without the exponential where l is 0. */
export type TransportTerm = readonly [n: number, d: number, t: number, l: number];

/** Viscosity of the dilute gas in µPa·s. */
export function diluteViscosity({ factor, molarMass, energy, size, collision }: DiluteGas, T: number): number {
  const logT = Math.log(T / energy);
  let sum = 0;
  for (const [a, t] of collision) sum += a * logT ** t;
  return (factor * Math.sqrt(molarMass * T)) / (size * size * Math.exp(sum));
}

export function transportSum(terms: readonly TransportTerm[], delta: number, tau: number): number {
  let sum = 0;
  for (const [n, d, t, l] of terms) sum += n * delta ** d * tau ** t * (l === 0 ? 1 : Math.exp(-(delta ** l)));
  return sum;
}

const powerSum = (terms: readonly (readonly [number, number])[], x: number): number => {
  let sum = 0;
  for (const [n, t] of terms) sum += n * x ** t;
  return sum;
};

/**
 * Second viscosity virial coefficient of Rainwater & Friend, J. Chem. Phys. 71 (1979) 2990, as
 * B* = Σ b·T*^t, in m³/mol.
 */
export const initialDensity = (gas: DiluteGas, terms: readonly (readonly [number, number])[], T: number): number =>
  avogadro * (gas.size * 1e-9) ** 3 * powerSum(terms, T / gas.energy);

/** Vogel et al., J. Phys. Chem. Ref. Data 27 (1998) 947, table 4: coefficients common to many fluids. */
export const vogelInitialDensity: readonly (readonly [number, number])[] = [
  [-19.572881, 0],
  [219.73999, -0.25],
  [-1015.3226, -0.5],
  [2471.01251, -0.75],
  [-3375.1717, -1],
  [2491.6597, -1.25],
  [-787.26086, -1.5],
  [14.085455, -2.5],
  [-0.34664158, -5.5],
];

export interface DenseViscosity {
  dilute: DiluteGas;
  /** B* of the initial density dependence. */
  initial?: readonly (readonly [b: number, t: number])[];
  /** Reduction of T (K) and density (mol/m³) in the terms below. */
  reducing: { T: number; rho: number };
  /** µPa·s */
  terms: readonly TransportTerm[];
  /** Free-volume term f·δ^d·(1/(δ₀ − δ) − 1/δ₀), δ₀ = Σ g·τ^h / Σ p·τ^q; f in µPa·s. */
  freeVolume?: {
    f: number;
    d: 0 | 1;
    above: readonly (readonly [g: number, h: number])[];
    below: readonly (readonly [p: number, q: number])[];
  };
  temperature?: readonly [number, number];
}

/** Dilute gas, initial density dependence and a residual of powers with a free-volume term. */
export function denseViscosity(equation: DenseViscosity): ViscosityEquation {
  const { dilute, initial, reducing, terms, freeVolume, temperature } = equation;
  return {
    value({ T, molarDensity }: HelmholtzState) {
      const delta = molarDensity / reducing.rho;
      const tau = reducing.T / T;
      const gas = diluteViscosity(dilute, T);
      let mu = gas + transportSum(terms, delta, tau);
      if (initial !== undefined) mu += gas * initialDensity(dilute, initial, T) * molarDensity;
      if (freeVolume !== undefined) {
        const { f, d, above, below } = freeVolume;
        const delta0 = powerSum(above, tau) / powerSum(below, tau);
        mu += f * (d === 1 ? delta : 1) * (1 / (delta0 - delta) - 1 / delta0);
      }
      return mu * 1e-6;
    },
    ...(temperature === undefined ? {} : { temperature }),
  };
}
