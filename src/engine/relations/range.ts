import type { RangeGrade, ValidityResult } from '../calculation/types';
import { expressionLatex, ungrouped, usesOf, type ComparisonNode, type Expression } from '../language/index';
import { readRelation } from './read';
import type { Relation } from './types';

/** Evaluates on plain numbers; undefined when there is no value. Handed in, since this floor has no evaluator. */
export type EvaluateNumbers = (expression: Expression, values: ReadonlyMap<string, number>) => number | undefined;

/** Share of a limit within which a case is called at the edge, on either side of it. */
const edge = 0.05;

const alwaysLogarithmic = /^(Re|Gr|Ra|Pe|Gz|Pr|Bi|Fo|We|Nu)/;
const turned: Readonly<Record<string, string>> = { '<': '>', '<=': '>=', '>': '<', '>=': '<=' };

interface SimpleRange {
  quantity: Expression;
  low?: { value: number; open: boolean };
  high?: { value: number; open: boolean };
}

function figureOf(
  expression: Expression,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): number | undefined {
  const symbols = usesOf(expression).filter((use) => use.type !== 'name' || use.name !== 'pi');
  return symbols.length === 0 ? evaluate(expression, values) : undefined;
}

/** Reads `a <= X <= b`, `X >= a`, `a > X` as a range of X, where the limits are figures. */
function simpleRange(
  node: ComparisonNode,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): SimpleRange | undefined {
  const figures = node.operands.map((operand) => figureOf(operand, values, evaluate));
  const at = figures.findIndex((figure) => figure === undefined);
  const quantity = node.operands[at];
  if (
    quantity === undefined ||
    figures.filter((figure) => figure === undefined).length !== 1 ||
    node.operands.length > 3
  )
    return undefined;
  const range: SimpleRange = { quantity };
  for (const [index, operator] of node.operators.entries()) {
    const left = figures[index];
    const limit = left ?? figures[index + 1];
    const sign = left === undefined ? operator : (turned[operator] ?? operator);
    if (limit === undefined) return undefined;
    if (sign === '<' || sign === '<=') range.high = { value: limit, open: sign === '<' };
    else if (sign === '>' || sign === '>=') range.low = { value: limit, open: sign === '>' };
    else return undefined;
  }
  return range;
}

const figureText = (value: number) => {
  const size = Math.abs(value);
  if (size !== 0 && (size >= 1e6 || size < 1e-3)) {
    const [mantissa = '', power = ''] = value.toExponential(3).split('e');
    const raised = [...String(Number(power))].map((sign) => (sign === '-' ? '⁻' : '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(sign)])).join('');
    const short = String(Number(mantissa));
    return `${short === '1' ? '' : `${short}·`}10${raised}`.replace('-', '−');
  }
  return String(Number(value.toPrecision(4)))
    .replace('-', '−')
    .replace(/\B(?=(\d{3})+(?!\d))(?<!\.\d*)/g, '\u00a0');
};

function near(value: number, limit: number): boolean {
  return limit !== 0 && Math.abs(value - limit) <= edge * Math.abs(limit);
}

function judgeRange(value: number, { low, high }: SimpleRange): { grade: RangeGrade; message: string } {
  const below = low !== undefined && (low.open ? value <= low.value : value < low.value);
  const above = high !== undefined && (high.open ? value >= high.value : value > high.value);
  const limit = below ? low?.value : above ? high?.value : undefined;
  if (limit !== undefined) {
    const words = `${below ? 'below' : 'above'} ${figureText(limit)}`;
    return near(value, limit)
      ? { grade: 'edge', message: `at the edge: ${words}` }
      : { grade: 'outside', message: words };
  }
  const close = [low, high].find((end) => end !== undefined && near(value, end.value));
  return close === undefined
    ? { grade: 'inside', message: 'within' }
    : { grade: 'edge', message: `within, near ${figureText(close.value)}` };
}

function wantsLogarithm(symbol: string, { low, high }: SimpleRange, value: number | undefined): boolean {
  const least = low?.value ?? value ?? 0;
  const most = high?.value ?? value ?? 0;
  if (least < 0 || most <= 0) return false;
  return alwaysLogarithmic.test(symbol) || (least > 0 && most / least > 20);
}

function judgeCondition(
  text: string,
  expression: Expression,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): ValidityResult {
  const conditionLatex = expressionLatex(expression);
  const symbols = [
    ...new Set(usesOf(expression).map((use) => (use.type === 'name' ? use.name : `${use.object}.${use.property}`))),
  ];
  const missing = symbols.filter((symbol) => symbol !== 'pi' && !values.has(symbol));
  const inner = ungrouped(expression);
  const range = inner.type === 'comparison' ? simpleRange(inner, values, evaluate) : undefined;
  const base = { condition: text, conditionLatex, missing, scale: 'linear' as const };
  if (range === undefined) {
    if (missing.length > 0)
      return { ...base, grade: 'unchecked', message: `not checked: ${missing.join(', ')} not given` };
    const holds = evaluate(expression, values);
    if (holds === undefined) return { ...base, grade: 'unchecked', message: 'not checked: it has no value here' };
    return { ...base, grade: holds === 0 ? 'outside' : 'inside', message: holds === 0 ? 'does not hold' : 'holds' };
  }
  const value = missing.length > 0 ? undefined : evaluate(range.quantity, values);
  const symbol = text.replace(/[\d.eE<>=\s]/g, '');
  const gauge = {
    ...base,
    symbolLatex: expressionLatex(range.quantity).replace(/\\frac\{([^{}]*)\}\{([^{}]*)\}/, '$1/$2'),
    low: range.low?.value,
    high: range.high?.value,
    scale: wantsLogarithm(symbol, range, value) ? ('log' as const) : ('linear' as const),
  };
  if (value === undefined) {
    const why = missing.length > 0 ? `${missing.join(', ')} not given` : 'it has no value here';
    return { ...gauge, grade: 'unchecked', message: `not checked: ${why}` };
  }
  return { ...gauge, value, valueText: figureText(value), ...judgeRange(value, range) };
}

/**
 * Where a case lies in every stated condition of a relation. `values` holds the numbers of inputs,
 * symbols that only the conditions need, intermediate results and the output, by symbol; what is
 * not in it is reported as not checked, never passed.
 */
export function judgeValidity(
  relation: Relation,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): ValidityResult[] {
  return readRelation(relation).validity.map(({ text, expression }) =>
    judgeCondition(text, expression, values, evaluate),
  );
}

const worseThan: readonly RangeGrade[] = ['inside', 'edge', 'unchecked', 'outside'];

/** The worst of some grades: outside before not checked before at the edge before inside. */
export function worstGrade(grades: readonly RangeGrade[]): RangeGrade {
  return grades.reduce<RangeGrade>(
    (worst, next) => (worseThan.indexOf(next) > worseThan.indexOf(worst) ? next : worst),
    'inside',
  );
}
