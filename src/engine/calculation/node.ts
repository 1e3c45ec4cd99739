import type { Diagnostic } from '../errors/diagnostic';
import type { Symbol } from './symbols';
import type { CalculationSettings, FluidCellResult, LineResult, RelationCellResult } from './types';

/** What one unit of dependence came to: a line, a fluid state, a relation, a text. */
export interface Outcome {
  /** Symbols it defines: `Q`, `w.rho`. */
  symbols: ReadonlyMap<string, Symbol>;
  line?: LineResult | undefined;
  fluid?: FluidCellResult | undefined;
  relation?: RelationCellResult | undefined;
  diagnostics: Diagnostic[];
  /** Relation cells outside their stated range that it follows from. */
  outsideRange: readonly string[];
}

/** What a node sees of the rest of the sheet while it is computed. */
export interface Surroundings {
  settings: CalculationSettings;
  /** Symbol of `x` or `w.rho`, built-in constants among them; undefined when nothing of that name exists. */
  symbol(key: string): Symbol | undefined;
  /** For proposals: all names that are defined, and the keys (`w.rho`) of those with several values. */
  names(): Iterable<string>;
  keysOf(name: string): Iterable<string>;
  /** Relation cells outside their range behind a name. */
  outsideBehind(name: string): readonly string[];
}

/** A unit of dependence. */
export interface CalculationNode {
  cellId: string;
  /** Its place among the nodes of its cell. */
  index: number;
  /** Number of its line in the source, counted from 0; of a line only. */
  line?: number;
  /** The name that others depend on: of a line its own, of a fluid state or relation that of the cell. */
  defines: string | undefined;
  /** Names it uses (for `w.rho` it is `w`), and the same as they are written out (`w.rho`). */
  uses: readonly string[];
  keys: readonly string[];
  compute(surroundings: Surroundings): Outcome;
}

/** The name in front of the point of a key. */
export function baseOf(key: string): string {
  const point = key.indexOf('.');
  return point < 0 ? key : key.slice(0, point);
}

/** Relation cells outside their range behind any of some names. */
export function outsideBehindAll(uses: readonly string[], surroundings: Surroundings): string[] {
  const found = new Set<string>();
  for (const name of uses) for (const id of surroundings.outsideBehind(name)) found.add(id);
  return [...found];
}
