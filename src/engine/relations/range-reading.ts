import { ungrouped, usesOf, type ComparisonNode, type Expression, type LogicalNode } from '../language/index';

/** One end of a stated range. The limit may be a figure or follow from other symbols. */
export interface RangeEnd {
  limit: Expression;
  /** `<` and `>`: the limit itself does not belong to the range. */
  open: boolean;
}

export interface RangeCondition {
  kind: 'range';
  quantity: Expression;
  low?: RangeEnd;
  high?: RangeEnd;
}

/** A stated condition, read for judging. */
export type ReadShape =
  | RangeCondition
  /** Two symbols set side by side: `T_s > T_b`. Nearness means nothing here. */
  | { kind: 'order'; comparison: ComparisonNode }
  | { kind: 'logical'; operator: LogicalNode['operator']; parts: readonly [Expression, Expression] }
  | { kind: 'other' };

const turned: Readonly<Record<string, string>> = { '<': '>', '<=': '>=', '>': '<', '>=': '<=' };

/** Names in an expression, each once; π is a figure. */
export function symbolsOf(expression: Expression): string[] {
  const names = usesOf(expression).map((use) => (use.type === 'name' ? use.name : `${use.object}.${use.property}`));
  return [...new Set(names)].filter((name) => name !== 'pi');
}

/** Whether an expression has no symbols: a limit as the source prints it. */
export function isFigure(expression: Expression): boolean {
  return symbolsOf(expression).length === 0;
}

function isSymbol(expression: Expression): boolean {
  return ungrouped(expression).type === 'name';
}

/** Puts `limit operator quantity` as an end of the range; false for a sign that bounds nothing. */
function addEnd(range: RangeCondition, quantityFirst: boolean, operator: string, limit: Expression): boolean {
  const sign = quantityFirst ? operator : turned[operator];
  const end = { limit, open: sign === '<' || sign === '>' };
  if (sign === '<' || sign === '<=') range.high = end;
  else if (sign === '>' || sign === '>=') range.low = end;
  else return false;
  return true;
}

function readComparison(node: ComparisonNode): ReadShape {
  const [first, second, third] = node.operands;
  const [before, after] = node.operators;
  if (first === undefined || second === undefined || before === undefined || node.operands.length > 3)
    return { kind: 'other' };
  if (third !== undefined && after !== undefined) {
    const range: RangeCondition = { kind: 'range', quantity: second };
    const bounded = addEnd(range, false, before, first) && addEnd(range, true, after, third);
    return bounded && range.low !== undefined && range.high !== undefined ? range : { kind: 'other' };
  }
  if (isSymbol(first) && isSymbol(second)) return { kind: 'order', comparison: node };
  const quantityFirst = !isFigure(first);
  const range: RangeCondition = { kind: 'range', quantity: quantityFirst ? first : second };
  return addEnd(range, quantityFirst, before, quantityFirst ? second : first) ? range : { kind: 'other' };
}

/**
 * Reads `a <= X <= b`, `X >= a`, `a > X` as a range of X. X and the limits may be expressions:
 * `L/D >= 0.05*Re*Pr` is a range of L/D.
 */
export function readShape(expression: Expression): ReadShape {
  const inner = ungrouped(expression);
  if (inner.type === 'comparison') return readComparison(inner);
  if (inner.type === 'logical') return { kind: 'logical', operator: inner.operator, parts: [inner.left, inner.right] };
  return { kind: 'other' };
}
