import type { Diagnostic, Span } from '../errors/diagnostic';
import type { DisplayedValue } from '../units/types';

export type { DisplayedValue };

export type CellKind = 'section' | 'text' | 'expressions' | 'fluid' | 'relation';

/**
 * How a fluid state is asked for.
 * - `state`: two inputs (T, p, x, h, s);
 * - `film`: T_wall, T_bulk and p, properties at their mean;
 * - `wall`: T_bulk, T_wall and p, properties at bulk, and those at the wall with the suffix `_w`;
 * - `saturation`: T or p, liquid (`_l`) and vapour (`_v`) side by side.
 */
export type FluidMode = 'state' | 'film' | 'wall' | 'saturation';

/** What a cell holds besides its source text. Which keys apply depends on the kind. */
export interface CellSettings {
  /** fluid, relation: the name under which other cells use its values (`w.rho`, `tube.Nu`). */
  name?: string | undefined;
  /** fluid: id of the substance. */
  substance?: string | undefined;
  /** fluid: absent means `state`. */
  mode?: FluidMode | undefined;
  /** relation: id of the catalogue entry. */
  relation?: string | undefined;
  /** relation: why it may stand although a stated range does not hold; printed in the report. */
  keepReason?: string | undefined;
  /** any kind: what is still to be verified here; empty or absent means nothing. */
  tbv?: string | undefined;
}

/** One cell as the engine takes it. The order of cells is the order on the sheet. */
export interface CellInput {
  id: string;
  kind: CellKind;
  /**
   * section: its title. text: Markdown. expressions: lines of the language.
   * fluid: lines that give the inputs (`T = T_in`, `p = 3 bar`).
   * relation: lines that bind the relation's symbols (`Re = w.rho*u*D/w.mu`); any other line
   * is an ordinary expression line that stands beneath the relation (`h_i = tube.Nu*w.k/D`).
   */
  source: string;
  settings: CellSettings;
}

export interface CalculationSettings {
  unitSystem: 'SI' | 'US';
  /** Significant digits of shown results, 2 to 10. */
  significantDigits: number;
  /** Ambient pressure in Pa, the zero of gauge units. */
  ambientPressure: number;
}

export interface CalculationInput {
  settings: CalculationSettings;
  cells: readonly CellInput[];
}

export interface LineResult {
  /** Zero-based number of the line on which it starts. */
  line: number;
  span: Span;
  kind: 'assignment' | 'expression' | 'require' | 'note';
  /** Canonical name that the line defines (`T_wall`, `rho`). */
  name?: string | undefined;
  symbolLatex?: string | undefined;
  /** Right side as written; for `require` the whole condition. */
  formulaLatex?: string | undefined;
  /** Right side with values and units in place of names; absent when it has no names. */
  substitutionLatex?: string | undefined;
  value?: DisplayedValue | undefined;
  /** require: whether it holds; absent when it could not be evaluated, never `true` by default. */
  satisfied?: boolean | undefined;
  /** Text after `#`. */
  note?: string | undefined;
  /** Names without a value that this line waits for. */
  waitsFor: string[];
  diagnostics: Diagnostic[];
  /** Ids of the relation cells outside their stated range that this result follows from. */
  outsideRange: string[];
}

export interface PropertyValue {
  /** Id of the property: `rho`, `cp`, `mu`, `k`, `Pr`, `nu`, `alpha`, `beta`, `h`, `s` … */
  property: string;
  symbolLatex: string;
  /** How other cells take it: `w.rho`, `w.mu_w`. */
  name: string;
  value: DisplayedValue;
  /** Stated uncertainty in words, empty when the source states none. */
  uncertainty: string;
}

export interface FluidStateRow {
  label: 'state' | 'film' | 'bulk' | 'wall' | 'liquid' | 'vapour' | 'saturation';
  /** `liquid`, `vapour`, `gas`, `supercritical`, `two-phase`. */
  phase: string;
  /** Formulation with region where it has one: `IAPWS R7-97 region 1`. */
  formulation: string;
  values: PropertyValue[];
  /** Properties that this state has not, with the reason. */
  missing: { property: string; reason: string }[];
}

export interface FluidCellResult {
  substance: string;
  substanceName: string;
  mode: FluidMode;
  rows: FluidStateRow[];
  /** Sources of the numbers, one citation each. */
  sources: string[];
}

