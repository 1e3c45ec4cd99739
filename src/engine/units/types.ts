/**
 * Exponents of the base quantities, in the order of `baseQuantities`. Rational exponents are kept
 * as exact fractions in twelfths (so 1/2, 1/3, 1/4 and 1/6 are whole numbers here).
 */
export type Dimension = readonly number[];

export const baseQuantities = [
  'length',
  'mass',
  'time',
  'temperature',
  'amount',
  'current',
  'luminosity',
  'angle',
  // Money is a plain dimension, each currency its own: no rate of exchange is ever assumed.
  'currency',
  'US dollar',
  'pound sterling',
  'Swiss franc',
] as const;
export const dimensionDenominator = 12;

/**
 * A unit expression after a number or after `to`, resolved against the unit table.
 * value in SI = number * factor + offset.
 */
export interface ResolvedUnit {
  /** As written: `kJ/(kg K)`. */
  text: string;
  factor: number;
  /** Only for levels: 273.15 for degC; for gauge units the ambient pressure is added when evaluated. */
  offset: number;
  dimension: Dimension;
  /** A level counts as one level, everything else as none. */
  level?: 'temperature' | 'gauge pressure' | undefined;
  /** `kJ/(kg·K)` with superscripts. */
  display: string;
  latex: string;
}

/** A value as it is shown, with the exact SI value behind it. */
export interface DisplayedValue {
  /** In coherent SI units (kelvin for a temperature level); a truth value for conditions. */
  si: number | boolean;
  /** Coherent SI unit of `si`, as text: `W/(m^2*K)`; `1` for a plain number. */
  siUnit: string;
  /** The figure as shown, rounded, thousands parted by U+00A0, with the decimal sign `.`. */
  text: string;
  /** `text` before the decimal sign … */
  whole: string;
  /** … and from the decimal sign on (may be empty); power of ten included: `.23×10⁶`. */
  fraction: string;
  /** Unit as shown, in plain text with superscripts: `W/(m²·K)`; empty for a plain number. */
  unit: string;
  unitLatex: string;
  /** `temperature` for levels (°C, K), `pressure` for gauge levels. */
  level?: 'temperature' | 'pressure' | undefined;
}
