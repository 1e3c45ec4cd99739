import type { Liquid } from '../liquids/types';

/** Molten mixture of 60 % sodium nitrate and 40 % potassium nitrate by mass; t in °C. */
export const solarSalt: Liquid = {
  id: 'solar_salt_60NaNO3_40KNO3',
  name: 'Nitrate salt, 60 % NaNO₃ and 40 % KNO₃',
  word: 'nitrate salt',
  aliases: ['solar salt', 'molten salt', 'nitrate salt'],
  formulation: 'Zavoico 2001',
  sources: ['Zavoico, Solar Power Tower Design Basis Document, Sandia National Laboratories, SAND2001-2100 (2001)'],
  range: '260 to 600 °C',
  temperature: [533.15, 873.15],
  rho: (T) => 2090 - 0.636 * (T - 273.15),
  cp: (T) => 1443 + 0.172 * (T - 273.15),
  mu: (T) => {
    const t = T - 273.15;
    return 1e-3 * (22.714 + t * (-0.12 + t * (2.281e-4 - 1.474e-7 * t)));
  },
  k: (T) => 0.443 + 1.9e-4 * (T - 273.15),
  freezing: () => 511.15,
  uncertainty: {},
};
