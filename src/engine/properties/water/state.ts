import { bars, celsius, pressureOutside, propertyError, temperatureOutside } from '../../errors/property-errors';
import { findRoot } from '../../numerics/roots';
import type { Outcome, SaturationPair, State, StateInputs } from '../types';
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
import { conductivity, viscosity } from './transport';

const formulation = 'IAPWS R7-97';
export const limits = { T: [273.15, 2273.15] as [number, number], p: [1, 100e6] as [number, number] };
const hotPressure = 50e6;
const triplePressure = 611.657;
const transportEnd = 1173.15;

/** Closer to saturation than this, temperature and pressure alone do not say which phase is meant. */
const closeTemperature = 0.05;
const closePressure = 1e-3;

const uncertainty = {
  rho: '0.01 % liquid, 0.1 % steam',
  cp: '0.2 % liquid, 1 % steam',
  mu: '1 % liquid, 3 % steam',
  k: '2 %',
  Pr: '3 %',
};

interface Located {
  state: WaterState;
  region: string;
  phase: State['phase'];
}

function phaseOf(T: number, p: number): State['phase'] {
  if (T >= criticalTemperature) return p >= criticalPressure ? 'supercritical' : 'gas';
  return p >= saturationPressure(T) ? 'liquid' : 'vapour';
}

/** The state at T and p without the question of phase; undefined outside the formulation. */
function locate(T: number, p: number, phase = phaseOf(T, p)): Located | undefined {
  if (T > 1073.15) return p <= hotPressure ? { state: inRegion5(T, p), region: 'region 5', phase } : undefined;
  if (T <= 623.15) {
    return phase === 'liquid'
      ? { state: inRegion1(T, p), region: 'region 1', phase }
      : { state: inRegion2(T, p), region: 'region 2', phase };
  }
  if (T > 863.15 || p <= boundaryPressure23(T)) return { state: inRegion2(T, p), region: 'region 2', phase };
  const state = solveRegion3(T, p, phase === 'liquid');
  return state === undefined ? undefined : { state, region: 'region 3', phase };
}

function complete({ state, region, phase }: Located): State {
  const { T, p, rho, h, u, s, cp, cv, w, beta } = state;
  const values: State['values'] = { T, p, rho, v: 1 / rho, h, u, s, cp, cv, w, beta };
  const missing: State['missing'] = {};
  if (T <= transportEnd) {
    const mu = viscosity(T, rho);
    const k = conductivity(state, mu);
    Object.assign(values, { mu, k, nu: mu / rho, alpha: k / (rho * cp), Pr: (mu * cp) / k });
  } else {
    const reason = propertyError(
      'TRANSPORT_OUT_OF_RANGE',
      `Viscosity (R12-08) and conductivity (R15-11) end at ${celsius(transportEnd)}; this is ${celsius(T)}.`,
      { T, high: transportEnd },
    );
    for (const property of ['mu', 'k', 'nu', 'alpha', 'Pr'] as const) missing[property] = reason;
  }
  const near = Math.abs(T - criticalTemperature) < 5 && Math.abs(p - criticalPressure) < 1e6;
  const warnings = near
    ? [
        propertyError(
          'WARN_NEAR_CRITICAL',
          'Close to the critical point properties change steeply and their uncertainty is larger than stated.',
        ),
      ]
    : [];
  return { substance: 'water', phase, formulation: `${formulation} ${region}`, values, missing, uncertainty, warnings };
}

const failed = (error: ReturnType<typeof propertyError>): { ok: false; error: ReturnType<typeof propertyError> } => ({
  ok: false,
  error,
});

