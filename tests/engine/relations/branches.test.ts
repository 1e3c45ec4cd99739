import { describe, expect, it } from 'vitest';
import { branchesOf } from '../../../src/engine/calculation/relation-evaluation';
import { relation, result } from '../../helpers/relations';

function branches(id: string, values: Readonly<Record<string, number>>) {
  return branchesOf(relation(id), new Map(Object.entries(values)));
}

describe('active branch', () => {
  it('follows the sides that apply, each joint once', () => {
    const at = branches('zukauskas-1972-cylinder', { Re: 500, Pr: 0.7, Pr_w: 0.7 });
    expect(at.map(({ message }) => message)).toEqual(['Re <= 40 does not hold', 'Re < 1000 holds', 'Pr <= 10 holds']);
  });

  it('warns near a joint, from either side', () => {
    const messages = (Re: number) =>
      branches('martin-1996-plate-nu', { Re, Pr: 5, beta: 1 }).map(({ near, message }) => [near, message]);
    expect(messages(1950)).toEqual([[true, 'Re < 2000 holds; near the joint at 2\u00a0000']]);
    expect(messages(2050)).toEqual([[true, 'Re < 2000 does not hold; near the joint at 2\u00a0000']]);
    expect(messages(1000)).toEqual([[false, 'Re < 2000 holds']]);
  });

  it('names the side for heating and cooling', () => {
    expect(branches('petukhov-viscosity-factor', { mu: 1e-3, mu_w: 5e-4 })[0]?.message).toBe('mu_w < mu holds');
  });

  it('is silent about guards of the arithmetic', () => {
    expect(branches('eff-counterflow', { NTU: 1, Cr: 1 })).toEqual([]);
    const temperatures = { T_hi: 400, T_ho: 380, T_ci: 300, T_co: 320 };
    expect(branches('lmtd-counterflow', { ...temperatures, d1: 80, d2: 80 })).toEqual([]);
  });

  it('has none where a formula is not piecewise', () => {
    expect(branches('gnielinski-1976-tube', { Re: 1e4, Pr: 5 })).toEqual([]);
  });
});

/** Share by which a result jumps at a joint. */
function jump(id: string, inputs: Readonly<Record<string, number>>, symbol: string, joint: number): number {
  const at = (part: number) => result(id, { ...inputs, [symbol]: joint * part });
  return Math.abs(at(1 + 1e-9) / at(1 - 1e-9) - 1);
}

describe('joints', () => {
  const coil = { D_i: 0.01, D_c: 0.5 };
  // Continuous ones join by their own derivation; the jumps of the others are known and small.
  it.each([
    ['white-1929-coil-laminar-friction', coil, 'Re', 11.6 / Math.sqrt(0.02), 1e-6],
    ['clift-1978-sphere', { Pr: 1 }, 'Re', 1, 1e-6],
    ['dropwise-steam', {}, 'Tc', 100, 1e-4],
    ['morgan-1975-cylinder', {}, 'Ra', 1e4, 1e-3],
    ['schmidt-1967-coil-turbulent-nu', { D_i: 0.01, D_c: 0.2, Pr: 0.7 }, 'Re', 2.2e4, 0.006],
    ['shah-london-local-const-temp', { Re: 100, Pr: 1, D: 0.01 }, 'x', 0.001, 0.01],
    ['shah-london-local-const-flux', { Re: 100, Pr: 1, D: 0.01 }, 'x', 0.0015, 0.015],
    ['martin-1996-plate-nu', { Pr: 5, beta: 1 }, 'Re', 2000, 0.025],
    ['zukauskas-1972-cylinder', { Pr: 0.7, Pr_w: 0.7 }, 'Re', 1000, 0.02],
  ])('%s', (id, inputs, symbol, joint, most) => {
    expect(jump(id, inputs, symbol, joint)).toBeLessThan(most);
  });
});
