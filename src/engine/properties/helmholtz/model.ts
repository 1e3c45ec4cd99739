import { bars, celsius, propertyError, temperatureOutside } from '../../errors/property-errors';
import { findRoot } from '../../numerics/roots';
import type { Phase, PureFluidModel } from '../pure-fluid/index';
import { completer } from './complete';
import { densityBetween, denserThan } from './density';
import { equationOf, type Equation, type HelmholtzState } from './equation';
import {
  exponentialAncillary,
  linearAncillary,
  saturationAtPressure,
  saturationAtTemperature,
  type SaturationPoint,
} from './saturation';
import type { Ancillary, HelmholtzFluid, SaturationAncillaries } from './types';

/** Closer to saturation than this, temperature and pressure alone do not say which phase is meant. */
const closeTemperature = 0.05;
const closePressure = 1e-3;
/** The ancillary pressures are good to 1 % at worst: nearer than this the exact line is asked. */
const ancillaryMargin = 0.03;

type Model = PureFluidModel<HelmholtzState>;

/** Remembers the last point asked for: one state asks for its saturation several times. */
function remembered(compute: (x: number) => SaturationPoint | undefined): (x: number) => SaturationPoint | undefined {
  let lastX = NaN;
  let last: SaturationPoint | undefined;
  return (x) => {
    if (x !== lastX) {
      last = compute(x);
      lastX = x;
    }
    return last;
  };
}

function gasDensity(equation: Equation, T: number, p: number, most: number): number {
  return densityBetween(equation, T, p, 0, most, p / (equation.fluid.gasConstant * T));
}

function refusal(fluid: HelmholtzFluid, T: number, p: number) {
  const melting = fluid.melting?.(T);
  if (melting === undefined || p <= melting) return undefined;
  return propertyError('BELOW_FREEZING', {
    name: fluid.word,
    freezing: celsius(T),
    condition: ` under ${bars(melting)}`,
    given: bars(p),
    T,
    p,
  });
}

/** Coldest temperature at a pressure: that of the triple point, or of melting. */
function coldest(fluid: HelmholtzFluid, p: number): number {
  const [low, high] = fluid.temperature;
  const { melting } = fluid;
  if (melting === undefined || melting(low) >= p) return low;
  const found = findRoot((T) => melting(T) - p, low, high);
  return found.converged ? found.root : low;
}

function shared(
  fluid: HelmholtzFluid,
): Pick<Model, 'id' | 'name' | 'formulation' | 'limits' | 'critical' | 'complete'> {
  return {
    id: fluid.id,
    name: fluid.word,
    formulation: fluid.formulation,
    limits: { T: fluid.temperature, p: fluid.pressure },
    critical: fluid.critical,
    complete: completer(fluid),
  };
}

const above = (fluid: HelmholtzFluid, T: number, p: number): Phase =>
  T >= fluid.critical.T && p >= fluid.critical.p ? 'supercritical' : 'gas';

