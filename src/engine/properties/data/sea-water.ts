import { saturationPressure } from '../water/saturation';
import type { Liquid } from '../liquids/types';

/** Salinity enters the equations for heat capacity and conductivity in g/kg. */
const grams = (x: number) => 1000 * x;
const celsiusOf = (T: number) => T - 273.15;

function density(T: number, S: number): number {
  const t = celsiusOf(T);
  const pure = 999.9 + t * (2.034e-2 + t * (-6.162e-3 + t * (2.261e-5 - 4.657e-8 * t)));
  const salt = 802 + t * (-2.001 + t * (1.677e-2 + t * -3.06e-5));
  return pure + S * salt - 1.613e-5 * S * S * t * t;
}

function heatCapacity(T: number, x: number): number {
  const S = grams(x);
  const a = 5.328 + S * (-9.76e-2 + 4.04e-4 * S);
  const b = -6.913e-3 + S * (7.351e-4 - 3.15e-6 * S);
  const c = 9.6e-6 + S * (-1.927e-6 + 8.23e-9 * S);
  const d = 2.5e-9 + S * (1.666e-9 - 7.125e-12 * S);
  return 1000 * (a + T * (b + T * (c + T * d)));
}

function viscosity(T: number, S: number): number {
  const t = celsiusOf(T);
  const water = 4.2844e-5 + 1 / (0.157 * (t + 64.993) ** 2 - 91.296);
  const a = 1.541 + 1.998e-2 * t - 9.52e-5 * t * t;
  const b = 7.974 - 7.561e-2 * t + 4.724e-4 * t * t;
  return water * (1 + S * (a + b * S));
}

function conductivity(T: number, x: number): number {
  const S = grams(x);
  const exponent =
    Math.log10(240 + 0.0002 * S) + 0.434 * (2.3 - (343.5 + 0.037 * S) / T) * (1 - T / (647 + 0.03 * S)) ** 0.333;
  return 1e-3 * 10 ** exponent;
}

/** Vapour pressure by Raoult's law, as Sharqawy et al. recommend: that of water over 1 + 0.57357·S/(1 − S). */
const vapourPressure = (T: number, S: number) => saturationPressure(T) / (1 + (0.57357 * S) / (1 - S));

/** Sea water at low pressure. */
export const seaWater: Liquid = {
  id: 'sea_water',
  name: 'Sea water',
  word: 'sea water',
  aliases: ['seawater', 'brackish water'],
  formulation: 'Sharqawy et al. 2010',
  sources: [
    'Sharqawy, Lienhard, Zubair, Thermophysical properties of seawater: a review of existing correlations and data, Desalin. Water Treat. 16 (2010) 354 (equations 8, 9, 13, 22)',
  ],
  range: '0 to 120 °C, salinity 0 to 0.12 kg/kg, at low pressure',
  temperature: [273.15, 393.15],
  composition: { range: [0, 0.12], hint: 'salinity is in kg/kg: 35 g/kg is 0.035' },
  rho: density,
  cp: heatCapacity,
  mu: viscosity,
  k: conductivity,
  vapourPressure: { from: 273.16, value: vapourPressure },
  uncertainty: { rho: '0.1 %', cp: '0.3 %', mu: '1.5 %', k: '3 %', Pr: '4 %' },
};
