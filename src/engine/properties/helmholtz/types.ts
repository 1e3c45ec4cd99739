import type { HelmholtzState } from './equation';

/** n·δ^d·τ^t·exp(−δ^l); without the exponential where l is 0. */
export type PowerTerm = readonly [n: number, d: number, t: number, l: number];

/** n·δ^d·τ^t·exp(−η(δ−ε)² − β(τ−γ)²) */
export type GaussianTerm = readonly [
  n: number,
  d: number,
  t: number,
  eta: number,
  epsilon: number,
  beta: number,
  gamma: number,
];

/** n·δ^d·τ^t·exp(−η(δ−ε)² + 1/(β(τ−γ)² + b)), of Gao et al. (2020) for ammonia. */
export type AssociatingTerm = readonly [...GaussianTerm, b: number];

/** n·Δ^b·δ·ψ, the non-analytic term of Span & Wagner (1996), with its own A, B, C, D. */
export type NonAnalyticTerm = readonly [
  n: number,
  a: number,
  b: number,
  beta: number,
  A: number,
  B: number,
  C: number,
  D: number,
];

/** Ideal-gas part of the reduced Helmholtz energy: ln δ + a1 + a2·τ + a·ln τ + sums. */
export interface IdealPart {
  a1: number;
  a2: number;
  logTau: number;
  /** n·τ^t */
  powers?: readonly (readonly [n: number, t: number])[];
  /** n·ln(1 − exp(−t·τ)) */
  einstein?: readonly (readonly [n: number, t: number])[];
  /** n·ln(c + d·exp(t·τ)) */
  general?: readonly (readonly [n: number, t: number, c: number, d: number])[];
}

export interface ResidualPart {
  power: readonly PowerTerm[];
  gaussian?: readonly GaussianTerm[];
  associating?: readonly AssociatingTerm[];
  nonAnalytic?: readonly NonAnalyticTerm[];
}

/** Σ n·θ^t with θ = 1 − T/T₀, and the quantity that it scales at T₀. */
export interface Ancillary {
  T: number;
  value: number;
  /** In an exponential the sum is multiplied by T₀/T, unless this is set. */
  unscaled?: true;
  terms: readonly (readonly [n: number, t: number])[];
}

/** Equations close to the saturation line, good to some 0.1 %: starts for the exact solution. */
export interface SaturationAncillaries {
  /** value·exp(T₀/T·Σ), Pa */
  pressure: Ancillary;
  /** value·(1 + Σ), mol/m³ */
  liquid: Ancillary;
  /** value·exp(T₀/T·Σ), mol/m³ */
  vapour: Ancillary;
}

/** A transport equation in SI units, with the temperatures that its authors state. */
export interface ViscosityEquation {
  value(state: HelmholtzState, fluid: HelmholtzFluid): number;
  temperature?: readonly [number, number];
}

export interface ConductivityEquation {
  /** Takes the viscosity too, on which its critical enhancement rests. */
  value(state: HelmholtzState, fluid: HelmholtzFluid, mu: number): number;
  temperature?: readonly [number, number];
}

/** Equation of state as reduced Helmholtz energy α(δ, τ), and the transport equations that go with it. */
export interface HelmholtzFluid {
  id: string;
  name: string;
  /** As it stands in a sentence: `nitrogen`. */
  word: string;
  aliases: string[];
  /** As named in tables and reports: `Lemmon et al. 2000`. */
  formulation: string;
  sources: string[];
  range: string;
  temperature: [number, number];
  pressure: [number, number];
  /** Temperatures of the measurements behind the equation, where it is used beyond them. */
  fitted?: [number, number];
  /** Above this a value is given with a warning: the molecule begins to dissociate. */
  dissociation?: number;
  /** J/(mol·K), the one used by the authors of the equation. */
  gasConstant: number;
  /** kg/mol */
  molarMass: number;
  /** K and mol/m³; p in Pa scales the critical enhancement of the conductivity. */
  reducing: { T: number; rho: number; p: number };
  critical: { T: number; p: number };
  ideal: IdealPart;
  residual: ResidualPart;
  /** Pure fluids: both phases. Mixtures such as air: the gas down to its dew line. */
  saturation: SaturationAncillaries | { dew: Ancillary };
  /** Surface tension in N/m: Σ a·(1 − T/T₀)^n. */
  surface?: { T: number; terms: readonly (readonly [a: number, n: number])[] };
  /** Melting pressure in Pa. */
  melting?(T: number): number;
  viscosity?: ViscosityEquation;
  conductivity?: ConductivityEquation;
  /** Stated uncertainty in words, by property. */
  uncertainty: Partial<Record<'rho' | 'cp' | 'mu' | 'k' | 'Pr' | 'p_sat', string>>;
}
