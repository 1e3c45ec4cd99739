import type { Diagnostic } from '../errors/diagnostic';
import { expressionLatex, hiddenNameHints, literalOf, symbolLatex, type Line } from '../language/index';
import { describe, type Inferred } from '../language/inference';
import { plainUnit, quantityName, sameDimension, type ResolvedUnit } from '../units/index';
import { dependenciesOf, evaluateExpression } from './expression';
import type { CalculationNode, Outcome, Surroundings } from './node';
import { isTemperatureLevel, present, valueLatex } from './present';
import type { Symbol } from './symbols';
import type { LineResult } from './types';

/** Names that speak of a temperature level: `T_a = 300 K` is one, `dT = 5 K` is not. */
const namesALevel = /^(T|t|theta|Theta)(_|\d|$)/;

function asNamed(type: Inferred, line: Line): Inferred {
  if (type.levels !== 'soft' || line.name === undefined || !namesALevel.test(line.name)) return type;
  const literal = line.expression === undefined ? undefined : literalOf(line.expression);
  return literal?.literal.unit === undefined ? type : { ...type, levels: 1 };
}

function targetDiagnostic(type: Inferred, line: Line): Diagnostic | undefined {
  const target = line.target;
  if (target === undefined || sameDimension(target.unit.dimension, type.dimension)) return undefined;
  return {
    code: 'UNITS_DISAGREE',
    severity: 'error',
    message: `Asked in ${target.unit.display || '1'} (${quantityName(target.unit.dimension)}), comes out as ${describe(type)}.`,
    span: target.span,
  };
}

function belowAbsoluteZero(type: Inferred, value: number, line: Line): Diagnostic | undefined {
  if (!isTemperatureLevel(type) || value >= 0) return undefined;
  return {
    code: 'BELOW_ABSOLUTE_ZERO',
    severity: 'error',
    message: `This temperature would be ${String(Number(value.toPrecision(4))).replace('-', '−')} K, below absolute zero.`,
    span: line.expression?.span ?? line.span,
  };
}

/** How a literal line is shown: as it was written. */
function wishOf(line: Line): { target?: ResolvedUnit | undefined; figures?: string | undefined } {
  const literal = line.expression === undefined ? undefined : literalOf(line.expression);
  if (line.target !== undefined) return { target: line.target.unit };
  if (literal === undefined) return {};
  const figures = /[eE]/.test(literal.literal.text) ? undefined : (literal.sign < 0 ? '-' : '') + literal.literal.text;
  return { target: literal.literal.unit?.unit ?? plainUnit, figures };
}

function emptyResult(line: Line): LineResult {
  return {
    line: line.number,
    span: line.span,
    kind: line.kind === 'blank' ? 'note' : line.kind,
    name: line.name,
    symbolLatex: line.name === undefined ? undefined : symbolLatex(line.name),
    formulaLatex: line.expression === undefined ? undefined : expressionLatex(line.expression),
    note: line.note,
    waitsFor: [],
    diagnostics: [...line.diagnostics],
    outsideRange: [],
  };
}

function computeLine(line: Line, uses: readonly string[], surroundings: Surroundings): Outcome {
  const result = emptyResult(line);
  const symbol: Symbol = {};
  const outcome = (): Outcome => ({
    symbols: line.name === undefined ? new Map<string, Symbol>() : new Map([[line.name, symbol]]),
    line: result,
    diagnostics: result.diagnostics,
    outsideRange: result.outsideRange,
  });
  const unreadable = line.diagnostics.some((diagnostic) => diagnostic.severity === 'error');
  if (line.expression === undefined || unreadable) return outcome();

  const isName = (word: string) => surroundings.symbol(word) !== undefined;
  const evaluated = evaluateExpression(line.expression, surroundings);
  result.diagnostics.push(...evaluated.diagnostics, ...hiddenNameHints(line, isName));
  result.waitsFor = evaluated.waitsFor;
  result.outsideRange = [...new Set(uses.flatMap((name) => surroundings.outsideBehind(name)))];
  if (evaluated.type === undefined) return outcome();
  const type = asNamed(evaluated.type, line);
  if (line.kind === 'require' && type.kind !== 'condition') {
    result.diagnostics.push({
      code: 'KIND',
      severity: 'error',
      message: `require states a condition, such as dp <= 50 kPa; this is ${describe(type)}.`,
      span: line.expression.span,
    });
    return outcome();
  }
  const wrongTarget = targetDiagnostic(type, line);
  if (wrongTarget !== undefined) result.diagnostics.push(wrongTarget);
  else symbol.type = type;
  const { value } = evaluated;
  if (value === undefined || wrongTarget !== undefined) return outcome();
  const impossible = belowAbsoluteZero(type, value, line);
  if (impossible !== undefined) {
    result.diagnostics.push(impossible);
    return outcome();
  }
  result.value = present(value, type, surroundings.settings, wishOf(line));
  result.substitutionLatex = evaluated.substitution;
  if (line.kind === 'require') result.satisfied = value !== 0;
  symbol.value = value;
  symbol.shown = valueLatex(result.value);
  symbol.display = result.value;
  return outcome();
}

/** A line of expressions as a unit of dependence. */
export function lineNode(cellId: string, key: string, line: Line): CalculationNode {
  const uses = line.expression === undefined ? [] : dependenciesOf(line.expression);
  return { key, cellId, defines: line.name, uses, compute: (surroundings) => computeLine(line, uses, surroundings) };
}
