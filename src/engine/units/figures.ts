import { raised } from './write';

/**
 * Parts figures in threes from the decimal sign on both sides (ISO 80000-1, 7.3.1). Four figures
 * before the sign are parted too, so that columns stand under each other; four behind it are not.
 */
export function partFigures(figures: string, gap: string): string {
  const [whole = '', decimals] = figures.split('.');
  const parted = whole.replace(/\B(?=(\d{3})+(?!\d))/g, gap);
  if (decimals === undefined) return parted;
  const long = decimals.length > 4 || (/\d{5}/.test(whole) && decimals.length > 3);
  return `${parted}.${long ? decimals.replace(/(\d{3})(?=\d)/g, `$1${gap}`) : decimals}`;
}

/** A figure as it is shown, split at the decimal sign. */
export interface Figure {
  whole: string;
  fraction: string;
}

const noBreakSpace = '\u00a0';
/** Beyond these powers of ten a figure is written with one. */
const smallestPlainPower = -4;
const largestPlainPower = 8;

/** Figures as written (`-1234.5`, `1.5e-3`) as they are shown. */
export function shownFigures(plain: string): Figure {
  const [mantissa = '', power] = plain.split(/[eE]/);
  const [whole = '0', decimals] = partFigures(mantissa.replace('-', '−'), noBreakSpace).split('.');
  const ten = power === undefined ? '' : `×10${raised(Number(power))}`;
  return { whole: whole === '' ? '0' : whole, fraction: (decimals ? `.${decimals}` : '') + ten };
}

/** A number to so many significant digits, as decimal figure or with a power of ten. */
export function figure(value: number, digits: number): Figure {
  if (value === 0) return { whole: '0', fraction: '' };
  const rounded = value.toExponential(digits - 1);
  const exponent = Number(rounded.split('e')[1] ?? 0);
  if (exponent < smallestPlainPower || exponent > largestPlainPower) return shownFigures(rounded);
  return shownFigures(Number(rounded).toFixed(Math.max(0, digits - 1 - exponent)));
}
