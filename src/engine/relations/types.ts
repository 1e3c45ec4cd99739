/** A symbol of a relation. `unit` is the unit in which the formula takes its number. */
export interface RelationSymbol {
  symbol: string;
  quantity: string;
  /** Unit in the expression language; `1` for a plain number. */
  unit: string;
  /** For temperatures: one on a scale (25 °C), or a difference of two (5 K). */
  temperature?: 'level' | 'difference';
}

/**
 * One line of a formula in the expression language (`f = (0.79*ln(Re) - 1.64)^-2`), or an
 * implicit one: `solve` is found between the two ends so that `equation` is zero.
 */
export type FormulaLine = string | { solve: string; between: readonly [string, string]; equation: string };

/** A published relation, as data. Formulas work on plain numbers in the units of the symbols. */
export interface Relation {
  /** Stable, never reused: `gnielinski-1976-tube`. */
  id: string;
  title: string;
  authors: string;
  year: string;
  inputs: readonly RelationSymbol[];
  formula: readonly FormulaLine[];
  output: RelationSymbol;
  /** Conditions in the expression language; symbols of inputs, of formula lines, of the output and of `validitySymbols`. */
  validity: readonly string[];
  /** Symbols that only the conditions need. */
  validitySymbols: readonly RelationSymbol[];
  /** Where the properties are to be taken: `bulk mean`, `film`, … Compulsory. */
  propertyTemperature: string;
  characteristicLength: string;
  wallCondition: string;
  /** In words as the source states it; empty when it states none. */
  accuracy: string;
  /** The same as a fraction, where it can be read as one. */
  relativeAccuracy?: number;
  /** Parts of the range for which the source states another figure; the first that holds counts. */
  accuracyBands?: readonly { when: string; relativeAccuracy: number }[];
  source: string;
  /** Confirmed by a second source or an independent check value. */
  confirmed: boolean;
  notes?: string;
}

export type Geometry =
  | 'tube'
  | 'annulus'
  | 'duct'
  | 'plate'
  | 'cylinder'
  | 'sphere'
  | 'bluff body'
  | 'tube bank'
  | 'finned bank'
  | 'packed bed'
  | 'jet'
  | 'coil'
  | 'enclosure'
  | 'channel'
  | 'fin'
  | 'exchanger'
  | 'wall'
  | 'surface'
  | 'fitting'
  | 'any';

export interface RelationFamily {
  id: string;
  title: string;
  geometry: Geometry;
  relations: readonly Relation[];
}
