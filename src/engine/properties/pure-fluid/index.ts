import type { Outcome, SaturationPair, State, StateInputs } from '../types';
import { refused } from './failure';
import type { PhaseState, PureFluidModel } from './model';
import { byPressureAnd, byTemperatureAndDensity } from './search';
import { byTemperatureAndPressure } from './single-phase';
import { byQuality, saturationPair } from './two-phase';

export type { Phase, PhaseState, PureFluidModel, SaturatedStates } from './model';

const allPairs = [
  ['T', 'p'],
  ['T', 'x'],
  ['p', 'x'],
  ['p', 'h'],
  ['p', 's'],
  ['T', 'rho'],
] as const;

/** Pairs of inputs that a model takes: without saturation, none with a quality. */
export function inputPairs<P extends PhaseState>(model: PureFluidModel<P>): (readonly (keyof StateInputs)[])[] {
  return allPairs.filter((pair) => model.saturation !== undefined || !(pair as readonly string[]).includes('x'));
}

/** A state of a pure fluid from two inputs. */
export function pureFluidState<P extends PhaseState>(model: PureFluidModel<P>, inputs: StateInputs): Outcome<State> {
  const { T, p, x, h, s, rho, massFraction, phase } = inputs;
  const given = [T, p, x, h, s, rho].filter((value) => value !== undefined).length;
  if (given === 2 && massFraction === undefined) {
    if (x !== undefined && model.saturation !== undefined) {
      if (T !== undefined) return byQuality(model, { T }, x);
      if (p !== undefined) return byQuality(model, { p }, x);
    }
    if (T !== undefined && p !== undefined) return byTemperatureAndPressure(model, T, p, phase);
    if (p !== undefined && h !== undefined) return byPressureAnd(model, 'h', p, h);
    if (p !== undefined && s !== undefined) return byPressureAnd(model, 's', p, s);
    if (T !== undefined && rho !== undefined) return byTemperatureAndDensity(model, T, rho);
  }
  const pairs = inputPairs(model).map((pair) => pair.join(' and '));
  return refused('UNSUPPORTED_INPUT', {
    name: model.name,
    inputs: `two of: ${pairs.join(', ')}`,
  });
}

/** Liquid and vapour at saturation, by T or by p. */
export function pureFluidSaturation<P extends PhaseState>(
  model: PureFluidModel<P>,
  given: { T: number } | { p: number },
): Outcome<SaturationPair> {
  return saturationPair(model, given);
}
