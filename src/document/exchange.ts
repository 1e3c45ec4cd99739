import type * as Y from 'yjs';
import { z } from 'zod';
import { localOrigin, newCellEntry, type CalculationDocument } from './calculation-document';
import { withoutPlace } from './cell-index';
import { firstPlaces } from './places';
import {
  calculationSettingsSchema,
  cellIdSchema,
  cellKinds,
  cellSettingsSchema,
  cellsMap,
  documentLimits,
  settingsMap,
} from './shape';

export const exchangeFormat = 'wallflux-calculation';
export const exchangeVersion = 1;

const cell = z.object({
  id: cellIdSchema,
  kind: z.enum(cellKinds),
  source: z.string().max(documentLimits.sourceLength).default(''),
  settings: cellSettingsSchema.default({}),
});

const version1 = z.object({
  format: z.literal(exchangeFormat),
  version: z.literal(exchangeVersion, 'a version of the format that this version of Wallflux does not know'),
  title: z.string().max(200).default(''),
  purpose: z.string().max(2000).optional(),
  number: z.string().max(100).optional(),
  revision: z.string().max(10).optional(),
  state: z.string().max(20).optional(),
  settings: calculationSettingsSchema.default({ unitSystem: 'SI', significantDigits: 4, ambientPressure: 101325 }),
  cells: z
    .array(cell)
    .max(documentLimits.cells)
    .refine((cells) => new Set(cells.map((one) => one.id)).size === cells.length, 'every cell has an id of its own'),
});

/** Steps that bring older versions of the format to the present one, by the version they begin from. */
const upgrades: Readonly<Record<number, (older: unknown) => unknown>> = {};

function upgraded(given: unknown): unknown {
  let current = given;
  for (let step = versionOf(current); step !== undefined && step < exchangeVersion; step = versionOf(current)) {
    const upgrade = upgrades[step];
    if (upgrade === undefined) return current;
    current = upgrade(current);
  }
  return current;
}

function versionOf(given: unknown): number | undefined {
  const version: unknown = typeof given === 'object' && given !== null ? Reflect.get(given, 'version') : undefined;
  return typeof version === 'number' ? version : undefined;
}

/** A whole calculation as it is exported and imported. */
export const exchangeSchema = z.preprocess(upgraded, version1);
export type ExchangeCalculation = z.output<typeof version1>;

export interface ExchangeHead {
  title: string;
  number?: string;
  revision?: string;
  state?: string;
}

/** The document in the exchange format; cells in the order of the sheet. */
export function toExchange(document: CalculationDocument, head: ExchangeHead): ExchangeCalculation {
  return {
    format: exchangeFormat,
    version: exchangeVersion,
    ...head,
    settings: document.settings(),
    cells: document.cells().map(withoutPlace),
  };
}

/** Writes a calculation into an empty document, with its ids. */
export function fillDocument(doc: Y.Doc, exchange: ExchangeCalculation): void {
  const map = doc.getMap(cellsMap);
  if (map.size > 0) throw new Error('Only an empty document can be filled.');
  const places = firstPlaces(exchange.cells.length);
  doc.transact(() => {
    for (const [key, value] of Object.entries(exchange.settings)) doc.getMap(settingsMap).set(key, value);
    exchange.cells.forEach(({ id, kind, source, settings }, index) =>
      map.set(id, newCellEntry(kind, places[index] ?? '', source, settings)),
    );
  }, localOrigin);
}
