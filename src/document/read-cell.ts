import type { CalculationSettings, CellInput, CellSettings } from '#engine';
import * as Y from 'yjs';
import { calculationSettingsSchema, cellKinds, cellSettingsSchema, settingsMap } from './shape';

/** A cell with its place in the order. */
export type DocumentCell = CellInput & { place: string };

const isKind = (kind: unknown): kind is CellInput['kind'] => (cellKinds as readonly unknown[]).includes(kind);

/** Reads a cell of the shared map; undefined when what others wrote there is no cell. */
export function readCell(id: string, value: unknown): DocumentCell | undefined {
  if (!(value instanceof Y.Map)) return undefined;
  const kind: unknown = value.get('kind');
  const source: unknown = value.get('source');
  const place: unknown = value.get('place');
  const settings: unknown = value.get('settings');
  if (!isKind(kind) || !(source instanceof Y.Text)) return undefined;
  return {
    id,
    kind,
    source: source.toJSON(),
    settings: readSettings(settings),
    place: typeof place === 'string' ? place : '',
  };
}

/** Settings one by one, so that one bad value does not take the others with it. */
function readSettings(map: unknown): CellSettings {
  if (!(map instanceof Y.Map)) return {};
  const entries = [...map.entries()].filter(([key, value]) => cellSettingsSchema.safeParse({ [key]: value }).success);
  return cellSettingsSchema.parse(Object.fromEntries(entries));
}

export function readCalculationSettings(doc: Y.Doc): CalculationSettings {
  const given = Object.fromEntries(doc.getMap(settingsMap).entries());
  const parsed = calculationSettingsSchema.safeParse(given);
  return parsed.success ? parsed.data : calculationSettingsSchema.parse({});
}

/** In the order of the sheet: by place, ties by id. */
export function inOrder(cells: readonly DocumentCell[]): DocumentCell[] {
  return [...cells].sort((a, b) => compare(a.place, b.place) || compare(a.id, b.id));
}

function compare(left: string, right: string): number {
  if (left === right) return 0;
  return left < right ? -1 : 1;
}
