import type { Diagnostic, Severity, Span } from './diagnostic';

/** What can be wrong where a relation is used. `{word}` stands for a parameter. */
const table = {
  UNKNOWN_RELATION: ['error', 'There is no relation "{relation}" in the catalogue; choose one.'],
  RELATION_INPUT: ['error', 'Still to be given: {list}. Write {first} = ….'],
  UNITS_DISAGREE: ['error', '{symbol} ({quantity}) is wanted as {wanted}; this is {given}.'],
  DIFFERENCE_WANTED: [
    'error',
    '{symbol} ({quantity}) is a difference; this is a temperature on a scale. Write it in K, or as one temperature less another.',
  ],
  LEVEL_WANTED: [
    'error',
    '{symbol} ({quantity}) is a temperature on a scale; this is a difference of two temperatures.',
  ],
  NO_VALUE: ['error', '{title} has no result for {symbol} with these values.'],
} as const satisfies Readonly<Record<string, readonly [Severity, string]>>;

export type RelationErrorCode = keyof typeof table;

export const relationErrorCodes = Object.keys(table) as RelationErrorCode[];

/** A diagnostic of a relation cell: the sentence comes from the table, with the parameters put in. */
export function relationDiagnostic(
  code: RelationErrorCode,
  parameters: Readonly<Record<string, string | number>>,
  span?: Span,
): Diagnostic {
  const [severity, sentence] = table[code];
  const message = sentence.replace(/\{(\w+)\}/g, (_, name: string) => String(parameters[name] ?? ''));
  return { code, severity, message, parameters, ...(span === undefined ? {} : { span }) };
}
