// Coefficients of the papers named in `sources`, read from the fluid data of CoolProp (MIT licence).
import type { HelmholtzFluid } from '../helmholtz/types';
import { lemmonJacobsenConductivity } from '../helmholtz/conductivity';
import { denseViscosity, type DiluteGas } from '../helmholtz/viscosity';

const gas: DiluteGas = {
  factor: 0.0266958,
  molarMass: 28.9586,
  energy: 103.3,
  size: 0.36,
  collision: [
    [0.431, 0],
    [-0.4623, 1],
    [0.08406, 2],
    [0.005341, 3],
    [-0.00331, 4],
  ],
};

/** Dry air as a pseudo-pure fluid. */
export const air: HelmholtzFluid = {
  id: 'air',
  name: 'Dry air',
  word: 'dry air',
  aliases: ['air'],
  formulation: 'Lemmon et al. 2000',
  sources: [
    'Lemmon, Jacobsen, Penoncello, Friend, Thermodynamic Properties of Air and Mixtures of Nitrogen, Argon, and Oxygen From 60 to 2000 K at Pressures to 2000 MPa, J. Phys. Chem. Ref. Data 29 (2000) 331',
    'Lemmon, Jacobsen, Viscosity and Thermal Conductivity Equations for Nitrogen, Oxygen, Argon, and Air, Int. J. Thermophys. 25 (2004) 21',
  ],
  range: '−213 to 1727 °C up to 20 000 bar, gas and supercritical',
  temperature: [59.75, 2000],
  pressure: [1, 2000000000],
  dissociation: 1700,
  gasConstant: 8.31451,
  molarMass: 0.02896546,
  reducing: { T: 132.6312, rho: 10447.7, p: 3785020 },
  critical: { T: 132.6312, p: 3785020 },
  ideal: {
    a1: -13.841928076,
    a2: 17.275266575,
    logTau: 2.490888032,
    powers: [
      [6.057194e-8, -3],
      [-2.10274769e-5, -2],
      [-0.000158860716, -1],
      [-0.00019536342, 1.5],
    ],
    einstein: [
      [0.791309509, 25.36365],
      [0.212236768, 16.90741],
    ],
    general: [[-0.197938904, 87.31279, 2 / 3, 1]],
  },
  residual: {
    power: [
      [0.118160747229, 1, 0, 0],
      [0.713116392079, 1, 0.33, 0],
      [-1.61824192067, 1, 1.01, 0],
      [0.0714140178971, 2, 0, 0],
      [-0.0865421396646, 3, 0, 0],
      [0.134211176704, 3, 0.15, 0],
      [0.0112626704218, 4, 0, 0],
      [-0.0420533228842, 4, 0.2, 0],
      [0.0349008431982, 4, 0.35, 0],
      [0.000164957183186, 6, 1.35, 0],
      [-0.101365037912, 1, 1.6, 1],
      [-0.17381369097, 3, 0.8, 1],
      [-0.0472103183731, 5, 0.95, 1],
      [-0.0122523554253, 6, 1.25, 1],
      [-0.146629609713, 1, 3.6, 2],
      [-0.0316055879821, 3, 6, 2],
      [0.000233594806142, 11, 3.25, 2],
      [0.0148287891978, 1, 3.5, 3],
      [-0.00938782884667, 3, 15, 3],
    ],
  },
  saturation: {
    dew: {
      T: 132.6312,
      value: 3785020,
      terms: [
        [-0.1567266, 0.5],
        [-5.539635, 1],
        [0.7567212, 2.5],
        [-3.514322, 4],
      ],
    },
  },
  viscosity: denseViscosity({
    dilute: gas,
    reducing: { T: 132.6312, rho: 10447.7 },
    terms: [
      [10.72, 1, 0.2, 0],
      [1.122, 4, 0.05, 0],
      [0.002019, 9, 2.4, 0],
      [-8.876, 1, 0.6, 1],
      [-0.02916, 8, 3.6, 1],
    ],
  }),
  conductivity: lemmonJacobsenConductivity({
    gas,
    factor: 1.308,
    dilute: [
      [1.405, -1.1],
      [-1.036, -0.3],
    ],
    terms: [
      [8.743, 1, 0.1, 0],
      [14.76, 2, 0, 0],
      [-16.62, 3, 0.5, 2],
      [3.793, 7, 2.7, 2],
      [-6.142, 7, 0.3, 2],
      [-0.3778, 11, 1.3, 2],
    ],
    critical: {
      xi0: 0.11,
      cutoff: 0.31,
      gamma0: 0.055,
      R0: 1.01,
      nu: 0.63,
      gamma: 1.2415,
      referenceT: 265.262,
      boltzmann: 1.380658e-23,
    },
  }),
  uncertainty: { rho: '0.1 %', cp: '1 %', mu: '1 %', k: '2 %', Pr: '3 %' },
};
