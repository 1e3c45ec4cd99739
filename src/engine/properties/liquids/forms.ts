import type { LiquidProperty } from './types';

/** Rows by power of T − T₀, columns by power of x − x₀. */
export interface Polynomial {
  T: number;
  x?: number;
  coefficients: readonly (readonly number[])[];
}

/** Σ c_ij (T − T₀)^i (x − x₀)^j by Horner's rule. */
export function polynomial({ T: T0, x: x0 = 0, coefficients }: Polynomial): LiquidProperty {
  return (T, x) => {
    const t = T - T0;
    const y = x - x0;
    let sum = 0;
    for (let i = coefficients.length - 1; i >= 0; i -= 1) {
      const row = coefficients[i] ?? [];
      let inner = 0;
      for (let j = row.length - 1; j >= 0; j -= 1) inner = inner * y + (row[j] ?? 0);
      sum = sum * t + inner;
    }
    return sum;
  };
}

/** The exponential of such a polynomial. */
export function exponentialPolynomial(form: Polynomial): LiquidProperty {
  const exponent = polynomial(form);
  return (T, x) => Math.exp(exponent(T, x));
}

/** exp(a/(T + b) − c) */
export const vogel =
  (a: number, b: number, c: number): LiquidProperty =>
  (T) =>
    Math.exp(a / (T + b) - c);
