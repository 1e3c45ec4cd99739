import type { RangeGrade, ValidityResult } from '../calculation/types';
import { expressionLatex, type ComparisonNode, type Expression, type LogicalNode } from '../language/index';
import { readShape, symbolsOf, type RangeCondition, type RangeEnd } from './range-reading';
import { notGiven, quantityText } from './range-words';
import { readRelation } from './read';
import type { Relation } from './types';

/** Evaluates on plain numbers; undefined when there is no value. Handed in, since this floor has no evaluator. */
export type EvaluateNumbers = (expression: Expression, values: ReadonlyMap<string, number>) => number | undefined;

/** Share of a limit within which a case is called at the edge, on either side of it. */
const edge = 0.05;
/** Characteristic numbers, which go over decades, also where only one end is stated. */
const overDecades = /^(Re|Gr|Ra|Pe|Gz|Pr|Bi|Fo|We|De|Rc|Rs)/;

/** A case, and what is needed to judge conditions on it. */
interface Case {
  relation: Relation;
  values: ReadonlyMap<string, number>;
  evaluate: EvaluateNumbers;
}

type Verdict = Omit<ValidityResult, 'condition' | 'conditionLatex' | 'missing'>;

/** A limit as a number, with what messages call it. */
interface Limit {
  value: number;
  open: boolean;
}

const declaredIn = (relation: Relation) => [...relation.inputs, ...relation.validitySymbols, relation.output];

/** Symbols of a condition without a value that can be asked for; results are not asked for. */
function missingIn(expression: Expression, { relation, values }: Case): string[] {
  const given = new Set([...relation.inputs, ...relation.validitySymbols].map((one) => one.symbol));
  return symbolsOf(expression).filter((symbol) => given.has(symbol) && !values.has(symbol));
}

function unchecked(expression: Expression, of: Case): Verdict {
  const missing = missingIn(expression, of);
  const results = symbolsOf(expression).filter((symbol) => !of.values.has(symbol) && !missing.includes(symbol));
  const why =
    missing.length > 0
      ? notGiven(missing)
      : results.length > 0
        ? `${results.join(', ')} has no value yet`
        : 'it has no value here';
  return { grade: 'unchecked', scale: 'linear', message: `not checked: ${why}` };
}

function isNear(value: number, limit: number): boolean {
  return limit !== 0 && Math.abs(value - limit) <= edge * Math.abs(limit);
}

/** Grade of a value between limits: beyond one by at most 5 %, or inside and nearer than that, is at the edge. */
function gradeOf(value: number, low: Limit | undefined, high: Limit | undefined, unit: string) {
  const below = low !== undefined && (low.open ? value <= low.value : value < low.value);
  const above = high !== undefined && (high.open ? value >= high.value : value > high.value);
  const passed = below ? low : above ? high : undefined;
  if (passed !== undefined) {
    const words = `${below ? 'below' : 'above'} ${quantityText(passed.value, unit)}`;
    return isNear(value, passed.value)
      ? { grade: 'edge' as const, message: `at the edge: ${words}` }
      : { grade: 'outside' as const, message: words };
  }
  const close = [low, high].find((end) => end !== undefined && isNear(value, end.value));
  return close === undefined
    ? { grade: 'inside' as const, message: 'within' }
    : { grade: 'edge' as const, message: `within, near ${quantityText(close.value, unit)}` };
}

/** Logarithmic where the range goes over more than a decade, or is open at one end for a characteristic number. */
function scaleOf(quantity: Expression, low: Limit | undefined, high: Limit | undefined, value: number | undefined) {
  const ends = [low?.value, high?.value].filter((end) => end !== undefined);
  if (ends.some((end) => end <= 0) || (value !== undefined && value <= 0)) return 'linear' as const;
  const wide =
    low !== undefined && high !== undefined
      ? high.value / low.value > 10
      : symbolsOf(quantity).some((symbol) => overDecades.test(symbol));
  return wide ? ('log' as const) : ('linear' as const);
}

/** Limits that follow from other symbols are rounded for show; figures of the source stay as they are. */
function shownLimit(end: RangeEnd | undefined, limit: Limit | undefined): number | undefined {
  if (end === undefined || limit === undefined) return undefined;
  return end.limit.type === 'number' ? limit.value : Number(limit.value.toPrecision(4));
}

/** L/D in one line: a built-up fraction is too high for a gauge. */
const inLine = (latex: string) => latex.replace(/\\frac\{([^{}]*)\}\{([^{}]*)\}/, '$1/$2');