/** A pure fluid: liquid, vapour and all above. */
function pureModel(fluid: HelmholtzFluid, ancillaries: SaturationAncillaries): Model {
  const equation = equationOf(fluid);
  const byT = remembered((T) => saturationAtTemperature(equation, ancillaries, T));
  const byP = remembered((p) => saturationAtPressure(equation, ancillaries, p));
  const near = (T: number, p: number, margin: number) =>
    Math.abs(Math.log(p / exponentialAncillary(ancillaries.pressure, T))) < margin;
  const linePressure = (T: number, p: number): number =>
    (near(T, p, ancillaryMargin) ? byT(T)?.p : undefined) ?? exponentialAncillary(ancillaries.pressure, T);
  const from = { T: fluid.temperature[0], p: byT(fluid.temperature[0])?.p ?? fluid.pressure[0] };

  function densityAt(T: number, p: number, phase: Phase): number {
    if (T >= fluid.critical.T) {
      const high = denserThan(equation, T, p, fluid.reducing.rho);
      return gasDensity(equation, T, p, high);
    }
    // On the line itself the exact densities end the bracket; away from it the ancillary ones will do.
    const exact = near(T, p, ancillaryMargin) ? byT(T) : undefined;
    if (phase === 'liquid') {
      const low = exact?.liquid ?? linearAncillary(ancillaries.liquid, T);
      const start = low * (exact === undefined ? 0.99 : 1 - 1e-7);
      return densityBetween(equation, T, p, start, denserThan(equation, T, p, low), low);
    }
    const high = exact === undefined ? exponentialAncillary(ancillaries.vapour, T) * 1.02 : exact.vapour * (1 + 1e-7);
    return gasDensity(equation, T, p, high);
  }

  return {
    ...shared(fluid),
    refuse: (T, p) => refusal(fluid, T, p),
    tooCold: (T) =>
      T > 0
        ? propertyError('BELOW_TRIPLE_POINT', {
            given: celsius(T),
            name: fluid.word,
            formulation: fluid.formulation,
            nearest: celsius(fluid.temperature[0]),
            T,
            low: fluid.temperature[0],
          })
        : temperatureOutside(T, fluid.temperature, fluid.formulation),
    temperatures: (p) => [coldest(fluid, p), fluid.temperature[1]],
    phaseOf(T, p) {
      if (T >= fluid.critical.T) return above(fluid, T, p);
      return p >= linePressure(T, p) ? 'liquid' : 'vapour';
    },
    isAmbiguous(T, p) {
      if (T >= fluid.critical.T || p >= fluid.critical.p || !near(T, p, 0.15)) return false;
      const line = byT(T);
      if (line === undefined) return true;
      return Math.abs(p / line.p - 1) < closePressure || Math.abs(p - line.p) < closeTemperature * line.slope;
    },
    at(T, p, phase) {
      const density = densityAt(T, p, phase);
      return Number.isNaN(density) ? undefined : equation.state(T, density);
    },
    atDensity: (T, rho) => (rho > 0 ? equation.state(T, rho / fluid.molarMass) : undefined),
    saturation: {
      from,
      at(given) {
        const point = 'T' in given ? byT(given.T) : byP(given.p);
        if (point === undefined) return undefined;
        const liquid = equation.state(point.T, point.liquid);
        const vapour = equation.state(point.T, point.vapour);
        return { T: point.T, p: point.p, liquid: { ...liquid, p: point.p }, vapour: { ...vapour, p: point.p } };
      },
      boiling: (p) => (p >= from.p && p < fluid.critical.p ? byP(p)?.T : undefined),
      ...(fluid.surface === undefined ? {} : { surfaceTension: surfaceTension(fluid.surface) }),
    },
  };
}

/** Σ a·(1 − T/T₀)^n in N/m. */
const surfaceTension =
  ({ T: T0, terms }: NonNullable<HelmholtzFluid['surface']>) =>
  (T: number): number =>
    terms.reduce((sum, [a, n]) => sum + a * Math.max(0, 1 - T / T0) ** n, 0);

/** A mixture of constant composition, carried as a gas down to its dew line. */
function gasModel(fluid: HelmholtzFluid, dew: Ancillary): Model {
  const equation = equationOf(fluid);
  const dewPressure = (T: number) => exponentialAncillary(dew, T);
  return {
    ...shared(fluid),
    refuse(T, p) {
      if (T >= fluid.critical.T || p <= dewPressure(T)) return refusal(fluid, T, p);
      return propertyError('TWO_PHASE_OR_LIQUID_AIR', {
        temperature: celsius(T),
        name: fluid.word,
        dew: bars(dewPressure(T)),
        pressure: bars(p),
        T,
        p,
      });
    },
    tooCold: (T) => temperatureOutside(T, fluid.temperature, fluid.formulation),
    temperatures(p) {
      const [low, high] = fluid.temperature;
      if (p >= dew.value) return [Math.max(fluid.critical.T, coldest(fluid, p)), high];
      if (p <= dewPressure(low)) return [low, high];
      const found = findRoot((T) => dewPressure(T) - p, low, fluid.critical.T);
      return [found.root, high];
    },
    phaseOf: (T, p) => above(fluid, T, p),
    isAmbiguous: () => false,
    at(T, p) {
      const high = denserThan(equation, T, p, fluid.reducing.rho * (T < fluid.critical.T ? 0.2 : 1));
      const density = gasDensity(equation, T, p, high);
      return Number.isNaN(density) ? undefined : equation.state(T, density);
    },
    atDensity(T, rho) {
      if (!(rho > 0)) return undefined;
      const state = equation.state(T, rho / fluid.molarMass);
      return state.compressibility > 0 ? state : undefined;
    },
  };
}

/** The model of a fluid given as Helmholtz energy. */
export function helmholtzModel(fluid: HelmholtzFluid): Model {
  return 'dew' in fluid.saturation ? gasModel(fluid, fluid.saturation.dew) : pureModel(fluid, fluid.saturation);
}
