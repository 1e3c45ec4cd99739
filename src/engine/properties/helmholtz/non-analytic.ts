import type { NonAnalyticTerm } from './types';

/** Beyond this the exponential of a term is below 1e-15 of the rest. */
const negligible = 35;

/**
 * Non-analytic terms n·Δ^b·δ·ψ of Span & Wagner, J. Phys. Chem. Ref. Data 25 (1996) 1509, with plain
 * derivatives by δ and τ, left in the fields.
 */
export class NonAnalytic {
  a = 0;
  ad = 0;
  add = 0;
  at = 0;
  att = 0;
  adt = 0;

  constructor(private readonly terms: readonly NonAnalyticTerm[]) {}

  /** False where all terms vanish. */
  evaluate(givenDelta: number, tau: number): boolean {
    this.a = this.ad = this.add = this.at = this.att = this.adt = 0;
    // At δ = 1 exactly the second derivative is a limit; a step of 1e-10 reaches it.
    const delta = Math.abs(givenDelta - 1) < 1e-10 ? 1 + 1e-10 : givenDelta;
    let any = false;
    for (const term of this.terms) any = this.add1(term, delta, tau) || any;
    return any;
  }

  private add1([n, a, b, beta, A, B, C, D]: NonAnalyticTerm, delta: number, tau: number): boolean {
    const x = delta - 1;
    const y = tau - 1;
    const xx = x * x;
    if (C * xx + D * y * y > negligible) return false;
    const psi = Math.exp(-C * xx - D * y * y);
    const psiD = -2 * C * x * psi;
    const psiDD = (2 * C * xx - 1) * 2 * C * psi;
    const psiT = -2 * D * y * psi;
    const psiTT = (2 * D * y * y - 1) * 2 * D * psi;
    const psiDT = 4 * C * D * x * y * psi;

    const e = 1 / (2 * beta);
    const root = xx ** e;
    const theta = -y + A * root;
    const distance = theta * theta + B * xx ** a;
    const rootSlope = root / xx;
    const powerSlope = xx ** (a - 1);
    const inner = (2 / beta) * A * theta * rootSlope + 2 * B * a * powerSlope;
    const distanceD = x * inner;
    const distanceDD =
      inner +
      xx *
        ((4 * B * a * (a - 1) * powerSlope) / xx +
          2 * A * A * (1 / beta) * (1 / beta) * rootSlope * rootSlope +
          ((4 / beta) * A * theta * (e - 1) * rootSlope) / xx);
    const w = distance ** b;
    const w1 = w / distance;
    const w2 = w1 / distance;
    const wD = b * w1 * distanceD;
    const wDD = b * (w1 * distanceDD + (b - 1) * w2 * distanceD * distanceD);
    const wT = -2 * theta * b * w1;
    const wTT = 2 * b * w1 + 4 * theta * theta * b * (b - 1) * w2;
    const wDT = -A * b * (2 / beta) * w1 * x * rootSlope - 2 * theta * b * (b - 1) * w2 * distanceD;

    this.a += n * w * delta * psi;
    this.ad += n * (w * (psi + delta * psiD) + wD * delta * psi);
    this.add += n * (w * (2 * psiD + delta * psiDD) + 2 * wD * (psi + delta * psiD) + wDD * delta * psi);
    this.at += n * delta * (wT * psi + w * psiT);
    this.att += n * delta * (wTT * psi + 2 * wT * psiT + w * psiTT);
    this.adt += n * (w * (psiT + delta * psiDT) + delta * wD * psiT + wT * (psi + delta * psiD) + wDT * delta * psi);
    return true;
  }
}
