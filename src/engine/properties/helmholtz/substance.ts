import { inputPairs, pureFluidSaturation, pureFluidState } from '../pure-fluid/index';
import type { Substance } from '../types';
import { equationOf } from './equation';
import { helmholtzModel } from './model';
import type { HelmholtzFluid } from './types';

/** A fluid of the Helmholtz form as a substance. */
export function helmholtzSubstance(fluid: HelmholtzFluid): Substance {
  const model = helmholtzModel(fluid);
  return {
    id: fluid.id,
    name: fluid.name,
    aliases: fluid.aliases,
    sources: fluid.sources,
    range: fluid.range,
    limits: { T: fluid.temperature, p: fluid.pressure },
    inputs: inputPairs(model),
    molarMass: fluid.molarMass,
    state: (inputs) => pureFluidState(model, inputs),
    ...(model.saturation === undefined
      ? {}
      : { saturation: (given: { T: number } | { p: number }) => pureFluidSaturation(model, given) }),
    transport(T, rho) {
      const state = equationOf(fluid).state(T, rho / fluid.molarMass);
      const mu = fluid.viscosity?.value(state, fluid);
      const k = fluid.conductivity?.value(state, fluid, mu ?? NaN);
      return { ...(mu === undefined ? {} : { mu }), ...(k === undefined ? {} : { k }) };
    },
  };
}
