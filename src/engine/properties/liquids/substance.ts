import type { Diagnostic } from '../../errors/diagnostic';
import { bars, celsius, plain, pressureOutside, propertyError, temperatureOutside } from '../../errors/property-errors';
import { findRoot } from '../../numerics/roots';
import type { Outcome, State, StateInputs, Substance } from '../types';
import type { Liquid } from './types';

const pressures: [number, number] = [1, 100e6];
/** Half step of the difference that gives the expansion coefficient, K. */
const step = 0.05;

function compositionProblem(liquid: Liquid, x: number | undefined): Diagnostic | undefined {
  if (liquid.composition === undefined) return undefined;
  const [low, high] = liquid.composition.range;
  if (x === undefined) return propertyError('UNSUPPORTED_INPUT', { name: liquid.name, inputs: inputWords(liquid) });
  if (x >= low && x <= high) return undefined;
  const { hint } = liquid.composition;
  return propertyError('OUT_OF_RANGE_COMPOSITION', {
    given: plain(x),
    formulation: liquid.formulation,
    from: plain(low),
    to: plain(high),
    hint: hint === undefined || x <= high ? '' : ` (${hint})`,
    nearest: plain(x < low ? low : high),
    x,
    low,
    high,
  });
}

function boilingProblem(liquid: Liquid, T: number, p: number, x: number): Diagnostic | undefined {
  const { vapourPressure } = liquid;
  if (vapourPressure === undefined || T < vapourPressure.from || p >= vapourPressure.value(T, x)) return undefined;
  const boiling = findRoot((at) => vapourPressure.value(at, x) - p, vapourPressure.from, T);
  return propertyError('WRONG_PHASE', {
    temperature: celsius(T),
    pressure: bars(p),
    name: liquid.word,
    natural: 'vapour',
    wanted: 'liquid',
    reason: boiling.converged ? `: it boils at ${celsius(boiling.root)}` : '',
    T,
    p,
    ...(boiling.converged ? { T_sat: boiling.root } : {}),
  });
}

function problemOf(liquid: Liquid, T: number, p: number | undefined, x: number | undefined): Diagnostic | undefined {
  const composition = compositionProblem(liquid, x);
  if (composition !== undefined) return composition;
  const freezing = liquid.freezing?.(x ?? 0);
  if (freezing !== undefined && T > 0 && T < freezing)
    return propertyError('BELOW_FREEZING', {
      name: liquid.word,
      freezing: celsius(freezing),
      condition: x === undefined ? '' : ` at a mass fraction of ${plain(x)}`,
      given: celsius(T),
      T,
      freezingT: freezing,
    });
  const [low, high] = liquid.temperature;
  if (!(T >= low && T <= high))
    return temperatureOutside(T, [Math.max(low, freezing ?? low), high], liquid.formulation);
  if (p === undefined) return undefined;
  if (!(p >= pressures[0] && p <= pressures[1])) return pressureOutside(p, pressures, liquid.formulation);
  return boilingProblem(liquid, T, p, x ?? 0);
}

function warningsOf(liquid: Liquid, T: number, p: number | undefined, x: number): Diagnostic[] {
  const certain = liquid.certainlyLiquidAbove?.(T, x);
  if (p === undefined || certain === undefined || p >= certain) return [];
  return [
    propertyError('WARN_BOILING_NOT_CARRIED', {
      name: liquid.word,
      pressure: bars(p),
      temperature: celsius(T),
      certain: bars(certain),
      T,
      p,
    }),
  ];
}

function stateOf(liquid: Liquid, T: number, p: number | undefined, x: number): State {
  const rho = liquid.rho(T, x);
  const cp = liquid.cp(T, x);
  const mu = liquid.mu(T, x);
  const k = liquid.k(T, x);
  const beta = (liquid.rho(T - step, x) - liquid.rho(T + step, x)) / (2 * step * rho);
  const freezing = liquid.freezing?.(x);
  return {
    substance: liquid.id,
    phase: 'liquid',
    formulation: liquid.formulation,
    values: {
      T,
      ...(p === undefined ? {} : { p }),
      rho,
      v: 1 / rho,
      cp,
      mu,
      k,
      nu: mu / rho,
      alpha: k / (rho * cp),
      Pr: (mu * cp) / k,
      beta,
      ...(freezing === undefined ? {} : { T_freeze: freezing }),
    },
    missing: {},
    uncertainty: liquid.uncertainty,
    warnings: warningsOf(liquid, T, p, x),
  };
}

const inputWords = (liquid: Liquid): string =>
  liquid.composition === undefined
    ? 'T, and p where boiling is to be watched'
    : 'T and massFraction (the mass of the solute by that of the mixture), and p where boiling is to be watched';

function liquidState(liquid: Liquid, inputs: StateInputs): Outcome<State> {
  const { T, p, massFraction, x, h, s, rho, phase } = inputs;
  const beside = [x, h, s, rho].some((value) => value !== undefined);
  const composed = (massFraction !== undefined) === (liquid.composition !== undefined);
  if (T === undefined || beside || !composed)
    return {
      ok: false,
      error: propertyError('UNSUPPORTED_INPUT', { name: liquid.name, inputs: inputWords(liquid) }),
    };
  const problem = problemOf(liquid, T, p, massFraction);
  if (problem !== undefined) return { ok: false, error: problem };
  if (phase === 'gas')
    return {
      ok: false,
      error: propertyError('PROPERTY_NOT_AVAILABLE', { reason: `Of ${liquid.word} only the liquid is carried` }),
    };
  return { ok: true, value: stateOf(liquid, T, p, massFraction ?? 0) };
}

/** A liquid given by closed equations as a substance. */
export function liquidSubstance(liquid: Liquid): Substance {
  const { freezing, composition } = liquid;
  const mixture = composition !== undefined;
  return {
    id: liquid.id,
    name: liquid.name,
    group: 'liquid',
    aliases: liquid.aliases,
    sources: liquid.sources,
    range: liquid.range,
    limits: { T: liquid.temperature, p: pressures },
    inputs: mixture
      ? [
          ['T', 'p', 'massFraction'],
          ['T', 'massFraction'],
        ]
      : [['T', 'p'], ['T']],
    state: (inputs) => liquidState(liquid, inputs),
    ...(freezing === undefined
      ? {}
      : {
          freezing(x?: number): Outcome<number> {
            const problem = compositionProblem(liquid, x);
            return problem === undefined ? { ok: true, value: freezing(x ?? 0) } : { ok: false, error: problem };
          },
        }),
  };
}
