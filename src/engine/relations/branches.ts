import type { ActiveBranch } from '../calculation/types';
import { expressionLatex, formatExpression, partsOf, type CallNode, type Expression } from '../language/index';
import { isFigure, readShape, type RangeCondition } from './range-reading';
import { figureText } from './range-words';
import type { EvaluateNumbers } from './range';
import { readRelation } from './read';
import type { Relation } from './types';

/** Share of a joint within which a case is called near it, the same as for limits of validity. */
const edge = 0.05;

function jointOf(range: RangeCondition, values: ReadonlyMap<string, number>, evaluate: EvaluateNumbers) {
  const value = evaluate(range.quantity, values);
  const ends = [range.low, range.high].flatMap((end) => {
    const limit = end === undefined ? undefined : evaluate(end.limit, values);
    return limit === undefined ? [] : [limit];
  });
  const distance = (limit: number) => Math.abs((value ?? Infinity) - limit);
  const joint = ends.sort((a, b) => distance(a) - distance(b))[0];
  const near = joint !== undefined && joint !== 0 && distance(joint) <= edge * Math.abs(joint);
  return { joint, near };
}

function branch(
  symbol: string,
  condition: Expression,
  holds: boolean,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): ActiveBranch {
  const shape = readShape(condition);
  const { joint, near } = shape.kind === 'range' ? jointOf(shape, values, evaluate) : { joint: undefined, near: false };
  const fact = `${formatExpression(condition)} ${holds ? 'holds' : 'does not hold'}`;
  return {
    symbol,
    conditionLatex: expressionLatex(condition),
    holds,
    ...(joint === undefined ? {} : { joint }),
    near,
    message: near && joint !== undefined ? `${fact}; near the joint at ${figureText(joint)}` : fact,
  };
}

const isBranching = (expression: Expression): expression is CallNode =>
  expression.type === 'call' && expression.name === 'if' && expression.arguments.length === 3;

/** Whether a condition parts ranges of the source, and is no guard of the arithmetic (`Cr == 1`). */
function isJoint(condition: Expression): boolean {
  const shape = readShape(condition);
  if (shape.kind === 'range') return [shape.low, shape.high].every((end) => end === undefined || isFigure(end.limit));
  return shape.kind === 'order' && shape.comparison.operators[0] !== '==';
}

/** Follows the sides of `if` that apply; sides that do not are not entered. */
function branchesIn(
  symbol: string,
  expression: Expression,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): ActiveBranch[] {
  if (!isBranching(expression))
    return partsOf(expression).flatMap((part) => branchesIn(symbol, part, values, evaluate));
  const [condition, first, second] = expression.arguments;
  if (condition === undefined || first === undefined || second === undefined) return [];
  const holds = evaluate(condition, values);
  if (holds === undefined) return [];
  const own = isJoint(condition) ? [branch(symbol, condition, holds !== 0, values, evaluate)] : [];
  return [...own, ...branchesIn(symbol, holds === 0 ? second : first, values, evaluate)];
}

/** One of several lines that branch at the same joint is enough. */
function oncePerJoint(branches: readonly ActiveBranch[]): ActiveBranch[] {
  return branches.filter(
    (one, index) => branches.findIndex(({ conditionLatex }) => conditionLatex === one.conditionLatex) === index,
  );
}

/** Active branches of the piecewise lines of a relation, for the values of a case with its results. */
export function activeBranches(
  relation: Relation,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): ActiveBranch[] {
  const branches = readRelation(relation).formula.flatMap((line) =>
    line.kind === 'assignment' ? branchesIn(line.symbol, line.expression, values, evaluate) : [],
  );
  return oncePerJoint(branches);
}
