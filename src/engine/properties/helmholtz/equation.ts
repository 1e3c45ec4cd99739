import { Ideal } from './ideal';
import { Residual } from './residual';
import type { HelmholtzFluid } from './types';

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
  /** ∂p/∂T at constant density, Pa/K. */
  pressureSlope: number;
  /** Heat capacity of the ideal gas at constant volume, J/(kg·K). */
  idealCv: number;
}

/** The equation of state of one fluid, ready to be evaluated. */
export class Equation {
  /** ∂p/∂ρ of the last `pressure`, Pa·m³/mol. */
  slope = 0;
  private readonly residual: Residual;
  private readonly ideal: Ideal;
  /** For a second temperature that stays the same, so that its factors in τ are kept. */
  private readonly reference: Residual;

  constructor(readonly fluid: HelmholtzFluid) {
    this.residual = new Residual(fluid.residual);
    this.ideal = new Ideal(fluid.ideal);
    this.reference = new Residual(fluid.residual);
  }

  /** Pressure in Pa; leaves ∂p/∂ρ in `slope`. */
  pressure(T: number, molarDensity: number): number {
    const { reducing, gasConstant } = this.fluid;
    const { residual } = this;
    residual.evaluate(molarDensity / reducing.rho, reducing.T / T);
    const RT = gasConstant * T;
    this.slope = RT * (1 + 2 * residual.ad + residual.add);
    return molarDensity * RT * (1 + residual.ad);
  }

  /** Residual derivatives at a point, for the saturation condition; read them before the next evaluation. */
  residualAt(T: number, molarDensity: number): Residual {
    const { reducing } = this.fluid;
    this.residual.evaluate(molarDensity / reducing.rho, reducing.T / T);
    return this.residual;
  }

  /** ∂ρ/∂p at a reference temperature, mol/(m³·Pa). */
  referenceCompressibility(T: number, molarDensity: number): number {
    const { reducing, gasConstant } = this.fluid;
    const { reference } = this;
    reference.evaluate(molarDensity / reducing.rho, reducing.T / T);
    return 1 / (gasConstant * T * (1 + 2 * reference.ad + reference.add));
  }

  state(T: number, molarDensity: number): HelmholtzState {
    const { reducing, gasConstant, molarMass } = this.fluid;
    const delta = molarDensity / reducing.rho;
    const tau = reducing.T / T;
    this.ideal.evaluate(tau);
    this.residual.evaluate(delta, tau);
    const { a, ad, add, at, att, adt } = this.residual;
    const R = gasConstant / molarMass;
    const stiffness = 1 + 2 * ad + add;
    const slope = 1 + ad - adt;
    const cv = -R * (this.ideal.att + att);
    const cp = cv + (R * slope * slope) / stiffness;
    return {
      T,
      p: molarDensity * gasConstant * T * (1 + ad),
      rho: molarDensity * molarMass,
      molarDensity,
      h: R * T * (1 + this.ideal.at + at + ad),
      u: R * T * (this.ideal.at + at),
      s: R * (this.ideal.at + at - this.ideal.a - Math.log(delta) - a),
      cp,
      cv,
      w: Math.sqrt(R * T * stiffness * (cp / cv)),
      beta: slope / (stiffness * T),
      compressibility: 1 / (gasConstant * T * stiffness),
      pressureSlope: molarDensity * gasConstant * slope,
      idealCv: -R * this.ideal.att,
    };
  }
}

const equations = new WeakMap<HelmholtzFluid, Equation>();

export function equationOf(fluid: HelmholtzFluid): Equation {
  let equation = equations.get(fluid);
  if (equation === undefined) {
    equation = new Equation(fluid);
    equations.set(fluid, equation);
  }
  return equation;
}
