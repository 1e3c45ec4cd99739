// Coefficients of the papers named in `sources`, read from the fluid data of CoolProp (MIT licence).
import type { HelmholtzFluid } from '../helmholtz/types';

/** R245fa (1,1,1,3,3-pentafluoropropane), without transport equations. */
export const r245fa: HelmholtzFluid = {
  id: 'R245fa',
  name: 'R245fa',
  word: 'R245fa',
  aliases: ['1,1,1,3,3-pentafluoropropane', 'HFC-245fa'],
  formulation: 'Akasaka et al. 2015',
  sources: [
    'Akasaka, Zhou, Lemmon, A Fundamental Equation of State for 1,1,1,3,3-Pentafluoropropane (R-245fa), J. Phys. Chem. Ref. Data 44 (2015) 013104',
    'Mulero, Cachadiña, Parra, Recommended Correlations for the Surface Tension of Common Fluids, J. Phys. Chem. Ref. Data 41 (2012) 043105',
  ],
  range: '−102 to 167 °C up to 2000 bar; no viscosity or conductivity',
  temperature: [171.05, 440],
  pressure: [1, 200000000],
  gasConstant: 8.3144621,
  molarMass: 0.13404794,
  reducing: { T: 427.01, rho: 3875, p: 3651000 },
  critical: { T: 427.01, p: 3651000 },
  ideal: {
    a1: -13.4283638514,
    a2: 9.87236538,
    logTau: 3,
    einstein: [
      [5.5728, 0.5197115834815994],
      [10.385, 2.364453600524394],
      [12.554, 5.735555763648281],
    ],
  },
  residual: {
    power: [
      [0.057506623, 4, 1, 0],
      [1.5615975, 1, 0.27, 0],
      [-2.3614485, 1, 0.9, 0],
      [-0.51773521, 2, 1.09, 0],
      [0.18509788, 3, 0.4, 0],
      [-0.87405626, 1, 2.9, 2],
      [-0.27530955, 3, 1.7, 2],
      [0.57971151, 2, 0.8, 1],
      [-0.39934306, 2, 3.6, 2],
      [-0.033230277, 7, 1.05, 1],
    ],
    gaussian: [
      [0.83210508, 1, 1.8, 1.011, 0.709, 1.879, 1.081],
      [-0.335443, 1, 4, 1.447, 0.939, 2.454, 0.651],
      [-0.10117801, 3, 4.5, 1.079, 0.703, 1.256, 0.468],
      [-0.0091495867, 3, 2, 7.86, 0.777, 21.1, 1.293],
    ],
  },
  saturation: {
    pressure: {
      T: 427.01,
      value: 3651000,
      terms: [
        [-0.9670903356725931, 7.194],
        [-11.756404923945222, 1.03],
        [5.087651519671258, 1.145],
        [-2.835805078027625, 2.84],
        [-2.217939014066299, 4.613],
        [28.8905424182831, 18.798],
      ],
    },
    liquid: {
      T: 427.01,
      value: 3875,
      terms: [
        [-0.645916749226158, 0.144],
        [1.2435143264412414, 0.165],
        [2.1374254146018647, 0.53],
        [-1.4105539340976712, 1.993],
        [2.697825229930464, 2.646],
        [-1.236775453941409, 3.593],
      ],
    },
    vapour: {
      T: 427.01,
      value: 3875,
      terms: [
        [-0.12316786769188867, 0.075],
        [-3.5467162730203325, 0.466],
        [-2.100626576983384, 1.018],
        [-3.02259697521286, 2.817],
        [-10.604906302496444, 6.14],
        [12.900898794193413, 8.5],
      ],
    },
  },
  surface: {
    T: 427.16,
    terms: [
      [0.073586, 1.0983],
      [0.0103, 0.60033],
      [-0.02663, 0.72765],
    ],
  },
  uncertainty: { rho: '0.1 %', cp: '5 %', p_sat: '0.1 to 0.35 %' },
};
