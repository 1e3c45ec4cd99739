import type { Diagnostic } from '../../errors/diagnostic';
import { bars, celsius, plain, pressureOutside, propertyError, temperatureOutside } from '../../errors/property-errors';
import type { Outcome, State, StateInputs, Substance } from '../types';
import { backgroundConductivity, viscosity as waterViscosity } from '../water/transport';
import { mixDiluteGases } from './mixing';
import {
  dewPoint,
  enthalpy,
  heatCapacity,
  humidityRatio,
  humidityRatioAtWetBulb,
  limits,
  saturationPressure,
  vapourPressure,
  volume,
  wetBulb,
} from './psychrometrics';

const formulation = 'ASHRAE 2017, ideal mixture';
const pressures: [number, number] = [1e4, 1e6];
const vapourMass = 0.018015268;

type Result = { W: number } | { error: Diagnostic };

const boils = (T: number, p: number): Diagnostic =>
  propertyError('PWS_ABOVE_P', {
    problem: `At ${celsius(T)} water's saturation pressure, ${bars(saturationPressure(T))}, is not below ${bars(p)}: no relative humidity is defined`,
    T,
    p,
  });

const supersaturated = (W: number, saturated: number, T: number): Diagnostic =>
  propertyError('SUPERSATURATED', {
    problem: `A humidity ratio of ${plain(W)} is above saturation at ${celsius(T)}, which is ${plain(saturated)}. Nearest: ${plain(saturated)}`,
    W,
    saturated,
    T,
  });

function fromRelativeHumidity(T: number, p: number, RH: number): Result {
  if (!(RH >= 0 && RH <= 1))
    return {
      error: propertyError('OUT_OF_RANGE_RH', {
        given: plain(RH),
        hint: RH > 1 ? ', or 0 % and 100 %' : '',
        nearest: RH < 0 ? '0' : '1',
        RH,
      }),
    };
  const pressure = RH * saturationPressure(T);
  return pressure < p ? { W: humidityRatio(pressure, p) } : { error: boils(T, p) };
}

function fromWetBulb(T: number, p: number, wet: number): Result {
  if (wet > T)
    return {
      error: propertyError('WET_BULB_ABOVE_DRY_BULB', {
        problem: `The wet-bulb temperature, ${celsius(wet)}, is above that of the air, ${celsius(T)}`,
        T,
        T_wb: wet,
      }),
    };
  if (!(wet >= limits[0])) return { error: temperatureOutside(wet, limits, formulation) };
  if (saturationPressure(wet) >= p) return { error: boils(wet, p) };
  const W = humidityRatioAtWetBulb(T, wet, p);
  if (W >= 0) return { W };
  return {
    error: propertyError('OUT_OF_RANGE_STATE', {
      problem: `A wet bulb of ${celsius(wet)} at ${celsius(T)} would need less than no humidity`,
      T,
      T_wb: wet,
    }),
  };
}

function fromDewPoint(T: number, p: number, dew: number): Result {
  if (dew > T) return { error: supersaturated(humidityRatio(saturationPressure(dew), p), saturatedRatio(T, p), T) };
  if (!(dew >= limits[0])) return { error: temperatureOutside(dew, limits, formulation) };
  return { W: humidityRatio(saturationPressure(dew), p) };
}

const saturatedRatio = (T: number, p: number): number => {
  const pressure = saturationPressure(T);
  return pressure < p ? humidityRatio(pressure, p) : Infinity;
};

function fromRatio(T: number, p: number | undefined, W: number): Result {
  if (!(W >= 0))
    return {
      error: propertyError('OUT_OF_RANGE_STATE', {
        problem: `A humidity ratio of ${plain(W)} is none: it begins at 0`,
        W,
      }),
    };
  const saturated = p === undefined ? Infinity : saturatedRatio(T, p);
  return W <= saturated ? { W } : { error: supersaturated(W, saturated, T) };
}

/** Dry air and vapour at their partial densities, mixed. */
function transport(air: Substance, T: number, p: number, W: number): { mu: number; k: number } | undefined {
  const part = vapourPressure(W, p) / p;
  const dry = air.state({ T, p });
  if (!dry.ok) return undefined;
  const { mu, k } = dry.value.values;
  if (mu === undefined || k === undefined || air.molarMass === undefined) return undefined;
  return mixDiluteGases([
    { part: 1 - part, molarMass: air.molarMass, mu, k },
    { part, molarMass: vapourMass, mu: waterViscosity(T, 0), k: backgroundConductivity(T, 0) },
  ]);
}

