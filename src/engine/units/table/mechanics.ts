import { foot, gravity, inch, mercury, pound, poundForce, water } from './constants';
import * as of from './dimensions';
import { units, type UnitDefinition } from './definition';

const psi = poundForce / inch ** 2;

/** Mass, force, pressure and viscosity. NIST SP 811 (2008), tables B.8 and B.9. */
export const mechanicsUnits: UnitDefinition[] = [
  ...units('mass', of.mass, 'NIST SP 811', [
    ['lb lbm', pound, { shown: 'lb' }],
    ['oz ounce', pound / 16],
    ['grain', pound / 7000],
    ['dram', pound / 256],
    ['stone', 14 * pound],
    ['cwt', 100 * pound],
    ['slug', poundForce / foot],
    ['ton_short', 2000 * pound, { shown: 'short ton' }],
    ['ton_long', 2240 * pound, { shown: 'long ton' }],
    ['klb', 1000 * pound],
    ['oz_troy', 31.1034768e-3, { shown: 'oz (troy)' }],
    ['carat', 0.2e-3],
  ]),
  ...units('force', of.force, 'SI brochure', [
    ['N newton', 1, { prefixed: true }],
    ['dyn', 1e-5],
  ]),
  ...units('force', of.force, 'NIST SP 811', [
    ['kgf kp', gravity, { shown: 'kgf' }],
    ['gf', gravity / 1000],
    ['tf', 1000 * gravity],
    ['lbf', poundForce],
    ['ozf', poundForce / 16],
    ['kip klbf', 1000 * poundForce],
    ['tonf_short', 2000 * poundForce, { shown: 'short tonf' }],
    ['pdl poundal', pound * foot],
  ]),
  ...units('pressure', of.pressure, 'SI brochure', [
    ['Pa pascal', 1, { prefixed: true }],
    ['bar', 1e5, { prefixed: 'mµudkM' }],
    ['bara bar_a', 1e5, { shown: 'bar' }],
    ['mbara', 100, { shown: 'mbar' }],
    ['kPaa kPa_a', 1000, { shown: 'kPa' }],
    ['dyn_cm2', 0.1, { shown: 'dyn/cm²' }],
  ]),
  // Columns of liquid are conventional: water 1 000 kg/m³, mercury 13 595.1 kg/m³, under standard gravity.
  ...units('pressure', of.pressure, 'NIST SP 811', [
    ['atm', 101325],
    ['at kgf_cm2', gravity * 1e4, { shown: 'at' }],
    ['Torr torr', 101325 / 760, { prefixed: 'mµu', shown: 'Torr' }],
    ['mmHg', (mercury * gravity) / 1000],
    ['cmHg', (mercury * gravity) / 100],
    ['inHg', mercury * gravity * inch],
    ['ftHg', mercury * gravity * foot],
    ['mmH2O mmWC mmWS', (water * gravity) / 1000, { shown: 'mmH₂O' }],
    ['cmH2O cmWC', (water * gravity) / 100, { shown: 'cmH₂O' }],
    ['mH2O mWC mWS', water * gravity, { shown: 'mH₂O' }],
    ['inH2O inWC inwc inwg', water * gravity * inch, { shown: 'inH₂O' }],
    ['ftH2O ftWC', water * gravity * foot, { shown: 'ftH₂O' }],
    ['psi psia', psi, { shown: 'psi' }],
    ['ksi', 1000 * psi],
    ['Mpsi', 1e6 * psi],
    ['psf', poundForce / foot ** 2, { shown: 'lbf/ft²' }],
    ['osi', poundForce / 16 / inch ** 2, { shown: 'ozf/in²' }],
  ]),
  ...units('gauge pressure', of.pressure, 'NIST SP 811', [
    ['barg bar_g', 1e5, { level: 'gauge pressure', shown: 'barg' }],
    ['mbarg mbar_g', 100, { level: 'gauge pressure', shown: 'mbarg' }],
    ['Pag Pa_g', 1, { level: 'gauge pressure', shown: 'Pag' }],
    ['kPag kPa_g', 1000, { level: 'gauge pressure', shown: 'kPag' }],
    ['MPag MPa_g', 1e6, { level: 'gauge pressure', shown: 'MPag' }],
    ['atg', gravity * 1e4, { level: 'gauge pressure' }],
    ['psig', psi, { level: 'gauge pressure' }],
    ['inH2Og inwcg', water * gravity * inch, { level: 'gauge pressure', shown: 'inH₂Og' }],
    ['inHgg', mercury * gravity * inch, { level: 'gauge pressure' }],
  ]),
  ...units('dynamic viscosity', of.dynamicViscosity, 'NIST SP 811', [
    ['P poise', 0.1, { prefixed: 'cmµu' }],
    ['reyn', psi],
  ]),
  ...units('kinematic viscosity', of.diffusivity, 'NIST SP 811', [['St stokes', 1e-4, { prefixed: 'cmµu' }]]),
  ...units('permeability', of.area, 'NIST SP 811', [['darcy', 1e-7 / 101325, { prefixed: 'm' }]]),
  // Grain per hour, square foot and inch of mercury, mercury at 0 °C.
  ...units('permeance', of.permeance, 'NIST SP 811', [
    ['perm', pound / 7000 / (3600 * foot ** 2 * mercury * gravity * inch)],
  ]),
];
