import type { CalculationChange, CalculationSettings, CellKind, CellSettings } from '#engine';
import * as Y from 'yjs';
import { CellIndex } from './cell-index';
import { cellShapes } from './cells/index';
import { inOrder, placeBelow, type Placed } from './places';
import { cellParts, readCalculationSettings, type DocumentCell } from './read-cell';
import { cellIdSchema, cellsMap, settingsMap } from './shape';

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
  cells(): readonly DocumentCell[];
  /** Ids of entries that are no cells: another program wrote them, or a newer version of this one. */
  unreadable(): string[];
  settings(): CalculationSettings;
  source(id: string): Y.Text | undefined;
  /** Answers the new cell's id. After a cell that is gone means at the end. */
  insertCell(cell: NewCell): string;
  duplicateCell(id: string): string;
  moveCell(id: string, after: string | null): void;
  removeCell(id: string): void;
  /** Without a value, or with an empty one, the setting is taken out. */
  setCellSetting<Key extends keyof CellSettings>(id: string, key: Key, value: CellSettings[Key]): void;
  setSettings(settings: Partial<CalculationSettings>): void;
  /** Several acts as one: one step of undo, one message to the others. */
  transact(act: () => void): void;
  /** Calls once a transaction with what changed by it, ready for the engine; answers the end of it. */
  observe(listener: (change: CalculationChange) => void): () => void;
}

/** What Yjs hands to a deep observer. */
type DeepEvents = Parameters<Parameters<Y.Map<unknown>['observeDeep']>[0]>[0];

/** A cell's entry of the shared map, not yet part of a document. */
export function newCellEntry(kind: CellKind, place: string, source: string, settings: CellSettings): Y.Map<unknown> {
  const cell = new Y.Map<unknown>();
  cell.set('kind', kind);
  cell.set('place', place);
  cell.set('source', new Y.Text(source));
  const given = Object.entries(settings).filter(([, value]) => value !== undefined && value !== '');
  cell.set('settings', new Y.Map(given));
  return cell;
}

class SharedCalculation implements CalculationDocument {
  private readonly map: Y.Map<unknown>;
  private readonly listeners = new Set<(change: CalculationChange) => void>();
  private index: CellIndex | undefined;
  /** What the transaction that is being ended has changed so far. */
  private change: CalculationChange | undefined;

  constructor(
    readonly doc: Y.Doc,
    private readonly newId: () => string,
  ) {
    this.map = doc.getMap(cellsMap);
    this.map.observeDeep((events) => this.noteCells(events));
    doc.getMap(settingsMap).observe(() => {
      this.change = { ...this.change, settings: this.settings() };
    });
    doc.on('afterTransaction', () => this.tell());
  }

  cells(): readonly DocumentCell[] {
    // Within a transaction the index is behind: its changes are announced at the end.
    if (this.doc._transaction !== null) return new CellIndex(this.map).all();
    return this.upToDate().all();
  }

  private upToDate(): CellIndex {
    this.index ??= new CellIndex(this.map);
    return this.index;
  }

  unreadable(): string[] {
    return [...this.map.entries()].flatMap(([id, value]) => (cellParts(id, value) === undefined ? [id] : []));
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

  private placed(): Placed[] {
    return inOrder(
      [...this.map.entries()].flatMap(([id, value]) => {
        const parts = cellParts(id, value);
        return parts === undefined ? [] : { id, place: parts.place };
      }),
    );
  }

  /** A key right below a cell; `moving` does not count as a neighbour. Cells that share the cell's key get new ones. */
  private makePlace(after: string | null, moving?: string): string {
    const cells = this.placed().filter((cell) => cell.id !== moving);
    const at = cells.findIndex((cell) => cell.id === after);
    const index = after !== null && at < 0 ? cells.length - 1 : at;
    const { place, replaced } = placeBelow(cells, index);
    for (const cell of replaced) this.cellMap(cell.id)?.set('place', cell.place);
    return place;
  }

  insertCell({ kind, after, source, settings }: NewCell): string {
    const id = cellIdSchema.parse(this.newId());
    if (this.map.has(id)) throw new Error(`There is a cell ${id} already.`);
    this.transact(() => {
      const text = source ?? cellShapes[kind].template;
      this.map.set(id, newCellEntry(kind, this.makePlace(after), text, settings ?? {}));
    });
    return id;
  }

  duplicateCell(id: string): string {
    const cell = this.cells().find((one) => one.id === id);
    if (cell === undefined) throw new Error(`There is no cell ${id} to duplicate.`);
    return this.insertCell({ kind: cell.kind, after: id, source: cell.source, settings: cell.settings });
  }

  moveCell(id: string, after: string | null): void {
    const ids = this.placed().map((cell) => cell.id);
    const at = ids.indexOf(id);
    const stands = at === 0 ? null : ids[at - 1];
    if (at < 0 || after === id || after === stands) return;
    this.transact(() => this.cellMap(id)?.set('place', this.makePlace(after, id)));
  }

  removeCell(id: string): void {
    if (this.map.has(id)) this.transact(() => this.map.delete(id));
  }

  setCellSetting<Key extends keyof CellSettings>(id: string, key: Key, value: CellSettings[Key]): void {
    const settings = this.cellMap(id)?.get('settings');
    if (!(settings instanceof Y.Map) || settings.get(key) === value) return;
    this.transact(() => {
      if (value === undefined || value === '') settings.delete(key);
      else settings.set(key, value);
    });
  }

  setSettings(settings: Partial<CalculationSettings>): void {
    const map = this.doc.getMap(settingsMap);
    this.transact(() => {
      for (const [key, value] of Object.entries(settings))
        if (value !== undefined && map.get(key) !== value) map.set(key, value);
    });
  }

  observe(listener: (change: CalculationChange) => void): () => void {
    // From here on there is something to compare with.
    this.upToDate();
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  }

  private noteCells(events: DeepEvents): void {
    if (this.index === undefined) return;
    const touched = new Set<string>();
    for (const event of events) {
      if (event.path.length > 0) touched.add(String(event.path[0]));
      else for (const id of event.changes.keys.keys()) touched.add(id);
    }
    const { put, remove, reordered } = this.index.refresh(touched);
    if (put.length === 0 && remove.length === 0 && !reordered) return;
    this.change = {
      ...this.change,
      ...(put.length > 0 ? { put } : {}),
      ...(remove.length > 0 ? { remove } : {}),
      ...(reordered ? { order: this.index.all().map((cell) => cell.id) } : {}),
    };
  }

  private tell(): void {
    const change = this.change;
    this.change = undefined;
    if (change !== undefined) for (const listener of [...this.listeners]) listener(change);
  }
}

/** Opens a Y.Doc as a calculation. Ids of new cells are handed in: this floor has no randomness. */
export function openDocument(doc: Y.Doc, options: { newId(): string }): CalculationDocument {
  return new SharedCalculation(doc, () => options.newId());
}
