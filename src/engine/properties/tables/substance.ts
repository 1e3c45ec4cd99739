import type { Diagnostic } from '../../errors/diagnostic';
import { celsius, pressureOutside, propertyError, temperatureOutside } from '../../errors/property-errors';
import type { Outcome, PropertyId, State, StateInputs, Substance } from '../types';
import { columnRange, interpolate, slopeOf } from './column';
import type { MaterialTable, TableProperty } from './types';

const pressures: [number, number] = [1, 100e6];
const tabulated = ['rho', 'cp', 'mu', 'k'] as const;

function problemOf(table: MaterialTable, T: number, p: number | undefined): Diagnostic | undefined {
  if (table.freezing !== undefined && T > 0 && T < table.freezing)
    return propertyError('BELOW_FREEZING', {
      name: table.word,
      freezing: celsius(table.freezing),
      condition: '',
      given: celsius(T),
      T,
      freezingT: table.freezing,
    });
  const [low, high] = table.temperature;
  if (!(T >= low && T <= high)) return temperatureOutside(T, table.temperature, table.formulation);
  return p === undefined || (p >= pressures[0] && p <= pressures[1])
    ? undefined
    : pressureOutside(p, pressures, table.formulation);
}

/** Why a property has no value at a temperature where others have one. */
function reasonOf(table: MaterialTable, property: TableProperty, T: number): Diagnostic {
  const column = table.columns[property];
  const range = column === undefined ? undefined : columnRange(column);
  return range === undefined
    ? propertyError('PROPERTY_NOT_AVAILABLE', { reason: `${property} of ${table.word} is not carried` })
    : temperatureOutside(T, range, `the table for ${property} of ${table.word}`);
}

/** Adds a value that follows from others, or the reason of the first of them that is missing. */
function derive(state: State, property: PropertyId, of: readonly PropertyId[], value: () => number): void {
  const lacking = of.find((each) => state.values[each] === undefined);
  if (lacking === undefined) state.values[property] = value();
  else {
    const reason = state.missing[lacking];
    if (reason !== undefined) state.missing[property] = reason;
  }
}

function stateOf(table: MaterialTable, T: number, p: number | undefined): State {
  const state: State = {
    substance: table.id,
    phase: table.phase,
    formulation: table.formulation,
    values: { T, ...(p === undefined ? {} : { p }) },
    missing: {},
    uncertainty: table.uncertainty,
    warnings: [],
  };
  const { values } = state;
  for (const property of tabulated) {
    if (table.phase === 'solid' && property === 'mu') continue;
    const column = table.columns[property];
    const value = column === undefined ? undefined : interpolate(column, T);
    if (value === undefined) state.missing[property] = reasonOf(table, property, T);
    else values[property] = value;
  }
  const { rho = NaN, cp = NaN, k = NaN, mu = NaN } = values;
  derive(state, 'v', ['rho'], () => 1 / rho);
  derive(state, 'alpha', ['k', 'rho', 'cp'], () => k / (rho * cp));
  if (table.phase === 'liquid') {
    derive(state, 'nu', ['mu', 'rho'], () => mu / rho);
    derive(state, 'Pr', ['mu', 'cp', 'k'], () => (mu * cp) / k);
    const slope = table.columns.rho === undefined ? undefined : slopeOf(table.columns.rho, T);
    if (slope !== undefined) values.beta = -slope / rho;
  }
  return state;
}

function tableState(table: MaterialTable, inputs: StateInputs): Outcome<State> {
  const { T, p, x, h, s, rho, massFraction, phase } = inputs;
  const refuse = (error: Diagnostic): Outcome<State> => ({ ok: false, error });
  if (T === undefined || [x, h, s, rho, massFraction].some((value) => value !== undefined))
    return refuse(propertyError('UNSUPPORTED_INPUT', { name: table.name, inputs: 'T (p may stand beside it)' }));
  if (phase !== undefined && phase !== table.phase)
    return refuse(
      propertyError('PROPERTY_NOT_AVAILABLE', { reason: `Of ${table.word} only the ${table.phase} is carried` }),
    );
  const problem = problemOf(table, T, p);
  return problem === undefined ? { ok: true, value: stateOf(table, T, p) } : refuse(problem);
}

/** A material given by tables as a substance. */
export function tableSubstance(table: MaterialTable): Substance {
  return {
    id: table.id,
    name: table.name,
    group: table.phase,
    aliases: table.aliases,
    sources: table.sources,
    range: table.range,
    limits: { T: table.temperature, p: pressures },
    inputs: [['T', 'p'], ['T']],
    state: (inputs) => tableState(table, inputs),
  };
}
