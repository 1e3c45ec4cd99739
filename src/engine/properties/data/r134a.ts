// Coefficients of the papers named in `sources`, read from the fluid data of CoolProp (MIT licence).
import type { HelmholtzFluid } from '../helmholtz/types';
import { olchowySengers, polynomialConductivity } from '../helmholtz/conductivity';
import { denseViscosity, vogelInitialDensity } from '../helmholtz/viscosity';

/** R134a (1,1,1,2-tetrafluoroethane). */
export const r134a: HelmholtzFluid = {
  id: 'R134a',
  name: 'R134a',
  word: 'R134a',
  aliases: ['1,1,1,2-tetrafluoroethane', 'HFC-134a'],
  formulation: 'Tillner-Roth & Baehr 1994',
  sources: [
    'Tillner-Roth, Baehr, An International Standard Formulation for the Thermodynamic Properties of 1,1,1,2-Tetrafluoroethane (HFC-134a) for Temperatures from 170 K to 455 K and Pressures up to 70 MPa, J. Phys. Chem. Ref. Data 23 (1994) 657',
    'Huber, Laesecke, Perkins, Model for the Viscosity and Thermal Conductivity of Refrigerants, Including a New Correlation for the Viscosity of R134a, Ind. Eng. Chem. Res. 42 (2003) 3163',
    'McLinden, Klein, Perkins, An extended corresponding states model for the thermal conductivity of refrigerants and refrigerant mixtures, Int. J. Refrig. 23 (2000) 43',
    'Mulero, Cachadiña, Parra, Recommended Correlations for the Surface Tension of Common Fluids, J. Phys. Chem. Ref. Data 41 (2012) 043105',
  ],
  range: '−103 to 182 °C up to 700 bar',
  temperature: [169.85, 455],
  pressure: [1, 70000000],
  gasConstant: 8.314471,
  molarMass: 0.102032,
  reducing: { T: 374.18, rho: 4978.830171000001, p: 4059280 },
  critical: { T: 374.21, p: 4059280 },
  ideal: {
    a1: -1.019535,
    a2: 9.047135,
    logTau: -1.629789,
    powers: [
      [-9.723916, -0.5],
      [-3.92717, -0.75],
    ],
  },
  residual: {
    power: [
      [0.05586817, 2, -0.5, 0],
      [0.498223, 1, 0, 0],
      [0.02458698, 3, 0, 0],
      [0.0008570145, 6, 0, 0],
      [0.0004788584, 6, 1.5, 0],
      [-1.800808, 1, 1.5, 0],
      [0.2671641, 1, 2, 0],
      [-0.04781652, 2, 2, 0],
      [0.01423987, 5, 1, 1],
      [0.3324062, 2, 3, 1],
      [-0.007485907, 2, 5, 1],
      [0.0001017263, 4, 1, 2],
      [-0.5184567, 1, 5, 2],
      [-0.08692288, 4, 5, 2],
      [0.2057144, 1, 6, 2],
      [-0.005000457, 2, 10, 2],
      [0.0004603262, 4, 10, 2],
      [-0.003497836, 1, 10, 3],
      [0.006995038, 5, 18, 3],
      [-0.01452184, 3, 22, 3],
      [-0.0001285458, 10, 50, 4],
    ],
  },
  saturation: {
    pressure: {
      T: 374.21,
      value: 4059280,
      terms: [
        [0.4331478287291047, 0.845],
        [-9.090302559074352, 0.99],
        [2.1476074125217703, 1.14],
        [-1.557687007603464, 2.651],
        [-3.5020328972698604, 4.507],
        [14.958442337201044, 17.235],
      ],
    },
    liquid: {
      T: 374.21,
      value: 5017.053,
      terms: [
        [18.772731940930015, 0.673],
        [-51.49939472178225, 0.994],
        [40.793536440596085, 1.257],
        [-1481.6500471538966, 5.783],
        [1600.534434298925, 5.943],
        [-67338.52423732559, 19.94],
      ],
    },
    vapour: {
      T: 374.21,
      value: 5017.053,
      terms: [
        [-5.147386240766544, 0.476],
        [5.34618043286371, 0.966],
        [-7.611015272838434, 1.321],
        [-28.85436432788653, 8.491],
        [-9.079306067130748, 13.463],
        [64, 13.463],
      ],
    },
  },
  surface: { T: 374.21, terms: [[0.05801, 1.241]] },
  viscosity: denseViscosity({
    dilute: {
      factor: 0.021357,
      molarMass: 102.031,
      energy: 299.363,
      size: 0.468932,
      collision: [
        [0.355404, 0],
        [-0.464337, 1],
        [0.0257353, 2],
      ],
    },
    initial: vogelInitialDensity,
    reducing: { T: 374.21, rho: 5017.053 },
    terms: [
      [-20.6900719, 1, 0, 0],
      [0.356029549, 2, 6, 0],
      [2.11101816, 2, 2, 0],
      [13.9601415, 2, 0.5, 0],
      [-4.5643502, 2, -2, 0],
      [-3.51593275, 3, 0, 0],
    ],
    freeVolume: {
      f: 214.76332,
      d: 0,
      above: [[3.163695636, 0]],
      below: [
        [1, 0],
        [-0.0890173375, -1],
        [0.100035295, -2],
      ],
    },
  }),
  conductivity: polynomialConductivity({
    dilute: {
      T: 1,
      above: [
        [-0.0105248, 0],
        [8.00982e-5, 1],
      ],
    },
    residual: {
      T: 1,
      rho: 515.249968352,
      terms: [
        [0.0037740609300000003, 1, 0],
        [0.010534223865, 2, 0],
        [-0.002952794565, 3, 0],
        [0.00128672592, 4, 0],
      ],
    },
    critical: { ...olchowySengers, cutoff: 0.52853564, referenceT: 1.5 * 374.18 },
  }),
  uncertainty: { rho: '0.05 %', cp: '0.5 to 1 %', p_sat: '0.02 %', mu: '1.5 to 3 %', k: '5 %', Pr: '6 %' },
};
