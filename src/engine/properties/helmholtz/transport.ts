import { helmholtzState, type HelmholtzState } from './equation';
import type { HelmholtzFluid } from './types';

/** The authors' value, J/K. */
const boltzmann = 1.380658e-23;

function diluteViscosity({ transport }: HelmholtzFluid, T: number): number {
  const logT = Math.log(T / transport.energy);
  const omega = Math.exp(transport.collision.reduce((sum, b, power) => sum + b * logT ** power, 0));
  return (0.0266958 * Math.sqrt(transport.molarMass * T)) / (transport.size ** 2 * omega);
}

function residualSum(
  terms: readonly (readonly [number, number, number, number])[],
  tau: number,
  delta: number,
): number {
  return terms.reduce(
    (sum, [n, t, d, l]) => sum + n * tau ** t * delta ** d * (l === 0 ? 1 : Math.exp(-(delta ** l))),
    0,
  );
}

/** Dynamic viscosity in Pa·s (Lemmon & Jacobsen 2004, eqs. 1–3). */
export function viscosity(fluid: HelmholtzFluid, T: number, molarDensity: number): number {
  const tau = fluid.reducing.T / T;
  const delta = molarDensity / fluid.reducing.rho;
  return (diluteViscosity(fluid, T) + residualSum(fluid.transport.viscosity, tau, delta)) * 1e-6;
}

/** Critical enhancement in W/(m·K) (Lemmon & Jacobsen 2004, eqs. 7–11). */
function enhancement(fluid: HelmholtzFluid, state: HelmholtzState, mu: number): number {
  const { T, molarDensity, cp, cv, rho } = state;
  const { xi0, gamma0, qD, referenceT } = fluid.transport.critical;
  const scale = (fluid.reducing.p * molarDensity) / fluid.reducing.rho ** 2;
  const chi = scale * state.compressibility;
  const reference = scale * helmholtzState(fluid, referenceT, molarDensity).compressibility;
  const excess = (chi - (reference * referenceT) / T) / gamma0;
  if (!(excess > 0)) return 0;
  const xi = xi0 * excess ** (0.63 / 1.2415);
  const y = xi / qD;
  const omega = (2 / Math.PI) * (((cp - cv) / cp) * Math.atan(y) + (cv / cp) * y);
  const omega0 = (2 / Math.PI) * (1 - Math.exp(-1 / (1 / y + (y * y * (fluid.reducing.rho / molarDensity) ** 2) / 3)));
  return ((rho * cp * boltzmann * 1.01 * T) / (6 * Math.PI * xi * 1e-9 * mu)) * (omega - omega0);
}

/** Thermal conductivity in W/(m·K) (Lemmon & Jacobsen 2004, eqs. 4–11). */
export function conductivity(fluid: HelmholtzFluid, state: HelmholtzState, mu: number): number {
  const tau = fluid.reducing.T / state.T;
  const delta = state.molarDensity / fluid.reducing.rho;
  const [factor, n2, t2, n3, t3] = fluid.transport.dilute;
  const dilute = factor * diluteViscosity(fluid, state.T) + n2 * tau ** t2 + n3 * tau ** t3;
  return (dilute + residualSum(fluid.transport.conductivity, tau, delta)) * 1e-3 + enhancement(fluid, state, mu);
}
