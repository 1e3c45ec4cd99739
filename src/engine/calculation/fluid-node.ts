import type { Diagnostic } from '../errors/diagnostic';
import type { Inferred } from '../language/inference';
import { describe, nearest } from '../language/inference';
import { readLines, type Line } from '../language/index';
import { findSubstance, propertyDefinitions } from '../properties/index';
import type { PropertyId, State, StateInputs, Substance } from '../properties/types';
import { isDimensionless, resolveUnit, sameDimension, type Dimension } from '../units/index';
import { dependenciesOf, evaluateExpression } from './expression';
import type { CalculationNode, Outcome, Surroundings } from './node';
import { present, valueLatex } from './present';
import type { Symbol } from './symbols';
import type { CellInput, FluidMode, FluidStateRow, PropertyValue } from './types';

interface InputLine {
  name: string;
  quantity: 'T' | 'p' | 'x' | 'h' | 's' | 'rho' | 'massFraction';
}

const inputsOfMode: Readonly<Record<FluidMode, readonly InputLine[]>> = {
  state: (['T', 'p', 'x', 'h', 's', 'rho', 'massFraction'] as const).map((name) => ({ name, quantity: name })),
  film: [
    { name: 'T_wall', quantity: 'T' },
    { name: 'T_bulk', quantity: 'T' },
    { name: 'p', quantity: 'p' },
    { name: 'massFraction', quantity: 'massFraction' },
  ],
  wall: [
    { name: 'T_bulk', quantity: 'T' },
    { name: 'T_wall', quantity: 'T' },
    { name: 'p', quantity: 'p' },
    { name: 'massFraction', quantity: 'massFraction' },
  ],
  saturation: [
    { name: 'T', quantity: 'T' },
    { name: 'p', quantity: 'p' },
  ],
};
const compulsory: Readonly<Record<FluidMode, readonly string[]>> = {
  state: [],
  film: ['T_wall', 'T_bulk', 'p'],
  wall: ['T_bulk', 'T_wall', 'p'],
  saturation: [],
};

const unitOfInput: Readonly<Record<InputLine['quantity'], string>> = {
  T: 'K',
  p: 'Pa',
  x: '1',
  h: 'J/kg',
  s: 'J/(kg*K)',
  rho: 'kg/m^3',
  massFraction: '1',
};
const dimensionOf = (unit: string): Dimension => resolveUnit(unit)?.dimension ?? [];

const error = (code: string, message: string, span?: Diagnostic['span']): Diagnostic => ({
  code,
  severity: 'error',
  message,
  ...(span === undefined ? {} : { span }),
});

interface GivenInputs {
  values: Map<string, number>;
  diagnostics: Diagnostic[];
  complete: boolean;
}

function inputsOf(lines: readonly Line[], mode: FluidMode, surroundings: Surroundings): GivenInputs {
  const values = new Map<string, number>();
  const diagnostics: Diagnostic[] = [];
  let complete = true;
  const wanted = inputsOfMode[mode];
  for (const line of lines) {
    diagnostics.push(...line.diagnostics);
    if (line.kind === 'note' || line.kind === 'blank') continue;
    const input = wanted.find((entry) => entry.name === line.name);
    const span = line.nameSpan ?? line.span;
    if (input === undefined || line.expression === undefined) {
      const near =
        line.name === undefined
          ? undefined
          : nearest(
              line.name,
              wanted.map((entry) => entry.name),
            );
      diagnostics.push(
        error(
          'FLUID_INPUT',
          `A fluid state is given by lines such as ${wanted
            .slice(0, 3)
            .map((entry) => `${entry.name} = …`)
            .join(', ')}.${near === undefined ? '' : ` Nearest: ${near}.`}`,
          span,
        ),
      );
      continue;
    }
    if (values.has(input.name)) diagnostics.push(error('FLUID_INPUT', `${input.name} is given twice.`, span));
    const { type, value, diagnostics: problems } = evaluateExpression(line.expression, surroundings);
    diagnostics.push(...problems);
    if (type !== undefined && !sameDimension(type.dimension, dimensionOf(unitOfInput[input.quantity]))) {
      diagnostics.push(
        error(
          'UNITS_DISAGREE',
          `${input.name} is wanted in ${unitOfInput[input.quantity]}; this is ${describe(type)}.`,
          line.expression.span,
        ),
      );
      complete = false;
    } else if (value === undefined) complete = false;
    else values.set(input.name, value);
  }
  if (diagnostics.some((diagnostic) => diagnostic.severity === 'error')) complete = false;
  return { values, diagnostics, complete };
}

interface Row {
  label: FluidStateRow['label'];
  /** Suffix of its names: `_w` at the wall, `_l` and `_v` at saturation. */
  suffix: string;
  state: State;
}

type Found = { ok: true; rows: Row[]; shared: Map<string, number> } | { ok: false; errors: Diagnostic[] };

function single(substance: Substance, label: Row['label'], suffix: string, inputs: StateInputs): Found {
  const outcome = substance.state(inputs);
  return outcome.ok
    ? { ok: true, rows: [{ label, suffix, state: outcome.value }], shared: new Map() }
    : { ok: false, errors: [outcome.error] };
}

function stateInputs(values: ReadonlyMap<string, number>, temperature?: number): StateInputs {
  const inputs: StateInputs = {};
  for (const key of ['T', 'p', 'x', 'h', 's', 'rho', 'massFraction'] as const) {
    const value = values.get(key);
    if (value !== undefined) inputs[key] = value;
  }
  if (temperature !== undefined) inputs.T = temperature;
  return inputs;
}