function byTemperatureAndPressure(T: number, p: number, wanted: StateInputs['phase']): Outcome<State> {
  if (!(T >= limits.T[0] && T <= limits.T[1])) return failed(temperatureOutside(T, limits.T, formulation));
  if (!(p >= limits.p[0] && p <= limits.p[1])) return failed(pressureOutside(p, limits.p, formulation));
  if (T > 1073.15 && p > hotPressure)
    return failed(pressureOutside(p, [limits.p[0], hotPressure], `${formulation} above 800 °C`));
  const natural = phaseOf(T, p);
  if (T < criticalTemperature && p < criticalPressure && p >= triplePressure) {
    const boiling = saturationTemperature(p);
    const close = Math.abs(T - boiling) < closeTemperature || Math.abs(p / saturationPressure(T) - 1) < closePressure;
    if (wanted === undefined && close) {
      return failed(
        propertyError(
          'AMBIGUOUS_AT_SATURATION',
          `At ${bars(p)} water boils at ${celsius(boiling)}: with ${celsius(T)} the phase is not certain. Give p and x (0 liquid, 1 steam), or ask for saturation.`,
          { T, p, T_sat: boiling },
        ),
      );
    }
    const isLiquid = natural === 'liquid';
    if (wanted !== undefined && isLiquid !== (wanted === 'liquid') && !close) {
      return failed(
        propertyError(
          'WRONG_PHASE',
          `At ${celsius(T)} and ${bars(p)} water is ${isLiquid ? 'liquid' : 'steam'}, not ${wanted}: it boils at ${celsius(boiling)}.`,
          { T, p, T_sat: boiling },
        ),
      );
    }
  }
  const phase =
    wanted === undefined || natural === 'gas' || natural === 'supercritical'
      ? natural
      : wanted === 'liquid'
        ? 'liquid'
        : 'vapour';
  const located = locate(T, p, phase);
  return located === undefined
    ? failed(
        propertyError('OUT_OF_RANGE_STATE', `${celsius(T)} and ${bars(p)} have no state in ${formulation}.`, { T, p }),
      )
    : { ok: true, value: complete(located) };
}

function phaseState(state: WaterState, T: number, phase: 'liquid' | 'vapour'): State {
  const region = T > 623.15 ? 'region 3' : phase === 'liquid' ? 'region 1' : 'region 2';
  return complete({ state, region: `${region}, saturated`, phase });
}

function saturationAt(inputs: {
  T?: number;
  p?: number;
}): Outcome<{ T: number; p: number; liquid: WaterState; vapour: WaterState }> {
  const { T, p } = inputs;
  if (T !== undefined && !(T >= limits.T[0]))
    return failed(temperatureOutside(T, [limits.T[0], criticalTemperature], 'the saturation line'));
  if (p !== undefined && !(p >= 611.213))
    return failed(pressureOutside(p, [611.213, criticalPressure], 'the saturation line'));
  if ((T ?? 0) >= criticalTemperature || (p ?? 0) >= criticalPressure) {
    return failed(
      propertyError(
        'SUPERCRITICAL_NO_SATURATION',
        `Above the critical point (${celsius(criticalTemperature)}, ${bars(criticalPressure)}) water has no saturation.`,
        { T: T ?? NaN, p: p ?? NaN },
      ),
    );
  }
  const temperature = T ?? saturationTemperature(p ?? NaN);
  const states = saturatedStates(temperature, p);
  return states === undefined
    ? failed(
        propertyError('OUT_OF_RANGE_STATE', `No saturated state was found at ${celsius(temperature)}.`, {
          T: temperature,
        }),
      )
    : { ok: true, value: states };
}

/** Liquid and vapour at saturation, by T or by p. */
export function saturation(inputs: { T: number } | { p: number }): Outcome<SaturationPair> {
  const found = saturationAt(inputs);
  if (!found.ok) return found;
  const { T, p, liquid, vapour } = found.value;
  return {
    ok: true,
    value: {
      T,
      p,
      liquid: phaseState(liquid, T, 'liquid'),
      vapour: phaseState(vapour, T, 'vapour'),
      h_fg: vapour.h - liquid.h,
      sigma: surfaceTension(T),
    },
  };
}

function byQuality(inputs: { T?: number; p?: number }, x: number): Outcome<State> {
  if (!(x >= 0 && x <= 1))
    return failed(
      propertyError(
        'OUT_OF_RANGE_QUALITY',
        `A vapour quality of ${x} is none: it lies between 0 (liquid) and 1 (vapour).`,
        { x },
      ),
    );
  const found = saturationAt(inputs);
  if (!found.ok) return found;
  const { T, p, liquid, vapour } = found.value;
  if (x === 0 || x === 1) {
    const state = phaseState(x === 0 ? liquid : vapour, T, x === 0 ? 'liquid' : 'vapour');
    return { ok: true, value: { ...state, values: { ...state.values, x } } };
  }
  const mix = (a: number, b: number) => a + x * (b - a);
  const v = mix(1 / liquid.rho, 1 / vapour.rho);
  const reason = propertyError(
    'TWO_PHASE_PROPERTY',
    'This property has no value between the phases; take it from the saturation pair (liquid and vapour).',
  );
  const missing = Object.fromEntries(
    (['cp', 'cv', 'w', 'mu', 'nu', 'k', 'Pr', 'alpha', 'beta'] as const).map((property) => [property, reason]),
  );
  const values = {
    T,
    p,
    x,
    rho: 1 / v,
    v,
    h: mix(liquid.h, vapour.h),
    s: mix(liquid.s, vapour.s),
    u: mix(liquid.u, vapour.u),
  };
  return {
    ok: true,
    value: {
      substance: 'water',
      phase: 'two-phase',
      formulation: `${formulation} region 4`,
      values,
      missing,
      uncertainty: {},
      warnings: [],
    },
  };
}

