import type { Inferred } from '../language/inference';
import {
  displayTruth,
  displayValue,
  resolveUnit,
  sameDimension,
  type DisplayedValue,
  type ResolvedUnit,
} from '../units/index';
import type { CalculationSettings } from './types';

/** A value as its line shows it. */
export function present(
  si: number,
  type: Inferred,
  settings: CalculationSettings,
  wish: { target?: ResolvedUnit | undefined; figures?: string | undefined } = {},
): DisplayedValue {
  if (type.kind === 'condition') return displayTruth(si !== 0);
  return displayValue(si, type.dimension, { ...settings, level: isTemperatureLevel(type), ...wish });
}

const temperature = resolveUnit('K')?.dimension ?? [];

export function isTemperatureLevel(type: Inferred): boolean {
  return type.levels === 1 && sameDimension(type.dimension, temperature);
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

/** To 12 significant digits with the coherent unit: what hashes and comparisons are made of. */
export function twelveDigits(value: DisplayedValue | undefined): string {
  if (value === undefined) return 'no value';
  if (typeof value.si === 'boolean') return String(value.si);
  const figure = String(Number(value.si.toPrecision(12)));
  return value.siUnit === '1' ? figure : `${figure} ${value.siUnit}`;
}
