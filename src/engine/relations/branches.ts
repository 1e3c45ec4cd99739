import { expressionLatex, formatExpression, partsOf, type CallNode, type Expression } from '../language/index';
import { readShape, type RangeCondition } from './range-reading';
import { figureText } from './range-words';
import type { EvaluateNumbers } from './range';
import { readRelation } from './read';
import type { Relation } from './types';

/** Which side of a joint of a piecewise formula applies, and whether the case lies near the joint. */
export interface ActiveBranch {
  /** Symbol of the formula line. */
  symbol: string;
  /** The condition as it stands in the formula: `Re < 2000`. */
  conditionLatex: string;
  holds: boolean;
  /** Limit at the joint, where the condition is a simple one. */
  joint?: number;
  near: boolean;
  /** `Re < 2000 holds; near the joint at 2 000`. */
  message: string;
}

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
  const taken = holds === 0 ? second : first;
  return [branch(symbol, condition, holds !== 0, values, evaluate), ...branchesIn(symbol, taken, values, evaluate)];
}

/** Active branches of the piecewise lines of a relation, for the values of a case with its results. */
export function activeBranches(
  relation: Relation,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): ActiveBranch[] {
  return readRelation(relation).formula.flatMap((line) =>
    line.kind === 'assignment' ? branchesIn(line.symbol, line.expression, values, evaluate) : [],
  );
}
