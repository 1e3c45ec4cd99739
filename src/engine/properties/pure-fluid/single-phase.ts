import { bars, celsius, pressureOutside, propertyError, temperatureOutside } from '../../errors/property-errors';
import type { Diagnostic } from '../../errors/diagnostic';
import type { Outcome, State, StateInputs } from '../types';
import { failed, refused } from './failure';
import type { Phase, PhaseState, PureFluidModel } from './model';

/** What is wrong with a temperature and a pressure whatever the phase. */
export function outside<P extends PhaseState>(
  model: PureFluidModel<P>,
  T: number | undefined,
  p: number | undefined,
): Diagnostic | undefined {
  const { limits, formulation } = model;
  if (T !== undefined && !(T >= limits.T[0])) return model.tooCold(T);
  if (T !== undefined && !(T <= limits.T[1])) return temperatureOutside(T, limits.T, formulation);
  if (p !== undefined && !(p >= limits.p[0] && p <= limits.p[1])) return pressureOutside(p, limits.p, formulation);
  return T === undefined || p === undefined ? undefined : model.refuse(T, p);
}

const words = (phase: Phase): string => (phase === 'liquid' ? 'liquid' : 'vapour');

function wrongPhase<P extends PhaseState>(
  model: PureFluidModel<P>,
  T: number,
  p: number,
  natural: Phase,
  wanted: string,
): Diagnostic {
  const boiling = p < model.critical.p ? model.saturation?.boiling(p) : undefined;
  return propertyError('WRONG_PHASE', {
    temperature: celsius(T),
    pressure: bars(p),
    name: model.name,
    natural: words(natural),
    wanted,
    reason: boiling === undefined ? '' : `: it boils at ${celsius(boiling)}`,
    T,
    p,
    ...(boiling === undefined ? {} : { T_sat: boiling }),
  });
}

/** The state at T and p; a phase that was asked for must be the natural one, or the point lie on the line. */
export function byTemperatureAndPressure<P extends PhaseState>(
  model: PureFluidModel<P>,
  T: number,
  p: number,
  wanted: StateInputs['phase'],
): Outcome<State> {
  const problem = outside(model, T, p);
  if (problem !== undefined) return failed(problem);
  let phase = model.phaseOf(T, p);
  if (phase === 'liquid' || phase === 'vapour') {
    const open = model.isAmbiguous(T, p);
    if (wanted === undefined && open) {
      const boiling = model.saturation?.boiling(p) ?? T;
      return refused('AMBIGUOUS_AT_SATURATION', {
        pressure: bars(p),
        name: model.name,
        boiling: celsius(boiling),
        temperature: celsius(T),
        T,
        p,
        T_sat: boiling,
      });
    }
    if (wanted !== undefined && (phase === 'liquid') !== (wanted === 'liquid')) {
      if (!open) return failed(wrongPhase(model, T, p, phase, wanted));
      phase = wanted === 'liquid' ? 'liquid' : 'vapour';
    }
  }
  const state = model.at(T, p, phase);
  return state === undefined
    ? refused('OUT_OF_RANGE_STATE', {
        problem: `${celsius(T)} and ${bars(p)} have no state in ${model.formulation}`,
        T,
        p,
      })
    : { ok: true, value: model.complete(state, phase, false) };
}
