import type { Diagnostic } from '../errors/diagnostic';
import { relationDiagnostic } from '../errors/relation-errors';
import type { Line } from '../language/index';
import { findRelation, type CatalogueEntry } from '../relations/index';
import type { Relation } from '../relations/types';
import { keysOf } from './expression';
import { outsideBehindAll, type CalculationNode, type Outcome, type Surroundings } from './node';
import { valueLatex } from './present';
import { bindAll } from './relation-binding';
import { workThrough } from './relation-evaluation';
import { relationResult, shownSymbol } from './relation-result';
import { partLines, promisedSymbols, scaleOf } from './relation-symbols';
import type { Symbol } from './symbols';
import type { CalculationSettings, CellInput } from './types';

function unbound(relation: Relation, bindings: ReadonlyMap<string, Line>): Diagnostic[] {
  const missing = relation.inputs.filter(({ symbol }) => !bindings.has(symbol));
  const [first] = missing;
  if (first === undefined) return [];
  const list = missing.map(({ symbol, quantity }) => `${symbol} (${quantity})`).join(', ');
  return [relationDiagnostic('RELATION_INPUT', { list, first: first.symbol })];
}

/** Values of a relation under the name of its cell. */
function symbolsOf(
  name: string,
  relation: Relation,
  values: ReadonlyMap<string, number>,
  settings: CalculationSettings,
): Map<string, Symbol> {
  const symbols = new Map<string, Symbol>([[name, { several: 'known' }]]);
  for (const [symbol, number] of values) {
    const shown = shownSymbol(relation, symbol, number, settings);
    if (shown === undefined) continue;
    const { type, toSi } = scaleOf(relation, symbol);
    symbols.set(`${name}.${symbol}`, { type, value: toSi(number), shown: valueLatex(shown), display: shown });
  }
  return symbols;
}

function compute(
  cell: CellInput,
  entry: CatalogueEntry,
  bindings: ReadonlyMap<string, Line>,
  behind: readonly string[],
  surroundings: Surroundings,
): Outcome {
  const { name = '', keepReason = '' } = cell.settings;
  const { relation } = entry;
  const bound = bindAll(relation, bindings, surroundings);
  const diagnostics = [...bound.flatMap((one) => one.diagnostics), ...unbound(relation, bindings)];
  const given = new Map<string, number>();
  for (const { input, number } of bound) if (number !== undefined) given.set(input.symbol, number);
  const complete = relation.inputs.every(({ symbol }) => given.has(symbol));
  const { values, failed } = complete ? workThrough(relation, given) : { values: given, failed: undefined };
  if (failed !== undefined) diagnostics.push(relationDiagnostic('NO_VALUE', { title: relation.title, symbol: failed }));
  const result = relationResult(cell.settings, entry, bound, values, surroundings.settings);
  const outside = result.grade === 'outside' && keepReason === '';
  const computed = complete && failed === undefined;
  return {
    symbols: computed ? symbolsOf(name, relation, values, surroundings.settings) : promisedSymbols(name, relation),
    relation: result,
    diagnostics,
    outsideRange: outside ? [...behind, cell.id] : behind,
  };
}

/** A relation as a unit of dependence, and the lines that stand beneath it. */
export function relationNode(cell: CellInput, lines: readonly Line[]): { node: CalculationNode; below: Line[] } {
  const { name = '', relation: id } = cell.settings;
  const entry = id === undefined ? undefined : findRelation(id);
  const { bindings, below } = partLines(lines, entry?.relation);
  const { uses, keys } = keysOf([...bindings.values()].map((line) => line.expression));
  const node: CalculationNode = {
    cellId: cell.id,
    index: 0,
    defines: name === '' ? undefined : name,
    uses,
    keys,
    compute: (surroundings) => {
      const behind = outsideBehindAll(uses, surroundings);
      if (entry !== undefined) return compute(cell, entry, bindings, behind, surroundings);
      return {
        symbols: new Map<string, Symbol>([[name, { several: 'unknown' }]]),
        diagnostics: [relationDiagnostic('UNKNOWN_RELATION', { relation: id ?? '' })],
        outsideRange: behind,
      };
    },
  };
  return { node, below };
}
