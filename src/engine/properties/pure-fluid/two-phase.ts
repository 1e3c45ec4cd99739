import { bars, celsius, plain, pressureOutside, propertyError } from '../../errors/property-errors';
import type { Outcome, SaturationPair, State } from '../types';
import { failed, refused } from './failure';
import type { PhaseState, PureFluidModel, SaturatedStates } from './model';

type Given = { T: number } | { p: number };

/** Both phases at saturation, by T or by p. */
export function saturatedStates<P extends PhaseState>(
  model: PureFluidModel<P>,
  given: Given,
): Outcome<SaturatedStates<P>> {
  const { saturation, critical, name } = model;
  if (saturation === undefined) return refused('UNSUPPORTED_INPUT', { name, inputs: 'T and p: it has no saturation' });
  if ('T' in given && !(given.T >= saturation.from.T)) return failed(model.tooCold(given.T));
  if ('p' in given && !(given.p >= saturation.from.p))
    return failed(pressureOutside(given.p, [saturation.from.p, critical.p], `the saturation line of ${name}`));
  if ('T' in given ? given.T >= critical.T : given.p >= critical.p)
    return refused('SUPERCRITICAL_NO_SATURATION', {
      critical: `${celsius(critical.T)}, ${bars(critical.p)}`,
      name,
      ...given,
    });
  const states = saturation.at(given);
  return states === undefined
    ? refused('OUT_OF_RANGE_STATE', {
        problem: `So close to the critical point (${celsius(critical.T)}, ${bars(critical.p)}) the two phases of ${name} cannot be told apart`,
        ...given,
      })
    : { ok: true, value: states };
}

/** Liquid and vapour at saturation, with what belongs to the pair. */
export function saturationPair<P extends PhaseState>(model: PureFluidModel<P>, given: Given): Outcome<SaturationPair> {
  const found = saturatedStates(model, given);
  if (!found.ok) return found;
  const { T, p, liquid, vapour } = found.value;
  const sigma = model.saturation?.surfaceTension?.(T);
  return {
    ok: true,
    value: {
      T,
      p,
      liquid: model.complete(liquid, 'liquid', true),
      vapour: model.complete(vapour, 'vapour', true),
      h_fg: vapour.h - liquid.h,
      ...(sigma === undefined ? {} : { sigma }),
    },
  };
}

const betweenPhases = ['cp', 'cv', 'w', 'mu', 'nu', 'k', 'Pr', 'alpha', 'beta'] as const;

/** A mixture of the saturated phases: only what mixes by mass; the rest has no value. */
function mixture<P extends PhaseState>(
  model: PureFluidModel<P>,
  { T, p, liquid, vapour }: SaturatedStates<P>,
  x: number,
): State {
  const mix = (a: number, b: number) => a + x * (b - a);
  const v = mix(1 / liquid.rho, 1 / vapour.rho);
  const reason = propertyError('TWO_PHASE_PROPERTY');
  return {
    substance: model.id,
    phase: 'two-phase',
    formulation: `${model.formulation}, two phases`,
    values: {
      T,
      p,
      x,
      rho: 1 / v,
      v,
      h: mix(liquid.h, vapour.h),
      s: mix(liquid.s, vapour.s),
      u: mix(liquid.u, vapour.u),
    },
    missing: Object.fromEntries(betweenPhases.map((property) => [property, reason])),
    uncertainty: {},
    warnings: [],
  };
}

/** The state of given vapour quality; at 0 and 1 one phase with all its properties. */
export function byQuality<P extends PhaseState>(model: PureFluidModel<P>, given: Given, x: number): Outcome<State> {
  if (!(x >= 0 && x <= 1)) return refused('OUT_OF_RANGE_QUALITY', { given: plain(x), nearest: x < 0 ? '0' : '1', x });
  const found = saturatedStates(model, given);
  if (!found.ok) return found;
  if (x > 0 && x < 1) return { ok: true, value: mixture(model, found.value, x) };
  const phase = x === 0 ? 'liquid' : 'vapour';
  const state = model.complete(found.value[phase], phase, true);
  return { ok: true, value: { ...state, values: { ...state.values, x } } };
}
