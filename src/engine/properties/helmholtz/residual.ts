import { NonAnalytic } from './non-analytic';
import type { ResidualPart } from './types';

/**
 * The residual part of α and its derivatives, each multiplied by as many δ and τ as it is derived
 * by (`add` is δ²·∂²α/∂δ²). Values are left in the fields, so that searches allocate nothing; what
 * depends on τ alone is kept until τ changes.
 */
export class Residual {
  a = 0;
  ad = 0;
  add = 0;
  at = 0;
  att = 0;
  adt = 0;

  private tau = NaN;
  private readonly powerTerms: number;
  private readonly n: Float64Array;
  private readonly d: Int32Array;
  private readonly t: Float64Array;
  private readonly l: Int32Array;
  /** η and ε of the terms behind the power terms. */
  private readonly eta: Float64Array;
  private readonly epsilon: Float64Array;
  private readonly beta: Float64Array;
  private readonly gamma: Float64Array;
  private readonly b: Float64Array;
  /** n times the factor in τ; its logarithmic derivative; τ²/factor times its second derivative. */
  private readonly factor: Float64Array;
  private readonly slope: Float64Array;
  private readonly bend: Float64Array;
  private readonly powers: Float64Array;
  private readonly decays: Float64Array;
  private readonly nonAnalytic: NonAnalytic | undefined;

  constructor({ power, gaussian = [], associating = [], nonAnalytic = [] }: ResidualPart) {
    const bells = [...gaussian.map((term) => [...term, Infinity] as const), ...associating];
    this.powerTerms = power.length;
    this.n = Float64Array.from([...power, ...bells].map(([n]) => n));
    this.d = Int32Array.from([...power, ...bells].map(([, d]) => d));
    this.t = Float64Array.from([...power, ...bells].map(([, , t]) => t));
    this.l = Int32Array.from(power.map(([, , , l]) => l));
    this.eta = Float64Array.from(bells.map((term) => term[3]));
    this.epsilon = Float64Array.from(bells.map((term) => term[4]));
    this.beta = Float64Array.from(bells.map((term) => term[5]));
    this.gamma = Float64Array.from(bells.map((term) => term[6]));
    this.b = Float64Array.from(bells.map((term) => term[7]));
    this.factor = new Float64Array(this.n.length);
    this.slope = new Float64Array(this.n.length);
    this.bend = new Float64Array(this.n.length);
    this.powers = new Float64Array(Math.max(...this.d, ...this.l) + 1);
    this.decays = new Float64Array(Math.max(0, ...this.l) + 1).fill(1);
    this.nonAnalytic = nonAnalytic.length === 0 ? undefined : new NonAnalytic(nonAnalytic);
  }

  /** All derivatives to the second order. */
  evaluate(delta: number, tau: number): void {
    this.evaluateTerms(delta, tau);
    const extra = this.nonAnalytic;
    if (extra?.evaluate(delta, tau) === true) {
      this.a += extra.a;
      this.ad += delta * extra.ad;
      this.add += delta * delta * extra.add;
      this.at += tau * extra.at;
      this.att += tau * tau * extra.att;
      this.adt += delta * tau * extra.adt;
    }
  }

  private evaluateTerms(delta: number, tau: number): void {
    this.prepare(delta, tau);
    const { powerTerms, n, d, l, eta, epsilon, factor, slope, bend, powers, decays } = this;
    let a = 0;
    let ad = 0;
    let add = 0;
    let at = 0;
    let att = 0;
    let adt = 0;
    for (let i = 0; i < n.length; i += 1) {
      const power = d[i] ?? 0;
      let term = (factor[i] ?? 0) * (powers[power] ?? 0);
      let s = power;
      let bendDelta: number;
      if (i < powerTerms) {
        const exponent = l[i] ?? 0;
        const decay = exponent === 0 ? 0 : exponent * (powers[exponent] ?? 0);
        term *= decays[exponent] ?? 1;
        s -= decay;
        bendDelta = s * (s - 1) - exponent * decay;
      } else {
        const bell = i - powerTerms;
        const width = eta[bell] ?? 0;
        const centre = epsilon[bell] ?? 0;
        const distance = delta - centre;
        term *= Math.exp(-width * distance * distance);
        s -= 2 * width * delta * distance;
        bendDelta = s * (s - 1) - 2 * width * delta * (2 * delta - centre);
      }
      const q = slope[i] ?? 0;
      a += term;
      ad += term * s;
      add += term * bendDelta;
      at += term * q;
      att += term * (bend[i] ?? 0);
      adt += term * s * q;
    }
    this.a = a;
    this.ad = ad;
    this.add = add;
    this.at = at;
    this.att = att;
    this.adt = adt;
  }

  private prepare(delta: number, tau: number): void {
    const { powers, decays } = this;
    powers[0] = 1;
    for (let power = 1; power < powers.length; power += 1) powers[power] = (powers[power - 1] ?? 0) * delta;
    for (let l = 1; l < decays.length; l += 1) decays[l] = Math.exp(-(powers[l] ?? 0));
    if (tau !== this.tau) this.prepareTau(tau);
  }

  private prepareTau(tau: number): void {
    this.tau = tau;
    const { powerTerms, n, t, beta, gamma, b, factor, slope, bend } = this;
    const logTau = Math.log(tau);
    for (let i = 0; i < n.length; i += 1) {
      const exponent = t[i] ?? 0;
      let logFactor = exponent * logTau;
      // q = τ·d ln f/dτ and r = τ·dq/dτ of the factor f(τ).
      let q = exponent;
      let r = 0;
      if (i >= powerTerms) {
        const bell = i - powerTerms;
        const width = beta[bell] ?? 0;
        const distance = tau - (gamma[bell] ?? 0);
        const shift = b[bell] ?? Infinity;
        if (shift === Infinity) {
          logFactor -= width * distance * distance;
          q -= 2 * width * tau * distance;
          r = -2 * width * tau * (2 * tau - (gamma[bell] ?? 0));
        } else {
          const u = shift + width * distance * distance;
          const rise = (2 * width * distance) / (u * u);
          logFactor += 1 / u;
          q -= tau * rise;
          r = -tau * rise - tau * tau * ((2 * width) / (u * u) - 2 * u * rise * rise);
        }
      }
      factor[i] = (n[i] ?? 0) * Math.exp(logFactor);
      slope[i] = q;
      bend[i] = q * (q - 1) + r;
    }
  }
}
