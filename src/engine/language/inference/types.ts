import type { Dimension } from '../../units/types';

/**
 * How many levels (temperatures in °C, gauge pressures) an expression sums. A level minus a level is
 * a difference (0), a mean of levels a level (1). `soft` is a difference unless something says
 * otherwise (5 K, Q/(m·c)); `any` may be either (a property, 300 K under another name).
 */
export type LevelCount = number | 'soft' | 'any';

/** What is known of an expression before any number is. */
export interface Inferred {
  kind: 'number' | 'condition';
  dimension: Dimension;
  levels: LevelCount;
  /** Value of a plain constant, for exponents and for weights of levels. */
  constant?: number | undefined;
  /** A level was multiplied: 2*25 °C. */
  scaled?: boolean | undefined;
}

/** What a name stands for; `failed` when its own definition has no type. */
export type Lookup = (name: string, property?: string) => Inferred | 'failed' | 'unknown';
