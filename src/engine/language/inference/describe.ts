import { dimensionless, isDimensionless, sameDimension } from '../../units/dimension';
import { quantityName, siUnitText } from '../../units/quantities';
import { resolveUnit } from '../../units/resolve';
import type { Dimension } from '../../units/types';
import type { Inferred } from './types';

const temperature = resolveUnit('K')?.dimension ?? dimensionless;
const pressure = resolveUnit('Pa')?.dimension ?? dimensionless;

export const isTemperature = (dimension: Dimension): boolean => sameDimension(dimension, temperature);
export const isPressure = (dimension: Dimension): boolean => sameDimension(dimension, pressure);

function levelWord({ dimension, levels }: Inferred): string {
  if (typeof levels !== 'number') return '';
  if (isTemperature(dimension)) return levels === 0 ? ' difference' : ' level';
  return isPressure(dimension) && levels === 0 ? ' difference' : '';
}

/** `a pressure (Pa)`, `a plain number`, `a temperature level (K)`. */
export function describe(type: Inferred): string {
  if (type.kind === 'condition') return 'a condition';
  if (isDimensionless(type.dimension)) return 'a plain number';
  const name = quantityName(type.dimension) + levelWord(type);
  return `${/^[aeiou]/.test(name) ? 'an' : 'a'} ${name} (${siUnitText(type.dimension)})`;
}

/** The words for levels of a dimension: temperatures on a scale, or gauge pressures. */
export function levelWords(dimension: Dimension): { one: string; many: string; zero: string } {
  return isPressure(dimension)
    ? { one: 'a gauge pressure', many: 'gauge pressures', zero: 'vacuum' }
    : { one: 'a temperature level', many: 'temperature levels', zero: 'absolute zero' };
}
