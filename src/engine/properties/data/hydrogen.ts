// Coefficients of the papers named in `sources`, read from the fluid data of CoolProp (MIT licence).
import type { HelmholtzFluid } from '../helmholtz/types';
import { olchowySengers, polynomialConductivity } from '../helmholtz/conductivity';
import { hydrogenViscosity } from '../helmholtz/transport/hydrogen';

/** Normal hydrogen: 75 % ortho, 25 % para. */
export const hydrogen: HelmholtzFluid = {
  id: 'H2',
  name: 'Hydrogen (normal)',
  word: 'hydrogen',
  aliases: ['hydrogen', 'normal hydrogen'],
  formulation: 'Leachman et al. 2009',
  sources: [
    'Leachman, Jacobsen, Penoncello, Lemmon, Fundamental Equations of State for Parahydrogen, Normal Hydrogen, and Orthohydrogen, J. Phys. Chem. Ref. Data 38 (2009) 721',
    'Muzny, Huber, Kazakov, Correlation for the Viscosity of Normal Hydrogen Obtained from Symbolic Regression, J. Chem. Eng. Data 58 (2013) 969',
    'Assael, Assael, Huber, Perkins, Takata, Correlation of the Thermal Conductivity of Normal and Parahydrogen from the Triple Point to 1000 K and up to 100 MPa, J. Phys. Chem. Ref. Data 40 (2011) 033101',
    'Mulero, Cachadiña, Parra, Recommended Correlations for the Surface Tension of Common Fluids, J. Phys. Chem. Ref. Data 41 (2012) 043105',
  ],
  range: '−259 to 727 °C up to 20 000 bar; conductivity up to 1000 bar',
  temperature: [13.957, 1000],
  pressure: [1, 2000000000],
  gasConstant: 8.314472,
  molarMass: 0.00201588,
  reducing: { T: 33.145, rho: 15508, p: 1296400 },
  critical: { T: 33.145, p: 1296400 },
  ideal: {
    a1: -1.4579856475,
    a2: 1.888076782,
    logTau: 1.5,
    einstein: [
      [1.616, 531 / 33.145],
      [-0.4117, 751 / 33.145],
      [-0.792, 1989 / 33.145],
      [0.758, 2484 / 33.145],
      [1.217, 6859 / 33.145],
    ],
  },
  residual: {
    power: [
      [-6.93643, 1, 0.6844, 0],
      [0.01, 4, 1, 0],
      [2.1101, 1, 0.989, 0],
      [4.52059, 1, 0.489, 0],
      [0.732564, 2, 0.803, 0],
      [-1.34086, 2, 1.1444, 0],
      [0.130985, 3, 1.409, 0],
      [-0.777414, 1, 1.754, 1],
      [0.351944, 3, 1.311, 1],
    ],
    gaussian: [
      [-0.0211716, 2, 4.187, 1.685, 1.506, 0.171, 0.7164],
      [0.0226312, 1, 5.646, 0.489, 0.156, 0.2245, 1.3444],
      [0.032187, 3, 0.791, 0.103, 1.736, 0.1304, 1.4517],
      [-0.0231752, 1, 7.249, 2.506, 0.67, 0.2785, 0.7204],
      [0.0557346, 1, 2.986, 1.607, 1.662, 0.3967, 1.5445],
    ],
  },
  saturation: {
    pressure: {
      T: 33.145,
      value: 1296400,
      terms: [
        [-0.5553870929135406, 0.882],
        [-7.0852972599030295, 1.072],
        [0.006868538454095541, 1.355],
        [0.8295514415153659, 2.61],
        [-0.08773773693832483, 8.191],
        [3.754274235303921, 1.239],
      ],
    },
    liquid: {
      T: 33.145,
      value: 15508,
      terms: [
        [1.9546584452513824, 0.407],
        [-5.715534926385584, 3.401],
        [714.2366728890577, 7.095],
        [-1666.5447521212081, 8.095],
        [2698.8598951804593, 10.911],
        [-12755.576112629806, 17.353],
      ],
    },
    vapour: {
      T: 33.145,
      value: 15508,
      terms: [
        [-3.036644018774332, 0.473],
        [-773.9211864728516, 6.618],
        [1530.809493601263, 7.083],
        [-3087.995404817007, 9.094],
        [3472.491545729249, 10.577],
        [-15649.585518005188, 19.579],
      ],
    },
  },
  surface: {
    T: 33.145,
    terms: [
      [-1.4165, 0.63882],
      [0.746383, 0.659804],
      [0.675625, 0.619149],
    ],
  },
  melting: (T) => -236200 + 231000 * ((T / 1) ** 1.7627 - 1),
  viscosity: hydrogenViscosity,
  conductivity: polynomialConductivity({
    dilute: {
      T: 33.145,
      above: [
        [-0.340976, 0],
        [4.5882, 1],
        [-1.4508, 2],
        [0.326394, 3],
        [0.00316939, 4],
        [0.000190592, 5],
        [-1.139e-6, 6],
      ],
      below: [
        [138.497, 0],
        [-22.1878, 1],
        [4.57151, 2],
        [1, 3],
      ],
    },
    residual: {
      T: 33.145,
      rho: 31.262,
      terms: [
        [0.0363081, 1, 0],
        [0.0018337, 1, -1],
        [-0.0207629, 2, 0],
        [-0.00886716, 2, -1],
        [0.031481, 3, 0],
        [0.015826, 3, -1],
        [-0.0143097, 4, 0],
        [-0.0106283, 4, -1],
        [0.0017498, 5, 0],
        [0.00280673, 5, -1],
      ],
    },
    critical: {
      ...olchowySengers,
      R0: 1.01,
      gamma0: 0.052,
      gamma: 1.2415,
      xi0: 0.15,
      cutoff: 0.4,
      referenceT: 1.5 * 33.145,
    },
  }),
  uncertainty: { rho: '0.1 %', cp: '1 %', p_sat: '0.2 %', mu: '4 %', k: '2 to 4 %', Pr: '6 %' },
};
