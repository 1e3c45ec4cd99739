import { findRoot } from '../../numerics/roots';
import { boundary23, region4 } from './coefficients';
import { criticalDensity, criticalTemperature, inRegion1, inRegion2, inRegion3, type WaterState } from './regions';

const n = (index: number): number => region4[index - 1] ?? 0;

/** Saturation pressure in Pa, 273.15 K to the critical point (R7-97 eq. 30). */
export function saturationPressure(T: number): number {
  const theta = T + n(9) / (T - n(10));
  const a = theta * theta + n(1) * theta + n(2);
  const b = n(3) * theta * theta + n(4) * theta + n(5);
  const c = n(6) * theta * theta + n(7) * theta + n(8);
  return ((2 * c) / (-b + Math.sqrt(b * b - 4 * a * c))) ** 4 * 1e6;
}

/** Saturation temperature in K, 611.213 Pa to the critical point (R7-97 eq. 31). */
export function saturationTemperature(p: number): number {
  const beta = (p / 1e6) ** 0.25;
  const e = beta * beta + n(3) * beta + n(6);
  const f = n(1) * beta * beta + n(4) * beta + n(7);
  const g = n(2) * beta * beta + n(5) * beta + n(8);
  const d = (2 * g) / (-f - Math.sqrt(f * f - 4 * e * g));
  return (n(10) + d - Math.sqrt((n(10) + d) ** 2 - 4 * (n(9) + n(10) * d))) / 2;
}

/** Pressure on the boundary between regions 2 and 3 in Pa, 623.15 K to 863.15 K (R7-97 eq. 5). */
export function boundaryPressure23(T: number): number {
  const [a = 0, b = 0, c = 0] = boundary23;
  return (a + b * T + c * T * T) * 1e6;
}

/** Density of saturated liquid, IAPWS SR1-86(1992); a start for region 3. */
function liquidDensity(T: number): number {
  const theta = 1 - T / criticalTemperature;
  const t = Math.cbrt(theta);
  const sum =
    1 +
    1.99274064 * t +
    1.09965342 * t ** 2 -
    0.510839303 * t ** 5 -
    1.75493479 * t ** 16 -
    45.5170352 * t ** 43 -
    6.7469445e5 * t ** 110;
  return criticalDensity * sum;
}

/** Density of saturated vapour, IAPWS SR1-86(1992). */
function vapourDensity(T: number): number {
  const theta = 1 - T / criticalTemperature;
  const t = theta ** (1 / 6);
  const sum =
    -2.0315024 * t ** 2 -
    2.6830294 * t ** 4 -
    5.38626492 * t ** 8 -
    17.2991605 * t ** 18 -
    44.7586581 * t ** 37 -
    63.9201063 * t ** 71;
  return criticalDensity * Math.exp(sum);
}

const densest = 900;
const thinnest = 50;

/** State of region 3 at given temperature and pressure; `liquid` decides below the critical temperature. */
export function solveRegion3(T: number, p: number, liquid: boolean): WaterState | undefined {
  const misfit = (rho: number) => inRegion3(T, rho).p - p;
  let [low, high] = [thinnest, densest];
  if (T < criticalTemperature) {
    if (liquid) low = loosen(liquidDensity(T), misfit, -1);
    else high = loosen(vapourDensity(T), misfit, 1);
  }
  const found = findRoot(misfit, low, high);
  return found.converged ? inRegion3(T, found.root) : undefined;
}

/**
 * The auxiliary densities agree with region 3 to some 1e-4 only: moves the end of the bracket a
 * little towards the other phase until the sign of the misfit is right.
 */
function loosen(rho: number, misfit: (rho: number) => number, direction: 1 | -1): number {
  let moved = rho;
  for (let step = 0; step < 40; step += 1) {
    if (Math.sign(misfit(moved)) === direction) return moved;
    moved += direction * 2e-4 * rho * (step + 1);
  }
  return moved;
}

export interface SaturatedStates {
  T: number;
  p: number;
  liquid: WaterState;
  vapour: WaterState;
}

/** Both phases at saturation; above 623.15 K by region 3. */
export function saturatedStates(T: number, p = saturationPressure(T)): SaturatedStates | undefined {
  if (T <= 623.15) return { T, p, liquid: inRegion1(T, p), vapour: inRegion2(T, p) };
  const liquid = solveRegion3(T, p, true);
  const vapour = solveRegion3(T, p, false);
  return liquid === undefined || vapour === undefined ? undefined : { T, p, liquid, vapour };
}

/** Surface tension in N/m, IAPWS R1-76(2014). */
export function surfaceTension(T: number): number {
  const tau = 1 - T / criticalTemperature;
  return 0.2358 * tau ** 1.256 * (1 - 0.625 * tau);
}
