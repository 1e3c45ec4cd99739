// Coefficients of the papers named in `sources`, read from the fluid data of CoolProp (MIT licence).
import type { HelmholtzFluid } from '../helmholtz/types';

/** R1234yf (2,3,3,3-tetrafluoropropene), without transport equations. */
export const r1234yf: HelmholtzFluid = {
  id: 'R1234yf',
  name: 'R1234yf',
  word: 'R1234yf',
  aliases: ['2,3,3,3-tetrafluoropropene', 'HFO-1234yf'],
  formulation: 'Lemmon & Akasaka 2022',
  sources: [
    'Lemmon, Akasaka, An International Standard Formulation for 2,3,3,3-Tetrafluoroprop-1-ene (R1234yf) Covering Temperatures from the Triple Point Temperature to 410 K and Pressures Up to 100 MPa, Int. J. Thermophys. 43 (2022) 119',
    'Mulero, Cachadiña, Parra, Recommended Correlations for the Surface Tension of Common Fluids, J. Phys. Chem. Ref. Data 41 (2012) 043105',
  ],
  range: '−152 to 137 °C up to 1000 bar; no viscosity or conductivity',
  temperature: [121.6, 410],
  pressure: [0.1, 100000000],
  gasConstant: 8.314462618,
  molarMass: 0.1140416,
  reducing: { T: 367.85, rho: 4180, p: 3384400 },
  critical: { T: 367.85, p: 3384400 },
  ideal: {
    a1: -12.081525543189,
    a2: 8.52896238365,
    logTau: 3,
    einstein: [
      [8.65, 1.3918716868288703],
      [9.75, 4.268044039690091],
      [2.11, 12.233247247519369],
    ],
  },
  residual: {
    power: [
      [0.0340387, 4, 1, 0],
      [1.912859, 1, 0.222, 0],
      [-2.1984719881617, 1, 0.61, 0],
      [-0.8147645305033, 2, 1.122, 0],
      [0.2288282, 3, 0.5, 0],
      [-1.65436, 1, 2.14, 2],
      [-1.446628, 3, 2.284, 2],
      [0.5961722, 2, 1.05, 1],
      [-0.6148209, 2, 2.33, 2],
      [-0.0180069, 7, 0.778, 1],
    ],
    gaussian: [
      [0.2845275, 1, 1, 28.1, 0.96, 1016, 1.061],
      [-0.3050809, 1, 2, 28, 0.96, 1000, 1.062],
      [2.198935, 1, 1.236, 1.307, 0.853, 1.16, 1.3],
      [-0.4270329, 1, 1.6, 1.96, 1.15, 1.2, 1.04],
      [-0.4015581, 1, 1.85, 1.25, 1.3, 1.26, 1],
      [0.1179587, 1, 0.7, 1, 1.5, 1.6, 1.14],
      [-0.3141002, 1, 1.75, 2.2, 0.762, 0.87, 1.1],
    ],
  },
  saturation: {
    pressure: {
      T: 367.85,
      value: 3384400,
      terms: [
        [-7.4507, 1],
        [2.164, 1.5],
        [-1.674, 3],
        [-3.318, 4],
        [-1.617, 9],
      ],
    },
    liquid: {
      T: 367.85,
      value: 4180,
      terms: [
        [3.392, 0.4],
        [-4.119, 0.7],
        [8.932, 1.1],
        [-8.525, 1.5],
        [3.384, 2.1],
      ],
    },
    vapour: {
      T: 367.85,
      value: 4180,
      unscaled: true,
      terms: [
        [-3.616, 0.426],
        [-74.91, 2],
        [197.7, 2.4],
        [-152.76, 2.7],
        [-61.062, 7.5],
        [-115.53, 15],
      ],
    },
  },
  surface: { T: 367.85, terms: [[0.06274, 1.394]] },
  uncertainty: { rho: '0.1 %', cp: '5 %', p_sat: '0.1 %' },
};