function find(substance: Substance, mode: FluidMode, values: ReadonlyMap<string, number>): Found {
  const bulk = values.get('T_bulk') ?? NaN;
  const wall = values.get('T_wall') ?? NaN;
  if (mode === 'state') return single(substance, 'state', '', stateInputs(values));
  if (mode === 'film') return single(substance, 'film', '', stateInputs(values, (bulk + wall) / 2));
  if (mode === 'wall') {
    const atBulk = single(substance, 'bulk', '', stateInputs(values, bulk));
    const atWall = single(substance, 'wall', '_w', stateInputs(values, wall));
    if (atBulk.ok && atWall.ok) return { ok: true, rows: [...atBulk.rows, ...atWall.rows], shared: new Map() };
    return { ok: false, errors: [atBulk, atWall].flatMap((found) => (found.ok ? [] : found.errors)) };
  }
  const T = values.get('T');
  const p = values.get('p');
  if (substance.saturation === undefined)
    return {
      ok: false,
      errors: [error('UNSUPPORTED_INPUT', `${substance.name} has no saturation in its formulation.`)],
    };
  if ((T === undefined) === (p === undefined))
    return { ok: false, errors: [error('FLUID_INPUT', 'Saturation is given by either T or p.')] };
  const outcome = substance.saturation(T === undefined ? { p: p ?? NaN } : { T });
  if (!outcome.ok) return { ok: false, errors: [outcome.error] };
  const { liquid, vapour, h_fg, sigma } = outcome.value;
  const shared = new Map([
    ['T_sat', outcome.value.T],
    ['p_sat', outcome.value.p],
    ['h_fg', h_fg],
  ]);
  if (sigma !== undefined) shared.set('sigma', sigma);
  return {
    ok: true,
    rows: [
      { label: 'liquid', suffix: '_l', state: liquid },
      { label: 'vapour', suffix: '_v', state: vapour },
    ],
    shared,
  };
}

const typeOf = (property: PropertyId): Inferred => {
  const { unit } = propertyDefinitions[property];
  const level = property === 'T' || property === 'T_sat';
  const dimension = dimensionOf(unit);
  return {
    kind: 'number',
    dimension,
    levels: level ? 1 : isDimensionless(dimension) ? 0 : property === 'p' || property === 'p_sat' ? 'any' : 0,
  };
};

function valuesOf(
  cellName: string,
  entries: Iterable<readonly [string, number]>,
  suffix: string,
  uncertainty: State['uncertainty'],
  surroundings: Surroundings,
  symbols: Map<string, Symbol>,
): PropertyValue[] {
  return [...entries].map(([id, value]) => {
    const property = id as PropertyId;
    const definition = propertyDefinitions[property];
    const type = typeOf(property);
    const shown = present(value, type, surroundings.settings);
    symbols.set(`${cellName}.${property}${suffix}`, { type, value, shown: valueLatex(shown) });
    return {
      property,
      symbolLatex: definition.symbolLatex,
      name: `${cellName}.${property}${suffix}`,
      value: shown,
      uncertainty: uncertainty[property] ?? '',
    };
  });
}

function compute(
  cell: CellInput,
  lines: readonly Line[],
  uses: readonly string[],
  surroundings: Surroundings,
): Outcome {
  const name = cell.settings.name ?? '';
  const mode = cell.settings.mode ?? 'state';
  const symbols = new Map<string, Symbol>([[name, {}]]);
  const outsideRange = [...new Set(uses.flatMap((use) => surroundings.outsideBehind(use)))];
  const { values, diagnostics, complete } = inputsOf(lines, mode, surroundings);
  const fail = (...errors: Diagnostic[]): Outcome => ({
    symbols,
    diagnostics: [...diagnostics, ...errors],
    outsideRange,
  });
  const substance = cell.settings.substance === undefined ? undefined : findSubstance(cell.settings.substance);
  if (substance === undefined)
    return fail(
      error('UNKNOWN_SUBSTANCE', `There is no substance "${cell.settings.substance ?? ''}"; choose one from the list.`),
    );
  if (!complete) return fail();
  const missing = compulsory[mode].filter((input) => !values.has(input));
  if (missing.length > 0) return fail(error('FLUID_INPUT', `Still to be given: ${missing.join(', ')}.`));
  const found = find(substance, mode, values);
  if (!found.ok) return fail(...found.errors);

  const rows = found.rows.map(({ label, suffix, state }) => ({
    label,
    phase: state.phase,
    formulation: state.formulation,
    values: valuesOf(
      name,
      Object.entries(state.values).filter((entry): entry is [string, number] => entry[1] !== undefined),
      suffix,
      state.uncertainty,
      surroundings,
      symbols,
    ),
    missing: Object.entries(state.missing).map(([property, reason]) => ({ property, reason: reason?.message ?? '' })),
  }));
  if (found.shared.size > 0) {
    const shared = valuesOf(name, found.shared, '', {}, surroundings, symbols);
    rows.unshift({
      label: 'saturation' as const,
      phase: 'two-phase',
      formulation: rows[0]?.formulation ?? '',
      values: shared,
      missing: [],
    });
  }
  symbols.set(name, { value: 1 });
  const warnings = found.rows.flatMap(({ state }) => state.warnings);
  return {
    symbols,
    fluid: { substance: substance.id, substanceName: substance.name, mode, rows, sources: substance.sources },
    diagnostics: [...diagnostics, ...warnings],
    outsideRange,
  };
}

/** A fluid state as a unit of dependence. */
export function fluidNode(cell: CellInput): CalculationNode {
  const lines = readLines(cell.source);
  const uses = [
    ...new Set(lines.flatMap((line) => (line.expression === undefined ? [] : dependenciesOf(line.expression)))),
  ];
  return {
    key: `${cell.id}:state`,
    cellId: cell.id,
    defines: cell.settings.name,
    uses,
    compute: (surroundings) => compute(cell, lines, uses, surroundings),
  };
}
