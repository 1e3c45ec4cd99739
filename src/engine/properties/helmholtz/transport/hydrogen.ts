import type { ViscosityEquation } from '../types';
import { diluteViscosity, initialDensity, type DiluteGas } from '../viscosity';

const gas: DiluteGas = {
  factor: 0.021357,
  molarMass: 2.01588,
  energy: 30.41,
  size: 0.297,
  collision: [
    [0.20963, 0],
    [-0.455274, 1],
    [0.143602, 2],
    [-0.0335325, 3],
    [0.00276981, 4],
  ],
};
const initial = [
  [-0.187, 0],
  [2.4871, -1],
  [3.7151, -2],
  [-11.0972, -3],
  [9.0965, -4],
  [-3.8292, -5],
  [0.5166, -6],
] as const;

/** Viscosity of normal hydrogen: Muzny, Huber & Kazakov, J. Chem. Eng. Data 58 (2013) 969, eqs. 3–9. */
export const hydrogenViscosity: ViscosityEquation = {
  value({ T, rho, molarDensity }) {
    const dilute = diluteViscosity(gas, T);
    const linear = dilute * initialDensity(gas, initial, T) * molarDensity;
    const t = T / 33.145;
    const r = rho * 0.011;
    const rr = r * r;
    const dense =
      6.43449673 *
      rr *
      Math.exp(0.0456334068 * t + 0.232797868 / t + (0.95832612 * rr) / (0.127941189 + t) + 0.363576595 * rr ** 3);
    return (dilute + linear + dense) * 1e-6;
  },
  temperature: [13.957, 1000],
};