function stateOf(air: Substance, T: number, p: number, W: number): State {
  const rho = (1 + W) / volume(T, W, p);
  const cp = heatCapacity(W);
  const saturation = saturationPressure(T);
  const values: State['values'] = {
    T,
    p,
    W,
    h_da: enthalpy(T, W),
    v_da: volume(T, W, p),
    p_ws: saturation,
    rho,
    cp,
    beta: 1 / T,
  };
  const missing: State['missing'] = {};
  if (saturation < p)
    Object.assign(values, { RH: vapourPressure(W, p) / saturation, W_sat: humidityRatio(saturation, p) });
  else Object.assign(missing, { RH: boils(T, p), W_sat: boils(T, p) });
  const low = propertyError('PROPERTY_NOT_AVAILABLE', {
    reason: `The air is so dry that it lies below ${celsius(limits[0])}`,
  });
  const dew = dewPoint(W, T, p);
  const wet = wetBulb(W, T, p);
  if (dew === undefined) missing.T_dp = low;
  else values.T_dp = dew;
  if (wet === undefined) missing.T_wb = low;
  else values.T_wb = wet;
  const mixed = transport(air, T, p, W);
  if (mixed !== undefined) {
    const { mu, k } = mixed;
    Object.assign(values, { mu, k, nu: mu / rho, alpha: k / (rho * cp), Pr: (mu * cp) / k });
  }
  return {
    substance: 'moist_air',
    phase: 'gas',
    formulation,
    values,
    missing,
    uncertainty: { W: '0.7 %', rho: '0.1 %', cp: '1 %', mu: '2 %, mixing rule', k: '3 %, mixing rule', Pr: '4 %' },
    warnings: [],
  };
}

const wanted = 'T and p with one of RH, W, T_wb, T_dp';

function moistAirState(air: Substance, inputs: StateInputs): Outcome<State> {
  const { T, p, RH, W, T_wb, T_dp, x, h, s, rho, massFraction } = inputs;
  const refuse = (error: Diagnostic): Outcome<State> => ({ ok: false, error });
  const given = [RH, W, T_wb, T_dp].filter((value) => value !== undefined).length;
  const beside = [x, h, s, rho, massFraction].some((value) => value !== undefined);
  if (T === undefined || given !== 1 || beside || (p === undefined && W === undefined))
    return refuse(propertyError('UNSUPPORTED_INPUT', { name: 'Moist air', inputs: wanted }));
  if (!(T >= limits[0] && T <= limits[1])) return refuse(temperatureOutside(T, limits, formulation));
  if (p === undefined) {
    const ratio = fromRatio(T, undefined, W ?? NaN);
    return 'error' in ratio ? refuse(ratio.error) : { ok: true, value: withoutPressure(T, ratio.W) };
  }
  if (!(p >= pressures[0] && p <= pressures[1])) return refuse(pressureOutside(p, pressures, formulation));
  const ratio =
    RH !== undefined
      ? fromRelativeHumidity(T, p, RH)
      : T_wb !== undefined
        ? fromWetBulb(T, p, T_wb)
        : T_dp !== undefined
          ? fromDewPoint(T, p, T_dp)
          : fromRatio(T, p, W ?? NaN);
  return 'error' in ratio ? refuse(ratio.error) : { ok: true, value: stateOf(air, T, p, ratio.W) };
}

/** What needs no pressure: the enthalpy. */
const withoutPressure = (T: number, W: number): State => ({
  substance: 'moist_air',
  phase: 'gas',
  formulation,
  values: { T, W, h_da: enthalpy(T, W), p_ws: saturationPressure(T), cp: heatCapacity(W), beta: 1 / T },
  missing: {},
  uncertainty: {},
  warnings: [],
});

/** Moist air as a mixture of ideal gases; enthalpy and volume per kg of dry air. `air` gives the dry air's transport. */
export function moistAirSubstance(air: Substance): Substance {
  return {
    id: 'moist_air',
    name: 'Moist air',
    aliases: ['humid air'],
    sources: [
      'ASHRAE Handbook, Fundamentals (2017), chapter 1, Psychrometrics',
      'Wilke, A Viscosity Equation for Gas Mixtures, J. Chem. Phys. 18 (1950) 517',
      'Mason, Saxena, Approximate Formula for the Thermal Conductivity of Gas Mixtures, Phys. Fluids 1 (1958) 361',
    ],
    range: '−100 to 200 °C, 0.1 to 10 bar; enthalpy and volume per kg of dry air',
    limits: { T: limits, p: pressures },
    inputs: [
      ['T', 'p', 'RH'],
      ['T', 'p', 'W'],
      ['T', 'p', 'T_wb'],
      ['T', 'p', 'T_dp'],
      ['T', 'W'],
    ],
    state: (inputs) => moistAirState(air, inputs),
  };
}
