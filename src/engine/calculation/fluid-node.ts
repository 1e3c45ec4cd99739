import type { Diagnostic } from '../errors/diagnostic';
import { evaluationDiagnostic } from '../errors/evaluation-errors';
import type { Line } from '../language/index';
import { nearest } from '../language/inference';
import { findSubstance, listSubstances } from '../properties/index';
import type { Substance } from '../properties/types';
import { keysOf } from './expression';
import { givenInputs, type GivenInputs } from './fluid-inputs';
import { promisedSymbols, rowValues } from './fluid-properties';
import { findStates, type FoundStates, type Refusal } from './fluid-states';
import { outsideBehindAll, type CalculationNode, type Outcome, type Surroundings } from './node';
import type { Symbol } from './symbols';
import type { CellInput, FluidMode, FluidStateRow } from './types';

function unknownSubstance(id: string): Diagnostic {
  const near = nearest(
    id,
    listSubstances().map((substance) => substance.id),
  );
  const hint = near === undefined ? '' : ` Nearest: ${near}.`;
  return evaluationDiagnostic('UNKNOWN_SUBSTANCE', undefined, { substance: id, hint });
}

/** Inputs that a refusal of the substance is about, by its code; `temperature` is that of its state. */
const blamed: Readonly<Record<string, string>> = {
  OUT_OF_RANGE_T: 'temperature',
  BELOW_FREEZING: 'temperature',
  BELOW_TRIPLE_POINT: 'temperature',
  OUT_OF_RANGE_P: 'p',
  NOT_ABSOLUTE: 'p',
  OUT_OF_RANGE_QUALITY: 'x',
  OUT_OF_RANGE_COMPOSITION: 'massFraction',
  OUT_OF_RANGE_RH: 'RH',
};

/** Puts a refusal to the line that it is about, where that can be told. */
function placed({ error, temperature = 'T' }: Refusal, { lines }: GivenInputs): Diagnostic {
  const input = blamed[error.code];
  const line = input === undefined ? undefined : lines.get(input === 'temperature' ? temperature : input);
  return error.span !== undefined || line === undefined
    ? error
    : { ...error, span: line.expression?.span ?? line.span };
}

function rowsOf(
  name: string,
  found: Extract<FoundStates, { ok: true }>,
  surroundings: Surroundings,
  symbols: Map<string, Symbol>,
): FluidStateRow[] {
  const rows = found.rows.map(({ label, suffix, state }): FluidStateRow => {
    const { phase, formulation, uncertainty } = state;
    const values = rowValues(name, Object.entries(state.values), suffix, uncertainty, surroundings, symbols);
    const missing = Object.entries(state.missing).map(([property, reason]) => ({
      property,
      reason: reason?.message ?? '',
    }));
    return { label, phase, formulation, values, missing };
  });
  if (found.shared.size === 0) return rows;
  const values = rowValues(name, found.shared, '', {}, surroundings, symbols);
  const formulation = rows[0]?.formulation ?? '';
  return [{ label: 'saturation', phase: 'two-phase', formulation, values, missing: [] }, ...rows];
}

function computeState(
  name: string,
  mode: FluidMode,
  substance: Substance,
  given: GivenInputs,
  surroundings: Surroundings,
): Omit<Outcome, 'outsideRange'> {
  const without = (refusals: readonly Refusal[]) => ({
    symbols: promisedSymbols(name, mode),
    diagnostics: [...given.diagnostics, ...refusals.map((refusal) => placed(refusal, given))],
  });
  if (!given.complete) return without([]);
  const found = findStates(substance, mode, given.values);
  if (!found.ok) return without(found.errors);
  const symbols = new Map<string, Symbol>([[name, { several: 'known' }]]);
  const rows = rowsOf(name, found, surroundings, symbols);
  const warnings = found.rows.flatMap(({ state }) => state.warnings);
  return {
    symbols,
    fluid: { substance: substance.id, substanceName: substance.name, mode, rows, sources: substance.sources },
    diagnostics: [...given.diagnostics, ...warnings],
  };
}

/** A fluid state as a unit of dependence. */
export function fluidNode(cell: CellInput, lines: readonly Line[]): CalculationNode {
  const { name = '', mode = 'state', substance: id } = cell.settings;
  const { uses, keys } = keysOf(lines.map((line) => line.expression));
  const compute = (surroundings: Surroundings): Outcome => {
    const outsideRange = outsideBehindAll(uses, surroundings);
    const given = givenInputs(lines, mode, surroundings);
    const substance = id === undefined ? undefined : findSubstance(id);
    if (substance !== undefined) return { ...computeState(name, mode, substance, given, surroundings), outsideRange };
    const symbols = new Map<string, Symbol>([[name, { several: 'unknown' }]]);
    return { symbols, diagnostics: [...given.diagnostics, unknownSubstance(id ?? '')], outsideRange };
  };
  return { cellId: cell.id, index: 0, defines: name === '' ? undefined : name, uses, keys, compute };
}
