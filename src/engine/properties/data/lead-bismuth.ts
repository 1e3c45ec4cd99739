import type { Liquid } from '../liquids/types';

/** Liquid eutectic of lead (44.5 %) and bismuth (55.5 %). */
export const leadBismuth: Liquid = {
  id: 'lead_bismuth_eutectic',
  name: 'Lead-bismuth eutectic (liquid)',
  word: 'lead-bismuth eutectic',
  aliases: ['LBE', 'lead-bismuth'],
  formulation: 'OECD/NEA handbook 2015',
  sources: [
    'Fazio et al., Handbook on Lead-bismuth Eutectic Alloy and Lead Properties, Materials Compatibility, Thermal-hydraulics and Technologies, OECD Nuclear Energy Agency (2015)',
  ],
  range: '125 to 827 °C',
  temperature: [398, 1100],
  rho: (T) => 11065 - 1.293 * T,
  cp: (T) => 164.8 + T * (-3.94e-2 + T * 1.25e-5) - 4.56e5 / (T * T),
  mu: (T) => 4.94e-4 * Math.exp(754.1 / T),
  k: (T) => 3.284 + T * (1.617e-2 - 2.305e-6 * T),
  freezing: () => 398,
  uncertainty: { rho: '0.8 %', cp: '5 %', mu: '8 %', k: '10 %', Pr: '14 %' },
};
