import type { Diagnostic } from '../../errors/diagnostic';
import type { State } from '../types';

/** Thermodynamic state of one phase, SI units per kg. */
export interface PhaseState {
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
}

export interface SaturatedStates<P extends PhaseState = PhaseState> {
  T: number;
  p: number;
  liquid: P;
  vapour: P;
}

export type Phase = State['phase'];

/** What a formulation of a pure fluid must answer, so that every pair of inputs can be served the same way. */
export interface PureFluidModel<P extends PhaseState = PhaseState> {
  id: string;
  /** As it stands in a sentence: `water`. */
  name: string;
  formulation: string;
  limits: { T: [number, number]; p: [number, number] };
  critical: { T: number; p: number };
  /** What lies within the limits and is refused nevertheless (solid, condensed, too hot for its pressure). */
  refuse(T: number, p: number): Diagnostic | undefined;
  /** Temperature below the limits. */
  tooCold(T: number): Diagnostic;
  /** Ends of the search for a temperature at given pressure. */
  temperatures(p: number): [number, number];
  phaseOf(T: number, p: number): Phase;
  /** Whether T and p alone leave the phase open: 0.05 K or 0.1 % from saturation. */
  isAmbiguous(T: number, p: number): boolean;
  /** The state with that phase at T and p. */
  at(T: number, p: number, phase: Phase): P | undefined;
  /** The state of that density, off the two-phase region; undefined where there is none within the limits. */
  atDensity(T: number, rho: number, phase: Phase | undefined): P | undefined;
  /** Values, reasons for those that are missing, and words on the state. */
  complete(state: P, phase: Phase, saturated: boolean): State;
  /** Absent for mixtures. */
  saturation?: {
    /** Lower end of the saturation line. */
    from: { T: number; p: number };
    at(given: { T: number } | { p: number }): SaturatedStates<P> | undefined;
    /** Boiling temperature, below the critical pressure. */
    boiling(p: number): number | undefined;
    surfaceTension?(T: number): number;
  };
}
