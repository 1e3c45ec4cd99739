import { celsius, pressureOutside, temperatureOutside } from '../../errors/property-errors';
import { findRoot } from '../../numerics/roots';
import type { Phase, PureFluidModel } from '../pure-fluid/index';
import { complete } from './complete';
import {
  criticalPressure,
  criticalTemperature,
  inRegion1,
  inRegion2,
  inRegion3,
  inRegion5,
  type WaterState,
} from './regions';
import {
  boundaryPressure23,
  saturatedStates,
  saturationPressure,
  saturationTemperature,
  solveRegion3,
  surfaceTension,
} from './saturation';

const formulation = 'IAPWS R7-97';
const limits = { T: [273.15, 2273.15] as [number, number], p: [1, 100e6] as [number, number] };
/** Region 5 begins above this temperature and ends at the lower pressure. */
const region5Start = 1073.15;
const region5Pressure = 50e6;
/** Region 3 lies above this temperature and the boundary to region 2. */
const region3Start = 623.15;
const boundary23End = 863.15;
const leastSaturation = { T: 273.15, p: 611.213 };
const triplePressure = 611.657;

/** Closer to saturation than this, temperature and pressure alone do not say which phase is meant. */
const closeTemperature = 0.05;
const closePressure = 1e-3;

function phaseOf(T: number, p: number): Phase {
  if (T >= criticalTemperature) return p >= criticalPressure ? 'supercritical' : 'gas';
  return p >= saturationPressure(T) ? 'liquid' : 'vapour';
}

/** The state at T and p with that phase; undefined outside the formulation. */
function at(T: number, p: number, phase: Phase): WaterState | undefined {
  if (T > region5Start) return p <= region5Pressure ? inRegion5(T, p) : undefined;
  if (T <= region3Start) return phase === 'liquid' ? inRegion1(T, p) : inRegion2(T, p);
  if (T > boundary23End || p <= boundaryPressure23(T)) return inRegion2(T, p);
  return solveRegion3(T, p, phase === 'liquid');
}

/** Region 3 directly, elsewhere the pressure that gives this density. */
function atDensity(T: number, rho: number, phase: Phase | undefined): WaterState | undefined {
  if (!(rho > 0)) return undefined;
  if (T > region3Start && T <= boundary23End) {
    const dense = inRegion3(T, rho);
    if (dense.p > boundaryPressure23(T) && dense.p <= limits.p[1]) return dense;
  }
  const line = T < criticalTemperature ? saturationPressure(T) : undefined;
  const low = phase === 'liquid' ? (line ?? limits.p[0]) : limits.p[0];
  const high = phase === 'vapour' && line !== undefined ? line : T > region5Start ? region5Pressure : limits.p[1];
  const sought = (p: number) => at(T, p, phase ?? phaseOf(T, p));
  const found = findRoot(
    (p) => {
      const state = sought(p);
      return state === undefined ? undefined : state.rho - rho;
    },
    low,
    high,
  );
  return found.converged ? sought(found.root) : undefined;
}

/** Water and steam by the regions of R7-97. */
export const waterModel: PureFluidModel<WaterState> = {
  id: 'water',
  name: 'water',
  formulation,
  limits,
  critical: { T: criticalTemperature, p: criticalPressure },
  refuse: (T, p) =>
    T > region5Start && p > region5Pressure
      ? pressureOutside(p, [limits.p[0], region5Pressure], `${formulation} above ${celsius(region5Start)}`)
      : undefined,
  tooCold: (T) => temperatureOutside(T, limits.T, formulation),
  temperatures: (p) => [limits.T[0], p <= region5Pressure ? limits.T[1] : region5Start],
  phaseOf,
  isAmbiguous: (T, p) =>
    T < criticalTemperature &&
    p < criticalPressure &&
    p >= triplePressure &&
    (Math.abs(T - saturationTemperature(p)) < closeTemperature ||
      Math.abs(p / saturationPressure(T) - 1) < closePressure),
  at,
  atDensity,
  complete,
  saturation: {
    from: leastSaturation,
    at: (given) => ('T' in given ? saturatedStates(given.T) : saturatedStates(saturationTemperature(given.p), given.p)),
    boiling: (p) => (p >= leastSaturation.p && p < criticalPressure ? saturationTemperature(p) : undefined),
    surfaceTension,
  },
};
