import { evaluationDiagnostic } from '../errors/evaluation-errors';
import type { Diagnostic } from '../errors/diagnostic';
import type { CalculationNode, Outcome } from './node';
import type { Symbol } from './symbols';

function withDiagnostic(outcome: Outcome, diagnostic: Diagnostic): Outcome {
  const { line } = outcome;
  const placed = line === undefined ? diagnostic : { ...diagnostic, span: line.span };
  const diagnostics = [...outcome.diagnostics, placed];
  return { ...outcome, diagnostics, ...(line === undefined ? {} : { line: { ...line, diagnostics } }) };
}

/** A further definition of a name: an error at its line, and no value. */
export function secondDefinition(outcome: Outcome, name: string, place: string): Outcome {
  const marked = withDiagnostic(outcome, evaluationDiagnostic('DEFINED_TWICE', undefined, { name, place }));
  const { line } = marked;
  if (line !== undefined) marked.line = { ...line, value: undefined, substitutionLatex: undefined };
  return { ...marked, symbols: new Map() };
}

/** The definition that counts, where there are others: a warning. */
export function firstDefinition(outcome: Outcome, name: string, place: string): Outcome {
  return withDiagnostic(outcome, evaluationDiagnostic('DEFINED_AGAIN', undefined, { name, place }));
}

/** A member of a circle: the way round it as an error, no values. */
export function circleMember(outcome: Outcome, way: readonly CalculationNode[]): Outcome {
  const names = way.map(({ defines }) => defines ?? '');
  const [name = ''] = names;
  const diagnostic =
    names.length === 1
      ? evaluationDiagnostic('CIRCLE_OF_ONE', undefined, { name })
      : evaluationDiagnostic('CIRCLE', undefined, { path: [...names, name].join(' → ') });
  const marked = withDiagnostic(outcome, diagnostic);
  if (marked.line !== undefined) marked.line = { ...marked.line, value: undefined, waitsFor: [] };
  const symbols = new Map<string, Symbol>();
  for (const [key, { type, several }] of outcome.symbols) symbols.set(key, { type, several });
  return { ...marked, symbols };
}

/** Where a fault of the program shows: the rest of the sheet still computes. */
export function faultyOutcome(node: CalculationNode, error: unknown): Outcome {
  const fault = error instanceof Error ? error.message : String(error);
  const symbols = new Map<string, Symbol>(node.defines === undefined ? [] : [[node.defines, {}]]);
  return { symbols, diagnostics: [evaluationDiagnostic('FAULT', undefined, { fault })], outsideRange: [] };
}
