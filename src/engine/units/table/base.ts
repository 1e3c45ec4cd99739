import { day } from './constants';
import * as of from './dimensions';
import { units, type UnitDefinition } from './definition';

const all = { prefixed: true } as const;

/** The SI and what is accepted beside it: SI brochure, 9th edition (2019), tables 2, 4 and 8. */
export const baseUnits: UnitDefinition[] = [
  ...units('length', of.length, 'SI brochure', [['m metre meter', 1, all]]),
  ...units('mass', of.mass, 'SI brochure', [
    ['g gram', 1e-3, all],
    ['t tonne', 1000, { prefixed: 'kMG' }],
  ]),
  ...units('time', of.time, 'SI brochure', [
    ['s second', 1, all],
    ['min minute', 60],
    ['h hr hour', 3600],
    ['d day', day],
  ]),
  ...units('time', of.time, 'NIST SP 811', [
    ['week', 7 * day],
    // 365 days, so that a year of running is 8 760 h.
    ['yr year', 365 * day],
  ]),
  ...units('temperature difference', of.temperature, 'SI brochure', [
    ['K kelvin', 1, { prefixed: 'mµukn' }],
    ['delta_degC Δ°C ΔdegC', 1, { shown: 'K' }],
  ]),
  ...units('temperature', of.temperature, 'SI brochure', [
    ['degC °C ℃ celsius', 1, { offset: 273.15, level: 'temperature', shown: '°C' }],
  ]),
  ...units('temperature', of.temperature, 'NIST SP 811', [
    ['degF °F ℉ fahrenheit', 5 / 9, { offset: 459.67 * (5 / 9), level: 'temperature', shown: '°F' }],
  ]),
  ...units('temperature difference', of.temperature, 'NIST SP 811', [
    ['delta_degF Δ°F ΔdegF', 5 / 9, { shown: 'Δ°F' }],
    ['degR °R rankine', 5 / 9, { shown: '°R' }],
  ]),
  ...units('amount of substance', of.amount, 'SI brochure', [['mol', 1, all]]),
  ...units('catalytic activity', of.catalysis, 'SI brochure', [['kat', 1, { prefixed: 'mµun' }]]),
  ...units('angle', of.one, 'SI brochure', [
    ['rad radian', 1, { prefixed: 'mµu' }],
    ['sr', 1],
    ['deg °', Math.PI / 180, { shown: '°' }],
    ['arcmin ′', Math.PI / 10800, { shown: '′' }],
    ['arcsec ″', Math.PI / 648000, { shown: '″' }],
  ]),
  ...units('angle', of.one, 'NIST SP 811', [
    ['gon', Math.PI / 200],
    ['rev revolution', 2 * Math.PI],
  ]),
  ...units('frequency', of.frequency, 'SI brochure', [['Hz hertz', 1, all]]),
  // A revolution is 2π rad: as in NIST SP 811, `rpm` is an angular velocity.
  ...units('angular velocity', of.frequency, 'NIST SP 811', [
    ['rpm', (2 * Math.PI) / 60],
    ['rps', 2 * Math.PI],
  ]),
  ...units('electric current', of.current, 'SI brochure', [['A ampere', 1, all]]),
  ...units('electric charge', of.charge, 'SI brochure', [
    ['C coulomb', 1, { prefixed: 'mµunpk' }],
    ['Ah', 3600, { prefixed: 'mk' }],
  ]),
  ...units('voltage', of.voltage, 'SI brochure', [['V volt', 1, { prefixed: 'MkmµunG' }]]),
  ...units('electric resistance', of.resistance, 'SI brochure', [['ohm Ω', 1, { prefixed: 'MkmµunGT', shown: 'Ω' }]]),
  ...units('electric conductance', of.conductance, 'SI brochure', [['S siemens', 1, { prefixed: 'mµunk' }]]),
  ...units('electric capacitance', of.capacitance, 'SI brochure', [['F farad', 1, { prefixed: 'mµunp' }]]),
  ...units('inductance', of.inductance, 'SI brochure', [['H henry', 1, { prefixed: 'mµun' }]]),
  ...units('magnetic flux', of.magneticFlux, 'SI brochure', [['Wb weber', 1, { prefixed: 'mµu' }]]),
  ...units('magnetic flux density', of.magneticFluxDensity, 'SI brochure', [
    ['T tesla', 1, { prefixed: 'mµun' }],
    ['gauss', 1e-4],
  ]),
  ...units('luminous intensity', of.luminosity, 'SI brochure', [['cd candela', 1, { prefixed: 'mk' }]]),
  ...units('luminous flux', of.luminosity, 'SI brochure', [['lm lumen', 1, { prefixed: 'mk' }]]),
  ...units('illuminance', of.illuminance, 'SI brochure', [['lx lux', 1, { prefixed: 'mk' }]]),
  ...units('ratio', of.one, 'definition', [
    ['% percent', 0.01, { shown: '%' }],
    ['permille ‰', 1e-3, { shown: '‰' }],
    ['ppm', 1e-6],
    ['ppb', 1e-9],
  ]),
  // Money as a plain dimension, for the cost of pumping and of losses.
  ...units('money', of.euro, 'none', [
    ['EUR €', 1, { prefixed: 'kM', shown: 'EUR' }],
    ['ct', 0.01],
  ]),
  ...units('money', of.dollar, 'none', [['USD', 1, { prefixed: 'kM' }]]),
  ...units('money', of.sterling, 'none', [['GBP £', 1, { prefixed: 'kM', shown: 'GBP' }]]),
  ...units('money', of.franc, 'none', [['CHF', 1, { prefixed: 'kM' }]]),
];
