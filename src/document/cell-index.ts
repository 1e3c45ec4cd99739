import type { CellInput } from '#engine';
import type * as Y from 'yjs';
import { inOrder } from './places';
import { readCell, type DocumentCell } from './read-cell';

export interface IndexChange {
  put: CellInput[];
  remove: string[];
  /** Cells came or moved. */
  reordered: boolean;
}

/** The cells of a shared map as they were last read. After a change only what it touched is read again. */
export class CellIndex {
  private readonly cells = new Map<string, DocumentCell>();
  private ordered: readonly DocumentCell[] | undefined;

  constructor(private readonly map: Y.Map<unknown>) {
    for (const [id, value] of map.entries()) {
      const cell = readCell(id, value);
      if (cell !== undefined) this.cells.set(id, cell);
    }
  }

  /** Ordered as on the sheet. */
  all(): readonly DocumentCell[] {
    this.ordered ??= inOrder([...this.cells.values()]);
    return this.ordered;
  }

  /** Reads these cells again; answers what is different from before. */
  refresh(ids: Iterable<string>): IndexChange {
    const change: IndexChange = { put: [], remove: [], reordered: false };
    for (const id of ids) {
      const before = this.cells.get(id);
      const now = readCell(id, this.map.get(id));
      if (now === undefined) {
        if (this.cells.delete(id)) change.remove.push(id);
        continue;
      }
      if (before !== undefined && same(before, now) && before.place === now.place) continue;
      this.cells.set(id, now);
      if (before === undefined || !same(before, now)) change.put.push(withoutPlace(now));
      if (before?.place !== now.place) change.reordered = true;
    }
    this.ordered = undefined;
    return change;
  }
}

export function withoutPlace({ id, kind, source, settings }: DocumentCell): CellInput {
  return { id, kind, source, settings };
}

function same(a: DocumentCell, b: DocumentCell): boolean {
  if (a.kind !== b.kind || a.source !== b.source) return false;
  const left = Object.entries(a.settings);
  const right = new Map<string, unknown>(Object.entries(b.settings));
  return left.length === right.size && left.every(([key, value]) => right.get(key) === value);
}
