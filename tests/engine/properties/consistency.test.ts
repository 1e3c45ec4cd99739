import { describe, expect, it } from 'vitest';
import { findSubstance, listSubstances } from '../../../src/engine/properties/index';
import type { PropertyId, State, StateInputs } from '../../../src/engine/properties/types';

/** A state that a test asks for; one that is refused is a mistake of the test. */
function state(substance: string, inputs: StateInputs): State {
  const outcome = findSubstance(substance)!.state(inputs);
  if (!outcome.ok) throw new Error(`${substance} ${JSON.stringify(inputs)}: ${outcome.error.message}`);
  return outcome.value;
}
const at = (substance: string, T: number, p: number, property: PropertyId, phase?: StateInputs['phase']): number =>
  state(substance, { T, p, ...(phase === undefined ? {} : { phase }) }).values[property]!;

/** Derivative by differences of the fourth order, since close to the critical point those of the second are too coarse. */
function slope(f: (x: number) => number, x: number): number {
  const d = 1e-4 * x;
  return (8 * (f(x + d) - f(x - d)) - (f(x + 2 * d) - f(x - 2 * d))) / (12 * d);
}

/** Points of one phase: liquids, gases, dense and supercritical states, all regions of water. */
const points: readonly (readonly [substance: string, T: number, p: number])[] = [
  ['water', 300, 1e5],
  ['water', 350, 50e6],
  ['water', 500, 1e5],
  ['water', 700, 10e6],
  ['water', 650, 30e6],
  ['water', 640, 22e6],
  ['water', 1500, 1e6],
  ['air', 300, 1e5],
  ['air', 1200, 20e6],
  ['air', 140, 6e6],
  ['N2', 100, 5e6],
  ['N2', 300, 50e6],
  ['O2', 250, 1e6],
  ['Ar', 400, 10e6],
  ['CO2', 250, 5e6],
  ['CO2', 320, 10e6],
  ['CO2', 600, 1e6],
  ['He', 10, 1e5],
  ['He', 300, 5e6],
  ['H2', 20, 1e6],
  ['H2', 300, 10e6],
  ['CH4', 120, 5e6],
  ['CH4', 300, 3e6],
  ['NH3', 260, 1e6],
  ['NH3', 450, 15e6],
  ['R134a', 280, 1e6],
  ['R134a', 350, 5e5],
  ['propane', 300, 5e6],
  ['n-butane', 400, 5e5],
  ['isobutane', 300, 1e6],
  ['R32', 300, 5e6],
  ['R1234yf', 300, 2e6],
  ['R245fa', 400, 2e5],
];

describe('thermodynamic consistency', () => {
  it.each(points)('%s at %d K and %d Pa: h, s, rho, cp, w and beta belong to one surface', (substance, T, p) => {
    const { h, s, rho, cp, cv, w, beta, v, u } = state(substance, { T, p }).values as Record<PropertyId, number>;
    const slopeT = (property: PropertyId) => slope((x) => at(substance, x, p, property), T);
    const slopeP = (property: PropertyId) => slope((x) => at(substance, T, x, property), p);
    expect(slopeT('h') / cp).toBeCloseTo(1, 6);
    expect((slopeT('s') * T) / cp).toBeCloseTo(1, 6);
    // Liquids near their density maximum expand hardly: compared with 1/T, which is the gas's.
    expect(Math.abs(-slopeT('rho') / rho - beta) * T).toBeLessThan(1e-5);
    // Maxwell: (∂s/∂p)_T = −(∂v/∂T)_p. The difference of entropies of a liquid is small: absolute in R.
    expect(Math.abs(slopeP('s') * rho + beta) * T).toBeLessThan(3e-5);
    // Mayer's relation in its general form: cp − cv = T·v·β²/κ, and w² = v·(cp/cv)/κ.
    const kappa = slopeP('rho') / rho;
    expect((cp - cv) / cp).toBeCloseTo((T * v * beta * beta) / kappa / cp, 4);
    expect((w * w * kappa * cv * rho) / cp).toBeCloseTo(1, 4);
    expect(u + p * v).toBeCloseTo(h, 3);
    expect(Number.isFinite(s)).toBe(true);
  });

  it.each(points)('%s at %d K and %d Pa comes back from (p,h), (p,s) and (T,rho)', (substance, T, p) => {
    const { h, s, rho } = state(substance, { T, p }).values as Record<PropertyId, number>;
    const byEnthalpy = state(substance, { p, h });
    expect(byEnthalpy.values.T! / T).toBeCloseTo(1, 9);
    expect(byEnthalpy.values.h! - h).toBeCloseTo(0, 3);
    expect(state(substance, { p, s }).values.T! / T).toBeCloseTo(1, 9);
    expect(state(substance, { T, rho }).values.p! / p).toBeCloseTo(1, substance === 'water' ? 8 : 6);
  });
});