export type RangeGrade = 'inside' | 'edge' | 'outside' | 'unchecked';

export interface ValidityResult {
  /** The condition as the catalogue states it: `0.5 <= Pr <= 2000`. */
  condition: string;
  conditionLatex: string;
  grade: RangeGrade;
  /** Left-hand quantity of a simple range (`Re`, `L/D`), and its value in this case. */
  symbolLatex?: string | undefined;
  value?: number | undefined;
  valueText?: string | undefined;
  low?: number | undefined;
  high?: number | undefined;
  scale: 'log' | 'linear';
  /** Where the case lies, in words: `within`, `below 60`, `not checked: L is not given`. */
  message: string;
  /** Symbols that were not given. */
  missing: string[];
}

/** Which side of a joint of a piecewise formula applies, and whether the case lies near the joint. */
export interface ActiveBranch {
  /** Symbol of the formula line. */
  symbol: string;
  /** The condition as it stands in the formula: `Re < 2000`. */
  conditionLatex: string;
  holds: boolean;
  /** Limit at the joint, where the condition is a simple one. */
  joint?: number;
  near: boolean;
  /** `Re < 2000 holds; near the joint at 2 000`. */
  message: string;
}

export interface RelationInputResult {
  symbol: string;
  symbolLatex: string;
  quantity: string;
  unit: string;
  /** Only the validity conditions need it; the formula does without. */
  onlyValidity: boolean;
  formulaLatex?: string | undefined;
  value?: DisplayedValue | undefined;
  span?: Span | undefined;
}

export interface RelationCellResult {
  relation: string;
  title: string;
  authors: string;
  year: string;
  family: string;
  inputs: RelationInputResult[];
  /** The formula lines: symbol = formula = values = result. */
  formula: LineResult[];
  outputs: { symbol: string; symbolLatex: string; name: string; value?: DisplayedValue | undefined }[];
  validity: ValidityResult[];
  /** Sides of a piecewise formula that apply, and whether the case lies near a joint. */
  branches?: ActiveBranch[] | undefined;
  /** Worst grade of all conditions. */
  grade: RangeGrade;
  propertyTemperature: string;
  characteristicLength: string;
  wallCondition: string;
  accuracy: string;
  /** Stated accuracy as a fraction, where the source gives one; and the interval it means here. */
  relativeAccuracy?: number | undefined;
  interval?: { low: DisplayedValue; high: DisplayedValue } | undefined;
  source: string;
  /** Confirmed by a second source or a check value. */
  confirmed: boolean;
  keepReason?: string | undefined;
}

export interface CellResult {
  id: string;
  kind: CellKind;
  /** expressions: its lines; relation: the lines beneath it. */
  lines: LineResult[];
  fluid?: FluidCellResult | undefined;
  relation?: RelationCellResult | undefined;
  /** text: the values named in `{{name}}`. */
  inline: Record<string, DisplayedValue>;
  /** All diagnostics of the cell, those of its lines included. */
  diagnostics: Diagnostic[];
  outsideRange: string[];
  /** Names that the cell defines and names of others that it uses directly. */
  defines: string[];
  uses: string[];
  /**
   * What a tick stands for: a hash of what the cell says (without notes, layout and place) and of
   * every value that it depends on, rounded to 12 significant digits.
   */
  fingerprint: string;
  /** The values that went into the fingerprint: name → figure with unit, 12 digits. */
  dependsOn: Record<string, string>;
}

export interface NamedValue {
  name: string;
  cellId: string;
  value?: DisplayedValue | undefined;
}

export interface CalculationResult {
  /** By cell id. */
  cells: Record<string, CellResult>;
  names: NamedValue[];
}

/** What changed since the last call of an engine that keeps state. */
export interface CalculationChange {
  settings?: CalculationSettings;
  /** New and changed cells. */
  put?: readonly CellInput[];
  remove?: readonly string[];
  /** All ids in sheet order; needed when cells were added or moved. */
  order?: readonly string[];
}

/** Only the cells whose result differs from before, and ids of cells that are gone. */
export interface CalculationDelta {
  cells: CellResult[];
  removed: string[];
  names: NamedValue[];
}
