// Coefficients of the source named below, read from the liquid data of CoolProp (MIT licence).
import { exponentialPolynomial, polynomial } from '../liquids/forms';
import type { Liquid } from '../liquids/types';
import { saturationPressure } from '../water/saturation';

const freezing = polynomial({ T: 0, x: 0.307031, coefficients: [[259.9, -66.31, -109.4, -228.3, -340.9, 146.5]] });

/** Propylene glycol in water. */
export const propyleneGlycolWater: Liquid = {
  id: 'propylene_glycol_water',
  name: 'Propylene glycol in water',
  word: 'propylene glycol in water',
  aliases: ['propylene glycol', 'MPG'],
  formulation: 'Melinder 2010',
  sources: [
    'Melinder, Properties of Secondary Working Fluids for Indirect Systems, International Institute of Refrigeration (2010)',
  ],
  range: 'freezing temperature to 100 °C, mass fraction of glycol 0 to 0.6',
  // The colder end is the freezing temperature at the greatest mass fraction.
  temperature: [223.14, 373.15],
  composition: { range: [0, 0.6], hint: 'a percentage is written with %: 30 %' },
  rho: polynomial({
    T: 305.8583,
    x: 0.307031,
    coefficients: [
      [1018, 76.04, -24.98, -155, -113.1, 234.2],
      [-0.5406, -0.945, 0.27, 2.829, -2.221],
      [-0.002666, 0.005541, -0.004018, -0.007175],
      [1.347e-5, -1.343e-5, 3.376e-5],
    ],
  }),
  cp: polynomial({
    T: 305.8583,
    x: 0.307031,
    coefficients: [
      [3882, -1304, -1598, 353.9, 5000, -4959],
      [2.699, 5.07, 0.9534, 31.02, -71.35],
      [-0.001659, -0.004752, 0.1167, -0.295],
      [-1.032e-5, 0.0001522, -0.000487],
    ],
  }),
  mu: exponentialPolynomial({
    T: 305.8583,
    x: 0.307031,
    coefficients: [
      [-6.224055, 3.328, 0.5453, -3.9, -1.587, 35.64],
      [-0.03045, -0.03984, -0.00086, 0.1054, 0.04475],
      [0.0002525, 0.0004332, -0.0001593, -0.001589],
      [-1.399e-6, -1.86e-6, -4.465e-7],
    ],
  }),
  k: polynomial({
    T: 305.8583,
    x: 0.307031,
    coefficients: [
      [0.4513, -0.4795, 0.2076, -0.09083, -0.05952, 0.2104],
      [0.0007955, -0.001678, 0.001563, -0.002518, -0.003605],
      [3.482e-8, 8.941e-6, -4.615e-5, 6.543e-5],
      [-5.966e-9, 1.493e-8, 9.897e-8],
    ],
  }),
  freezing: (x) => freezing(0, x),
  // The solute is less volatile than water, so that the mixture boils above water.
  certainlyLiquidAbove: (T) => saturationPressure(Math.max(T, 273.16)),
  uncertainty: { rho: '0.5 %', cp: '2 to 3 %', mu: '5 to 7 %', k: '2 to 3 %', Pr: '8 %' },
};
