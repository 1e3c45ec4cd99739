import type { Liquid } from '../liquids/types';

/** Liquid sodium along its saturation line. */
export const sodium: Liquid = {
  id: 'sodium',
  name: 'Sodium (liquid)',
  word: 'sodium',
  aliases: ['Na', 'liquid sodium'],
  formulation: 'Fink & Leibowitz 1995',
  sources: [
    'Fink, Leibowitz, Thermodynamic and Transport Properties of Sodium Liquid and Vapor, Argonne National Laboratory, ANL/RE-95/2 (1995); density and viscosity not compared with a second source',
  ],
  range: '98 to 2227 °C along the saturation line; heat capacity to 1727 °C',
  temperature: [371, 2500],
  rho: (T) => {
    const theta = 1 - T / 2503.7;
    return 219 + 275.32 * theta + 511.58 * Math.sqrt(theta);
  },
  cp: (T) => 1658.2 + T * (-0.8479 + T * 4.4541e-4) - 2.9926e6 / (T * T),
  mu: (T) => Math.exp(-6.4406 - 0.3958 * Math.log(T) + 556.835 / T),
  k: (T) => 124.67 + T * (-0.11381 + T * (5.5226e-5 - 1.1842e-8 * T)),
  freezing: () => 371,
  uncertainty: { rho: '0.5 % to 1000 K', cp: '2 % to 1000 K', mu: '3 to 5 %', k: '5 % to 1000 K', Pr: '7 %' },
};
