import {
  btuTable,
  btuThermochemical,
  calorieTable,
  calorieThermochemical,
  degreeFahrenheit,
  foot,
  gravity,
  hour,
  inch,
  poundForce,
} from './constants';
import * as of from './dimensions';
import { units, type UnitDefinition } from './definition';

const horsepower = 550 * foot * poundForce;

/**
 * Energy, heat rate and what insulation is rated in. BTU and cal without a suffix are those of the
 * International Table; `BTU_th` and `cal_th` are thermochemical. NIST SP 811 (2008), tables B.8 and B.9.
 */
export const heatUnits: UnitDefinition[] = [
  ...units('energy', of.energy, 'SI brochure', [
    ['J joule', 1, { prefixed: true }],
    ['Wh', 3600, { prefixed: 'mkMGT' }],
    ['eV', 1.602176634e-19, { prefixed: 'mkMG' }],
    ['erg', 1e-7],
  ]),
  ...units('energy', of.energy, 'NIST SP 811', [
    ['cal cal_IT', calorieTable, { prefixed: 'kMG' }],
    ['cal_th', calorieThermochemical, { prefixed: 'k' }],
    ['BTU Btu BTU_IT Btu_IT', btuTable, { shown: 'BTU' }],
    ['kBTU kBtu', 1000 * btuTable, { shown: 'kBTU' }],
    ['MMBTU MMBtu', 1e6 * btuTable, { shown: 'MMBTU' }],
    ['BTU_th Btu_th', btuThermochemical, { shown: 'BTU (th)' }],
    ['therm therm_EC', 1e5 * btuTable, { shown: 'therm' }],
    ['therm_US', 1.054804e8, { shown: 'therm (US)' }],
    ['quad', 1e15 * btuTable],
    ['ftlbf', foot * poundForce, { shown: 'ft·lbf' }],
    ['inlbf', inch * poundForce, { shown: 'in·lbf' }],
    ['hph', horsepower * hour, { shown: 'hp·h' }],
    ['tce', 7e9 * calorieTable],
    ['toe', 1e10 * calorieTable, { prefixed: 'kM' }],
  ]),
  ...units('heat rate', of.heatRate, 'SI brochure', [['W watt', 1, { prefixed: true }]]),
  ...units('heat rate', of.heatRate, 'NIST SP 811', [
    ['BTUh Btuh', btuTable / hour, { shown: 'BTU/h' }],
    ['MBH', (1000 * btuTable) / hour],
    ['TR ton_ref tonref', (12000 * btuTable) / hour, { shown: 'TR' }],
    ['hp', horsepower],
    ['hp_metric PS', 75 * gravity, { shown: 'PS' }],
    ['hp_electric', 746, { shown: 'hp (electric)' }],
    ['hp_water', 746.043, { shown: 'hp (water)' }],
    ['hp_boiler', 9809.5, { shown: 'hp (boiler)' }],
  ]),
  ...units('heat flux', of.heatFlux, 'ISO 7730', [['met', 58.2]]),
  ...units('energy per area', of.energyPerArea, 'NIST SP 811', [['langley', 1e4 * calorieThermochemical]]),
  ...units('thermal resistance of an area', of.resistanceOfArea, 'NIST SP 811', [
    ['clo', 0.155],
    ['tog', 0.1],
    ['RSI', 1, { shown: 'm²·K/W' }],
    ['Rvalue', (foot ** 2 * degreeFahrenheit * hour) / btuTable, { shown: 'h·ft²·°F/BTU' }],
  ]),
];
