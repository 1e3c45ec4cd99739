import { evaluationDiagnostic } from '../errors/evaluation-errors';
import type { Line } from '../language/index';
import type { Inferred } from '../language/inference';
import { readRelation } from '../relations/index';
import type { Relation, RelationSymbol } from '../relations/types';
import { isDimensionless, plainUnit, resolveUnit, type ResolvedUnit } from '../units/index';
import type { Symbol } from './symbols';

/** Unit in which a formula takes a symbol. */
export function unitOf(symbol: RelationSymbol): ResolvedUnit {
  const unit = resolveUnit(symbol.unit);
  if (unit === undefined) throw new Error(`The catalogue names no unit: ${symbol.unit}`);
  return unit;
}

export function typeOf(symbol: RelationSymbol): Inferred {
  const { dimension } = unitOf(symbol);
  if (symbol.temperature !== undefined)
    return { kind: 'number', dimension, levels: symbol.temperature === 'level' ? 1 : 0 };
  return { kind: 'number', dimension, levels: isDimensionless(dimension) ? 0 : 'any' };
}

/** What a symbol of a relation measures, and its number in SI. */
export interface SymbolScale {
  type: Inferred;
  toSi(number: number): number;
}

const plainScale: SymbolScale = {
  type: { kind: 'number', dimension: plainUnit.dimension, levels: 0 },
  toSi: (number) => number,
};

/** Scale of any symbol: as declared for inputs and output, a plain number for what stands between. */
export function scaleOf(relation: Relation, symbol: string): SymbolScale {
  const declared = [...relation.inputs, ...relation.validitySymbols, relation.output].find(
    (one) => one.symbol === symbol,
  );
  if (declared === undefined) return plainScale;
  const { factor, offset } = unitOf(declared);
  return { type: typeOf(declared), toSi: (number) => number * factor + offset };
}

/** All that a relation may offer, with types and without values: so that what uses it is checked at once. */
export function promisedSymbols(name: string, relation: Relation): Map<string, Symbol> {
  const symbols = new Map<string, Symbol>([[name, { several: 'known' }]]);
  const names = [
    ...[relation.output, ...relation.inputs, ...relation.validitySymbols].map(({ symbol }) => symbol),
    ...readRelation(relation).formula.map(({ symbol }) => symbol),
  ];
  for (const symbol of names) symbols.set(`${name}.${symbol}`, { type: scaleOf(relation, symbol).type });
  return symbols;
}

/** Lines that bind a symbol of the relation, and those that stand beneath it. */
export function partLines(
  lines: readonly Line[],
  relation: Relation | undefined,
): { bindings: Map<string, Line>; below: Line[] } {
  const symbols = new Set(
    relation === undefined ? [] : [...relation.inputs, ...relation.validitySymbols].map(({ symbol }) => symbol),
  );
  const bindings = new Map<string, Line>();
  const below: Line[] = [];
  for (const line of lines) {
    if (line.kind === 'blank') continue;
    if (line.kind !== 'assignment' || line.name === undefined || !symbols.has(line.name)) below.push(line);
    else bindings.set(line.name, bindings.has(line.name) ? givenTwice(line, line.name) : line);
  }
  return { bindings, below };
}

function givenTwice(line: Line, name: string): Line {
  const span = line.nameSpan ?? line.span;
  return { ...line, diagnostics: [...line.diagnostics, evaluationDiagnostic('BOUND_TWICE', span, { name })] };
}
