import { bars, celsius, plain } from '../../errors/property-errors';
import type { Outcome, State } from '../types';
import { failed, refused } from './failure';
import type { Phase, PhaseState, PureFluidModel } from './model';
import { outside } from './single-phase';
import { byQuality, saturatedStates } from './two-phase';

const mostIterations = 100;

/**
 * The temperature between two ends at which h or s reaches a value, by Newton's method with the slope
 * that the state itself knows (cp, or cp/T), halving the bracket where a step would leave it.
 */
function temperatureWith<P extends PhaseState>(
  at: (T: number) => P | undefined,
  property: 'h' | 's',
  value: number,
  from: number,
  to: number,
): number | undefined {
  let [low, high] = [from, to];
  const [first, last] = [at(low), at(high)];
  if (first === undefined || last === undefined || first[property] > value || last[property] < value) return undefined;
  let T = low + ((high - low) * (value - first[property])) / (last[property] - first[property]);
  for (let iteration = 0; iteration < mostIterations; iteration += 1) {
    const state = at(T);
    if (state === undefined) return undefined;
    const misfit = state[property] - value;
    if (misfit > 0) high = T;
    else low = T;
    let next = T - misfit / (property === 'h' ? state.cp : state.cp / T);
    if (!(next > low) || !(next < high)) next = 0.5 * (low + high);
    const step = Math.abs(next - T);
    T = next;
    if (step <= 1e-13 * T) return T;
  }
  return undefined;
}

/** By p and h, or p and s: the phase at p is found first, then the temperature with which the equation gives the value. */
export function byPressureAnd<P extends PhaseState>(
  model: PureFluidModel<P>,
  property: 'h' | 's',
  p: number,
  value: number,
): Outcome<State> {
  const problem = outside(model, undefined, p);
  if (problem !== undefined) return failed(problem);
  let [low, high] = model.temperatures(p);
  let side: Phase | undefined;
  if (model.saturation !== undefined && p >= model.saturation.from.p && p < model.critical.p) {
    const found = saturatedStates(model, { p });
    if (!found.ok) return found;
    const { T, liquid, vapour } = found.value;
    if (value >= liquid[property] && value <= vapour[property])
      return byQuality(model, { p }, (value - liquid[property]) / (vapour[property] - liquid[property]));
    side = value < liquid[property] ? 'liquid' : 'vapour';
    if (side === 'liquid') high = T;
    else low = T;
  }
  const phaseAt = (T: number): Phase => (side !== undefined && T < model.critical.T ? side : model.phaseOf(T, p));
  const T = temperatureWith((at) => model.at(at, p, phaseAt(at)), property, value, low, high);
  const phase = T === undefined ? undefined : phaseAt(T);
  const state = T === undefined || phase === undefined ? undefined : model.at(T, p, phase);
  if (state === undefined)
    return refused('OUT_OF_RANGE_STATE', {
      problem: `No temperature from ${celsius(low)} to ${celsius(high)} gives ${
        property === 'h'
          ? `an enthalpy of ${plain(value / 1000)} kJ/kg`
          : `an entropy of ${plain(value / 1000)} kJ/(kg K)`
      } at ${bars(p)} in ${model.formulation}`,
      p,
      [property]: value,
    });
  return { ok: true, value: model.complete(state, phase ?? model.phaseOf(state.T, p), false) };
}

/** By T and density, through the two-phase region where the density lies between those of the phases. */
export function byTemperatureAndDensity<P extends PhaseState>(
  model: PureFluidModel<P>,
  T: number,
  rho: number,
): Outcome<State> {
  const problem = outside(model, T, undefined);
  if (problem !== undefined) return failed(problem);
  let phase: Phase | undefined;
  if (model.saturation !== undefined && T < model.critical.T) {
    const found = saturatedStates(model, { T });
    if (!found.ok) return found;
    const { liquid, vapour } = found.value;
    if (rho <= liquid.rho && rho >= vapour.rho)
      return byQuality(model, { T }, (1 / rho - 1 / liquid.rho) / (1 / vapour.rho - 1 / liquid.rho));
    phase = rho > liquid.rho ? 'liquid' : 'vapour';
  }
  const state = model.atDensity(T, rho, phase);
  const refusal = state === undefined ? undefined : outside(model, T, state.p);
  if (refusal !== undefined) return failed(refusal);
  if (state === undefined)
    return refused('OUT_OF_RANGE_STATE', {
      problem: `No pressure within ${model.formulation} gives a density of ${plain(rho)} kg/m³ at ${celsius(T)}`,
      T,
      rho,
    });
  return { ok: true, value: model.complete(state, phase ?? model.phaseOf(T, state.p), false) };
}
