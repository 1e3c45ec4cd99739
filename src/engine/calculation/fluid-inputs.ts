import type { Diagnostic } from '../errors/diagnostic';
import { evaluationDiagnostic } from '../errors/evaluation-errors';
import type { Line } from '../language/index';
import { describe, isTemperature, nearest } from '../language/inference';
import { sameDimension } from '../units/index';
import { evaluateExpression } from './expression';
import { dimensionOf } from './fluid-properties';
import type { Surroundings } from './node';
import type { FluidMode } from './types';

/** Inputs that a state takes, as they are named in its lines. */
export const stateQuantities = ['T', 'p', 'x', 'h', 's', 'rho', 'massFraction', 'RH', 'W', 'T_wb', 'T_dp'] as const;
type Quantity = (typeof stateQuantities)[number];

const unitOfInput: Readonly<Record<Quantity, string>> = {
  T: 'K',
  p: 'Pa',
  x: '1',
  h: 'J/kg',
  s: 'J/(kg*K)',
  rho: 'kg/m^3',
  massFraction: '1',
  RH: '1',
  W: '1',
  T_wb: 'K',
  T_dp: 'K',
};

interface InputLine {
  name: string;
  quantity: Quantity;
}

const twoTemperatures: readonly InputLine[] = [
  { name: 'T_wall', quantity: 'T' },
  { name: 'T_bulk', quantity: 'T' },
  { name: 'p', quantity: 'p' },
  { name: 'massFraction', quantity: 'massFraction' },
];
const inputsOfMode: Readonly<Record<FluidMode, readonly InputLine[]>> = {
  state: stateQuantities.map((name) => ({ name, quantity: name })),
  film: twoTemperatures,
  wall: twoTemperatures,
  saturation: [
    { name: 'T', quantity: 'T' },
    { name: 'p', quantity: 'p' },
  ],
};

export interface GivenInputs {
  values: Map<string, number>;
  /** Where each is given, for what the substance has to say of it. */
  lines: Map<string, Line>;
  diagnostics: Diagnostic[];
  complete: boolean;
}

function noInput(line: Line, wanted: readonly InputLine[]): Diagnostic {
  const names = wanted.map(({ name }) => name);
  const near = line.name === undefined ? undefined : nearest(line.name, names);
  const lines = names
    .slice(0, 3)
    .map((name) => `${name} = …`)
    .join(', ');
  const span = line.nameSpan ?? line.span;
  const mend = near === undefined ? undefined : { label: `Write ${near}`, span, insert: near };
  return evaluationDiagnostic(
    'FLUID_LINE',
    span,
    { lines, hint: near === undefined ? '' : ` Nearest: ${near}.` },
    mend,
  );
}

/** Evaluates one input; answers nothing when it has no value of the wanted kind. */
function valueOf(
  line: Line,
  input: InputLine,
  surroundings: Surroundings,
  diagnostics: Diagnostic[],
): number | undefined {
  if (line.expression === undefined) return undefined;
  const { type, value, diagnostics: problems } = evaluateExpression(line.expression, surroundings);
  diagnostics.push(...problems);
  if (type === undefined) return undefined;
  const unit = unitOfInput[input.quantity];
  const { span } = line.expression;
  if (type.kind === 'condition' || !sameDimension(type.dimension, dimensionOf(unit))) {
    diagnostics.push(evaluationDiagnostic('FLUID_UNITS', span, { name: input.name, unit, given: describe(type) }));
    return undefined;
  }
  if (isTemperature(type.dimension) && type.levels === 0) {
    const parameters = { name: input.name, wanted: 'a temperature level', given: describe(type) };
    diagnostics.push(evaluationDiagnostic('LEVEL_FOR_DIFFERENCE', span, parameters));
    return undefined;
  }
  return value;
}

/** The inputs of a fluid state from its lines. */
export function givenInputs(lines: readonly Line[], mode: FluidMode, surroundings: Surroundings): GivenInputs {
  const given: GivenInputs = { values: new Map(), lines: new Map(), diagnostics: [], complete: true };
  const wanted = inputsOfMode[mode];
  for (const line of lines) {
    given.diagnostics.push(...line.diagnostics);
    if (line.kind === 'note' || line.kind === 'blank') continue;
    const input = wanted.find(({ name }) => name === line.name);
    if (input === undefined || line.kind !== 'assignment') {
      if (line.diagnostics.every(({ severity }) => severity !== 'error')) given.diagnostics.push(noInput(line, wanted));
      continue;
    }
    if (given.lines.has(input.name))
      given.diagnostics.push(evaluationDiagnostic('FLUID_TWICE', line.nameSpan, { name: input.name }));
    given.lines.set(input.name, line);
    const value = valueOf(line, input, surroundings, given.diagnostics);
    if (value === undefined) given.complete = false;
    else given.values.set(input.name, value);
  }
  if (given.diagnostics.some(({ severity }) => severity === 'error')) given.complete = false;
  return given;
}
