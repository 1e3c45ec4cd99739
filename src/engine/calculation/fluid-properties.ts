import type { Inferred } from '../language/inference';
import { propertyDefinitions } from '../properties/index';
import type { PropertyId, State } from '../properties/types';
import { isDimensionless, resolveUnit, type Dimension } from '../units/index';
import type { Surroundings } from './node';
import { present, valueLatex } from './present';
import type { Symbol } from './symbols';
import type { FluidMode, PropertyValue } from './types';

export function dimensionOf(unit: string): Dimension {
  const resolved = resolveUnit(unit);
  if (resolved === undefined) throw new Error(`The table of properties names no unit: ${unit}`);
  return resolved.dimension;
}

function typeOf(property: PropertyId): Inferred {
  const { unit } = propertyDefinitions[property];
  const dimension = dimensionOf(unit);
  // Temperatures of a state are levels; its pressures are absolute and may be taken either way.
  const levels = unit === 'K' ? 1 : unit === 'Pa' && !isDimensionless(dimension) ? 'any' : 0;
  return { kind: 'number', dimension, levels };
}

const types = new Map(Object.keys(propertyDefinitions).map((id) => [id, typeOf(id as PropertyId)]));

/** Suffixes of the values of each mode: `_w` at the wall, `_l` and `_v` at saturation. */
const suffixes: Readonly<Record<FluidMode, readonly string[]>> = {
  state: [''],
  film: [''],
  wall: ['', '_w'],
  saturation: ['', '_l', '_v'],
};

/** All that a fluid state may offer, with types and without values: so that what uses it is checked at once. */
export function promisedSymbols(name: string, mode: FluidMode): Map<string, Symbol> {
  const symbols = new Map<string, Symbol>([[name, { several: 'known' }]]);
  for (const suffix of suffixes[mode]) for (const [id, type] of types) symbols.set(`${name}.${id}${suffix}`, { type });
  return symbols;
}

/** Values of one row, and the symbols under which others use them. */
export function rowValues(
  cellName: string,
  values: Iterable<readonly [string, number | undefined]>,
  suffix: string,
  uncertainty: State['uncertainty'],
  { settings }: Surroundings,
  symbols: Map<string, Symbol>,
): PropertyValue[] {
  return [...values].flatMap(([id, value]) => {
    const property = id as PropertyId;
    const type = types.get(property);
    if (value === undefined || type === undefined || !Number.isFinite(value)) return [];
    const shown = present(value, type, settings);
    const name = `${cellName}.${property}${suffix}`;
    symbols.set(name, { type, value, shown: valueLatex(shown), display: shown });
    const { symbolLatex } = propertyDefinitions[property];
    return [{ property, symbolLatex, name, value: shown, uncertainty: uncertainty[property] ?? '' }];
  });
}