/** By p and h, or p and s: the phase at p is found first, then T with which the forward equation gives the value. */
function byPressureAnd(property: 'h' | 's', p: number, value: number): Outcome<State> {
  if (!(p >= limits.p[0] && p <= limits.p[1])) return failed(pressureOutside(p, limits.p, formulation));
  const hottest = p <= hotPressure ? limits.T[1] : 1073.15;
  let [low, high] = [limits.T[0], hottest];
  let phase: State['phase'] | undefined;
  if (p >= 611.213 && p < criticalPressure) {
    const found = saturationAt({ p });
    if (!found.ok) return found;
    const { T, liquid, vapour } = found.value;
    if (value >= liquid[property] && value <= vapour[property])
      return byQuality({ p }, (value - liquid[property]) / (vapour[property] - liquid[property]));
    phase = value < liquid[property] ? 'liquid' : 'vapour';
    if (phase === 'liquid') high = T;
    else low = T;
  }
  const at = (T: number) => locate(T, p, T < criticalTemperature ? phase : undefined)?.state;
  const found = findRoot(
    (T) => {
      const state = at(T);
      return state === undefined ? undefined : state[property] - value;
    },
    low,
    high,
  );
  const located = found.converged
    ? locate(found.root, p, found.root < criticalTemperature ? phase : undefined)
    : undefined;
  if (located === undefined)
    return failed(
      propertyError(
        'OUT_OF_RANGE_STATE',
        `No temperature from ${celsius(low)} to ${celsius(high)} gives this ${property === 'h' ? 'enthalpy' : 'entropy'} at ${bars(p)}.`,
        { p, [property]: value },
      ),
    );
  return { ok: true, value: complete(located) };
}

/** By T and density: region 3 directly, elsewhere the pressure that gives this density. */
function byTemperatureAndDensity(T: number, rho: number): Outcome<State> {
  if (!(T >= limits.T[0] && T <= limits.T[1])) return failed(temperatureOutside(T, limits.T, formulation));
  let [low, high] = [limits.p[0], T > 1073.15 ? hotPressure : limits.p[1]];
  let phase: State['phase'] | undefined;
  if (T < criticalTemperature) {
    const found = saturationAt({ T });
    if (!found.ok) return found;
    const { p, liquid, vapour } = found.value;
    if (rho <= liquid.rho && rho >= vapour.rho)
      return byQuality({ T }, (1 / rho - 1 / liquid.rho) / (1 / vapour.rho - 1 / liquid.rho));
    phase = rho > liquid.rho ? 'liquid' : 'vapour';
    if (phase === 'liquid') low = p;
    else high = p;
  }
  if (T > 623.15 && T <= 863.15) {
    const dense = inRegion3(T, rho);
    if (rho > 0 && dense.p > boundaryPressure23(T) && dense.p <= limits.p[1])
      return { ok: true, value: complete({ state: dense, region: 'region 3', phase: phase ?? phaseOf(T, dense.p) }) };
  }
  const found = findRoot(
    (p) => {
      const state = locate(T, p, phase)?.state;
      return state === undefined ? undefined : state.rho - rho;
    },
    low,
    high,
  );
  const located = found.converged ? locate(T, found.root, phase) : undefined;
  if (located === undefined)
    return failed(
      propertyError('OUT_OF_RANGE_STATE', `No pressure gives a density of ${rho} kg/m³ at ${celsius(T)}.`, { T, rho }),
    );
  return { ok: true, value: complete(located) };
}

/** A state of water or steam from two inputs. */
export function waterState(inputs: StateInputs): Outcome<State> {
  const { T, p, x, h, s, rho, phase } = inputs;
  const given = [T, p, x, h, s, rho].filter((value) => value !== undefined).length;
  if (given === 2 && x !== undefined && (T !== undefined || p !== undefined))
    return byQuality(T === undefined ? { p: p ?? NaN } : { T }, x);
  if (given === 2 && T !== undefined && p !== undefined) return byTemperatureAndPressure(T, p, phase);
  if (given === 2 && p !== undefined && h !== undefined) return byPressureAnd('h', p, h);
  if (given === 2 && p !== undefined && s !== undefined) return byPressureAnd('s', p, s);
  if (given === 2 && T !== undefined && rho !== undefined) return byTemperatureAndDensity(T, rho);
  return failed(
    propertyError('UNSUPPORTED_INPUT', 'Water takes two of: T and p, T and x, p and x, p and h, p and s, T and rho.'),
  );
}
