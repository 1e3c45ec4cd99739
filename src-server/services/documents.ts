import { createHash } from 'node:crypto';
import {
  createEngine,
  evaluateCalculation,
  twelveDigits,
  type CalculationInput,
  type CalculationResult,
} from '#engine';
import { canonicalJson, openDocument, toExchange, type ExchangeCalculation } from '#document';
import * as Y from 'yjs';
import type { Database } from '../db/index';
import { loadStored } from '../repositories/documents';
import type { CalculationRow } from '../repositories/calculations';
import type { RevisionRow } from '../repositories/revisions';

/** The document of a revision as it is in the database. */
export async function loadDocument(db: Database, revisionId: string): Promise<{ doc: Y.Doc; throughId: string }> {
  const { state, updates } = await loadStored(db, revisionId);
  const doc = new Y.Doc();
  doc.transact(() => {
    if (state !== undefined) Y.applyUpdate(doc, state);
    for (const { content } of updates) Y.applyUpdate(doc, content);
  });
  return { doc, throughId: updates.at(-1)?.id ?? '0' };
}

const neverNew = {
  newId: (): string => {
    throw new Error('The server adds no cells of its own.');
  },
};

/** What a revision says now: its content in the exchange format. */
export async function currentContent(
  db: Database,
  calculation: CalculationRow,
  revision: RevisionRow,
): Promise<ExchangeCalculation> {
  const { doc } = await loadDocument(db, revision.id);
  return toExchange(openDocument(doc, neverNew), {
    title: calculation.title,
    number: calculation.number,
    revision: revision.letter,
    state: revision.state,
  });
}

export function computeContent(content: CalculationInput): CalculationResult {
  return evaluateCalculation({ settings: content.settings, cells: content.cells });
}

/** Every name with its value to 12 significant digits and its SI unit: what is frozen, and compared later. */
export function figuresOf({ names }: CalculationResult): Record<string, string> {
  return Object.fromEntries(names.map(({ name, value }) => [name, twelveDigits(value)]));
}

/**
 * Computes a second time on another way, as a sheet that was written from its end to its beginning;
 * answers the names whose values differ from the first pass. None may: results depend on the sheet alone.
 */
export function differingNames({ settings, cells }: CalculationInput, first: CalculationResult): string[] {
  const engine = createEngine();
  const order = cells.map((cell) => cell.id);
  const half = Math.floor(cells.length / 2);
  engine.update({ settings, put: cells.slice(half) });
  engine.update({ put: cells.slice(0, half), order });
  const second = figuresOf(engine.result());
  const expected = figuresOf(first);
  const names = new Set([...Object.keys(expected), ...Object.keys(second)]);
  return [...names].filter((name) => expected[name] !== second[name]);
}

/** SHA-256 over cells and settings: what a signature of a revision that is not locked is bound to. */
export function contentFingerprint(content: CalculationInput): string {
  return createHash('sha256')
    .update(canonicalJson({ settings: content.settings, cells: content.cells }))
    .digest('hex');
}
