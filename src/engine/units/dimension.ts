import { baseQuantities, dimensionDenominator, type Dimension } from './types';

/** No dimension at all: a plain number. */
export const dimensionless: Dimension = baseQuantities.map(() => 0);

/** A base quantity to the power of one. */
export function baseDimension(quantity: (typeof baseQuantities)[number]): Dimension {
  return baseQuantities.map((name) => (name === quantity ? dimensionDenominator : 0));
}

export function multiplyDimensions(left: Dimension, right: Dimension): Dimension {
  return left.map((exponent, index) => exponent + (right[index] ?? 0));
}

export function divideDimensions(left: Dimension, right: Dimension): Dimension {
  return left.map((exponent, index) => exponent - (right[index] ?? 0));
}

/**
 * Dimension to a rational power. Answers undefined when an exponent would not be a whole number of
 * twelfths: no quantity of the field has such a dimension.
 */
export function powerOfDimension(dimension: Dimension, exponent: number): Dimension | undefined {
  const power = dimension.map((part) => {
    const product = part * exponent;
    return Math.abs(product - Math.round(product)) < 1e-9 ? Math.round(product) : NaN;
  });
  return power.some(Number.isNaN) ? undefined : power.map((part) => (part === 0 ? 0 : part));
}

export function sameDimension(left: Dimension, right: Dimension): boolean {
  return left.every((exponent, index) => exponent === right[index]);
}

export function isDimensionless(dimension: Dimension): boolean {
  return dimension.every((exponent) => exponent === 0);
}
