import type { CalculationSettings, CellInput, CellSettings } from '#engine';
import * as Y from 'yjs';
import type { z } from 'zod';
import { readPlace } from './places';
import {
  calculationSettingSchemas,
  calculationSettingsSchema,
  cellIdSchema,
  cellKinds,
  cellSettingSchemas,
  cellSettingsSchema,
  settingsMap,
} from './shape';

/** A cell with its place in the order. */
export type DocumentCell = CellInput & { place: string };

const isKind = (kind: unknown): kind is CellInput['kind'] => (cellKinds as readonly unknown[]).includes(kind);

/** The parts of an entry of the cells map; undefined when what others wrote there is no cell. */
export function cellParts(
  id: string,
  value: unknown,
): { kind: CellInput['kind']; source: Y.Text; place: string; settings: unknown } | undefined {
  if (!(value instanceof Y.Map) || !cellIdSchema.safeParse(id).success) return undefined;
  const kind: unknown = value.get('kind');
  const source: unknown = value.get('source');
  if (!isKind(kind) || !(source instanceof Y.Text)) return undefined;
  return { kind, source, place: readPlace(value.get('place')), settings: value.get('settings') };
}

/** Reads a cell of the shared map; undefined when what others wrote there is no cell. */
export function readCell(id: string, value: unknown): DocumentCell | undefined {
  const parts = cellParts(id, value);
  if (parts === undefined) return undefined;
  const { kind, source, place, settings } = parts;
  return { id, kind, source: source.toJSON(), settings: readSettings(settings), place };
}

/** Values one by one, so that one bad value does not take the others with it. */
function goodValues(map: Y.Map<unknown>, schemas: Readonly<Record<string, z.ZodType>>): Record<string, unknown> {
  const entries = [...map.entries()].filter(
    ([key, value]) => Object.hasOwn(schemas, key) && schemas[key]?.safeParse(value).success,
  );
  return Object.fromEntries(entries);
}

function readSettings(map: unknown): CellSettings {
  return map instanceof Y.Map && map.size > 0 ? cellSettingsSchema.parse(goodValues(map, cellSettingSchemas)) : {};
}

export function readCalculationSettings(doc: Y.Doc): CalculationSettings {
  return calculationSettingsSchema.parse(goodValues(doc.getMap(settingsMap), calculationSettingSchemas));
}