function judgeRange(condition: Expression, range: RangeCondition, of: Case): Verdict {
  const { quantity } = range;
  const limitOf = (end: RangeEnd | undefined): Limit | undefined => {
    const value = end === undefined ? undefined : of.evaluate(end.limit, of.values);
    return value === undefined || end === undefined ? undefined : { value, open: end.open };
  };
  const [low, high] = [limitOf(range.low), limitOf(range.high)];
  const value = symbolsOf(quantity).every((symbol) => of.values.has(symbol))
    ? of.evaluate(quantity, of.values)
    : undefined;
  const unit = declaredIn(of.relation).find((one) => one.symbol === symbolsOf(quantity)[0])?.unit ?? '1';
  const shownUnit = quantity.type === 'name' ? unit : '1';
  const gauge = {
    symbolLatex: inLine(expressionLatex(quantity)),
    low: shownLimit(range.low, low),
    high: shownLimit(range.high, high),
    ...(value === undefined ? {} : { value, valueText: quantityText(value, shownUnit) }),
    scale: scaleOf(quantity, low, high, value),
  };
  const limitsKnown =
    (low !== undefined) === (range.low !== undefined) && (high !== undefined) === (range.high !== undefined);
  if (value === undefined || !limitsKnown) return { ...unchecked(condition, of), ...gauge };
  return { ...gauge, ...gradeOf(value, low, high, shownUnit) };
}

const orderWords: Readonly<Record<ComparisonNode['operators'][number], string>> = {
  '<': 'below',
  '<=': 'at most',
  '>': 'above',
  '>=': 'at least',
  '==': 'equal to',
  '!=': 'other than',
};

/** `T_s > T_b`: which of two symbols is larger decides, as for heating against cooling. */
function judgeOrder(comparison: ComparisonNode, of: Case): Verdict {
  const holds = of.evaluate(comparison, of.values);
  if (holds === undefined) return unchecked(comparison, of);
  const [left = '', right = ''] = comparison.operands.map((operand) => symbolsOf(operand)[0] ?? '');
  const textOf = (symbol: string) =>
    quantityText(of.values.get(symbol) ?? 0, declaredIn(of.relation).find((one) => one.symbol === symbol)?.unit ?? '1');
  const word = orderWords[comparison.operators[0] ?? '=='];
  const scale = 'linear' as const;
  if (holds !== 0) return { grade: 'inside', scale, message: 'holds' };
  return {
    grade: 'outside',
    scale,
    message: `${left} = ${textOf(left)} is not ${word} ${right} = ${textOf(right)}`,
  };
}

/** One part of an `and` or `or` in words: `Pr = 3 is below 5`. */
function partWords(text: string, { valueText, message }: Verdict): string {
  return valueText === undefined ? `${text}: ${message}` : `${text}: ${valueText}, ${message}`;
}

function judgeLogical(
  text: string,
  operator: LogicalNode['operator'],
  parts: readonly Expression[],
  of: Case,
): Verdict {
  const judged = parts.map((part) => ({
    text: text.slice(part.span.from, part.span.to),
    verdict: judge(text, part, of),
  }));
  const ordered = [...judged].sort((a, b) => badness(a.verdict.grade) - badness(b.verdict.grade));
  const deciding = operator === 'and' ? ordered.at(-1) : ordered[0];
  if (deciding === undefined) return { grade: 'unchecked', scale: 'linear', message: 'not checked' };
  const { grade, message } = deciding.verdict;
  const scale = 'linear' as const;
  if (grade === 'inside') return { grade, scale, message: operator === 'or' ? `holds: ${deciding.text}` : 'within' };
  if (grade === 'unchecked') return { grade, scale, message };
  const told = operator === 'or' ? judged : judged.filter((one) => one.verdict.grade === grade);
  return { grade, scale, message: told.map((one) => partWords(one.text, one.verdict)).join('; ') };
}

function judge(text: string, expression: Expression, of: Case): Verdict {
  const shape = readShape(expression);
  switch (shape.kind) {
    case 'range':
      return judgeRange(expression, shape, of);
    case 'order':
      return judgeOrder(shape.comparison, of);
    case 'logical':
      return judgeLogical(text, shape.operator, shape.parts, of);
    case 'other': {
      const holds = of.evaluate(expression, of.values);
      if (holds === undefined) return unchecked(expression, of);
      const message = holds === 0 ? 'does not hold' : 'holds';
      return { grade: holds === 0 ? 'outside' : 'inside', scale: 'linear', message };
    }
  }
}

/**
 * Where a case lies in every stated condition of a relation. `values` holds the numbers of inputs,
 * symbols that only the conditions need, intermediate results and the output, by symbol; what is
 * not in it is reported as not checked, never passed.
 *
 * Grades: inside; at the edge (within 5 % of a limit, on either side of it); outside; not checked.
 */
export function judgeValidity(
  relation: Relation,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): ValidityResult[] {
  const of: Case = { relation, values, evaluate };
  return readRelation(relation).validity.map(({ text, latex, expression }) => ({
    condition: text,
    conditionLatex: latex,
    missing: missingIn(expression, of),
    ...judge(text, expression, of),
  }));
}

const worseThan: readonly RangeGrade[] = ['inside', 'edge', 'unchecked', 'outside'];
const badness = (grade: RangeGrade) => worseThan.indexOf(grade);

/** The worst of some grades: outside before not checked before at the edge before inside. */
export function worstGrade(grades: readonly RangeGrade[]): RangeGrade {
  return grades.reduce<RangeGrade>((worst, next) => (badness(next) > badness(worst) ? next : worst), 'inside');
}
