import { criticalEnhancement, olchowySengers, residualConductivity } from '../conductivity';
import type { ConductivityEquation, ViscosityEquation } from '../types';
import { initialDensity, vogelInitialDensity } from '../viscosity';

/** Laesecke & Muzny 2017, eq. 4: coefficients of the dilute gas. */
const a = [
  1749.35489318835, -369.069300007128, 5423856.34887691, -2.21283852168356, -269503.247933569, 73145.021531826,
  5.34368649509278,
] as const;
const lennardJones = { factor: 0, molarMass: 44.0098, energy: 200.76, size: 0.378421, collision: [] };

function diluteViscosity(T: number): number {
  const root = Math.cbrt(T);
  const divisor =
    a[0] +
    a[1] * T ** (1 / 6) +
    a[2] * Math.exp(a[3] * root) +
    (a[4] + a[5] * root) / Math.exp(root) +
    a[6] * Math.sqrt(T);
  return (0.0010055 * Math.sqrt(T)) / divisor;
}

/** Triple point, by which the dense part is reduced: K and kg/m³ of the liquid. */
const triple = { T: 216.592, rho: 1178.53 };
const c1 = 0.360603235428487;
const c2 = 0.121550806591497;
const exponent = 8.06282737481277;

/** Viscosity of carbon dioxide: Laesecke & Muzny, J. Phys. Chem. Ref. Data 46 (2017) 013107. */
export const carbonDioxideViscosity: ViscosityEquation = {
  value({ T, rho, molarDensity }, { gasConstant, molarMass }) {
    const dilute = diluteViscosity(T);
    const linear = dilute * initialDensity(lennardJones, vogelInitialDensity, T) * molarDensity;
    const t = T / triple.T;
    const r = rho / triple.rho;
    // Eq. 8: the viscosity that density, temperature and molecule alone set, with Avogadro's number to the third.
    const scale =
      (triple.rho ** (2 / 3) * Math.sqrt(gasConstant * triple.T)) / (molarMass ** (1 / 6) * 84446887.43579945);
    return dilute + linear + scale * (c1 * t * r ** 3 + (r * r + r ** exponent) / (t - c2));
  },
  temperature: [100, 2000],
};

/** Huber et al. 2016, eq. 3: dilute gas in mW/(m·K). */
const dilute = [0.0151874307, 0.028067404, 0.022856419, -0.0074162421] as const;
/** Huber et al. 2016, table 3. */
const residual = {
  T: 304.1282,
  rho: 467.6,
  terms: [
    [0.0100128, 1, 0],
    [0.0560488, 2, 0],
    [-0.081162, 3, 0],
    [0.0624337, 4, 0],
    [-0.0206336, 5, 0],
    [0.00253248, 6, 0],
    [0.00430829, 1, -1],
    [-0.0358563, 2, -1],
    [0.067148, 3, -1],
    [-0.0522855, 4, -1],
    [0.0174571, 5, -1],
    [-0.00196414, 6, -1],
  ],
} as const;
const critical = { ...olchowySengers, R0: 1.02, gamma0: 0.052, xi0: 0.15, cutoff: 0.4, referenceT: 456.19 };

/** Conductivity of carbon dioxide: Huber et al., J. Phys. Chem. Ref. Data 45 (2016) 013102. */
export const carbonDioxideConductivity: ConductivityEquation = {
  value(state, fluid, mu) {
    const tau = fluid.reducing.T / state.T;
    const [l0, l1, l2, l3] = dilute;
    const gas = 1e-3 / (Math.sqrt(tau) * (l0 + tau * (l1 + tau * (l2 + tau * l3))));
    return gas + residualConductivity(residual, state) + criticalEnhancement(fluid, critical, state, mu);
  },
  temperature: [200, 1100],
};
