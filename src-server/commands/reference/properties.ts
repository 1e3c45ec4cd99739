import { z } from 'zod';
import {
  findSubstance,
  propertyDefinitions,
  waterBackgroundConductivity,
  waterViscosity,
  type PropertyId,
  type State,
  type StateInputs,
  type Substance,
} from '#engine';
import { readCsv } from './csv';
import { agrees, Skips, type Summary } from './summary';

const number = z.union([z.literal(''), z.coerce.number()]).transform((value) => (value === '' ? undefined : value));
const row = z.object({
  substance: z.string().min(1),
  property: z.string().min(1),
  T_K: number,
  p_Pa: number,
  inputs: z
    .string()
    .transform((text) =>
      text === '' ? {} : z.record(z.string(), z.union([z.number(), z.string(), z.boolean()])).parse(JSON.parse(text)),
    ),
  expected: z.coerce.number(),
  rel_tol: z.coerce.number(),
  id: z.string().default(''),
});
type Row = z.infer<typeof row>;

/** Inputs that a state takes; anything else selects a variant of the formulation. */
const stateKeys = ['T', 'p', 'x', 'h', 's', 'rho'] as const;
/** Keys that name a variant which is the product's own. */
const variantKeys: readonly string[] = ['phase', 'critical_enhancement', 'transport'];
const saturationProperties: readonly string[] = ['p_sat', 'T_sat', 'h_fg', 'sigma'];

function inputsOf(record: Row): StateInputs {
  const inputs: StateInputs = {};
  if (record.T_K !== undefined) inputs.T = record.T_K;
  if (record.p_Pa !== undefined) inputs.p = record.p_Pa;
  for (const key of stateKeys) {
    const value = record.inputs[key];
    if (typeof value === 'number') inputs[key] = value;
  }
  const { phase } = record.inputs;
  if (phase === 'liquid' || phase === 'gas') inputs.phase = phase;
  return inputs;
}

/** Why a row asks for something that the product does not carry; undefined when it does. */
function notCarried(record: Row, substance: Substance): string | undefined {
  if (!(record.property in propertyDefinitions)) return `${record.property} is no property of the product`;
  if (record.inputs.eos !== undefined) return `${record.substance} by ${String(record.inputs.eos)}`;
  const keys = Object.keys(record.inputs).filter(
    (key) => !(stateKeys as readonly string[]).includes(key) && !variantKeys.includes(key),
  );
  if (keys.length > 0) return `input ${keys.join(', ')}`;
  const inputs = Object.keys(inputsOf(record)).filter((key) => key !== 'phase');
  const takes = substance.inputs.some(
    (pair) => pair.length === inputs.length && pair.every((key) => inputs.includes(key)),
  );
  const saturation = saturationProperties.includes(record.property) && inputs.length === 1;
  return takes || saturation ? undefined : `inputs ${inputs.join(', ') || 'none'} of ${record.substance}`;
}

function valueOf(record: Row, substance: Substance): number | string {
  const { rho: density } = inputsOf(record);
  if (
    substance.id === 'water' &&
    record.inputs.critical_enhancement === false &&
    record.T_K !== undefined &&
    density !== undefined
  ) {
    // Verification tables of the transport equations by themselves, also where R7-97 has no state.
    return record.property === 'mu'
      ? waterViscosity(record.T_K, density)
      : waterBackgroundConductivity(record.T_K, density);
  }
  const { T, p, phase, ...rest } = inputsOf(record);
  const property = record.property as PropertyId;
  if (saturationProperties.includes(property) && substance.saturation !== undefined) {
    const pair = substance.saturation(T === undefined ? { p: p ?? NaN } : { T });
    if (!pair.ok) return pair.error.message;
    const values: Record<string, number | undefined> = {
      p_sat: pair.value.p,
      T_sat: pair.value.T,
      h_fg: pair.value.h_fg,
      sigma: pair.value.sigma,
    };
    return values[property] ?? 'no value';
  }
  const outcome = substance.state({
    ...(T === undefined ? {} : { T }),
    ...(p === undefined ? {} : { p }),
    ...(phase === undefined ? {} : { phase }),
    ...rest,
  });
  if (!outcome.ok) return outcome.error.message;
  const state: State = outcome.value;
  return state.values[property] ?? state.missing[property]?.message ?? 'no value';
}

/** Compares fluid properties with a CSV of check values: substance, property, T_K, p_Pa, inputs (JSON), expected, rel_tol, id. */
export function compareProperties(text: string): Summary {
  const summary: Summary = { passed: 0, failed: 0, skipped: 0, lines: [] };
  const skips = new Skips();
  for (const [index, record] of readCsv(text).entries()) {
    const parsed = row.parse(record);
    const substance = findSubstance(parsed.substance);
    const reason = substance === undefined ? `${parsed.substance} is not carried` : notCarried(parsed, substance);
    if (substance === undefined || reason !== undefined) {
      skips.add(reason ?? '');
      continue;
    }
    const got = valueOf(parsed, substance);
    if (typeof got === 'number' && agrees(got, parsed.expected, parsed.rel_tol)) summary.passed += 1;
    else {
      summary.failed += 1;
      summary.lines.push(
        `row ${index + 2} ${parsed.id} ${parsed.substance} ${parsed.property}: got ${got}, expected ${parsed.expected} within ${parsed.rel_tol}`,
      );
    }
  }
  return { ...summary, skipped: skips.total, lines: [...summary.lines, ...skips.lines()] };
}
