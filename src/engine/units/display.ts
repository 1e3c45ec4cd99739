import { isDimensionless } from './dimension';
import { figure, shownFigures, type Figure } from './figures';
import { shownUnit, siUnitText } from './quantities';
import { plainUnit, resolveUnit } from './resolve';
import type { Dimension, DisplayedValue, ResolvedUnit } from './types';

export { figure } from './figures';

export interface DisplayOptions {
  unitSystem: 'SI' | 'US';
  significantDigits: number;
  /** Pa; zero of gauge units. */
  ambientPressure: number;
  /** Whether the value is one temperature level. */
  level?: boolean;
  /** Unit asked for by the line. */
  target?: ResolvedUnit | undefined;
  /** Unit taken when the line asks for none, where it measures the same: that of a lone literal. */
  preferredUnit?: ResolvedUnit | undefined;
  /** Figures as written, for a line that is only a literal. */
  figures?: string | undefined;
}

const levelUnits = { SI: need('degC'), US: need('degF') };

function need(text: string): ResolvedUnit {
  const unit = resolveUnit(text);
  if (unit === undefined) throw new Error(`no unit ${text}`);
  return unit;
}

function measuresSame(unit: ResolvedUnit, dimension: Dimension): boolean {
  return unit.dimension.every((exponent, index) => exponent === dimension[index]);
}

function unitFor(si: number, dimension: Dimension, options: DisplayOptions): ResolvedUnit {
  if (options.target !== undefined) return options.target;
  if (options.preferredUnit !== undefined && measuresSame(options.preferredUnit, dimension))
    return options.preferredUnit;
  if (isDimensionless(dimension)) return plainUnit;
  if (options.level === true) return levelUnits[options.unitSystem];
  return shownUnit(dimension, si, options.unitSystem);
}

/** SI value → number in a unit; gauge units count from ambient pressure. */
export function inUnit(si: number, unit: ResolvedUnit, ambientPressure: number): number {
  const zero = unit.level === 'gauge pressure' ? ambientPressure : unit.offset;
  return (si - zero) / unit.factor;
}

/** Number in a unit → SI value. */
export function fromUnit(value: number, unit: ResolvedUnit, ambientPressure: number): number {
  return value * unit.factor + (unit.level === 'gauge pressure' ? ambientPressure : unit.offset);
}

/** A value that is not finite never reaches a sheet; whoever asks for it has skipped an error. */
function shownValue(value: number, unit: ResolvedUnit, options: DisplayOptions): Figure {
  if (!Number.isFinite(value)) throw new Error(`a value that is no number cannot be shown: ${value} ${unit.display}`);
  if (options.figures !== undefined) return shownFigures(options.figures);
  if (unit.level === 'temperature') return levelFigure(value, options.significantDigits);
  return isCount(value, unit, options.significantDigits)
    ? shownFigures(String(value))
    : figure(value, options.significantDigits);
}

/** Whole plain numbers are counts (62 tubes): they get no decimals. */
function isCount(value: number, unit: ResolvedUnit, digits: number): boolean {
  return unit === plainUnit && Number.isInteger(value) && Math.abs(value) < 10 ** digits;
}

/** A quantity as it is shown: unit by request, else by profile and size; figures to the digits asked for. */
export function displayValue(si: number, dimension: Dimension, options: DisplayOptions): DisplayedValue {
  const unit = unitFor(si, dimension, options);
  const shown = shownValue(inUnit(si, unit, options.ambientPressure), unit, options);
  return {
    si,
    siUnit: siUnitText(dimension),
    text: shown.whole + shown.fraction,
    whole: shown.whole,
    fraction: shown.fraction,
    unit: unit.display,
    unitLatex: unit.latex,
    ...(unit.level === 'temperature' || options.level === true ? { level: 'temperature' as const } : {}),
    ...(unit.level === 'gauge pressure' ? { level: 'pressure' as const } : {}),
  };
}

/** Levels near zero keep the decimals that others have: 4.00 °C beside 82.00 °C, not 4.000 °C. */
function levelFigure(value: number, digits: number): Figure {
  const size = Math.abs(value);
  const whole = size < 1 ? 1 : Math.floor(Math.log10(size)) + 1;
  const decimals = Math.max(0, Math.min(digits - whole, digits - 2));
  const rounded = Number(value.toFixed(decimals));
  return rounded === 0 ? shownFigures((0).toFixed(decimals)) : shownFigures(value.toFixed(decimals));
}

export function displayTruth(value: boolean): DisplayedValue {
  const text = value ? 'true' : 'false';
  return { si: value, siUnit: '1', text, whole: text, fraction: '', unit: '', unitLatex: '' };
}
