import { isDimensionless } from './dimension';
import { shownUnit, siUnitText } from './quantities';
import { plainUnit, resolveUnit } from './resolve';
import type { Dimension, DisplayedValue, ResolvedUnit } from './types';

export interface DisplayOptions {
  unitSystem: 'SI' | 'US';
  significantDigits: number;
  /** Pa; zero of gauge units. */
  ambientPressure: number;
  /** Whether the value is one temperature level. */
  level?: boolean;
  /** Unit asked for by the line. */
  target?: ResolvedUnit | undefined;
  /** Figures as written, for a line that is only a literal. */
  figures?: string | undefined;
}

const superscript: Readonly<Record<string, string>> = {
  '-': '⁻',
  0: '⁰',
  1: '¹',
  2: '²',
  3: '³',
  4: '⁴',
  5: '⁵',
  6: '⁶',
  7: '⁷',
  8: '⁸',
  9: '⁹',
};
const raised = (power: number) => [...String(power)].map((sign) => superscript[sign] ?? sign).join('');

/** Parts thousands of the whole part by a no-break space (ISO 80000-1, 7.3.1). */
function partThousands(whole: string): string {
  return whole.replace(/\B(?=(\d{3})+(?!\d))/g, '\u00a0');
}

interface Figure {
  whole: string;
  fraction: string;
}

/** A number to `digits` significant digits, as decimal figure or with a power of ten. */
export function figure(value: number, digits: number): Figure {
  if (value === 0) return { whole: '0', fraction: '' };
  const [mantissa = '0', power = '0'] = value.toExponential(digits - 1).split('e');
  const exponent = Number(power);
  if (exponent < -4 || exponent > 8) {
    const [whole = '0', decimals] = mantissa.split('.');
    return {
      whole: whole.replace('-', '−'),
      fraction: `${decimals === undefined ? '' : `.${decimals}`}×10${raised(exponent)}`,
    };
  }
  const plain =
    exponent >= digits
      ? String(BigInt(Math.round(Number(`${mantissa}e${exponent}`))))
      : Number(`${mantissa}e${exponent}`).toFixed(Math.max(0, digits - 1 - exponent));
  return split(plain);
}

function split(plain: string): Figure {
  const [whole = '0', decimals] = plain.replace('-', '−').split('.');
  return { whole: partThousands(whole), fraction: decimals === undefined ? '' : `.${decimals}` };
}

function unitFor(si: number, dimension: Dimension, options: DisplayOptions): ResolvedUnit {
  if (options.target !== undefined) return options.target;
  if (isDimensionless(dimension)) return plainUnit;
  if (options.level === true) return levelUnits[options.unitSystem];
  return shownUnit(dimension, si, options.unitSystem);
}

const levelUnits = { SI: need('degC'), US: need('degF') };

function need(text: string): ResolvedUnit {
  const unit = resolveUnit(text);
  if (unit === undefined) throw new Error(`no unit ${text}`);
  return unit;
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

/** A quantity as it is shown: unit by request, else by profile and size; figures to the digits asked for. */
export function displayValue(si: number, dimension: Dimension, options: DisplayOptions): DisplayedValue {
  const unit = unitFor(si, dimension, options);
  const value = inUnit(si, unit, options.ambientPressure);
  const digits =
    unit.level === 'temperature' ? levelDigits(value, options.significantDigits) : options.significantDigits;
  const shown = options.figures === undefined ? figure(value, digits) : split(options.figures);
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

/** Levels near zero keep the decimals that others have: 4.0 °C beside 82.00 °C, not 4.000 °C. */
function levelDigits(value: number, digits: number): number {
  const size = Math.abs(value);
  const whole = size < 1 ? 0 : Math.floor(Math.log10(size)) + 1;
  return Math.max(1, Math.min(digits, whole + Math.max(1, digits - 2)));
}

export function displayTruth(value: boolean): DisplayedValue {
  const text = value ? 'true' : 'false';
  return { si: value, siUnit: '1', text, whole: text, fraction: '', unit: '', unitLatex: '' };
}
