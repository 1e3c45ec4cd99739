import type { Diagnostic, Span } from '../../errors/diagnostic';
import type { Dimension } from '../../units/types';
import type { Expression } from '../tree';

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

/**
 * What a name stands for; `failed` when its own definition has no type, `several` when it is a cell
 * with several values, of which one must be taken.
 */
export type Lookup = (name: string, property?: string) => Inferred | 'failed' | 'unknown' | 'several';

/** Names for proposals: all that are defined, and the keys (`w.rho`) of one with several values. */
export interface Reach {
  names(): Iterable<string>;
  keysOf(name: string): Iterable<string>;
}

/** What the parts of the inference share. */
export interface Context {
  infer(expression: Expression): Inferred | undefined;
  report(diagnostic: Diagnostic): void;
  /**
   * An expression at a place where its level count is looked at for the last time: refuses a count
   * that makes no sense, warns of a level that was multiplied.
   */
  settle(type: Inferred, span: Span): Inferred | undefined;
}
