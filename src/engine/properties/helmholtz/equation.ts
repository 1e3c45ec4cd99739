import type { HelmholtzFluid } from './types';

/** α and its derivatives at one point; r residual, 0 ideal, d by δ, t by τ. */
interface Derivatives {
  a0: number;
  a0t: number;
  a0tt: number;
  ar: number;
  ard: number;
  ardd: number;
  art: number;
  artt: number;
  ardt: number;
}

function idealPart({ ideal }: HelmholtzFluid, delta: number, tau: number): Pick<Derivatives, 'a0' | 'a0t' | 'a0tt'> {
  let a0 = Math.log(delta) + ideal.a1 + ideal.a2 * tau + ideal.logTau * Math.log(tau);
  let a0t = ideal.a2 + ideal.logTau / tau;
  let a0tt = -ideal.logTau / (tau * tau);
  for (const [n, t] of ideal.powers) {
    const power = n * tau ** t;
    a0 += power;
    a0t += (t * power) / tau;
    a0tt += (t * (t - 1) * power) / (tau * tau);
  }
  for (const [n, t] of ideal.einstein) {
    const e = Math.exp(-t * tau);
    a0 += n * Math.log(1 - e);
    a0t += (n * t * e) / (1 - e);
    a0tt -= (n * t * t * e) / (1 - e) ** 2;
  }
  for (const [n, t, c, d] of ideal.general) {
    // Divided through by the exponential, which would overflow for large t·τ.
    const e = c * Math.exp(-t * tau);
    a0 += n * (t * tau + Math.log(d + e));
    a0t += (n * t * d) / (d + e);
    a0tt += (n * t * t * d * e) / (d + e) ** 2;
  }
  return { a0, a0t, a0tt };
}

function residualPart(
  { residual }: HelmholtzFluid,
  delta: number,
  tau: number,
): Omit<Derivatives, 'a0' | 'a0t' | 'a0tt'> {
  const logDelta = Math.log(delta);
  const logTau = Math.log(tau);
  let [ar, ard, ardd, art, artt, ardt] = [0, 0, 0, 0, 0, 0];
  for (const [n, d, t, l] of residual) {
    const dl = l === 0 ? 0 : delta ** l;
    const term = n * Math.exp(d * logDelta + t * logTau - dl);
    const slope = d - l * dl;
    ar += term;
    ard += term * slope;
    ardd += term * (slope * (slope - 1) - l * l * dl);
    art += term * t;
    artt += term * t * (t - 1);
    ardt += term * slope * t;
  }
  return {
    ar,
    ard: ard / delta,
    ardd: ardd / (delta * delta),
    art: art / tau,
    artt: artt / (tau * tau),
    ardt: ardt / (delta * tau),
  };
}

/** Thermodynamic state from temperature (K) and molar density (mol/m³); SI units per kg. */
export interface HelmholtzState {
  T: number;
  p: number;
  rho: number;
  molarDensity: number;
  h: number;
  u: number;
  s: number;
  cp: number;
  cv: number;
  w: number;
  beta: number;
  /** ∂ρ/∂p at constant temperature, mol/(m³·Pa). */
  compressibility: number;
}

export function helmholtzState(fluid: HelmholtzFluid, T: number, molarDensity: number): HelmholtzState {
  const delta = molarDensity / fluid.reducing.rho;
  const tau = fluid.reducing.T / T;
  const { a0, a0t, a0tt } = idealPart(fluid, delta, tau);
  const { ar, ard, ardd, art, artt, ardt } = residualPart(fluid, delta, tau);
  const R = fluid.gasConstant / fluid.molarMass;
  const stiffness = 1 + 2 * delta * ard + delta * delta * ardd;
  const slope = 1 + delta * ard - delta * tau * ardt;
  const cv = -R * tau * tau * (a0tt + artt);
  const cp = cv + (R * slope * slope) / stiffness;
  return {
    T,
    p: molarDensity * fluid.gasConstant * T * (1 + delta * ard),
    rho: molarDensity * fluid.molarMass,
    molarDensity,
    h: R * T * (1 + tau * (a0t + art) + delta * ard),
    u: R * T * tau * (a0t + art),
    s: R * (tau * (a0t + art) - a0 - ar),
    cp,
    cv,
    w: Math.sqrt(R * T * stiffness * (cp / cv)),
    beta: slope / (stiffness * T),
    compressibility: 1 / (fluid.gasConstant * T * stiffness),
  };
}

/** Pressure and ∂p/∂ρ only, for the search of the density. */
function pressure(fluid: HelmholtzFluid, T: number, molarDensity: number): { p: number; slope: number } {
  const delta = molarDensity / fluid.reducing.rho;
  const { ard, ardd } = residualPart(fluid, delta, fluid.reducing.T / T);
  const RT = fluid.gasConstant * T;
  return { p: molarDensity * RT * (1 + delta * ard), slope: RT * (1 + 2 * delta * ard + delta * delta * ardd) };
}

/** Density of the gas (or supercritical fluid) by Newton's method from the ideal gas; undefined when it does not converge. */
export function gasDensity(fluid: HelmholtzFluid, T: number, p: number): number | undefined {
  const most = 4 * fluid.reducing.rho;
  let rho = Math.min(p / (fluid.gasConstant * T), 2.5 * fluid.reducing.rho);
  for (let iteration = 0; iteration < 100; iteration += 1) {
    const { p: got, slope } = pressure(fluid, T, rho);
    if (!(slope > 0)) {
      rho *= 0.8;
      continue;
    }
    const step = (p - got) / slope;
    rho = Math.min(most, Math.max(rho + step, rho * 0.3));
    if (Math.abs(step) <= 1e-13 * rho) return rho;
  }
  return undefined;
}

/** Dew pressure in Pa below the critical temperature. */
export function dewPressure(fluid: HelmholtzFluid, T: number): number {
  const theta = 1 - T / fluid.reducing.T;
  const sum = fluid.dew.reduce((total, [n, t]) => total + n * theta ** t, 0);
  return fluid.reducing.p * Math.exp((fluid.reducing.T / T) * sum);
}
