import { criticalDensity, criticalPressure, criticalTemperature, type WaterState } from './regions';

/** R12-08 table 2: terms i, j, H of the exponent. */
const viscosityTerms: readonly (readonly [number, number, number])[] = [
  [0, 0, 0.520094],
  [1, 0, 0.0850895],
  [2, 0, -1.08374],
  [3, 0, -0.289555],
  [0, 1, 0.222531],
  [1, 1, 0.999115],
  [2, 1, 1.88797],
  [3, 1, 1.26613],
  [5, 1, 0.120573],
  [0, 2, -0.281378],
  [1, 2, -0.906851],
  [2, 2, -0.772479],
  [3, 2, -0.489837],
  [4, 2, -0.25704],
  [0, 3, 0.161913],
  [1, 3, 0.257399],
  [0, 4, -0.0325372],
  [3, 4, 0.0698452],
  [4, 5, 0.00872102],
  [3, 6, -0.00435673],
  [5, 6, -0.000593264],
];

const viscosityI = Int32Array.from(viscosityTerms, ([i]) => i);
const viscosityJ = Int32Array.from(viscosityTerms, ([, j]) => j);
const viscosityH = Float64Array.from(viscosityTerms, ([, , h]) => h);
const xPowers = new Float64Array(6);
const yPowers = new Float64Array(7);

function powers(table: Float64Array, base: number): void {
  table[0] = 1;
  for (let power = 1; power < table.length; power += 1) table[power] = (table[power - 1] ?? 0) * base;
}

const viscosityDilute = [1.67752, 2.20462, 0.6366564, -0.241605];

function polynomial(coefficients: readonly number[], x: number): number {
  let sum = 0;
  for (let index = coefficients.length - 1; index >= 0; index -= 1) sum = sum * x + (coefficients[index] ?? 0);
  return sum;
}

/**
 * Dynamic viscosity in Pa·s, IAPWS R12-08 without the critical enhancement (its recommendation for
 * industrial use).
 */
export function viscosity(T: number, rho: number): number {
  const t = T / criticalTemperature;
  const delta = rho / criticalDensity;
  const dilute = (100 * Math.sqrt(t)) / polynomial(viscosityDilute, 1 / t);
  const x = 1 / t - 1;
  const y = delta - 1;
  powers(xPowers, x);
  powers(yPowers, y);
  let sum = 0;
  for (let at = 0; at < viscosityH.length; at += 1)
    sum += (viscosityH[at] ?? 0) * (xPowers[viscosityI[at] ?? 0] ?? 0) * (yPowers[viscosityJ[at] ?? 0] ?? 0);
  return dilute * Math.exp(delta * sum) * 1e-6;
}

/** R15-11 table 1 and 2. */
const diluteConductivity = [2.443221e-3, 1.323095e-2, 6.770357e-3, -3.454586e-3, 4.096266e-4];
const conductivityTerms: readonly (readonly number[])[] = [
  [1.60397357, -0.646013523, 0.111443906, 0.102997357, -0.0504123634, 0.00609859258],
  [2.33771842, -2.78843778, 1.53616167, -0.463045512, 0.0832827019, -0.00719201245],
  [2.19650529, -4.54580785, 3.55777244, -1.40944978, 0.275418278, -0.0205938816],
  [-1.21051378, 1.60812989, -0.621178141, 0.0716373224, 0, 0],
  [-2.720337, 4.57586331, -3.18369245, 1.1168348, -0.19268305, 0.012913842],
];
/** R15-11 table 6: polynomial of ζ at the reference temperature, by range of density. */
const zetaRanges: readonly (readonly [number, readonly number[]])[] = [
  [
    0.310559006,
    [6.53786807199516, -5.61149954923348, 3.39624167361325, -2.27492629730878, 10.2631854662709, 1.97815050331519],
  ],
  [
    0.776397516,
    [6.52717759281799, -6.30816983387575, 8.08379285492595, -9.82240510197603, 12.1358413791395, -5.54349664571295],
  ],
  [
    1.242236025,
    [5.35500529896124, -3.96415689925446, 8.91990208918795, -12.033872950579, 9.19494865194302, -2.16866274479712],
  ],
  [
    1.863354037,
    [1.55225959906681, 0.464621290821181, 8.93237374861479, -11.0321960061126, 6.1678099993336, -0.965458722086812],
  ],
  [
    Infinity,
    [1.11999926419994, 0.595748562571649, 9.8895256507892, -10.325505114704, 4.66861294457414, -0.503243546373828],
  ],
];

/** R15-11 makes the heat capacity dimensionless with this gas constant, not with that of R7-97; J/(kg·K). */
const transportGasConstant = 461.51805;

function criticalEnhancement(state: WaterState, mu: number): number {
  const t = state.T / criticalTemperature;
  const delta = state.rho / criticalDensity;
  const zeta = (state.compressibility * criticalPressure) / criticalDensity;
  const reference =
    1 / polynomial((zetaRanges.find(([limit]) => delta <= limit) ?? zetaRanges[4] ?? [0, [1]])[1], delta);
  const excess = delta * (zeta - (reference * 1.5) / t);
  if (!(excess > 0)) return 0;
  const y = (0.13 * (excess / 0.06) ** (0.63 / 1.239)) / 0.4;
  if (y < 1.2e-7) return 0;
  const kappa = state.cp / state.cv;
  const z =
    (2 / (Math.PI * y)) *
    ((1 - 1 / kappa) * Math.atan(y) + y / kappa - (1 - Math.exp(-1 / (1 / y + (y * y) / (3 * delta * delta)))));
  return (177.8514 * delta * (state.cp / transportGasConstant) * t * z) / (mu * 1e6);
}

/** Thermal conductivity in W/(m·K) without critical enhancement: the first two factors of R15-11. */
export function backgroundConductivity(T: number, rho: number): number {
  const t = T / criticalTemperature;
  const delta = rho / criticalDensity;
  const dilute = Math.sqrt(t) / polynomial(diluteConductivity, 1 / t);
  const x = 1 / t - 1;
  let sum = 0;
  for (let i = conductivityTerms.length - 1; i >= 0; i -= 1)
    sum = sum * x + polynomial(conductivityTerms[i] ?? [], delta - 1);
  return dilute * Math.exp(delta * sum) * 1e-3;
}

/** Thermal conductivity in W/(m·K), IAPWS R15-11 with the critical enhancement for industrial use (eq. 25). */
export function conductivity(state: WaterState, mu: number): number {
  return backgroundConductivity(state.T, state.rho) + criticalEnhancement(state, mu) * 1e-3;
}
