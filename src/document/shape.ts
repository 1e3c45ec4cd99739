import type { CalculationSettings, CellKind, CellSettings } from '#engine';
import { z } from 'zod';

/** Names of the shared maps in a document. */
export const cellsMap = 'cells';
export const settingsMap = 'settings';

export const cellKinds = ['section', 'text', 'expressions', 'fluid', 'relation'] as const satisfies readonly CellKind[];

/** Larger calculations are refused on import and by the server, and not written by the screens. */
export const documentLimits = { cells: 5000, sourceLength: 100_000, settingLength: 2000 } as const;

/** Ids become keys of results, parts of addresses and of conditions: plain signs only. */
export const cellIdSchema = z
  .string()
  .max(100)
  .regex(/^[A-Za-z0-9][A-Za-z0-9_-]*$/, 'letters, figures, dash and underscore only, a letter or figure first');

const setting = z.string().max(documentLimits.settingLength).optional();

const cellSettingsObject = z.object({
  name: setting,
  substance: setting,
  mode: z.enum(['state', 'film', 'wall', 'saturation']).optional(),
  relation: setting,
  keepReason: setting,
  tbv: setting,
});
export const cellSettingsSchema: z.ZodType<CellSettings> = cellSettingsObject;
/** Schema of each setting by itself. */
export const cellSettingSchemas = cellSettingsObject.shape;

const calculationSettingsObject = z.object({
  unitSystem: z.enum(['SI', 'US']).default('SI'),
  significantDigits: z.number().int().min(2).max(10).default(4),
  ambientPressure: z.number().min(1000).max(1e7).default(101325),
});
export const calculationSettingsSchema: z.ZodType<CalculationSettings> = calculationSettingsObject;
export const calculationSettingSchemas = calculationSettingsObject.shape;

/** Which settings a kind of cell has, and what its source begins with. */
export interface CellShape {
  kind: CellKind;
  settings: readonly (keyof CellSettings)[];
  template: string;
}
