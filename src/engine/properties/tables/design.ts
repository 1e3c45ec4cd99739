import { slug } from './slug';
import type { MaterialTable } from './types';

/** The standard's design values hold at 10 °C; they are offered around room temperature. */
const temperature: [number, number] = [253.15, 333.15];
const sources = [
  'DIN EN 12524:2000 (now EN ISO 10456), Building materials and products, Hygrothermal properties, Tabulated design values',
];

/** A building material by its design values: name, density, conductivity, heat capacity. */
export function designMaterial([name, rho, k, cp]: readonly [string, number, number, number]): MaterialTable {
  const constant = (value: number) => ({ T: [283.15], values: [value] });
  return {
    id: slug(name),
    name,
    word: name.charAt(0).toLowerCase() + name.slice(1),
    aliases: [],
    phase: 'solid',
    formulation: 'EN ISO 10456 design values',
    sources,
    range: '−20 to 60 °C, design values',
    temperature,
    columns: { rho: constant(rho), k: constant(k), cp: constant(cp) },
    uncertainty: {},
  };
}
