import { besselI, besselJ, besselK } from '../numerics/bessel';
import { erf, erfc } from '../numerics/error-function';

/** A function on plain numbers: where it has a value, and which. */
export interface Evaluator {
  name: string;
  /** Answers no finite number where `refuse` has a reason. */
  evaluate(x: number, y: number): number;
  /** Why there is no value for these arguments; undefined when there is one. */
  refuse?(x: number, y: number): string | undefined;
}

const negative = (name: string) => (x: number) => (x < 0 ? `${name} of a negative value` : undefined);
const notPositive = (name: string) => (x: number) => (x <= 0 ? `${name} of a value that is not positive` : undefined);
const outsideOne = (name: string) => (x: number) =>
  Math.abs(x) > 1 ? `${name} of a value outside −1 to 1` : undefined;
const noOrder = (n: number) =>
  Number.isInteger(n) && n >= 0 && n <= 100
    ? undefined
    : 'the order of a Bessel function is a whole number from 0 to 100';

/** Functions whose formula would answer some number where they have no value. */
function guarded(name: string, evaluate: Evaluator['evaluate'], refuse: NonNullable<Evaluator['refuse']>): Evaluator {
  return { name, evaluate: (x, y) => (refuse(x, y) === undefined ? evaluate(x, y) : NaN), refuse };
}

const evaluators: readonly Evaluator[] = [
  { name: 'sqrt', evaluate: Math.sqrt, refuse: negative('square root') },
  { name: 'cbrt', evaluate: Math.cbrt },
  { name: 'exp', evaluate: Math.exp },
  { name: 'ln', evaluate: Math.log, refuse: notPositive('logarithm') },
  { name: 'log10', evaluate: Math.log10, refuse: notPositive('logarithm') },
  { name: 'sin', evaluate: Math.sin },
  { name: 'cos', evaluate: Math.cos },
  { name: 'tan', evaluate: Math.tan },
  { name: 'asin', evaluate: Math.asin, refuse: outsideOne('arcsine') },
  { name: 'acos', evaluate: Math.acos, refuse: outsideOne('arccosine') },
  { name: 'atan', evaluate: Math.atan },
  { name: 'sinh', evaluate: Math.sinh },
  { name: 'cosh', evaluate: Math.cosh },
  { name: 'tanh', evaluate: Math.tanh },
  { name: 'asinh', evaluate: Math.asinh },
  {
    name: 'acosh',
    evaluate: Math.acosh,
    refuse: (x) => (x < 1 ? 'inverse hyperbolic cosine of a value below 1' : undefined),
  },
  {
    name: 'atanh',
    evaluate: Math.atanh,
    refuse: (x) => (Math.abs(x) >= 1 ? 'inverse hyperbolic tangent of a value outside −1 to 1' : undefined),
  },
  { name: 'abs', evaluate: Math.abs },
  { name: 'erf', evaluate: erf },
  { name: 'erfc', evaluate: erfc },
  guarded('besselJ', besselJ, noOrder),
  guarded('besselI', besselI, noOrder),
  guarded('besselK', besselK, (n, x) => noOrder(n) ?? notPositive('Bessel function K')(x)),
  // Of powers with a broken exponent; a negative base has none, unlike `cbrt` itself.
  guarded('cube root', Math.cbrt, (x) => (x < 0 ? 'a broken power of a negative value' : undefined)),
];

const codes = new Map(evaluators.map((evaluator, index) => [evaluator.name, index]));

export function functionCode(name: string): number {
  const code = codes.get(name);
  if (code === undefined) throw new Error(`There is no function ${name}.`);
  return code;
}

export function evaluatorOf(code: number): Evaluator {
  const evaluator = evaluators[code];
  if (evaluator === undefined) throw new Error(`There is no function number ${code}.`);
  return evaluator;
}
