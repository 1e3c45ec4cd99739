import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readCsv } from '../../../src-server/commands/reference/csv';
import { propertyErrorCodes } from '../../../src/engine/errors/property-errors';
import { findSubstance } from '../../../src/engine/properties/index';
import type { PropertyId, StateInputs } from '../../../src/engine/properties/types';

const rows = readCsv(readFileSync(new URL('../../check-values/property-errors.csv', import.meta.url), 'utf8'));

/** Inputs of the table that have another name here; a volume fraction has none. */
const names: Readonly<Record<string, string>> = { mass_fraction: 'massFraction', salinity_kg_kg: 'massFraction' };

/** Codes by which a state, its property or its saturation is refused or warned of. */
function codesOf(substance: string, property: string, given: Record<string, unknown>): string[] {
  const found = findSubstance(substance);
  if (found === undefined) return ['UNKNOWN_SUBSTANCE'];
  const inputs = Object.fromEntries(
    Object.entries(given)
      .filter(([key]) => key !== 'volume_fraction')
      .map(([key, value]) => [names[key] ?? key, value]),
  ) as StateInputs;
  if (['T_sat', 'p_sat', 'sigma', 'h_fg'].includes(property)) {
    const pair = found.saturation?.(inputs as { T: number });
    return pair === undefined || pair.ok ? [] : [pair.error.code];
  }
  const asked = found.id === 'moist_air' && property === 'W_sat' ? { ...inputs, W: 0 } : inputs;
  const outcome = found.state(asked);
  if (!outcome.ok) return [outcome.error.code];
  const missing = outcome.value.missing[property as PropertyId];
  return [...(missing === undefined ? [] : [missing.code]), ...outcome.value.warnings.map(({ code }) => code)];
}

/** Where the table leaves a choice between codes, ours. */
const ours: Readonly<Record<string, string>> = {
  E33: 'PROPERTY_NOT_AVAILABLE',
  // The table of engine oil is carried to 400 K.
  E47: 'OUT_OF_RANGE_T',
};

describe('situations without a value', () => {
  it.each(rows)(
    '$id $substance $property: $why',
    ({ id = '', substance = '', property = '', inputs_SI, expected_code }) => {
      const given = JSON.parse(inputs_SI ?? '{}') as Record<string, unknown>;
      expect(codesOf(substance, property, given)).toContain(ours[id] ?? expected_code);
    },
  );

  const water = findSubstance('water')!;
  it.each([
    [{ T: 250, p: 1e5 }, 'OUT_OF_RANGE_T'],
    [{ T: 2300, p: 1e5 }, 'OUT_OF_RANGE_T'],
    [{ T: 300, p: 200e6 }, 'OUT_OF_RANGE_P'],
    [{ T: 1200, p: 60e6 }, 'OUT_OF_RANGE_P'],
    [{ T: 300, p: 0 }, 'NOT_ABSOLUTE'],
    [{ T: 300, p: -5e4 }, 'NOT_ABSOLUTE'],
    [{ T: 300, x: 1.2 }, 'OUT_OF_RANGE_QUALITY'],
    [{ p: 1e5, x: -0.1 }, 'OUT_OF_RANGE_QUALITY'],
    // 100 °C at 1 atm is steam by 0.026 K (R7-97: T_sat = 373.1243 K).
    [{ T: 373.15, p: 101325 }, 'AMBIGUOUS_AT_SATURATION'],
    [{ T: 660, x: 0.5 }, 'SUPERCRITICAL_NO_SATURATION'],
    [{ T: 300 }, 'UNSUPPORTED_INPUT'],
    [{ T: 300, p: 1e5, h: 1e5 }, 'UNSUPPORTED_INPUT'],
    [{ T: 300, p: 1e5, massFraction: 0.3 }, 'UNSUPPORTED_INPUT'],
    [{ p: 1e6, s: 20000 }, 'OUT_OF_RANGE_STATE'],
    [{ T: NaN, p: 1e5 }, 'OUT_OF_RANGE_T'],
  ] as const)('water %j: %s', (inputs, code) => {
    const outcome = water.state(inputs);
    expect(outcome.ok).toBe(false);
    if (!outcome.ok) expect(outcome.error.code).toBe(code);
  });

  it('gives the phase that is asked for where both are possible', () => {
    const liquid = water.state({ T: 373.13, p: 101325, phase: 'liquid' });
    const steam = water.state({ T: 373.13, p: 101325, phase: 'gas' });
    expect(liquid.ok && liquid.value.values.rho).toBeGreaterThan(900);
    expect(steam.ok && steam.value.values.rho).toBeLessThan(1);
  });

  it('says the limit, the value given and the nearest valid one', () => {
    const outcome = findSubstance('air')!.state({ T: 2500, p: 1e5 });
    expect(outcome.ok ? '' : outcome.error.message).toBe(
      '2226.85 °C is outside Lemmon et al. 2000, which covers −213.4 °C to 1726.85 °C. Nearest: 1726.85 °C.',
    );
  });

  it('leaves no word in braces and begins with a capital', () => {
    const seen = rows.flatMap(({ substance = '', inputs_SI }) => {
      const outcome = findSubstance(substance)?.state(JSON.parse(inputs_SI ?? '{}') as StateInputs);
      return outcome === undefined || outcome.ok ? [] : [outcome.error.message];
    });
    expect(seen.length).toBeGreaterThan(10);
    for (const message of seen) expect(message).toMatch(/^[^a-z{}][^{}]*\.$/);
    expect(propertyErrorCodes.length).toBeGreaterThan(20);
  });
});
