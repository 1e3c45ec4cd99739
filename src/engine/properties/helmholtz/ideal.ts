import type { IdealPart } from './types';

/** Ideal-gas part of α without ln δ, kept until τ changes: a, τ·∂a/∂τ and τ²·∂²a/∂τ². */
export class Ideal {
  a = 0;
  at = 0;
  att = 0;
  private tau = NaN;

  constructor(private readonly part: IdealPart) {}

  evaluate(tau: number): void {
    if (tau === this.tau) return;
    this.tau = tau;
    const { a1, a2, logTau, powers = [], einstein = [], general = [] } = this.part;
    let a = a1 + a2 * tau + logTau * Math.log(tau);
    let at = a2 * tau + logTau;
    let att = -logTau;
    for (const [n, t] of powers) {
      const power = n * tau ** t;
      a += power;
      at += t * power;
      att += t * (t - 1) * power;
    }
    for (const [n, t] of einstein) {
      const z = t * tau;
      const e = Math.exp(-z);
      a += n * Math.log(1 - e);
      at += (n * z * e) / (1 - e);
      att -= (n * z * z * e) / (1 - e) ** 2;
    }
    for (const [n, t, c, d] of general) {
      // Divided through by the exponential, which would overflow for large t·τ.
      const z = t * tau;
      const e = c * Math.exp(-z);
      a += n * (z + Math.log(d + e));
      at += (n * z * d) / (d + e);
      att += (n * z * z * d * e) / (d + e) ** 2;
    }
    this.a = a;
    this.at = at;
    this.att = att;
  }
}
