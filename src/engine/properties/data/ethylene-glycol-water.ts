// Coefficients of the source named below, read from the liquid data of CoolProp (MIT licence).
import { exponentialPolynomial, polynomial } from '../liquids/forms';
import type { Liquid } from '../liquids/types';
import { saturationPressure } from '../water/saturation';

const freezing = polynomial({ T: 0, x: 0.308462, coefficients: [[257.9, -80.8, -133.4, -72.93, 100.6, 11.4]] });

/** Ethylene glycol in water. */
export const ethyleneGlycolWater: Liquid = {
  id: 'ethylene_glycol_water',
  name: 'Ethylene glycol in water',
  word: 'ethylene glycol in water',
  aliases: ['ethylene glycol', 'MEG', 'glycol'],
  formulation: 'Melinder 2010',
  sources: [
    'Melinder, Properties of Secondary Working Fluids for Indirect Systems, International Institute of Refrigeration (2010)',
  ],
  range: 'freezing temperature to 100 °C, mass fraction of glycol 0 to 0.6',
  // The colder end is the freezing temperature at the greatest mass fraction.
  temperature: [221.94, 373.15],
  composition: { range: [0, 0.6], hint: 'a percentage is written with %: 30 %' },
  rho: polynomial({
    T: 304.878,
    x: 0.308462,
    coefficients: [
      [1034, 131.1, 0.749, -106.2, -96.23, 489.1],
      [-0.4781, -0.6876, 0.7855, 1.229, -7.211],
      [-0.002692, 0.004805, -0.003995, -0.01153],
      [4.725e-6, 1.69e-6, 4.982e-5],
    ],
  }),
  cp: polynomial({
    T: 304.878,
    x: 0.308462,
    coefficients: [
      [3737, -1799, -993.3, 2610, 1537, -16180],
      [2.93, 10.46, 3.516, -1.189, -42.72],
      [-0.004675, -0.04147, 0.05109, -0.1643],
      [-1.389e-5, 1.847e-5, -0.0007138],
    ],
  }),
  mu: exponentialPolynomial({
    T: 304.878,
    x: 0.308462,
    coefficients: [
      [-6.437255, 2.471, 0.03328, 1.659, 3.089, -18.65],
      [-0.0255, -0.01171, 0.01086, 0.003157, 0.01831],
      [0.0001782, 0.0001052, 0.0001051, 0.0004063],
      [-7.669e-7, -1.634e-6, -6.475e-6],
    ],
  }),
  k: polynomial({
    T: 304.878,
    x: 0.308462,
    coefficients: [
      [0.472, -0.4286, 0.1747, 0.03017, -0.1322, 0.2678],
      [0.0008903, -0.001473, 0.0006814, -0.002412, 0.002555],
      [-1.058e-6, 1.059e-5, -3.612e-5, 4.004e-5],
      [-2.789e-9, -1.142e-8, 2.365e-8],
    ],
  }),
  freezing: (x) => freezing(0, x),
  // The solute is less volatile than water, so that the mixture boils above water.
  certainlyLiquidAbove: (T) => saturationPressure(Math.max(T, 273.16)),
  uncertainty: { rho: '0.5 %', cp: '2 to 3 %', mu: '5 to 7 %', k: '2 to 3 %', Pr: '8 %' },
};
