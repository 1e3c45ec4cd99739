import type { Expression, MemberNode, NameNode } from './tree';

/** Direct parts of an expression, in reading order. */
export function partsOf(expression: Expression): readonly Expression[] {
  switch (expression.type) {
    case 'group':
      return [expression.inner];
    case 'unary':
      return [expression.operand];
    case 'binary':
    case 'logical':
      return [expression.left, expression.right];
    case 'comparison':
      return expression.operands;
    case 'call':
      return expression.arguments;
    default:
      return [];
  }
}

/** All uses of names and members, in reading order. */
export function usesOf(expression: Expression): (NameNode | MemberNode)[] {
  if (expression.type === 'name' || expression.type === 'member') return [expression];
  return partsOf(expression).flatMap(usesOf);
}

/** The same under the name that lists use: names and members with their spans. */
export const namesOf = usesOf;

/** Without the parentheses around it. */
export function ungrouped(expression: Expression): Expression {
  return expression.type === 'group' ? ungrouped(expression.inner) : expression;
}

/** Whether the expression is nothing but a literal, perhaps with a sign. */
export function literalOf(
  expression: Expression,
): { sign: 1 | -1; literal: Extract<Expression, { type: 'number' }> } | undefined {
  const inner = ungrouped(expression);
  if (inner.type === 'number') return { sign: 1, literal: inner };
  if (inner.type === 'unary' && inner.operator === '-' && inner.operand.type === 'number')
    return { sign: -1, literal: inner.operand };
  return undefined;
}
