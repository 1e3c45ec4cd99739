import { baseUnits } from './table/base';
import type { UnitDefinition } from './table/definition';
import { geometryUnits } from './table/geometry';
import { heatUnits } from './table/heat';
import { mechanicsUnits } from './table/mechanics';

export type { UnitDefinition } from './table/definition';

export const unitTable: readonly UnitDefinition[] = [...baseUnits, ...geometryUnits, ...mechanicsUnits, ...heatUnits];

/** SI prefixes; `u` stands for micro as well. SI brochure (2019), table 7. */
export const prefixes: Readonly<Record<string, number>> = {
  Q: 1e30,
  R: 1e27,
  Y: 1e24,
  Z: 1e21,
  E: 1e18,
  P: 1e15,
  T: 1e12,
  G: 1e9,
  M: 1e6,
  k: 1e3,
  h: 1e2,
  da: 1e1,
  d: 1e-1,
  c: 1e-2,
  m: 1e-3,
  µ: 1e-6,
  u: 1e-6,
  n: 1e-9,
  p: 1e-12,
  f: 1e-15,
  a: 1e-18,
  z: 1e-21,
  y: 1e-24,
  r: 1e-27,
  q: 1e-30,
};

const prefixNames: Readonly<Record<string, string>> = { kilo: 'k', mega: 'M', milli: 'm', micro: 'µ', centi: 'c' };

/** A unit name resolved: its definition, and the factor of a prefix. */
export interface UnitEntry {
  definition: UnitDefinition;
  prefixFactor: number;
  shown: string;
}

const byName = new Map<string, UnitEntry>();
for (const definition of unitTable) {
  for (const name of definition.names) {
    if (byName.has(name)) throw new Error(`The unit table has two units named ${name}`);
    byName.set(name, { definition, prefixFactor: 1, shown: definition.shown ?? definition.names[0] ?? name });
  }
}

function addPrefixed(definition: UnitDefinition, name: string): void {
  const { prefixed } = definition;
  if (prefixed === undefined) return;
  const [symbol = ''] = definition.names;
  // Words take prefixes that are words (`millimetre`), symbols those that are letters.
  const word = name !== symbol && name.length > 3 && !name.includes('_');
  for (const [prefix, factor] of Object.entries(prefixes)) {
    if (prefixed !== true && !(prefix.length === 1 && prefixed.includes(prefix))) continue;
    const spelled = Object.entries(prefixNames).find(([, sign]) => sign === prefix)?.[0];
    const before = word ? spelled : prefix;
    if (before === undefined || byName.has(before + name)) continue;
    const shownPrefix = prefix === 'u' ? 'µ' : prefix;
    byName.set(before + name, {
      definition,
      prefixFactor: factor,
      shown: shownPrefix + (definition.shown ?? symbol),
    });
  }
}
// Prefixed names never hide a unit's own name: `min` stays the minute, `Pa` the pascal.
for (const definition of unitTable) for (const name of definition.names) addPrefixed(definition, name);

/** The unit of a name as typed; the letters that have two code points (µ, Ω, Å) are one. */
export function findUnit(name: string): UnitEntry | undefined {
  return byName.get(name.normalize('NFC').replace(/\u03bc/g, '\u00b5'));
}

/** All names that can be typed, prefixed ones included. */
export function unitNames(): string[] {
  return [...byName.keys()];
}
