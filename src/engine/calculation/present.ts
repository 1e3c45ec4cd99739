import { isTemperature, type Inferred } from '../language/inference';
import {
  displayTruth,
  displayValue,
  resolveUnit,
  siUnitText,
  type DisplayedValue,
  type ResolvedUnit,
} from '../units/index';
import type { CalculationSettings } from './types';

/** How a line wishes its value to be shown. */
export interface Wish {
  target?: ResolvedUnit | undefined;
  figures?: string | undefined;
}

/** Values this large stay in their coherent unit: no other could hold them for certain. */
const largestConverted = 1e280;

/** A value as its line shows it. A wished unit must be able to hold it. */
export function present(si: number, type: Inferred, settings: CalculationSettings, wish: Wish = {}): DisplayedValue {
  if (type.kind === 'condition') return displayTruth(si !== 0);
  const huge = wish.target === undefined && Math.abs(si) > largestConverted;
  const target = huge ? resolveUnit(siUnitText(type.dimension)) : wish.target;
  return displayValue(si, type.dimension, { ...settings, ...wish, target, level: isTemperatureLevel(type) });
}

export function isTemperatureLevel(type: Inferred): boolean {
  return type.levels === 1 && isTemperature(type.dimension);
}

/** The figure with its unit in LaTeX, for substitution. */
export function valueLatex(value: DisplayedValue): { latex: string; single: boolean } {
  const figure = value.text
    .replace(/\u00a0/g, '\\,')
    .replace(/−/g, '-')
    .replace(
      /×10([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)/,
      (_, power: string) =>
        `{\\times}10^{${[...power]
          .map((sign) => '⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(sign))
          .map((digit) => (digit < 0 ? '-' : String(digit)))
          .join('')}}`,
    );
  const unit = value.unitLatex === '' ? '' : `\\,${value.unitLatex}`;
  const negative = value.text.startsWith('−');
  const latex = negative ? `\\left(${figure}${unit}\\right)` : figure + unit;
  return { latex, single: negative || (unit === '' && !value.text.includes('×')) };
}

/** Figure and unit in one, for sentences. */
export function valueText(value: DisplayedValue): string {
  return `${value.text} ${value.unit}`.trim();
}

/** A number to 12 significant digits: what hashes and comparisons are made of. */
export function twelveFigures(value: number): string {
  return String(Number(value.toPrecision(12)));
}

/** To 12 significant digits with the coherent unit. */
export function twelveDigits(value: DisplayedValue | undefined): string {
  if (value === undefined) return 'no value';
  if (typeof value.si === 'boolean') return String(value.si);
  const figure = twelveFigures(value.si);
  return value.siUnit === '1' ? figure : `${figure} ${value.siUnit}`;
}
