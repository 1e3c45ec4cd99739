/** Equation of state as reduced Helmholtz energy α(δ, τ), and the transport equations that go with it. */
export interface HelmholtzFluid {
  id: string;
  name: string;
  aliases: string[];
  /** As named in tables and reports: `Lemmon et al. 2000`. */
  formulation: string;
  sources: string[];
  range: string;
  temperature: [number, number];
  pressure: [number, number];
  /** Above this a value is given with a warning: the molecule begins to dissociate. */
  dissociation?: number;
  /** J/(mol·K), the one used by the authors of the equation. */
  gasConstant: number;
  /** kg/mol */
  molarMass: number;
  reducing: { T: number; rho: number; p: number };
  /** Critical temperature (of mixtures: maxcondentherm), K. */
  critical: { T: number };
  ideal: {
    /** a1 + a2·τ + a·ln τ */
    a1: number;
    a2: number;
    logTau: number;
    powers: readonly (readonly [n: number, t: number])[];
    /** n·ln(1 − exp(−t·τ)) */
    einstein: readonly (readonly [n: number, t: number])[];
    /** n·ln(c + d·exp(t·τ)) */
    general: readonly (readonly [n: number, t: number, c: number, d: number])[];
  };
  /** n·δ^d·τ^t·exp(−δ^l), without the exponential where l is 0. */
  residual: readonly (readonly [n: number, d: number, t: number, l: number])[];
  /** Dew line p = p_c·exp(T_c/T·Σ n·θ^t), by the reducing state. */
  dew: readonly (readonly [n: number, t: number])[];
  transport: LemmonJacobsen;
  uncertainty: { rho: string; cp: string; mu: string; k: string; Pr: string };
}

/** Lemmon, E. W.; Jacobsen, R. T (2004): Viscosity and thermal conductivity equations for nitrogen, oxygen, argon, and air. Int. J. Thermophys. 25, 21. */
export interface LemmonJacobsen {
  /** g/mol, K, nm */
  molarMass: number;
  energy: number;
  size: number;
  collision: readonly number[];
  /** µPa·s */
  viscosity: readonly (readonly [n: number, t: number, d: number, l: number])[];
  /** mW/(m·K): factor of the dilute viscosity, then two powers of τ. */
  dilute: readonly [factor: number, n2: number, t2: number, n3: number, t3: number];
  conductivity: readonly (readonly [n: number, t: number, d: number, l: number])[];
  critical: { xi0: number; gamma0: number; qD: number; referenceT: number };
}
