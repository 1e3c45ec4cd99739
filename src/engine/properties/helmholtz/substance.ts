import { bars, celsius, pressureOutside, propertyError, temperatureOutside } from '../../errors/property-errors';
import type { Outcome, State, StateInputs, Substance } from '../types';
import { dewPressure, gasDensity, helmholtzState } from './equation';
import { conductivity, viscosity } from './transport';
import type { HelmholtzFluid } from './types';

function gasState(fluid: HelmholtzFluid, T: number, p: number): Outcome<State> {
  if (!(T >= fluid.temperature[0] && T <= fluid.temperature[1]))
    return { ok: false, error: temperatureOutside(T, fluid.temperature, fluid.formulation) };
  if (!(p >= fluid.pressure[0] && p <= fluid.pressure[1]))
    return { ok: false, error: pressureOutside(p, fluid.pressure, fluid.formulation) };
  if (T < fluid.critical.T && p > dewPressure(fluid, T)) {
    const dew = dewPressure(fluid, T);
    return {
      ok: false,
      error: propertyError(
        'TWO_PHASE_OR_LIQUID_AIR',
        `At ${celsius(T)} ${fluid.name.toLowerCase()} condenses above ${bars(dew)}; only the gas is carried. This is ${bars(p)}.`,
        { T, p, dew },
      ),
    };
  }
  const density = gasDensity(fluid, T, p);
  if (density === undefined)
    return {
      ok: false,
      error: propertyError(
        'OUT_OF_RANGE_STATE',
        `${celsius(T)} and ${bars(p)} have no state in ${fluid.formulation}.`,
        { T, p },
      ),
    };
  const state = helmholtzState(fluid, T, density);
  const mu = viscosity(fluid, T, density);
  const k = conductivity(fluid, state, mu);
  const { rho, cp, h, u, s, cv, w, beta } = state;
  const hot = fluid.dissociation !== undefined && T > fluid.dissociation;
  return {
    ok: true,
    value: {
      substance: fluid.id,
      phase: T > fluid.critical.T && p > fluid.reducing.p ? 'supercritical' : 'gas',
      formulation: fluid.formulation,
      values: {
        T,
        p,
        rho,
        v: 1 / rho,
        h,
        u,
        s,
        cp,
        cv,
        w,
        beta,
        mu,
        k,
        nu: mu / rho,
        alpha: k / (rho * cp),
        Pr: (mu * cp) / k,
      },
      missing: {},
      uncertainty: fluid.uncertainty,
      warnings: hot
        ? [
            propertyError(
              'WARN_HIGH_T_DISSOCIATION',
              `Above ${celsius(fluid.dissociation ?? 0)} ${fluid.name.toLowerCase()} begins to dissociate, which the formulation does not carry.`,
              { T },
            ),
          ]
        : [],
    },
  };
}

/** A gas of the Helmholtz form as a substance: by T and p. */
export function gasSubstance(fluid: HelmholtzFluid): Substance {
  return {
    id: fluid.id,
    name: fluid.name,
    aliases: fluid.aliases,
    sources: fluid.sources,
    range: fluid.range,
    limits: { T: fluid.temperature, p: fluid.pressure },
    inputs: [['T', 'p']],
    state({ T, p, x, h, s, rho }: StateInputs) {
      if (T === undefined || p === undefined || [x, h, s, rho].some((value) => value !== undefined)) {
        return { ok: false, error: propertyError('UNSUPPORTED_INPUT', `${fluid.name} takes T and p.`) };
      }
      return gasState(fluid, T, p);
    },
  };
}
