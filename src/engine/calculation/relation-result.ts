import { expressionLatex, substitutedLatex, symbolLatex } from '../language/index';
import { readRelation, worstGrade, type CatalogueEntry } from '../relations/index';
import type { Relation } from '../relations/types';
import { present, valueLatex } from './present';
import type { Bound } from './relation-binding';
import { branchesOf, statedAccuracyOf, validityOf } from './relation-evaluation';
import { scaleOf } from './relation-symbols';
import type { CalculationSettings, CellSettings, DisplayedValue, LineResult, RelationCellResult } from './types';

/** A symbol's number as it is shown; formulas take temperatures from absolute zero, in kelvin. */
export function shownSymbol(
  relation: Relation,
  symbol: string,
  number: number | undefined,
  settings: CalculationSettings,
  inFormula = false,
): DisplayedValue | undefined {
  if (number === undefined) return undefined;
  const { type, toSi } = scaleOf(relation, symbol);
  const si = toSi(number);
  if (!Number.isFinite(si)) return undefined;
  return present(si, inFormula ? { ...type, levels: 'any' } : type, settings);
}

function formulaLines(
  relation: Relation,
  values: ReadonlyMap<string, number>,
  settings: CalculationSettings,
): LineResult[] {
  return readRelation(relation).formula.map((line, index): LineResult => {
    const isImplicit = line.kind === 'implicit';
    const expression = isImplicit ? line.equation : line.expression;
    const value = shownSymbol(relation, line.symbol, values.get(line.symbol), settings);
    const substitution = substitutedLatex(expression, (use) => {
      if (use.type !== 'name') return undefined;
      const shown = shownSymbol(relation, use.name, values.get(use.name), settings, true);
      return shown === undefined ? undefined : valueLatex(shown);
    });
    return {
      line: index,
      span: { from: 0, to: 0 },
      kind: 'assignment',
      name: line.symbol,
      symbolLatex: symbolLatex(line.symbol),
      formulaLatex: isImplicit ? `\\text{root of }${expressionLatex(expression)}=0` : expressionLatex(expression),
      substitutionLatex: value === undefined || isImplicit ? undefined : substitution,
      value,
      waitsFor: [],
      diagnostics: [],
      outsideRange: [],
    };
  });
}

function intervalOf(
  relation: Relation,
  result: number | undefined,
  part: number | undefined,
  settings: CalculationSettings,
): RelationCellResult['interval'] {
  if (result === undefined || part === undefined) return undefined;
  const at = (factor: number) => shownSymbol(relation, relation.output.symbol, result * factor, settings);
  const low = at(1 - part);
  const high = at(1 + part);
  return low === undefined || high === undefined ? undefined : { low, high };
}

/** Everything that a relation cell shows. */
export function relationResult(
  { name = '', keepReason }: CellSettings,
  { relation, family }: CatalogueEntry,
  bound: readonly Bound[],
  values: ReadonlyMap<string, number>,
  settings: CalculationSettings,
): RelationCellResult {
  const { symbol } = relation.output;
  const result = values.get(symbol);
  const validity = validityOf(relation, values);
  const relativeAccuracy = statedAccuracyOf(relation, values);
  return {
    relation: relation.id,
    title: relation.title,
    authors: relation.authors,
    year: relation.year,
    family: family.title,
    inputs: bound.map(({ input }) => input),
    formula: formulaLines(relation, values, settings),
    outputs: [
      {
        symbol,
        symbolLatex: symbolLatex(symbol),
        name: `${name}.${symbol}`,
        value: shownSymbol(relation, symbol, result, settings),
      },
    ],
    validity,
    branches: branchesOf(relation, values),
    grade: worstGrade(validity.map((one) => one.grade)),
    propertyTemperature: relation.propertyTemperature,
    characteristicLength: relation.characteristicLength,
    wallCondition: relation.wallCondition,
    accuracy: relation.accuracy,
    relativeAccuracy,
    interval: intervalOf(relation, result, relativeAccuracy, settings),
    source: relation.source,
    confirmed: relation.confirmed,
    keepReason,
  };
}
