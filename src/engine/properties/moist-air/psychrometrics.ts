// ASHRAE Handbook, Fundamentals (2017), chapter 1: ideal mixture of dry air and water vapour.
import { findRoot } from '../../numerics/roots';

/** Triple point of water: below it the saturation is over ice. */
const triple = 273.16;
const massRatio = 0.621945;
/** Specific gas constant of dry air, J/(kg·K). */
const gasConstant = 287.042;
export const limits: [number, number] = [173.15, 473.15];

/** Saturation pressure of water vapour in Pa, over ice or over liquid (eqs. 5 and 6). */
export function saturationPressure(T: number): number {
  if (T <= triple)
    return Math.exp(
      -5.6745359e3 / T +
        6.3925247 +
        T * (-9.677843e-3 + T * (6.2215701e-7 + T * (2.0747825e-9 - 9.484024e-13 * T))) +
        4.1635019 * Math.log(T),
    );
  return Math.exp(
    -5.8002206e3 / T +
      1.3914993 +
      T * (-4.8640239e-2 + T * (4.1764768e-5 - 1.4452093e-8 * T)) +
      6.5459673 * Math.log(T),
  );
}

/** kg of vapour per kg of dry air at a vapour pressure (eq. 20). */
export const humidityRatio = (vapourPressure: number, p: number): number =>
  (massRatio * vapourPressure) / (p - vapourPressure);

/** The reverse: Pa. */
export const vapourPressure = (W: number, p: number): number => (p * W) / (massRatio + W);

/** Humidity ratio with a wet bulb (eqs. 33 and 35). */
export function humidityRatioAtWetBulb(T: number, wetBulb: number, p: number): number {
  const t = T - 273.15;
  const wet = wetBulb - 273.15;
  const saturated = humidityRatio(saturationPressure(wetBulb), p);
  return wet >= 0
    ? ((2501 - 2.326 * wet) * saturated - 1.006 * (t - wet)) / (2501 + 1.86 * t - 4.186 * wet)
    : ((2830 - 0.24 * wet) * saturated - 1.006 * (t - wet)) / (2830 + 1.86 * t - 2.1 * wet);
}

/** Temperature at which the vapour begins to condense; undefined for dry air or below the range. */
export function dewPoint(W: number, T: number, p: number): number | undefined {
  const pressure = vapourPressure(W, p);
  if (pressure < saturationPressure(limits[0])) return undefined;
  const found = findRoot((at) => Math.log(saturationPressure(at) / pressure), limits[0], T + 1e-6);
  return found.converged ? found.root : undefined;
}

/** Thermodynamic wet-bulb temperature; undefined below the range. */
export function wetBulb(W: number, T: number, p: number): number | undefined {
  // Where water boils below T the wet bulb lies below the boiling point.
  const top = saturationPressure(T) < p ? T : boilingPoint(p) - 1e-6;
  const found = findRoot((at) => humidityRatioAtWetBulb(T, at, p) - W, limits[0], top);
  return found.converged ? found.root : undefined;
}

function boilingPoint(p: number): number {
  return findRoot((T) => Math.log(saturationPressure(T) / p), limits[0], limits[1]).root;
}

/** Enthalpy in J per kg of dry air; zero are dry air and liquid water at 0 °C (eq. 30). */
export const enthalpy = (T: number, W: number): number => {
  const t = T - 273.15;
  return 1000 * (1.006 * t + W * (2501 + 1.86 * t));
};

/** Volume in m³ per kg of dry air (eq. 26). */
export const volume = (T: number, W: number, p: number): number => (gasConstant * T * (1 + 1.607858 * W)) / p;

/** Heat capacity in J/(kg·K) of the moist air, consistent with the enthalpy. */
export const heatCapacity = (W: number): number => (1006 + 1860 * W) / (1 + W);
