import { baseDimension, dimensionless, divideDimensions, multiplyDimensions, powerOfDimension } from './dimension';
import type { Dimension, ResolvedUnit } from './types';

/** A unit of the table. SI value = number * factor + offset. */
export interface UnitDefinition {
  names: readonly string[];
  factor: number;
  dimension: Dimension;
  offset?: number;
  /** SI prefixes may stand before the names. */
  prefixed?: boolean;
  level?: ResolvedUnit['level'];
  /** How it is shown, when not by its first name. */
  shown?: string;
}

const one = dimensionless;
const length = baseDimension('length');
const mass = baseDimension('mass');
const time = baseDimension('time');
const temperature = baseDimension('temperature');
const amount = baseDimension('amount');
const current = baseDimension('current');
const luminosity = baseDimension('luminosity');
const currency = baseDimension('currency');
const power = (dimension: Dimension, exponent: number): Dimension => powerOfDimension(dimension, exponent) ?? one;
const times = multiplyDimensions;
const per = divideDimensions;

const area = power(length, 2);
const volume = power(length, 3);
const velocity = per(length, time);
const force = per(times(mass, length), power(time, 2));
const pressure = per(force, area);
const energy = times(force, length);
const heatRate = per(energy, time);
const charge = times(current, time);
const voltage = per(heatRate, current);

/** Exact by definition unless a line says otherwise. */
const inch = 0.0254;
const foot = 0.3048;
const pound = 0.45359237;
const gravity = 9.80665;
const poundForce = pound * gravity;
/** International table; NIST SP 811 (2008) table B.8. */
const btu = 1055.05585262;
const calorie = 4.1868;
const gallon = 231 * inch ** 3;
const imperialGallon = 4.54609e-3;

type Row = [names: string, factor: number, dimension: Dimension, more?: Omit<UnitDefinition, 'names' | 'factor' | 'dimension'>];
const prefixed = { prefixed: true };

