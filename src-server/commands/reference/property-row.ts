import { z } from 'zod';
import { propertyDefinitions, type PropertyId, type StateInputs, type Substance } from '#engine';

const number = z.union([z.literal(''), z.coerce.number()]).transform((value) => (value === '' ? undefined : value));

/** One row of a table of check values. */
export const propertyRow = z.object({
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
export type PropertyRow = z.infer<typeof propertyRow>;

/** Names of inputs in the tables, and the state's input that each is. */
const inputNames: Readonly<Record<string, keyof StateInputs>> = {
  T: 'T',
  p: 'p',
  x: 'x',
  h: 'h',
  s: 's',
  rho: 'rho',
  rho_molar: 'rho',
  mass_fraction: 'massFraction',
  salinity_kg_kg: 'massFraction',
  RH: 'RH',
  W: 'W',
  T_wb: 'T_wb',
  T_dp: 'T_dp',
};
/** Keys that name a variant which is the product's own, or an input of a derived property. */
const variantKeys: readonly string[] = ['phase', 'critical_enhancement', 'transport', 'h_ref', 'T1', 'T2'];
/** Names of properties in the tables where the product has another. */
export const propertyNames: Readonly<Record<string, PropertyId>> = {
  h_per_kg_dry: 'h_da',
  v_per_kg_dry: 'v_da',
  rho_moist: 'rho',
};
/** Properties that a row may ask for beside those of a state. */
const derived: readonly string[] = [
  'delta_h',
  'cp_molar',
  'T_freeze',
  'h_sat_per_kg_dry',
  ...Object.keys(propertyNames),
];
/** Of saturated moist air; their rows give T and p only. */
export const saturatedAir: readonly string[] = ['W_sat', 'p_ws', 'h_sat_per_kg_dry'];
export const saturationProperties: readonly string[] = ['p_sat', 'T_sat', 'h_fg', 'sigma'];

export function stateInputsOf(row: PropertyRow, substance: Substance): StateInputs {
  const inputs: StateInputs = {};
  if (row.T_K !== undefined) inputs.T = row.T_K;
  if (row.p_Pa !== undefined) inputs.p = row.p_Pa;
  for (const [key, value] of Object.entries(row.inputs)) {
    const name = inputNames[key];
    if (name === undefined || name === 'phase' || typeof value !== 'number') continue;
    inputs[name] = key === 'rho_molar' ? value * (substance.molarMass ?? NaN) : value;
  }
  const { phase } = row.inputs;
  if (phase === 'liquid' || phase === 'gas') inputs.phase = phase;
  return inputs;
}

/** Why a row asks for something that the product does not carry; undefined when it does. */
export function missingInputs(row: PropertyRow, substance: Substance): string | undefined {
  const { property } = row;
  if (!(property in propertyDefinitions) && !derived.includes(property))
    return `${property} is no property of the product`;
  if (row.inputs.eos !== undefined) return `${row.substance} by ${String(row.inputs.eos)}`;
  const keys = Object.keys(row.inputs).filter((key) => !(key in inputNames) && !variantKeys.includes(key));
  if (keys.length > 0) return `input ${keys.join(', ')} of ${row.substance}`;
  const inputs = Object.keys(stateInputsOf(row, substance)).filter((key) => key !== 'phase');
  if (substance.id === 'moist_air' && saturatedAir.includes(property)) return undefined;
  if (property === 'delta_h' || property === 'T_freeze') return undefined;
  if (saturationProperties.includes(property) && inputs.length === 1) return undefined;
  const takes = substance.inputs.some(
    (pair) => pair.length === inputs.length && pair.every((key) => inputs.includes(key)),
  );
  return takes ? undefined : `inputs ${inputs.join(', ') || 'none'} of ${row.substance}`;
}
