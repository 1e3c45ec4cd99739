import { dimensionDenominator } from './types';
import type { UnitFactor } from './scan';

/** A factor of a unit product: its name as shown, and its exponent. */
export interface WrittenFactor {
  name: string;
  exponent: number;
}

interface Style {
  name(shown: string): string;
  power(exponent: number): string;
  dot: string;
}

/**
 * Writes a quotient with one solidus: `W/(m²·K)`; negative powers only when nothing stands above
 * (SI brochure, 5.4.6).
 */
function write(factors: readonly WrittenFactor[], style: Style): string {
  const above = factors.filter((factor) => factor.exponent > 0);
  const below = factors.filter((factor) => factor.exponent < 0);
  const part = (list: readonly WrittenFactor[], sign: number) =>
    list.map(({ name, exponent }) => style.name(name) + style.power(exponent * sign)).join(style.dot);
  if (below.length === 0) return part(above, 1);
  if (above.length === 0) return part(below, 1);
  const denominator = part(below, -1);
  return `${part(above, 1)}/${below.length > 1 ? `(${denominator})` : denominator}`;
}

const raisedSigns = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** `-12` as `⁻¹²`. */
export function raised(power: number): string {
  return [...String(power)].map((sign) => (sign === '-' ? '⁻' : (raisedSigns[Number(sign)] ?? sign))).join('');
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}

/** `1/2` of 0.5: exponents are whole numbers of twelfths. */
export function fractionText(value: number): string {
  const twelfths = Math.round(value * dimensionDenominator);
  const divisor = greatestCommonDivisor(Math.abs(twelfths), dimensionDenominator);
  const bottom = dimensionDenominator / divisor;
  return bottom === 1 ? String(twelfths / divisor) : `${twelfths / divisor}/${bottom}`;
}

const plainStyle: Style = {
  name: (shown) => shown,
  power: (exponent) =>
    exponent === 1 ? '' : Number.isInteger(exponent) ? raised(exponent) : `^(${fractionText(exponent)})`,
  dot: '·',
};

/** Signs of unit names in mathematics. KaTeX's \\mu is italic, so the micro sign is set as text. */
const latexSigns: Readonly<Record<string, string>> = {
  ' ': '\\ ',
  '%': '\\%',
  '‰': '\\text{‰}',
  '°': '{^\\circ}',
  µ: '\\text{µ}',
  Ω: '\\Omega ',
  Å: '\\text{Å}',
  Δ: '\\Delta ',
  '′': "{'}",
  '″': "{''}",
  '₂': '_2',
  ₙ: '_n',
  '·': '{\\cdot}',
  '²': '^{2}',
  '³': '^{3}',
  '⁶': '^{6}',
};

function latexName(shown: string): string {
  return [...shown].map((sign) => latexSigns[sign] ?? sign).join('');
}

const latexStyle: Style = {
  name: latexName,
  power: (exponent) => (exponent === 1 ? '' : `^{${fractionText(exponent)}}`),
  dot: '{\\cdot}',
};

/** The same unit twice becomes a power; what cancels stays, since it says what was meant (`kg/kg`). */
function collected(factors: readonly UnitFactor[]): WrittenFactor[] {
  const list: WrittenFactor[] = [];
  for (const { entry, exponent } of factors) {
    const same = list.find(
      ({ name, exponent: other }) => name === entry.shown && Math.sign(other) === Math.sign(exponent),
    );
    if (same === undefined) list.push({ name: entry.shown, exponent });
    else same.exponent += exponent;
  }
  return list;
}

/** Unit as shown in text: `kJ/(kg·K)`. */
export function unitDisplay(factors: readonly UnitFactor[]): string {
  return write(collected(factors), plainStyle);
}

/** Unit in mathematics, upright. */
export function unitLatex(factors: readonly UnitFactor[]): string {
  return `\\mathrm{${write(collected(factors), latexStyle)}}`;
}
