import { residualConductivity } from '../conductivity';
import type { HelmholtzState } from '../equation';
import type { ConductivityEquation } from '../types';

const criticalT = 405.4;
const criticalRho = 235;
const residual = {
  T: 1,
  rho: criticalRho,
  terms: [
    [0.03808645, 1, 0],
    [0.06647986, 2, 0],
    [-0.0300295, 3, 0],
    [0.00998779, 4, 0],
  ],
} as const;
const boltzmann = 1.3806504e-23;

/** Critical enhancement: along the critical isochore (eq. 9), then away from it. */
function enhancement({ T, rho }: HelmholtzState): number {
  // On the critical isotherm itself the expression has no value; a step of 1e-6 off it is meant.
  const t = Math.max(1e-6, Math.abs((T - criticalT) / criticalT));
  const root = Math.sqrt(t);
  const viscosity = (2.6 + 1.6 * t) * 1e-5;
  const slope = (2.18 - 0.12 / Math.exp(17.8 * t)) * 1e5;
  const length = 1.34e-10 * t ** -0.63 * (1 + root);
  const susceptibility = 0.423e-8 * t ** -1.24 * (1 + root / 0.7);
  const isochore =
    ((1.2 * boltzmann * T * T) / (6 * Math.PI * viscosity * length)) *
    slope *
    slope *
    susceptibility *
    Math.exp(-36 * t * t);
  const width = (0.61 * criticalRho + 16.5 * Math.log(t)) ** 2;
  const edge = 0.6 * criticalRho;
  const distance = Math.max(rho, edge) - 0.96 * criticalRho;
  const factor = rho < edge ? (rho / edge) ** 2 : 1;
  return isochore * (width / (width + distance * distance)) * factor;
}

/** Conductivity of ammonia in W/(m·K): Tufeu et al., Ber. Bunsenges. Phys. Chem. 88 (1984) 422. */
export const ammoniaConductivity: ConductivityEquation = {
  value(state) {
    const { T } = state;
    const dilute = 0.03589 + T * (-0.000175 + T * (4.551e-7 + T * (1.685e-10 - 4.828e-13 * T)));
    return dilute + residualConductivity(residual, state) + enhancement(state);
  },
};
