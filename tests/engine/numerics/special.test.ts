import { describe, expect, it } from 'vitest';
import { besselI, besselJ, besselK } from '../../../src/engine/numerics/bessel';
import { erf, erfc } from '../../../src/engine/numerics/error-function';

const relative = (got: number, wanted: number) => Math.abs(got / wanted - 1);

describe('error function', () => {
  // Abramowitz & Stegun, table 7.1 (ten figures; from memory), and mpmath 1.3.0 at 30 digits.
  it.each([
    [0.5, 0.5204998778130465],
    [1, 0.8427007929497149],
    [1.5, 0.9661051464753108],
    [2, 0.9953222650189527],
    [-1, -0.8427007929497149],
    [1e-10, 1.1283791670955126e-10],
  ])('erf(%s)', (x, wanted) => {
    expect(relative(erf(x), wanted)).toBeLessThan(4e-16 * 4);
  });

  // mpmath 1.3.0: the complement keeps its relative accuracy where one minus erf has none left.
  it.each([
    [1, 0.15729920705028513],
    [2, 0.004677734981047266],
    [2.5, 0.0004069520174449589],
    [3, 2.209049699858544e-5],
    [5, 1.537459794428035e-12],
    [10, 2.088487583762545e-45],
    [26, 5.663192408856143e-296],
  ])('erfc(%s)', (x, wanted) => {
    expect(relative(erfc(x), wanted)).toBeLessThan(2e-14);
  });

  it('and its complement add up to one', () => {
    for (let x = -6; x <= 6; x += 0.37) expect(erf(x) + erfc(x)).toBeCloseTo(1, 14);
  });
});

describe('Bessel functions', () => {
  // Abramowitz & Stegun, tables 9.1, 9.8 and 9.11 to their figures (from memory), digits beyond by mpmath 1.3.0.
  it.each<[name: string, f: (n: number, x: number) => number, n: number, x: number, wanted: number]>([
    ['J', besselJ, 0, 1, 0.7651976865579666],
    ['J', besselJ, 1, 1, 0.4400505857449335],
    ['J', besselJ, 0, 2.4, 0.002507683297243813],
    ['J', besselJ, 0, 10, -0.2459357644513483],
    ['J', besselJ, 5, 2, 0.007039629755871685],
    ['J', besselJ, 50, 1, 2.906004948173273e-80],
    ['J', besselJ, 100, 1, 8.43182878962672e-189],
    ['J', besselJ, 0, 1000, 0.024786686152420176],
    ['J', besselJ, 2, 1e5, 0.0017192380513872299],
    ['I', besselI, 0, 1, 1.2660658777520084],
    ['I', besselI, 1, 1, 0.5651591039924851],
    ['I', besselI, 0, 10, 2815.716628466254],
    ['I', besselI, 2, 0.1, 0.001251041992241759],
    ['K', besselK, 0, 1, 0.42102443824070834],
    ['K', besselK, 1, 1, 0.6019072301972346],
    ['K', besselK, 0, 0.1, 2.427069024702017],
    ['K', besselK, 1, 10, 1.8648773453825582e-5],
    ['K', besselK, 0, 1e-30, 69.1934843054797],
  ])('%s of order', (_, f, n, x, wanted) => {
    expect(relative(f(n, x), wanted), `${n}, ${x}`).toBeLessThan(1e-12);
  });

  // DLMF 10.5.2 and 10.28.2: the Wronskians, which tie the functions to each other at any argument.
  it('satisfy I_n K_{n+1} + I_{n+1} K_n = 1/x', () => {
    for (const n of [0, 1, 5, 20]) {
      for (const x of [0.01, 0.5, 2, 11.9, 12.1, 40, 300]) {
        const sum = besselI(n, x) * besselK(n + 1, x) + besselI(n + 1, x) * besselK(n, x);
        expect(relative(sum, 1 / x), `${n}, ${x}`).toBeLessThan(1e-12);
      }
    }
  });

  // DLMF 10.6.1.
  it('satisfy J_{n−1} + J_{n+1} = (2n/x) J_n, across the change of method', () => {
    for (const n of [1, 3, 6]) {
      for (const x of [0.5, 5, 49, 51, 60, 86, 400, 9999]) {
        const left = besselJ(n - 1, x) + besselJ(n + 1, x);
        expect(Math.abs(left - ((2 * n) / x) * besselJ(n, x)), `${n}, ${x}`).toBeLessThan(2e-15);
      }
    }
  });

  it('of negative arguments change sign with odd orders', () => {
    expect(besselJ(1, -2)).toBe(-besselJ(1, 2));
    expect(besselI(2, -2)).toBe(besselI(2, 2));
  });

  it('are quick, whatever the argument', () => {
    const begin = performance.now();
    for (const x of [1e-300, 1e9, 1e300]) for (const n of [0, 100]) [besselJ, besselI, besselK].map((f) => f(n, x));
    expect(performance.now() - begin).toBeLessThan(1000);
  });
});