/** One line a unit. Factors: SI brochure (9th ed., 2019) and NIST SP 811 (2008), tables B.8 and B.9. */
const rows: Row[] = [
  ['m metre meter', 1, length, prefixed],
  ['g gram', 1e-3, mass, prefixed],
  ['s second sec', 1, time, prefixed],
  ['K kelvin', 1, temperature, prefixed],
  ['mol', 1, amount, prefixed],
  ['A ampere', 1, current, prefixed],
  ['cd candela', 1, luminosity, prefixed],
  ['rad radian', 1, one, prefixed],
  ['sr', 1, one],
  ['Hz hertz', 1, power(time, -1), prefixed],
  ['N newton', 1, force, prefixed],
  ['Pa pascal', 1, pressure, prefixed],
  ['J joule', 1, energy, prefixed],
  ['W watt', 1, heatRate, prefixed],
  ['C coulomb', 1, charge, prefixed],
  ['V volt', 1, voltage, prefixed],
  ['ohm Ω', 1, per(voltage, current), { prefixed: true, shown: 'Ω' }],
  ['F farad', 1, per(charge, voltage), prefixed],
  ['H henry', 1, per(times(voltage, time), current), prefixed],
  ['T tesla', 1, per(times(voltage, time), area), prefixed],
  // Plain ratios.
  ['% percent', 0.01, one, { shown: '%' }],
  ['permille ‰', 1e-3, one, { shown: '‰' }],
  ['ppm', 1e-6, one],
  ['ppb', 1e-9, one],
  // Length.
  ['in inch', inch, length],
  ['ft foot feet', foot, length],
  ['yd yard', 3 * foot, length],
  ['mi mile', 5280 * foot, length],
  ['nmi', 1852, length],
  ['mil thou', inch / 1000, length],
  ['angstrom Å', 1e-10, length, { shown: 'Å' }],
  ['micron', 1e-6, length, { shown: 'µm' }],
  // Area and volume.
  ['ha hectare', 1e4, area],
  ['acre', 43560 * foot ** 2, area],
  ['L l litre liter', 1e-3, volume, prefixed],
  ['gal gallon', gallon, volume],
  ['qt quart', gallon / 4, volume],
  ['pt pint', gallon / 8, volume],
  ['floz', gallon / 128, volume, { shown: 'fl oz' }],
  ['gal_UK', imperialGallon, volume, { shown: 'gal (UK)' }],
  ['bbl barrel', 42 * gallon, volume],
  // Mass.
  ['t tonne', 1000, mass, prefixed],
  ['lb lbm', pound, mass, { shown: 'lb' }],
  ['oz ounce', pound / 16, mass],
  ['slug', poundForce / foot, mass],
  ['ton_short', 2000 * pound, mass, { shown: 'short ton' }],
  ['ton_long', 2240 * pound, mass, { shown: 'long ton' }],
  ['grain', pound / 7000, mass],
  // Time.
  ['min minute', 60, time],
  ['h hr hour', 3600, time, { shown: 'h' }],
  ['d day', 86400, time],
  ['week', 604800, time],
  ['a yr year', 31557600, time, { shown: 'a' }],
  // Temperature differences; levels stand in a list of their own.
  ['delta_degC Δ°C ΔdegC', 1, temperature, { shown: 'K' }],
  ['delta_degF Δ°F ΔdegF', 5 / 9, temperature, { shown: 'Δ°F' }],
  ['R degR rankine', 5 / 9, temperature, { shown: '°R' }],
  // Angle.
  ['deg', Math.PI / 180, one, { shown: '°' }],
  ['arcmin', Math.PI / 10800, one, { shown: '′' }],
  ['rev', 2 * Math.PI, one],
  // Speed and rotation.
  ['rpm', 1 / 60, power(time, -1)],
  ['kn knot', 1852 / 3600, velocity, { shown: 'kn' }],
  ['mph', (5280 * foot) / 3600, velocity],
  ['fpm', foot / 60, velocity, { shown: 'ft/min' }],
  ['fps', foot, velocity, { shown: 'ft/s' }],
  ['kph', 1000 / 3600, velocity, { shown: 'km/h' }],
  // Flow.
  ['gpm', gallon / 60, per(volume, time), { shown: 'gal/min' }],
  ['cfm', foot ** 3 / 60, per(volume, time), { shown: 'ft³/min' }],
  ['cfs', foot ** 3, per(volume, time), { shown: 'ft³/s' }],
  ['lpm', 1e-3 / 60, per(volume, time), { shown: 'L/min' }],
  // Force.
  ['lbf', poundForce, force],
  ['kgf kp', gravity, force, { shown: 'kgf' }],
  ['dyn', 1e-5, force],
  ['ozf', poundForce / 16, force],
  ['kip', 1000 * poundForce, force],
  // Pressure. Columns of liquid are conventional values, NIST SP 811 table B.8.
  ['bar', 1e5, pressure, prefixed],
  ['bara bar_a', 1e5, pressure, { shown: 'bar' }],
  ['atm', 101325, pressure],
  ['at', gravity * 1e4, pressure],
  ['Torr torr', 101325 / 760, pressure, { shown: 'Torr' }],
  ['mmHg', 133.3224, pressure],
  ['inHg', 3386.389, pressure],
  ['mmH2O', 9.80665, pressure, { shown: 'mmH₂O' }],
  ['cmH2O', 98.0665, pressure, { shown: 'cmH₂O' }],
  ['mH2O', 9806.65, pressure, { shown: 'mH₂O' }],
  ['inH2O inwc', 249.08891, pressure, { shown: 'inH₂O' }],
  ['ftH2O', 2989.0669, pressure, { shown: 'ftH₂O' }],
  ['psi psia', poundForce / inch ** 2, pressure, { shown: 'psi' }],
  ['ksi', (1000 * poundForce) / inch ** 2, pressure],
  ['psf', poundForce / foot ** 2, pressure, { shown: 'lbf/ft²' }],
  ['barg bar_g', 1e5, pressure, { level: 'gauge pressure', shown: 'barg' }],
  ['mbarg', 100, pressure, { level: 'gauge pressure' }],
  ['kPag kPa_g', 1000, pressure, { level: 'gauge pressure', shown: 'kPag' }],
  ['Pag', 1, pressure, { level: 'gauge pressure' }],
  ['MPag', 1e6, pressure, { level: 'gauge pressure' }],
  ['psig', poundForce / inch ** 2, pressure, { level: 'gauge pressure' }],
  // Energy and power.
  ['eV', 1.602176634e-19, energy, prefixed],
  ['Wh', 3600, energy, prefixed],
  ['cal', calorie, energy, prefixed],
  ['cal_th', 4.184, energy],
  ['BTU Btu', btu, energy, { shown: 'BTU' }],
  ['MBTU', 1000 * btu, energy],
  ['MMBTU', 1e6 * btu, energy],
  ['therm', 1e5 * btu, energy],
  ['ftlbf', foot * poundForce, energy, { shown: 'ft·lbf' }],
  ['erg', 1e-7, energy],
  ['hp', 550 * foot * poundForce, heatRate],
  ['hp_metric PS', 75 * gravity, heatRate, { shown: 'PS' }],
  ['hp_boiler', 9809.5, heatRate, { shown: 'boiler hp' }],
  ['TR ton_ref tonref', (12000 * btu) / 3600, heatRate, { shown: 'TR' }],
  ['BTUh Btuh', btu / 3600, heatRate, { shown: 'BTU/h' }],
  // Viscosity.
  ['P poise', 0.1, times(pressure, time), prefixed],
  ['St stokes', 1e-4, per(area, time), prefixed],
  ['reyn', poundForce / inch ** 2, times(pressure, time)],
  // Resistance of insulation and clothing.
  ['clo', 0.155, per(times(area, temperature), heatRate)],
  ['RSI', 1, per(times(area, temperature), heatRate), { shown: 'm²·K/W' }],
  ['Rvalue', (foot ** 2 * (5 / 9)) / (btu / 3600), per(times(area, temperature), heatRate), { shown: 'h·ft²·°F/BTU' }],
  ['met', 58.2, per(heatRate, area)],
  ['lm', 1, luminosity, prefixed],
  ['lx', 1, per(luminosity, area), prefixed],
  // Money, as a plain dimension.
  ['EUR €', 1, currency, { shown: 'EUR' }],
  ['ct_EUR', 0.01, currency, { shown: 'ct' }],
];

