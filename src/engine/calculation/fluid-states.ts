import type { Diagnostic } from '../errors/diagnostic';
import { evaluationDiagnostic } from '../errors/evaluation-errors';
import type { State, StateInputs, Substance } from '../properties/types';
import { stateQuantities } from './fluid-inputs';
import type { FluidMode, FluidStateRow } from './types';

/** One state of a fluid cell. */
export interface StateRow {
  label: FluidStateRow['label'];
  /** Suffix of its names: `_w` at the wall, `_l` and `_v` at saturation. */
  suffix: string;
  state: State;
}

/** States with the values they share (of saturation), or why there are none. */
export type FoundStates =
  { ok: true; rows: StateRow[]; shared: Map<string, number> } | { ok: false; errors: Refusal[] };

export interface Refusal {
  error: Diagnostic;
  /** Name of the temperature input of the state that is refused. */
  temperature?: string;
}

const compulsory: Readonly<Record<FluidMode, readonly string[]>> = {
  state: [],
  film: ['T_wall', 'T_bulk', 'p'],
  wall: ['T_bulk', 'T_wall', 'p'],
  saturation: [],
};

const refused = (...errors: Diagnostic[]): FoundStates => ({ ok: false, errors: errors.map((error) => ({ error })) });

/** Inputs that stand for the temperature of a row; that of a film is a mean of two. */
const temperatures: Partial<Record<StateRow['label'], string>> = { state: 'T', bulk: 'T_bulk', wall: 'T_wall' };

function single(substance: Substance, label: StateRow['label'], suffix: string, inputs: StateInputs): FoundStates {
  const outcome = substance.state(inputs);
  if (outcome.ok) return { ok: true, rows: [{ label, suffix, state: outcome.value }], shared: new Map() };
  const temperature = temperatures[label];
  return { ok: false, errors: [{ error: outcome.error, ...(temperature === undefined ? {} : { temperature }) }] };
}

function stateInputs(values: ReadonlyMap<string, number>, temperature?: number): StateInputs {
  const inputs: StateInputs = {};
  for (const key of stateQuantities) {
    const value = values.get(key);
    if (value !== undefined) inputs[key] = value;
  }
  if (temperature !== undefined) inputs.T = temperature;
  return inputs;
}

function wallStates(
  substance: Substance,
  values: ReadonlyMap<string, number>,
  bulk: number,
  wall: number,
): FoundStates {
  const atBulk = single(substance, 'bulk', '', stateInputs(values, bulk));
  const atWall = single(substance, 'wall', '_w', stateInputs(values, wall));
  if (atBulk.ok && atWall.ok) return { ok: true, rows: [...atBulk.rows, ...atWall.rows], shared: new Map() };
  return { ok: false, errors: [atBulk, atWall].flatMap((found) => (found.ok ? [] : found.errors)) };
}

function saturationStates(substance: Substance, T: number | undefined, p: number | undefined): FoundStates {
  if (substance.saturation === undefined)
    return refused(evaluationDiagnostic('NO_SATURATION', undefined, { name: substance.name }));
  if ((T === undefined) === (p === undefined)) return refused(evaluationDiagnostic('FLUID_ONE_OF', undefined));
  const outcome = substance.saturation(T === undefined ? { p: p ?? NaN } : { T });
  if (!outcome.ok) return refused(outcome.error);
  const { liquid, vapour, h_fg, sigma } = outcome.value;
  const shared = new Map([
    ['T_sat', outcome.value.T],
    ['p_sat', outcome.value.p],
    ['h_fg', h_fg],
  ]);
  if (sigma !== undefined) shared.set('sigma', sigma);
  const rows: StateRow[] = [
    { label: 'liquid', suffix: '_l', state: liquid },
    { label: 'vapour', suffix: '_v', state: vapour },
  ];
  return { ok: true, rows, shared };
}

/** The states that a mode asks for, from inputs in SI. */
export function findStates(substance: Substance, mode: FluidMode, values: ReadonlyMap<string, number>): FoundStates {
  const missing = compulsory[mode].filter((input) => !values.has(input));
  if (missing.length > 0)
    return refused(evaluationDiagnostic('FLUID_MISSING', undefined, { names: missing.join(', ') }));
  const bulk = values.get('T_bulk') ?? NaN;
  const wall = values.get('T_wall') ?? NaN;
  switch (mode) {
    case 'state':
      return single(substance, 'state', '', stateInputs(values));
    case 'film':
      return single(substance, 'film', '', stateInputs(values, (bulk + wall) / 2));
    case 'wall':
      return wallStates(substance, values, bulk, wall);
    case 'saturation':
      return saturationStates(substance, values.get('T'), values.get('p'));
  }
}
