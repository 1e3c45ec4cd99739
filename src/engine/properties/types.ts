import type { Diagnostic } from '../errors/diagnostic';

/** SI values, temperatures in K, pressures absolute in Pa, h and s per kg. */
export type StateInputs = Partial<Record<'T' | 'p' | 'x' | 'h' | 's' | 'rho', number>> & {
  /** Asked-for phase, where the caller knows it. */
  phase?: 'liquid' | 'gas';
  /** Composition of a mixture as mass fraction of the solute (glycols, sea water). */
  massFraction?: number;
  /** Moist air: relative humidity (0 to 1), kg of vapour per kg of dry air, wet bulb and dew point in K. */
  RH?: number;
  W?: number;
  T_wb?: number;
  T_dp?: number;
};

export type PropertyId =
  | 'T'
  | 'p'
  | 'x'
  | 'rho'
  | 'v'
  | 'h'
  | 'u'
  | 's'
  | 'cp'
  | 'cv'
  | 'w'
  | 'mu'
  | 'nu'
  | 'k'
  | 'Pr'
  | 'alpha'
  | 'beta'
  | 'sigma'
  | 'T_sat'
  | 'p_sat'
  | 'h_fg'
  | 'T_freeze'
  | 'RH'
  | 'W'
  | 'W_sat'
  | 'T_wb'
  | 'T_dp'
  | 'p_ws'
  | 'h_da'
  | 'v_da';

export interface PropertyDefinition {
  id: PropertyId;
  /** `dynamic viscosity` */
  quantity: string;
  /** Coherent SI unit: `Pa*s`. */
  unit: string;
  symbolLatex: string;
}

export interface State {
  substance: string;
  phase: 'liquid' | 'vapour' | 'gas' | 'supercritical' | 'two-phase' | 'solid';
  /** `IAPWS R7-97 region 1` */
  formulation: string;
  values: Partial<Record<PropertyId, number>>;
  /** Properties that this state has not, with the reason. */
  missing: Partial<Record<PropertyId, Diagnostic>>;
  /** Stated uncertainty in words, by property. */
  uncertainty: Partial<Record<PropertyId, string>>;
  warnings: Diagnostic[];
}

export interface SaturationPair {
  T: number;
  p: number;
  liquid: State;
  vapour: State;
  h_fg: number;
  sigma?: number;
}

/** A value, or the reason why there is none. */
export type Outcome<T> = { ok: true; value: T } | { ok: false; error: Diagnostic };

/** What a substance's data file offers; the only thing the rest of the product sees of it. */
export interface Substance {
  id: string;
  /** `Water and steam` */
  name: string;
  /** Where lists put it; fluids where absent. */
  group?: 'fluid' | 'liquid' | 'solid';
  /** Other words under which it is found. */
  aliases: string[];
  /** Formulations with authors and year, one citation each. */
  sources: string[];
  /** Range in words, for the browser of fluids and the report. */
  range: string;
  limits: { T: [number, number]; p: [number, number] };
  /** Pairs of inputs that it takes: `['T','p']`. */
  inputs: (readonly (keyof StateInputs)[])[];
  /** kg/mol, of pure substances and of air. */
  molarMass?: number;
  state(inputs: StateInputs): Outcome<State>;
  /** Absent for substances without a phase change in the formulation. */
  saturation?(inputs: { T: number } | { p: number }): Outcome<SaturationPair>;
  /** Freezing temperature in K, of the composition where it is a mixture. */
  freezing?(massFraction?: number): Outcome<number>;
  /**
   * The transport equations by themselves at T in K and a density in kg/m³, zero included, as the
   * verification tables of their papers give them (of water without critical enhancement).
   */
  transport?(T: number, rho: number): { mu?: number; k?: number };
}