describe('borders of the regions of R7-97', () => {
  const step = 1e-6;
  it.each([
    // Allowances of the release for the borders (R7-97, section 2): v 0.02 %, h 0.2 kJ/kg, cp 1 %.
    ['1 and 3', 623.15, 30e6],
    ['1 and 3', 623.15, 90e6],
    ['2 and 3', 863.15, 99e6],
    ['2 and 5', 1073.15, 1e6],
    ['2 and 5', 1073.15, 40e6],
  ])('regions %s at %d K, %d Pa', (_regions, T, p) => {
    const below = (property: PropertyId) => at('water', T - step, p, property);
    const above = (property: PropertyId) => at('water', T + step, p, property);
    expect(Math.abs(above('rho') / below('rho') - 1)).toBeLessThan(2e-4);
    expect(Math.abs(above('h') - below('h'))).toBeLessThan(200);
    expect(Math.abs(above('cp') / below('cp') - 1)).toBeLessThan(0.01);
    expect(Math.abs(above('k') / below('k') - 1)).toBeLessThan(0.01);
  });
});

describe('two phases', () => {
  it.each(['water', 'CO2', 'NH3', 'R134a', 'propane'])('%s mixes by mass and comes back', (substance) => {
    const p = 1e6;
    const pair = findSubstance(substance)!.saturation!({ p });
    if (!pair.ok) throw new Error(pair.error.message);
    const { liquid, vapour, h_fg } = pair.value;
    const mixed = state(substance, { p, x: 0.3 });
    expect(mixed.phase).toBe('two-phase');
    expect(mixed.values.h).toBeCloseTo(0.7 * liquid.values.h! + 0.3 * vapour.values.h!, 4);
    expect(vapour.values.h! - liquid.values.h!).toBeCloseTo(h_fg, 6);
    expect(mixed.missing.cp?.code).toBe('TWO_PHASE_PROPERTY');
    expect(state(substance, { p, h: mixed.values.h! }).values.x).toBeCloseTo(0.3, 9);
    expect(state(substance, { p, s: mixed.values.s! }).values.x).toBeCloseTo(0.3, 9);
    expect(state(substance, { T: mixed.values.T!, rho: mixed.values.rho! }).values.x).toBeCloseTo(0.3, 7);
  });
});

describe('every substance', () => {
  const substances = listSubstances();
  it('is found by its id, its name and every alias', () => {
    for (const substance of substances)
      for (const word of [substance.id, substance.name]) expect(findSubstance(word)?.id).toBe(substance.id);
    expect(findSubstance('STEAM')?.id).toBe('water');
    expect(new Set(substances.map(({ id }) => id)).size).toBe(substances.length);
  });

  it.each(substances.map((substance) => [substance.id, substance] as const))(
    '%s says its sources and range, and is positive in the middle of it',
    (_id, substance) => {
      expect(substance.sources.length).toBeGreaterThan(0);
      expect(substance.range).toMatch(/°C/);
      const [low, high] = substance.limits.T;
      // The geometric middle: of gases a temperature well above the critical one, of others one between their ends.
      const inputs: StateInputs = { T: Math.sqrt(low * high) };
      if (substance.inputs.some((pair) => pair.includes('massFraction'))) inputs.massFraction = 0.1;
      if (substance.id === 'moist_air') inputs.W = 0.001;
      inputs.p = 1e5;
      const outcome = substance.state(inputs);
      if (!outcome.ok) throw new Error(outcome.error.message);
      for (const property of ['rho', 'cp', 'k', 'mu', 'Pr', 'w', 'cv'] as const) {
        const value = outcome.value.values[property];
        if (value !== undefined) expect(value, property).toBeGreaterThan(0);
      }
    },
  );
});

describe('density maximum of water', () => {
  it('lies at 3.98 °C at 1 atm (Kell, J. Chem. Eng. Data 20 (1975) 97), where beta changes its sign', () => {
    expect(at('water', 273.15 + 3.9, 101325, 'beta')).toBeLessThan(0);
    expect(at('water', 273.15 + 4.1, 101325, 'beta')).toBeGreaterThan(0);
  });
});
