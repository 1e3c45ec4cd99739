import type { CalculationChange, CalculationSettings, CellKind, CellSettings } from '#engine';
import { generateKeyBetween } from 'fractional-indexing';
import * as Y from 'yjs';
import { cellShapes } from './cells/index';
import { inOrder, readCalculationSettings, readCell, type DocumentCell } from './read-cell';
import { cellsMap, settingsMap } from './shape';

/** Origin of one's own transactions: undo takes back these, and only these. */
export const localOrigin = 'own change';

export interface NewCell {
  kind: CellKind;
  /** Id of the cell above; null for the top. */
  after: string | null;
  source?: string;
  settings?: CellSettings;
}

/** The shared calculation: cells and settings on a Y.Doc, with the acts of the sheet on them. */
export interface CalculationDocument {
  readonly doc: Y.Doc;
  /** Ordered as on the sheet. Entries that are no cells are left out. */
  cells(): DocumentCell[];
  settings(): CalculationSettings;
  source(id: string): Y.Text | undefined;
  insertCell(cell: NewCell): string;
  duplicateCell(id: string): string;
  moveCell(id: string, after: string | null): void;
  removeCell(id: string): void;
  setCellSetting<Key extends keyof CellSettings>(id: string, key: Key, value: CellSettings[Key]): void;
  setSettings(settings: Partial<CalculationSettings>): void;
  /** Several acts as one: one step of undo, one message to the others. */
  transact(act: () => void): void;
  /** Calls with what changed, ready for the engine; answers the end of it. */
  observe(listener: (change: CalculationChange) => void): () => void;
}

/** What Yjs hands to a deep observer. */
type DeepEvents = Parameters<Parameters<Y.Map<unknown>['observeDeep']>[0]>[0];

class SharedCalculation implements CalculationDocument {
  private readonly map: Y.Map<unknown>;

  constructor(
    readonly doc: Y.Doc,
    private readonly newId: () => string,
  ) {
    this.map = doc.getMap(cellsMap);
  }

  cells(): DocumentCell[] {
    return inOrder([...this.map.entries()].flatMap(([id, value]) => readCell(id, value) ?? []));
  }

  settings(): CalculationSettings {
    return readCalculationSettings(this.doc);
  }

  transact(act: () => void): void {
    this.doc.transact(act, localOrigin);
  }

  private cellMap(id: string): Y.Map<unknown> | undefined {
    const value = this.map.get(id);
    return value instanceof Y.Map ? value : undefined;
  }

  source(id: string): Y.Text | undefined {
    const source = this.cellMap(id)?.get('source');
    return source instanceof Y.Text ? source : undefined;
  }

  /** A key between a cell and the one below it; `moving` does not count as a neighbour. */
  private placeAfter(after: string | null, moving?: string): string {
    const cells = this.cells().filter((cell) => cell.id !== moving);
    const at = after === null ? -1 : cells.findIndex((cell) => cell.id === after);
    const index = after !== null && at < 0 ? cells.length - 1 : at;
    const above = cells[index]?.place || null;
    // Two cells written at one place at the same time share a key: the next greater one counts.
    const below = cells.slice(index + 1).find((cell) => above === null || cell.place > above)?.place || null;
    return generateKeyBetween(above, below);
  }

  insertCell({ kind, after, source, settings }: NewCell): string {
    const id = this.newId();
    this.transact(() => {
      const cell = new Y.Map<unknown>();
      cell.set('kind', kind);
      cell.set('place', this.placeAfter(after));
      cell.set('source', new Y.Text(source ?? cellShapes[kind].template));
      cell.set('settings', new Y.Map(Object.entries(settings ?? {}).filter(([, value]) => value !== undefined)));
      this.map.set(id, cell);
    });
    return id;
  }

  duplicateCell(id: string): string {
    const cell = this.cells().find((one) => one.id === id);
    if (cell === undefined) throw new Error(`There is no cell ${id} to duplicate.`);
    return this.insertCell({ kind: cell.kind, after: id, source: cell.source, settings: cell.settings });
  }

  moveCell(id: string, after: string | null): void {
    if (after === id) return;
    this.transact(() => this.cellMap(id)?.set('place', this.placeAfter(after, id)));
  }

  removeCell(id: string): void {
    this.transact(() => this.map.delete(id));
  }

  setCellSetting<Key extends keyof CellSettings>(id: string, key: Key, value: CellSettings[Key]): void {
    this.transact(() => {
      const settings = this.cellMap(id)?.get('settings');
      if (!(settings instanceof Y.Map)) return;
      if (value === undefined || value === '') settings.delete(key);
      else settings.set(key, value);
    });
  }

  setSettings(settings: Partial<CalculationSettings>): void {
    this.transact(() => {
      for (const [key, value] of Object.entries(settings)) this.doc.getMap(settingsMap).set(key, value);
    });
  }

  observe(listener: (change: CalculationChange) => void): () => void {
    const onCells = (events: DeepEvents) => listener(this.changeOf(events));
    const onSettings = () => listener({ settings: this.settings() });
    this.map.observeDeep(onCells);
    this.doc.getMap(settingsMap).observe(onSettings);
    return () => {
      this.map.unobserveDeep(onCells);
      this.doc.getMap(settingsMap).unobserve(onSettings);
    };
  }

  private changeOf(events: DeepEvents): CalculationChange {
    const touched = new Set<string>();
    let ordered = false;
    for (const event of events) {
      if (event.path.length === 0) {
        ordered = true;
        for (const id of event.changes.keys.keys()) touched.add(id);
      } else {
        touched.add(String(event.path[0]));
        if (event.path.length === 1 && event.changes.keys.has('place')) ordered = true;
      }
    }
    const cells = this.cells();
    const present = new Map(cells.map(({ id, kind, source, settings }) => [id, { id, kind, source, settings }]));
    const put = [...touched].flatMap((id) => present.get(id) ?? []);
    const remove = [...touched].filter((id) => !present.has(id));
    return {
      put,
      ...(remove.length > 0 ? { remove } : {}),
      ...(ordered ? { order: cells.map((cell) => cell.id) } : {}),
    };
  }
}

/** Opens a Y.Doc as a calculation. Ids of new cells are handed in: this floor has no randomness. */
export function openDocument(doc: Y.Doc, options: { newId(): string }): CalculationDocument {
  return new SharedCalculation(doc, () => options.newId());
}
