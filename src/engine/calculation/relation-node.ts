import type { Diagnostic } from '../errors/diagnostic';
import { relationDiagnostic } from '../errors/relation-errors';
import { expressionLatex, readLines, substitutedLatex, symbolLatex, type Line } from '../language/index';
import { describe, type Inferred } from '../language/inference';
import { findRelation, readRelation, worstGrade, type CatalogueEntry } from '../relations/index';
import type { Relation, RelationSymbol } from '../relations/types';
import { isDimensionless, resolveUnit, sameDimension, type ResolvedUnit } from '../units/index';
import { dependenciesOf, evaluateExpression } from './expression';
import type { CalculationNode, Outcome, Surroundings } from './node';
import { present, valueLatex } from './present';
import { branchesOf, statedAccuracyOf, validityOf, workThrough } from './relation-evaluation';
import type { Symbol } from './symbols';
import type { CellInput, LineResult, RelationCellResult, RelationInputResult } from './types';

const unitOf = (symbol: RelationSymbol): ResolvedUnit => {
  const unit = resolveUnit(symbol.unit);
  if (unit === undefined) throw new Error(`The catalogue names no unit: ${symbol.unit}`);
  return unit;
};
const typeOf = (symbol: RelationSymbol): Inferred => {
  const { dimension } = unitOf(symbol);
  if (symbol.temperature !== undefined)
    return { kind: 'number', dimension, levels: symbol.temperature === 'level' ? 1 : 0 };
  return { kind: 'number', dimension, levels: isDimensionless(dimension) ? 0 : 'any' };
};

/** Lines that bind a symbol of the relation, and those that stand beneath it. */
export function partLines(
  lines: readonly Line[],
  entry: CatalogueEntry | undefined,
): { bindings: Line[]; below: Line[] } {
  const symbols = new Set(
    entry === undefined ? [] : [...entry.relation.inputs, ...entry.relation.validitySymbols].map((one) => one.symbol),
  );
  const binds = (line: Line) => line.kind === 'assignment' && line.name !== undefined && symbols.has(line.name);
  return { bindings: lines.filter(binds), below: lines.filter((line) => !binds(line) && line.kind !== 'blank') };
}

interface Bound {
  input: RelationInputResult;
  /** Number in the symbol's own unit. */
  number?: number | undefined;
  diagnostics: Diagnostic[];
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
  const evaluated = evaluateExpression(line.expression, surroundings);
  const diagnostics = [...line.diagnostics, ...evaluated.diagnostics];
  if (evaluated.type === undefined) return { input, diagnostics };
  const unit = unitOf(symbol);
  if (!sameDimension(evaluated.type.dimension, unit.dimension)) {
    const parameters = {
      symbol: symbol.symbol,
      quantity: symbol.quantity,
      wanted: describe(typeOf(symbol)),
      given: describe(evaluated.type),
    };
    diagnostics.push(relationDiagnostic('UNITS_DISAGREE', parameters, line.expression.span));
    return { input, diagnostics };
  }
  const { levels } = evaluated.type;
  const mistaken =
    symbol.temperature === 'difference' && typeof levels === 'number' && levels !== 0
      ? 'DIFFERENCE_WANTED'
      : symbol.temperature === 'level' && levels === 0
        ? 'LEVEL_WANTED'
        : undefined;
  if (mistaken !== undefined) {
    const parameters = { symbol: symbol.symbol, quantity: symbol.quantity };
    diagnostics.push(relationDiagnostic(mistaken, parameters, line.expression.span));
    return { input, diagnostics };
  }
  if (evaluated.value === undefined) return { input, diagnostics };
  input.value = present(evaluated.value, evaluated.type, surroundings.settings);
  return { input, number: (evaluated.value - unit.offset) / unit.factor, diagnostics };
}

function bindAll(relation: Relation, bindings: readonly Line[], surroundings: Surroundings): Bound[] {
  const lineOf = (symbol: string) => bindings.filter((line) => line.name === symbol).at(-1);
  return [
    ...relation.inputs.map((symbol) => bind(symbol, false, lineOf(symbol.symbol), surroundings)),
    ...relation.validitySymbols.map((symbol) => bind(symbol, true, lineOf(symbol.symbol), surroundings)),
  ];
}

/** Type of any symbol of the relation: declared for inputs and output, a plain number for what stands between. */
function symbolType(relation: Relation, symbol: string): { type: Inferred; toSi(number: number): number } {
  const declared = [...relation.inputs, ...relation.validitySymbols, relation.output].find(
    (one) => one.symbol === symbol,
  );
  if (declared === undefined)
    return {
      type: { kind: 'number', dimension: unitOf({ symbol, quantity: '', unit: '1' }).dimension, levels: 0 },
      toSi: (number) => number,
    };
  const { factor, offset } = unitOf(declared);
  return { type: typeOf(declared), toSi: (number) => number * factor + offset };
}

