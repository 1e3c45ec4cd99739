import type { Ref, ShallowRef } from 'vue';
import type { Awareness } from 'y-protocols/awareness';
import type * as Y from 'yjs';
import type { CalculationSettings, CellInput, CellResult, NamedValue } from '#engine';
import type { CalculationDocument } from '#document';
import type { PersonHere } from './sheetContext';

/** How the shared document stands with the server. */
export interface LineState {
  /** `waiting`: not loaded yet. `refused`: the server does not take changes (any more). */
  kind: 'waiting' | 'joined' | 'offline' | 'not kept' | 'refused';
  /** Since when, in ms; of `offline` and `not kept`. */
  since: number | undefined;
  /** Own changes that the server has not kept yet. */
  waiting: number;
  /** When the server last kept everything, in ms. */
  keptAt: number | undefined;
  /** A sentence; of `refused`. */
  reason: string;
  /** Of `refused`: this browser holds changes that the server will not take; `tryAgain` lets go of them. */
  letGo?: boolean;
  /** After the line came back: how many changes joined. */
  joined: number;
}

/** Everything live behind a sheet: shared document, results, people, undo. */
export interface SheetConnection {
  document: Readonly<ShallowRef<CalculationDocument | undefined>>;
  cells: Readonly<ShallowRef<readonly CellInput[]>>;
  settings: Readonly<ShallowRef<CalculationSettings>>;
  results: Readonly<ShallowRef<ReadonlyMap<string, CellResult>>>;
  names: Readonly<ShallowRef<readonly NamedValue[]>>;
  busy: Readonly<Ref<boolean>>;
  engineFailure: Readonly<Ref<unknown>>;
  people: Readonly<Ref<readonly PersonHere[]>>;
  line: Readonly<Ref<LineState>>;
  awareness: Awareness | undefined;
  undoManager: Y.UndoManager | undefined;
  canUndo: Readonly<Ref<boolean>>;
  undo(): void;
  redo(): void;
  /** Tells others in which cell one is, and whether one writes there. */
  tell(cellId: string | undefined, writing: boolean): void;
  /** Tries the line now; of a refused sheet: begins anew from what the server has. */
  tryAgain(): void;
  forgetJoined(): void;
}
