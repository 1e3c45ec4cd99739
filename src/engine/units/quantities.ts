import { sameDimension } from './dimension';
import { quantities, type Quantity } from './quantity-table';
import { resolveUnit } from './resolve';
import { fractionText } from './write';
import { dimensionDenominator, type Dimension, type ResolvedUnit } from './types';

interface Resolved {
  quantity: Quantity;
  dimension: Dimension;
  choices: Record<'SI' | 'US', readonly { unit: ResolvedUnit; from: number }[]>;
}

const known: readonly Resolved[] = quantities.map((quantity) => ({
  quantity,
  dimension: unitOf(quantity.si).dimension,
  choices: { SI: resolved(quantity.SI), US: resolved(quantity.US) },
}));

function resolved(choices: Quantity['SI']): { unit: ResolvedUnit; from: number }[] {
  return choices.map(([text, from]) => ({ unit: unitOf(text), from }));
}

function unitOf(text: string): ResolvedUnit {
  const unit = resolveUnit(text);
  if (unit === undefined) throw new Error(`The table of quantities names no unit: ${text}`);
  return unit;
}

function entryOf(dimension: Dimension): Resolved | undefined {
  return known.find((entry) => sameDimension(entry.dimension, dimension));
}

/** In the order of `baseQuantities`. */
const baseUnits = ['m', 'kg', 's', 'K', 'mol', 'A', 'cd', 'rad', 'EUR', 'USD', 'GBP', 'CHF'];

/** Coherent SI unit of any dimension: of a named quantity its usual one, else the shortest product found. */
export function siUnitText(dimension: Dimension): string {
  const quantity = entryOf(dimension)?.quantity;
  if (quantity !== undefined) return quantity.si;
  const starts: [string, number][] = [['', 0]];
  for (const name of ['W', 'J', 'Pa', 'N']) starts.push([name, 1], [name, -1]);
  const candidates = starts.map(([name, exponent]): [string, number][] => {
    const start = name === '' ? undefined : unitOf(name).dimension;
    const rest = dimension.map((part, index) => part - exponent * (start?.[index] ?? 0));
    const factors = rest.flatMap((part, index) =>
      part === 0 ? [] : [[baseUnits[index] ?? '', part / dimensionDenominator] satisfies [string, number]],
    );
    return name === '' ? factors : [[name, exponent], ...factors];
  });
  const shortest = candidates.reduce((best, next) => (next.length < best.length ? next : best));
  return writeProduct(shortest);
}

function writeProduct(factors: readonly (readonly [string, number])[]): string {
  const power = (name: string, exponent: number) => {
    if (exponent === 1) return name;
    return Number.isInteger(exponent) ? `${name}^${exponent}` : `${name}^(${fractionText(exponent)})`;
  };
  const above = factors.filter(([, exponent]) => exponent > 0).map(([name, exponent]) => power(name, exponent));
  const below = factors.filter(([, exponent]) => exponent < 0).map(([name, exponent]) => power(name, -exponent));
  if (above.length + below.length === 0) return '1';
  const denominator = below.length > 1 ? `(${below.join('*')})` : (below[0] ?? '');
  return below.length === 0 ? above.join('*') : `${above.length === 0 ? '1' : above.join('*')}/${denominator}`;
}

/** `pressure`, `heat transfer coefficient`; for an unnamed dimension `quantity in kg·m`. */
export function quantityName(dimension: Dimension): string {
  if (dimension.every((exponent) => exponent === 0)) return 'plain number';
  return entryOf(dimension)?.quantity.name ?? `quantity in ${siUnitText(dimension)}`;
}

/** The unit in which a value of this size is shown under a profile. */
export function shownUnit(dimension: Dimension, size: number, system: 'SI' | 'US'): ResolvedUnit {
  const choices = entryOf(dimension)?.choices[system];
  const magnitude = Math.abs(size);
  // Zero has no size to choose by: the plain SI unit.
  if (choices === undefined || (magnitude === 0 && system === 'SI')) return unitOf(siUnitText(dimension));
  const [first] = choices;
  return choices.filter(({ from }) => magnitude >= from).at(-1)?.unit ?? first?.unit ?? unitOf(siUnitText(dimension));
}
