import { dimensionless, divideDimensions, isDimensionless, multiplyDimensions, powerOfDimension } from './dimension';
import { scanFactors, type UnitFactor } from './scan';
import type { Dimension, ResolvedUnit } from './types';
import { unitDisplay, unitLatex } from './write';

export interface ScannedUnit {
  unit: ResolvedUnit;
  /** Offset behind the last character that belongs to the unit. */
  end: number;
  /** `W/m^2*K`: a factor after a divisor without parentheses. */
  ambiguous: boolean;
}

export const plainUnit: ResolvedUnit = {
  text: '',
  factor: 1,
  offset: 0,
  dimension: dimensionless,
  display: '',
  latex: '',
};

function productOf(factors: readonly UnitFactor[]): { factor: number; dimension: Dimension } | undefined {
  let dimension: Dimension = dimensionless;
  let factor = 1;
  for (const { entry, exponent } of factors) {
    if (entry.definition.level === 'gauge pressure' && !(factors.length === 1 && exponent === 1)) return undefined;
    const part = powerOfDimension(entry.definition.dimension, Math.abs(exponent));
    if (part === undefined) return undefined;
    dimension = exponent > 0 ? multiplyDimensions(dimension, part) : divideDimensions(dimension, part);
    factor *= (entry.definition.factor * entry.prefixFactor) ** exponent;
  }
  return Number.isFinite(factor) && factor > 0 ? { factor, dimension } : undefined;
}

function resolveFactors(factors: readonly UnitFactor[], text: string): ResolvedUnit | undefined {
  const product = productOf(factors);
  if (product === undefined) return undefined;
  const [only] = factors;
  const alone = factors.length === 1 && only?.exponent === 1 ? only.entry.definition : undefined;
  return {
    text,
    ...product,
    // A level unit inside a product means its interval, as in W/(m² °C).
    offset: alone?.offset ?? 0,
    level: alone?.level,
    display: unitDisplay(factors),
    latex: unitLatex(factors),
  };
}

/** Reads the unit that begins at `at`, as far as it goes; undefined when no unit begins there. */
export function scanUnit(text: string, at = 0): ScannedUnit | undefined {
  const scanned = scanFactors(text, at);
  if (scanned === undefined) return undefined;
  const unit = resolveFactors(scanned.factors, text.slice(at, scanned.end));
  return unit === undefined ? undefined : { unit, end: scanned.end, ambiguous: scanned.ambiguous };
}

/** Resolves a whole unit text; `1` and the empty text are the plain number. Undefined when it is no unit. */
export function resolveUnit(text: string): ResolvedUnit | undefined {
  const trimmed = text.trim();
  if (trimmed === '' || trimmed === '1') return plainUnit;
  const scanned = scanUnit(trimmed);
  return scanned?.end === trimmed.length ? scanned.unit : undefined;
}

/** The words of a unit and where they stand: for the hint that one of them is also a defined name. */
export function unitWords(text: string): { word: string; from: number; to: number }[] {
  const factors = scanFactors(text, 0)?.factors ?? [];
  return factors.map(({ word, at }) => ({ word, from: at, to: at + word.length }));
}

/** `W/m^2*K` with the factors that follow the divisor beneath it: `W/(m²·K)`, for a mend. */
export function underOneSolidus(text: string): string | undefined {
  const solidus = text.indexOf('/');
  if (solidus < 0 || /[()]/.test(text)) return undefined;
  const below = text
    .slice(solidus + 1)
    .trim()
    .split(/\s*[*·⋅×/]\s*|\s+/);
  const mended = `${text.slice(0, solidus).trim()}/(${below.join(' ')})`;
  return resolveUnit(mended) === undefined ? undefined : mended;
}

export function isUnitless(unit: ResolvedUnit): boolean {
  return isDimensionless(unit.dimension);
}
