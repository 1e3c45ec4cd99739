/** How the dimensions of a function's arguments and result hang together. */
export type DimensionRule =
  /** plain number in, plain number out */
  | 'plain'
  /** square or cube root of any dimension */
  | 'root2'
  | 'root3'
  /** all arguments alike, result alike */
  | 'same'
  /** like `same`, levels add up */
  | 'sum'
  | 'mean'
  | 'if';

export interface FunctionSignature {
  name: string;
  /** Names of the arguments, for help while writing. */
  parameters: readonly string[];
  least: number;
  most: number;
  rule: DimensionRule;
  help: string;
}

const many = 50;
const row = (
  name: string,
  parameters: string,
  rule: DimensionRule,
  help: string,
  least?: number,
  most?: number,
): FunctionSignature => {
  const list = parameters.split(' ');
  return { name, parameters: list, least: least ?? list.length, most: most ?? list.length, rule, help };
};

/** Every function of the language. */
export const functionSignatures: readonly FunctionSignature[] = [
  row('sqrt', 'x', 'root2', 'square root'),
  row('cbrt', 'x', 'root3', 'cube root'),
  row('exp', 'x', 'plain', 'e to the power of x'),
  row('ln', 'x', 'plain', 'natural logarithm'),
  row('log10', 'x', 'plain', 'logarithm to base ten'),
  row('sin', 'angle', 'plain', 'sine of an angle (radians, or a value in deg)'),
  row('cos', 'angle', 'plain', 'cosine of an angle'),
  row('tan', 'angle', 'plain', 'tangent of an angle'),
  row('asin', 'x', 'plain', 'angle whose sine is x'),
  row('acos', 'x', 'plain', 'angle whose cosine is x'),
  row('atan', 'x', 'plain', 'angle whose tangent is x'),
  row('sinh', 'x', 'plain', 'hyperbolic sine'),
  row('cosh', 'x', 'plain', 'hyperbolic cosine'),
  row('tanh', 'x', 'plain', 'hyperbolic tangent'),
  row('asinh', 'x', 'plain', 'inverse hyperbolic sine'),
  row('acosh', 'x', 'plain', 'inverse hyperbolic cosine'),
  row('atanh', 'x', 'plain', 'inverse hyperbolic tangent'),
  row('erf', 'x', 'plain', 'error function'),
  row('erfc', 'x', 'plain', 'complementary error function'),
  row('besselJ', 'n x', 'plain', 'Bessel function of the first kind, whole order n'),
  row('besselI', 'n x', 'plain', 'modified Bessel function of the first kind, whole order n'),
  row('besselK', 'n x', 'plain', 'modified Bessel function of the second kind, whole order n'),
  row('abs', 'x', 'same', 'size without sign'),
  row('min', 'a b …', 'same', 'least of the values', 1, many),
  row('max', 'a b …', 'same', 'greatest of the values', 1, many),
  row('sum', 'a b …', 'sum', 'sum of the values', 1, many),
  row('mean', 'a b …', 'mean', 'arithmetic mean of the values', 1, many),
  row('if', 'condition then otherwise', 'if', 'one of two values, by a condition'),
];

const byName = new Map(functionSignatures.map((signature) => [signature.name, signature]));

export function findFunction(name: string): FunctionSignature | undefined {
  return byName.get(name);
}
