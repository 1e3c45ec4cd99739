import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readCsv } from '../../../src-server/commands/reference/csv';
import { findSubstance } from '../../../src/engine/properties/index';

const text = readFileSync(new URL('../../check-values/saturation.csv', import.meta.url), 'utf8');
const rows = readCsv(text.replace(/^#.*\n/gm, '')).map(({ substance = '', ...numbers }) => ({
  substance,
  T: Number(numbers.T_K),
  p: Number(numbers.p_Pa),
  liquid: Number(numbers.rho_liquid),
  vapour: Number(numbers.rho_vapour),
}));

/** A pure fluid that the test is about; a missing one is a mistake of the test. */
const pair = (substance: string, given: { T: number } | { p: number }) => {
  const outcome = findSubstance(substance)!.saturation!(given);
  if (!outcome.ok) throw new Error(`${substance}: ${outcome.error.message}`);
  return outcome.value;
};

describe('saturation against the published expansions', () => {
  it.each(rows)('$substance at $T K', ({ substance, T, p, liquid, vapour }) => {
    const found = pair(substance, { T });
    expect(found.liquid.values.rho! / liquid).toBeCloseTo(1, 8);
    expect(found.vapour.values.rho! / vapour).toBeCloseTo(1, 8);
    // The expansions for pressure carry some 1e-7 Pa of rounding, which shows at the triple points of hydrocarbons.
    expect(Math.abs(found.p - p)).toBeLessThan(1e-8 * p + 1e-6);
  });

  it('has eleven temperatures of every pure fluid, and of oxygen those below its critical one', () => {
    expect(rows.length).toBe(163);
  });
});

describe('saturation by pressure', () => {
  const away = rows.filter(
    ({ substance, T }) => T < 0.998 * (rows.filter((row) => row.substance === substance).at(-1)?.T ?? 0),
  );
  it.each(away)('$substance at $T K comes back', ({ substance, T }) => {
    const byPressure = pair(substance, { p: pair(substance, { T }).p });
    expect(byPressure.T / T).toBeCloseTo(1, 11);
  });
});

describe("Clapeyron's equation along the saturation line", () => {
  const fluids = ['water', ...new Set(rows.map(({ substance }) => substance))];
  it.each(fluids)('%s', (substance) => {
    const [low, high] = substance === 'water' ? [273.16, 600] : [rows.find((row) => row.substance === substance)!.T, 0];
    const top = high || 0.93 * rows.filter((row) => row.substance === substance).at(-1)!.T;
    for (const part of [0.1, 0.4, 0.7, 1]) {
      const T = low + part * (top - low);
      const step = 1e-4 * T;
      const slope = (pair(substance, { T: T + step }).p - pair(substance, { T: T - step }).p) / (2 * step);
      const { h_fg, liquid, vapour } = pair(substance, { T });
      const expected = h_fg / (T * (vapour.values.v! - liquid.values.v!));
      // R7-97 joins three equations with the saturation line, consistent to some 1e-4 only.
      expect(slope / expected).toBeCloseTo(1, substance === 'water' ? 3 : 5);
    }
  });
});
