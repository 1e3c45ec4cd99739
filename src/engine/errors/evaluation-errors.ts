import type { Diagnostic, Mend, Severity, Span } from './diagnostic';

/**
 * What can be wrong between reading a line and its result: names, dimensions, levels, values.
 * `{word}` stands for a parameter. Several sentences share a code where programs need not tell them apart.
 */
const table = {
  // Names
  UNKNOWN_NAME: ['UNKNOWN_NAME', 'error', 'No value is named {name}.{hint}'],
  UNKNOWN_MEMBER: ['UNKNOWN_NAME', 'error', '{object} has no value {property}.{hint}'],
  UNKNOWN_INLINE: ['UNKNOWN_NAME', 'warning', 'No value is named {name}.{hint}'],
  NAME_OF_SEVERAL: ['SEVERAL_VALUES', 'error', '{name} holds several values; take one of them, such as {example}.'],
  UNKNOWN_FUNCTION: ['UNKNOWN_FUNCTION', 'error', 'There is no function {name}.{hint} To multiply, write {name}*(…).'],
  LOG: ['UNKNOWN_FUNCTION', 'error', 'log is read in two ways: write ln (natural) or log10.'],
  ARGUMENTS: ['ARGUMENTS', 'error', '{name} is written {name}({parameters}); {count} given.'],
  CIRCLE: ['CIRCLE', 'error', 'These define each other in a circle: {path}.'],
  CIRCLE_OF_ONE: ['CIRCLE', 'error', '{name} is defined by itself.'],
  DEFINED_TWICE: ['DEFINED_TWICE', 'error', '{name} is defined already in {place}; every name is defined once.'],
  DEFINED_AGAIN: ['DEFINED_AGAIN', 'warning', '{name} is defined again in {place}, which is not used.'],

  // Kinds and dimensions
  NOT_OF_CONDITION: ['KIND', 'error', '"not" stands before a condition, not before {given}.'],
  SIGN_OF_CONDITION: ['KIND', 'error', 'A sign stands before a number, not before a condition.'],
  CONDITION_AS_NUMBER: ['KIND', 'error', 'A condition cannot be calculated with; use if(condition, a, b).'],
  JOINED_NUMBERS: ['KIND', 'error', '"{operator}" joins conditions, not {given}.'],
  ORDERED_CONDITIONS: ['KIND', 'error', 'Conditions can be joined with "and" and "or", not compared by {operator}.'],
  IF_CONDITION: ['KIND', 'error', 'if begins with a condition; this is {given}.'],
  ARGUMENT_CONDITION: ['KIND', 'error', '{name} takes numbers, not conditions.'],
  REQUIRE_CONDITION: ['KIND', 'error', 'require states a condition, such as dp <= 50 kPa; this is {given}.'],
  VALUE_CONDITION: ['KIND', 'error', '{name} is wanted as a number; this is a condition.'],
  SUM_UNITS: ['UNITS_DISAGREE', 'error', 'These cannot be {verb}: left is {left}, right is {right}.'],
  COMPARED_UNITS: ['UNITS_DISAGREE', 'error', 'These cannot be compared: left is {left}, right is {right}.'],
  ARGUMENT_UNITS: ['UNITS_DISAGREE', 'error', '{name} takes a plain number; this is {given}.'],
  ARGUMENTS_DIFFER: ['UNITS_DISAGREE', 'error', '{name} takes values of one kind: here are {left} and {right}.'],
  BRANCHES_DIFFER: [
    'UNITS_DISAGREE',
    'error',
    'Both branches of if must be of one kind: the first is {left}, the second {right}.',
  ],
  ROOT_UNITS: ['UNITS_DISAGREE', 'error', 'There is no such root of {given}.'],
  TARGET_UNITS: ['UNITS_DISAGREE', 'error', 'Asked in {unit} ({wanted}), comes out as {given}.'],
  EXPONENT_UNITS: ['EXPONENT', 'error', 'An exponent is a plain number; this one is {given}.'],
  EXPONENT_CHANGES: [
    'EXPONENT',
    'error',
    'The unit of the result must be known beforehand: {given} can only be raised to a figure, not to a value that may change.',
  ],
  EXPONENT_ODD: ['EXPONENT', 'error', '{Given} to the power of {exponent} is no quantity.'],

  // Levels
  LEVELS: [
    'LEVELS',
    'error',
    '{count} {levels} are added up here; {one} and a difference make {one}, half the sum of two is their mean.',
  ],
  LEVEL_SCALED: ['LEVELS', 'warning', '{What} is multiplied here, counted from {zero}. {advice}'],
  LEVEL_IN_PRODUCT: [
    'LEVELS',
    'warning',
    '{text} counts from {zero} in a product: {absolute}. For a difference write {difference}.',
  ],
  TARGET_LEVEL: [
    'LEVELS',
    'error',
    'This is a difference, and {unit} shows {one}. Ask for {instead}, or add the difference to {one}.',
  ],
  TARGET_LEVEL_UNSURE: [
    'LEVELS',
    'warning',
    'Shown as {one}, counted from {zero}. If this is a difference, ask for {instead}.',
  ],
  TARGET_DIFFERENCE: ['LEVELS', 'error', 'This is {one}, and {unit} shows a difference. Ask for {instead}.'],
  LEVEL_FOR_DIFFERENCE: [
    'LEVELS',
    'error',
    '{name} is wanted as {wanted}; this is {given}. Write a difference in K, or as one temperature less another.',
  ],
  BELOW_ABSOLUTE_ZERO: [
    'BELOW_ABSOLUTE_ZERO',
    'error',
    'This temperature would be {value} K, below absolute zero.{hint}',
  ],
  BELOW_VACUUM: ['BELOW_VACUUM', 'error', 'This pressure would be {value} Pa absolute, below vacuum.'],

  // Values
  DIVISION_BY_ZERO: ['DIVISION_BY_ZERO', 'error', 'Division by zero: {divisor}.'],
  ZERO_TO_NEGATIVE: ['DIVISION_BY_ZERO', 'error', 'Division by zero: {base} to the power of {exponent}.'],
  NEGATIVE_POWER: ['NO_VALUE', 'error', 'A negative value has a power to whole exponents only: {base}, {exponent}.'],
  NO_VALUE: ['NO_VALUE', 'error', 'No result: {reason}: {arguments}.'],
  OVERFLOW: ['OVERFLOW', 'error', 'The result is too large to be computed{from}.'],
  OVERFLOW_SHOWN: ['OVERFLOW', 'error', 'The result is too large to be shown in {unit}.'],

  // Cells
  FLUID_LINE: ['FLUID_INPUT', 'error', 'A fluid state is given by lines such as {lines}.{hint}'],
  FLUID_TWICE: ['FLUID_INPUT', 'error', '{name} is given twice.'],
  FLUID_MISSING: ['FLUID_INPUT', 'error', 'Still to be given: {names}.'],
  FLUID_ONE_OF: ['FLUID_INPUT', 'error', 'Saturation is given by either T or p.'],
  FLUID_UNITS: ['UNITS_DISAGREE', 'error', '{name} is wanted in {unit}; this is {given}.'],
  UNKNOWN_SUBSTANCE: [
    'UNKNOWN_SUBSTANCE',
    'error',
    'There is no substance "{substance}"; choose one from the list.{hint}',
  ],
  NO_SATURATION: ['UNSUPPORTED_INPUT', 'error', '{name} has no saturation in its formulation.'],
  BOUND_TWICE: ['DEFINED_TWICE', 'error', '{name} is given twice; the last one is taken.'],
  SOURCE_TOO_LONG: [
    'TOO_LONG',
    'error',
    'This cell has more than {limit} characters and is not computed; part it into several.',
  ],
  TOO_MANY_CELLS: [
    'TOO_LONG',
    'error',
    'This sheet is too large: from here on nothing is computed. Part it into several calculations.',
  ],
  FAULT: ['FAULT', 'error', 'This could not be computed because of a fault in the program.'],
} as const satisfies Readonly<Record<string, readonly [code: string, Severity, string]>>;

export type EvaluationError = keyof typeof table;

/** Codes that a diagnostic of this table can carry, each once. */
export const evaluationErrorCodes: readonly string[] = [...new Set(Object.values(table).map(([code]) => code))];

/** A diagnostic of inference or evaluation: the sentence comes from the table, with the parameters put in. */
export function evaluationDiagnostic(
  error: EvaluationError,
  span: Span | undefined,
  parameters: Readonly<Record<string, string | number>> = {},
  mend?: Mend,
): Diagnostic {
  const [code, severity, sentence] = table[error];
  const message = sentence.replace(/\{(\w+)\}/g, (_, name: string) => String(parameters[name] ?? ''));
  return {
    code,
    severity,
    message,
    ...(span === undefined ? {} : { span }),
    ...(Object.keys(parameters).length === 0 ? {} : { parameters }),
    ...(mend === undefined ? {} : { mend }),
  };
}
