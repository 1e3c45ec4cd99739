import type { Diagnostic } from '../errors/diagnostic';
import type { Symbol } from './symbols';
import type { CalculationSettings, FluidCellResult, LineResult, RelationCellResult } from './types';

/** What one unit of dependence came to: a line, a fluid state, a relation, a text. */
export interface Outcome {
  /** Symbols it defines: `Q`, `w.rho`. */
  symbols: ReadonlyMap<string, Symbol>;
  line?: LineResult;
  fluid?: FluidCellResult | undefined;
  relation?: RelationCellResult | undefined;
  diagnostics: Diagnostic[];
  /** Relation cells outside their stated range that it follows from. */
  outsideRange: string[];
}

/** What a node sees of the rest of the sheet while it is computed. */
export interface Surroundings {
  settings: CalculationSettings;
  /** Symbol of `x` or `w.rho`; undefined when nothing of that name exists. */
  symbol(key: string): Symbol | undefined;
  /** Whether some cell is called `w`, so that `w.rho` may be meant. */
  isObject(name: string): boolean;
  namesInReach(): readonly string[];
  /** Relation cells outside their range behind a name. */
  outsideBehind(name: string): readonly string[];
}

/** A unit of dependence. */
export interface CalculationNode {
  key: string;
  cellId: string;
  /** The name that others depend on: of a line its own, of a fluid state or relation that of the cell. */
  defines: string | undefined;
  /** Names it uses (for `w.rho` it is `w`). */
  uses: readonly string[];
  compute(surroundings: Surroundings): Outcome;
}