/** Temperature levels: the only units with an offset. */
const levels: Row[] = [
  ['degC °C celsius', 1, temperature, { offset: 273.15, level: 'temperature', shown: '°C' }],
  ['degF °F fahrenheit', 5 / 9, temperature, { offset: 459.67 * (5 / 9), level: 'temperature', shown: '°F' }],
];

export const unitTable: readonly UnitDefinition[] = [...rows, ...levels].map(([names, factor, dimension, more]) => ({
  names: names.split(' '),
  factor,
  dimension,
  ...more,
}));

export const prefixes: Readonly<Record<string, number>> = {
  Q: 1e30, R: 1e27, Y: 1e24, Z: 1e21, E: 1e18, P: 1e15, T: 1e12, G: 1e9, M: 1e6, k: 1e3, h: 1e2, da: 1e1,
  d: 1e-1, c: 1e-2, m: 1e-3, µ: 1e-6, μ: 1e-6, u: 1e-6, n: 1e-9, p: 1e-12, f: 1e-15, a: 1e-18, z: 1e-21, y: 1e-24,
};

/** A unit name resolved: its definition, and the factor of a prefix. */
export interface UnitEntry {
  definition: UnitDefinition;
  prefixFactor: number;
  shown: string;
}

const byName = new Map<string, UnitEntry>();
for (const definition of unitTable) {
  for (const name of definition.names) {
    byName.set(name, { definition, prefixFactor: 1, shown: definition.shown ?? definition.names[0] ?? name });
  }
}
// Prefixed names never hide a unit's own name: `min` stays the minute, `Pa` the pascal.
for (const definition of unitTable) {
  if (definition.prefixed !== true) continue;
  const [symbol = ''] = definition.names;
  for (const name of definition.names.filter((name) => name.length <= 3 || name === symbol)) {
    for (const [prefix, prefixFactor] of Object.entries(prefixes)) {
      const full = prefix + name;
      if (byName.has(full)) continue;
      const shownPrefix = prefix === 'u' || prefix === 'μ' ? 'µ' : prefix;
      byName.set(full, { definition, prefixFactor, shown: shownPrefix + (definition.shown ?? symbol) });
    }
  }
}

export function findUnit(name: string): UnitEntry | undefined {
  return byName.get(name);
}

/** All names that can be typed, prefixed ones included. */
export function unitNames(): string[] {
  return [...byName.keys()];
}
