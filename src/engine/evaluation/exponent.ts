import type { Expression } from '../language/tree';

/** Value of an exponent made of figures only (`-2`, `1/3`, `(0.5)`). */
export function exponentOf(expression: Expression): number | undefined {
  if (expression.type === 'group') return exponentOf(expression.inner);
  if (expression.type === 'number') return expression.unit === undefined ? expression.value : undefined;
  if (expression.type === 'unary' && expression.operator !== 'not') {
    const operand = exponentOf(expression.operand);
    return operand === undefined ? undefined : expression.operator === '-' ? -operand : operand;
  }
  if (expression.type === 'binary' && expression.operator === '/') {
    const left = exponentOf(expression.left);
    const right = exponentOf(expression.right);
    return left === undefined || right === undefined ? undefined : left / right;
  }
  return undefined;
}

/** Exponents up to this size are multiplied out. */
const largestWhole = 32;

/**
 * Parts an exponent into a whole number and a root, x^e = x^whole · root(x), so that no power has to
 * be taken: halves, thirds and quarters. Undefined for every other exponent.
 */
export function simplePower(
  exponent: number,
): { whole: number; root?: 'sqrt' | 'cbrt' | 'fourth'; twice?: boolean } | undefined {
  const size = Math.abs(exponent);
  if (!(size <= largestWhole)) return undefined;
  const whole = Math.floor(size);
  const rest = size - whole;
  if (rest === 0) return { whole };
  if (rest === 0.5) return { whole, root: 'sqrt' };
  if (rest === 0.25) return { whole, root: 'fourth' };
  // 2/3 and 4/3 are no binary fractions: what is left of them is a third but for rounding.
  if (size === (whole * 3 + 1) / 3) return { whole, root: 'cbrt' };
  if (size === (whole * 3 + 2) / 3) return { whole, root: 'cbrt', twice: true };
  return undefined;
}
