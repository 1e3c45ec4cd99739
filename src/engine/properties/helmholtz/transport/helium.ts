import type { HelmholtzState } from '../equation';
import type { ConductivityEquation, ViscosityEquation } from '../types';

/** Viscosity of helium-4 in Pa·s: Arp, McCarty & Friend, NIST Technical Note 1334 (1998). */
export const heliumViscosity: ViscosityEquation = {
  value({ T, rho }) {
    // The note counts in g/cm³ and in 1e-7 Pa·s.
    const r = rho / 1000;
    const x = Math.log(Math.min(T, 300));
    const b = -47.5295259 / x + 87.6799309 - 42.0741589 * x + 8.33128289 * x ** 2 - 0.589252385 * x ** 3;
    const c = 547.309267 / x - 904.870586 + 431.404928 * x - 81.4504854 * x ** 2 + 5.37008433 * x ** 3;
    const d = -1684.39324 / x + 3331.0863 - 1632.19172 * x + 308.804413 * x ** 2 - 20.2936367 * x ** 3;
    const cold = -0.135311743 / x + 1.00347841 + 1.20654649 * x - 0.149564551 * x ** 2 + 0.012520841 * x ** 3;
    const whole = Math.exp(cold + r * (b + r * (c + r * d)));
    if (T <= 100) return whole * 1e-7;
    const dilute = 196 * T ** 0.71938 * Math.exp(12.451 / T - 295.67 / T ** 2 - 4.1249);
    return (dilute + whole - Math.exp(cold)) * 1e-7;
  },
  temperature: [2.1768, 1500],
};

/** Critical region of Hands & Arp: critical point and constants of the scaled equation of state. */
const scaled = {
  x0: 0.392,
  e1: 2.8461,
  e2: 0.27156,
  beta: 0.3554,
  gamma: 1.1743,
  delta: 4.304,
  rho: 69.158,
  T: 5.18992,
  p: 2.2746e5,
} as const;

/** Isothermal compressibility of the scaled equation, 1/Pa, blended into that of the equation of state. */
function compressibility(state: HelmholtzState, dT: number, dRho: number): number {
  const { x0, e1, e2, beta, gamma, delta, rho, p } = scaled;
  const plain = (state.compressibility * state.rho) / state.molarDensity / state.rho;
  const weight = (dT / 0.2) ** 2 + (dRho / 0.25) ** 2;
  if (weight > 1 || dRho === 0) return plain;
  const x = (dT / dRho) ** (1 / beta);
  const z = 1 + x / x0;
  const inner = 1 + e2 * z ** (2 / beta);
  const power = (gamma - 1) / (2 * beta);
  const h = e1 * z * inner ** power;
  const slope = (e1 / x0) * (inner ** power + z * power * inner ** (power - 1) * e2 * (2 / beta) * z ** (2 / beta - 1));
  const right = dRho ** (delta - 1) * (delta * h - (x / beta) * slope);
  return weight * plain + (1 - weight) / (right * (state.rho / rho) ** 2 * p);
}

function enhancement(state: HelmholtzState, mu: number): number {
  const { T, rho, pressureSlope } = state;
  if (T <= 3.5 || T >= 12 || rho === 0) return 0;
  const dT = Math.abs(1 - T / scaled.T);
  const dRho = Math.abs(1 - rho / scaled.rho);
  const decay = Math.exp(-18.66 * dT ** 2 - 4.25 * dRho ** 4);
  // The two leading factors are those of the authors' program; the printed equation differs.
  return (
    (3.4685233e-17 * 3.726229668 * Math.sqrt(compressibility(state, dT, dRho)) * T ** 2 * pressureSlope ** 2 * decay) /
    (rho * mu)
  );
}

/** Conductivity of helium-4 in W/(m·K): Hands & Arp, Cryogenics 21 (1981) 697. */
export const heliumConductivity: ConductivityEquation = {
  value(state, _fluid, mu) {
    const { T, rho } = state;
    const dilute =
      2.7870034e-3 *
      T ** 0.7034007057 *
      Math.exp(3.739232544 / T - 26.20316969 / T ** 2 + 59.82252246 / T ** 3 - 49.26397634 / T ** 4);
    const t = Math.cbrt(T);
    const linear = 1.86297053e-4 - 7.275964435e-7 * T - 1.427549651e-4 * t + 3.290833592e-5 * t * t;
    const cubic = -5.213335363e-8 + 4.492659933e-8 * t - 5.924416513e-9 * t * t;
    const logarithmic = 7.087321137e-6 - 6.013335678e-6 * t + 8.067145814e-7 * t * t + 3.995125013e-7 / T;
    const excess = linear * rho + cubic * rho ** 3 + (rho === 0 ? 0 : logarithmic * rho * rho * Math.log(rho / 68));
    return dilute + excess + enhancement(state, mu);
  },
  temperature: [2.1768, 1500],
};
