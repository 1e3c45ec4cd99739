import type { Diagnostic, Mend, Severity, Span } from './diagnostic';

/** What can be wrong, or easily meant otherwise, where a line is read. `{word}` stands for a parameter. */
const table = {
  UNKNOWN_UNIT: ['error', '{problem}.'],
  UNKNOWN_UNIT_OR_SIGN: ['error', '{problem}. To multiply, write {number}*{word}.'],
  UNCERTAINTY_UNIT: ['error', 'The uncertainty is in {uncertainty}, the value in {unit}; they must measure the same.'],
  TARGET_MISSING: ['error', 'After "to" stands the unit in which the result is shown.'],
  MISSING_SIGN: ['error', 'Between {left} and {right} a sign is missing; to multiply, write {left}*{right}.'],
  GROUPED_FIGURES: ['error', 'A space parts {left} and {right}; write {left}{right} for one number.'],
  DECIMAL_COMMA: ['error', 'A comma parts arguments; the decimal sign is a point: {mended}.'],
  COMMA_AMBIGUOUS: ['error', '{text} may be {decimal} or {grouped}; write one of them.'],
  UNCLOSED: ['error', 'This parenthesis is not closed.'],
  UNOPENED: ['error', 'This parenthesis closes nothing.'],
  EMPTY_GROUP: ['error', 'Between the parentheses an expression is missing.'],
  MISSING_RIGHT_SIDE: ['error', 'After = an expression is missing.'],
  MISSING_CONDITION: ['error', 'After "require" a condition is missing, such as dp <= 50 kPa.'],
  MISSING_OPERAND_AFTER: ['error', 'After {sign} a value is missing.'],
  MISSING_OPERAND_BEFORE: ['error', 'Before {sign} a value is missing.'],
  MISSING_ARGUMENT: ['error', 'Beside the comma an argument is missing.'],
  SINGLE_EQUALS: ['error', 'In a condition "is equal to" is written ==.'],
  SECOND_EQUALS: ['error', 'A line has one = only, behind the name that it defines.'],
  LEFT_SIDE: ['error', 'Left of = stands the one name that the line defines, such as T_wall.'],
  DEFINED_MEMBER: ['error', '{name} belongs to the cell {object}; the line must define a name without a point.'],
  RESERVED_WORD: ['error', '"{word}" is a word of the language and cannot be a name.'],
  POWER_SIGN: ['error', 'A power is written with ^.'],
  UNKNOWN_SIGN: ['error', 'The sign {sign} has no meaning here.'],
  SIGN_INSTEAD: ['error', 'The sign {sign} has no meaning here; write {instead}.'],
  UNCERTAINTY_PLACE: ['error', 'An uncertainty stands behind a number, as in 850 ± 5 %.'],
  NUMBER_RANGE: ['error', '{text} lies outside the range of numbers that can be computed with.'],
  TOO_DEEP: ['error', 'This line nests deeper than {limit} levels; split it.'],
  TOO_LONG: ['error', 'This line has more than {limit} characters; split it.'],
  UNREADABLE: ['error', '{text} cannot be read here.'],
  UNFINISHED: ['error', 'The line is not complete.'],
  UNIT_AFTER_DIVISOR: [
    'warning',
    '{unit} is read from left to right, as {display}. Write {mended} to divide by all that follows, or {product} to multiply.',
  ],
  TARGET_AFTER_DIVISOR: [
    'warning',
    '{unit} is read from left to right, as {display}. Write {mended} to divide by all that follows.',
  ],
  UNIT_OR_NAME: [
    'hint',
    '{word} in {unit} is the unit, not the value named {word}. To take the value, write {mended}.',
  ],
  GAUGE_NOTATION: ['error', 'Gauge pressure is written {mended}, with the g at the unit.'],
  ABSOLUTE_NOTATION: ['error', 'Pressure is absolute unless it is gauge; write {mended}.'],
  DEGREE_NOTATION: ['error', '{unit} is read as degree times {letter}; the temperature is written {mended}.'],
  FRACTION_BEFORE_UNIT: [
    'hint',
    '{above}/{below} {unit} is read as {above}/({below} {unit}). For a fraction of one {unit} write ({above}/{below})*1 {unit}.',
  ],
  COULOMB: ['hint', 'C is the coulomb, a unit of charge; degrees Celsius are degC.'],
  FARAD: ['hint', 'F is the farad, a unit of capacitance; degrees Fahrenheit are degF.'],
  REVOLUTIONS: [
    'hint',
    '{number} rpm is an angular velocity, {value} rad/s (a revolution is 2π rad). For revolutions per time write {number} 1/min.',
  ],
  PERCENT_OF_PERCENT: ['hint', 'Both figures are in %; the uncertainty is read as percentage points.'],
} as const satisfies Readonly<Record<string, readonly [Severity, string]>>;

export type LanguageErrorCode = keyof typeof table;

export const languageErrorCodes = Object.keys(table) as LanguageErrorCode[];

/** A diagnostic of reading: the sentence comes from the table, with the parameters put in. */
export function languageDiagnostic(
  code: LanguageErrorCode,
  span: Span,
  parameters: Readonly<Record<string, string | number>> = {},
  mend?: Mend,
): Diagnostic {
  const [severity, sentence] = table[code];
  const message = sentence.replace(/\{(\w+)\}/g, (_, name: string) => String(parameters[name] ?? ''));
  return { code, severity, message, span, parameters, ...(mend === undefined ? {} : { mend }) };
}
