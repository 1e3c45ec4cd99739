import type { Diagnostic } from '../errors/diagnostic';
import { relationDiagnostic } from '../errors/relation-errors';
import { expressionLatex, symbolLatex, type Line } from '../language/index';
import { describe, type Inferred } from '../language/inference';
import type { Relation, RelationSymbol } from '../relations/types';
import { sameDimension } from '../units/index';
import { evaluateExpression } from './expression';
import type { Surroundings } from './node';
import { present } from './present';
import { typeOf, unitOf } from './relation-symbols';
import type { RelationInputResult } from './types';

/** A symbol of a relation with what it is bound to. */
export interface Bound {
  input: RelationInputResult;
  /** Number in the symbol's own unit. */
  number?: number | undefined;
  diagnostics: Diagnostic[];
}

/** Why an expression cannot stand for a symbol; undefined when it can. */
function mismatch(symbol: RelationSymbol, type: Inferred, span: Diagnostic['span']): Diagnostic | undefined {
  const { quantity } = symbol;
  if (type.kind === 'condition' || !sameDimension(type.dimension, unitOf(symbol).dimension)) {
    const wanted = describe(typeOf(symbol));
    const parameters = { symbol: symbol.symbol, quantity, wanted, given: describe(type) };
    return relationDiagnostic('UNITS_DISAGREE', parameters, span);
  }
  if (symbol.temperature === 'difference' && typeof type.levels === 'number' && type.levels !== 0)
    return relationDiagnostic('DIFFERENCE_WANTED', { symbol: symbol.symbol, quantity }, span);
  if (symbol.temperature === 'level' && type.levels === 0)
    return relationDiagnostic('LEVEL_WANTED', { symbol: symbol.symbol, quantity }, span);
  return undefined;
}

function bind(
  symbol: RelationSymbol,
  onlyValidity: boolean,
  line: Line | undefined,
  surroundings: Surroundings,
): Bound {
  const input: RelationInputResult = {
    symbol: symbol.symbol,
    symbolLatex: symbolLatex(symbol.symbol),
    quantity: symbol.quantity,
    unit: symbol.unit,
    onlyValidity,
  };
  if (line?.expression === undefined) return { input, diagnostics: line?.diagnostics ?? [] };
  input.formulaLatex = expressionLatex(line.expression);
  input.span = line.span;
  const { type, value, diagnostics: problems } = evaluateExpression(line.expression, surroundings);
  const diagnostics = [...line.diagnostics, ...problems];
  if (type === undefined) return { input, diagnostics };
  const wrong = mismatch(symbol, type, line.expression.span);
  if (wrong !== undefined) return { input, diagnostics: [...diagnostics, wrong] };
  if (value === undefined) return { input, diagnostics };
  const unit = unitOf(symbol);
  input.value = present(value, type, surroundings.settings);
  return { input, number: (value - unit.offset) / unit.factor, diagnostics };
}

/** All symbols of a relation with what its cell binds them to, those of the conditions alone last. */
export function bindAll(relation: Relation, bindings: ReadonlyMap<string, Line>, surroundings: Surroundings): Bound[] {
  const bound = (symbol: RelationSymbol, onlyValidity: boolean) =>
    bind(symbol, onlyValidity, bindings.get(symbol.symbol), surroundings);
  return [
    ...relation.inputs.map((symbol) => bound(symbol, false)),
    ...relation.validitySymbols.map((symbol) => bound(symbol, true)),
  ];
}
