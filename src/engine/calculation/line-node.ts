import { evaluationDiagnostic } from '../errors/evaluation-errors';
import { expressionLatex, hiddenNameHints, literalOf, symbolLatex, type Line } from '../language/index';
import { describe } from '../language/inference';
import { plainUnit } from '../units/index';
import { evaluateExpression, impossibleLevel, keysOf } from './expression';
import { outsideBehindAll, type CalculationNode, type Outcome, type Surroundings } from './node';
import { present, valueLatex, type Wish } from './present';
import type { Symbol } from './symbols';
import { asNamed, tooLarge, withTarget } from './target';
import type { LineResult } from './types';

/** How a literal line is shown: as it was written. */
function wishOf(line: Line): Wish {
  const literal = line.expression === undefined ? undefined : literalOf(line.expression);
  if (line.target !== undefined) return { target: line.target.unit };
  if (literal === undefined) return {};
  const figures = /[eE]/.test(literal.literal.text) ? undefined : (literal.sign < 0 ? '-' : '') + literal.literal.text;
  return { target: literal.literal.unit?.unit ?? plainUnit, figures };
}

/** What a line shows before it is computed; the same whatever the sheet holds beside it. */
function shownParts(
  line: Line,
): Pick<LineResult, 'line' | 'span' | 'kind' | 'name' | 'symbolLatex' | 'formulaLatex' | 'note'> {
  return {
    line: line.number,
    span: line.span,
    kind: line.kind === 'blank' ? 'note' : line.kind,
    name: line.name,
    symbolLatex: line.name === undefined ? undefined : symbolLatex(line.name),
    formulaLatex: line.expression === undefined ? undefined : expressionLatex(line.expression),
    note: line.note,
  };
}

/** Computes into a result and the symbol of the line; stops where there is nothing more to say. */
function computeInto(result: LineResult, symbol: Symbol, line: Line, surroundings: Surroundings): void {
  const unreadable = line.diagnostics.some((diagnostic) => diagnostic.severity === 'error');
  if (line.expression === undefined || unreadable) return;
  const isName = (word: string) => surroundings.symbol(word) !== undefined;
  const evaluated = evaluateExpression(line.expression, surroundings);
  result.diagnostics.push(...evaluated.diagnostics, ...hiddenNameHints(line, isName));
  result.waitsFor = evaluated.waitsFor;
  if (evaluated.type === undefined) return;
  if (line.kind === 'require' && evaluated.type.kind !== 'condition') {
    const given = describe(evaluated.type);
    result.diagnostics.push(evaluationDiagnostic('REQUIRE_CONDITION', line.expression.span, { given }));
    return;
  }
  const asked = withTarget(asNamed(evaluated.type, line), line);
  if (asked.diagnostic !== undefined) result.diagnostics.push(asked.diagnostic);
  const { type } = asked;
  if (type === undefined) return;
  symbol.type = type;
  const { value } = evaluated;
  if (value === undefined) return;
  const impossible =
    impossibleLevel(type, value, line.expression.span) ?? tooLarge(value, line, surroundings.settings.ambientPressure);
  if (impossible !== undefined) {
    result.diagnostics.push(impossible);
    return;
  }
  result.value = present(value, type, surroundings.settings, wishOf(line));
  result.substitutionLatex = evaluated.substitution;
  if (line.kind === 'require') result.satisfied = value !== 0;
  symbol.value = value;
  symbol.shown = valueLatex(result.value);
  symbol.display = result.value;
}

/** A line of expressions as a unit of dependence. */
export function lineNode(cellId: string, index: number, line: Line): CalculationNode {
  const { uses, keys } = keysOf([line.expression]);
  const parts = shownParts(line);
  const compute = (surroundings: Surroundings): Outcome => {
    const outsideRange = outsideBehindAll(uses, surroundings);
    const result: LineResult = { ...parts, waitsFor: [], diagnostics: [...line.diagnostics], outsideRange };
    const symbol: Symbol = {};
    computeInto(result, symbol, line, surroundings);
    const symbols = line.name === undefined ? new Map<string, Symbol>() : new Map([[line.name, symbol]]);
    return { symbols, line: result, diagnostics: result.diagnostics, outsideRange };
  };
  return { cellId, index, line: line.number, defines: line.name, uses, keys, compute };
}