function formulaLines(
  relation: Relation,
  values: ReadonlyMap<string, number>,
  surroundings: Surroundings,
): LineResult[] {
  const shownOf = (symbol: string, inFormula = false) => {
    const value = values.get(symbol);
    if (value === undefined) return undefined;
    const { type, toSi } = symbolType(relation, symbol);
    // Formulas take temperatures from absolute zero: their figures stand in kelvin, not in °C.
    return present(toSi(value), inFormula ? { ...type, levels: 'any' } : type, surroundings.settings);
  };
  return readRelation(relation).formula.map((line, index): LineResult => {
    const expression = line.kind === 'assignment' ? line.expression : line.equation;
    const lookup = (use: { type: 'name'; name: string } | { type: 'member' }) => {
      const shown = use.type === 'name' ? shownOf(use.name, true) : undefined;
      return shown === undefined ? undefined : valueLatex(shown);
    };
    const value = shownOf(line.symbol);
    const isImplicit = line.kind === 'implicit';
    return {
      line: index,
      span: { from: 0, to: 0 },
      kind: 'assignment',
      name: line.symbol,
      symbolLatex: symbolLatex(line.symbol),
      formulaLatex: isImplicit ? `\\text{root of }${expressionLatex(expression)}=0` : expressionLatex(expression),
      substitutionLatex: value === undefined || isImplicit ? undefined : substitutedLatex(expression, lookup),
      value,
      waitsFor: [],
      diagnostics: [],
      outsideRange: [],
    };
  });
}

function compute(
  cell: CellInput,
  entry: CatalogueEntry | undefined,
  bindings: readonly Line[],
  uses: readonly string[],
  surroundings: Surroundings,
): Outcome {
  const name = cell.settings.name ?? '';
  const symbols = new Map<string, Symbol>([[name, {}]]);
  const behind = [...new Set(uses.flatMap((use) => surroundings.outsideBehind(use)))];
  if (entry === undefined) {
    return {
      symbols,
      diagnostics: [relationDiagnostic('UNKNOWN_RELATION', { relation: cell.settings.relation ?? '' })],
      outsideRange: behind,
    };
  }
  const { relation, family } = entry;
  const bound = bindAll(relation, bindings, surroundings);
  const diagnostics = bound.flatMap((one) => one.diagnostics);
  const given = new Map(
    bound.flatMap(({ input, number }) => (number === undefined ? [] : [[input.symbol, number] as const])),
  );
  const unbound = relation.inputs.filter((symbol) => !bindings.some((line) => line.name === symbol.symbol));
  if (unbound.length > 0) {
    const list = unbound.map((symbol) => `${symbol.symbol} (${symbol.quantity})`).join(', ');
    diagnostics.push(relationDiagnostic('RELATION_INPUT', { list, first: unbound[0]?.symbol ?? '' }));
  }
  const complete = relation.inputs.every((symbol) => given.has(symbol.symbol));
  const { values, failed } = complete ? workThrough(relation, given) : { values: given, failed: undefined };
  if (failed !== undefined) diagnostics.push(relationDiagnostic('NO_VALUE', { title: relation.title, symbol: failed }));
  const validity = validityOf(relation, values);
  const grade = worstGrade(validity.map((one) => one.grade));
  const outside = grade === 'outside' && (cell.settings.keepReason ?? '') === '';
  if (complete && failed === undefined) {
    for (const [symbol, number] of values) {
      const { type, toSi } = symbolType(relation, symbol);
      const si = toSi(number);
      symbols.set(`${name}.${symbol}`, {
        type,
        value: si,
        shown: valueLatex(present(si, type, surroundings.settings)),
      });
    }
    symbols.set(name, { value: 1 });
  }
  return {
    symbols,
    relation: relationResult(cell, entry, bound, values, validity, grade, family.title, surroundings),
    diagnostics,
    outsideRange: outside ? [...behind, cell.id] : behind,
  };
}

function relationResult(
  cell: CellInput,
  { relation }: CatalogueEntry,
  bound: readonly Bound[],
  values: ReadonlyMap<string, number>,
  validity: RelationCellResult['validity'],
  grade: RelationCellResult['grade'],
  family: string,
  surroundings: Surroundings,
): RelationCellResult {
  const { type, toSi } = symbolType(relation, relation.output.symbol);
  const result = values.get(relation.output.symbol);
  const shown = (number: number) => present(toSi(number), type, surroundings.settings);
  const part = statedAccuracyOf(relation, values);
  return {
    relation: relation.id,
    title: relation.title,
    authors: relation.authors,
    year: relation.year,
    family,
    inputs: bound.map(({ input }) => input),
    formula: formulaLines(relation, values, surroundings),
    outputs: [
      {
        symbol: relation.output.symbol,
        symbolLatex: symbolLatex(relation.output.symbol),
        name: `${cell.settings.name ?? ''}.${relation.output.symbol}`,
        value: result === undefined ? undefined : shown(result),
      },
    ],
    validity,
    branches: branchesOf(relation, values),
    grade,
    propertyTemperature: relation.propertyTemperature,
    characteristicLength: relation.characteristicLength,
    wallCondition: relation.wallCondition,
    accuracy: relation.accuracy,
    relativeAccuracy: part,
    interval:
      result === undefined || part === undefined
        ? undefined
        : { low: shown(result * (1 - part)), high: shown(result * (1 + part)) },
    source: relation.source,
    confirmed: relation.confirmed,
    keepReason: cell.settings.keepReason,
  };
}

/** A relation as a unit of dependence, and the lines that stand beneath it. */
export function relationNode(cell: CellInput): { node: CalculationNode; below: Line[] } {
  const entry = cell.settings.relation === undefined ? undefined : findRelation(cell.settings.relation);
  const { bindings, below } = partLines(readLines(cell.source), entry);
  const uses = [
    ...new Set(bindings.flatMap((line) => (line.expression === undefined ? [] : dependenciesOf(line.expression)))),
  ];
  const node: CalculationNode = {
    key: `${cell.id}:relation`,
    cellId: cell.id,
    defines: cell.settings.name,
    uses,
    compute: (surroundings) => compute(cell, entry, bindings, uses, surroundings),
  };
  return { node, below };
}
