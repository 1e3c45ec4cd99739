import { computed, ref, shallowRef } from 'vue';
import { Awareness } from 'y-protocols/awareness';
import * as Y from 'yjs';
import { createEngine, type CalculationDelta, type CellInput, type CellResult, type NamedValue } from '#engine';
import { acts, may, type Person, type RevisionDetail, type RevisionState, type Role } from '#contract';
import { fillDocument, localOrigin, openDocument } from '#document';
import type { LineState, SheetConnection } from 'src/composables/sheetConnection';

const id = (figure: number) => `00000000-0000-4000-8000-${String(figure).padStart(12, '0')}`;
export const people = {
  engineer: { id: id(1), signInName: 'odile.varga', name: 'O. Varga', initials: 'OV' },
  checker: { id: id(3), signInName: 'hanna.quaye', name: 'H. Quaye', initials: 'HQ' },
} satisfies Record<string, Person>;

/** A revision as the server would answer it to a person in `role`. */
export function revisionFor(role: Role, state: RevisionState): RevisionDetail {
  const revision = {
    id: id(100),
    letter: 'A',
    state,
    changeNote: '',
    begunAt: '2026-03-12T09:00:00.000Z',
    lockedAt: null,
    signatures: [],
    fingerprint: null,
  };
  return {
    revision,
    calculation: { id: id(10), number: '2417-C-031', title: 'Jacket-water cooler', group: '' },
    project: {
      id: id(50),
      number: '2417',
      title: 'Veldra Ness power house',
      firm: 'Hollin & Strake',
      client: '',
      place: '',
    },
    revisions: [revision],
    writers: [people.engineer],
    acts: acts.filter((act) => may(role, act, state)),
    reasons: [],
  };
}

/** A sheet without a server: document and engine in this process, everything kept at once. */
export function localConnection(cells: readonly CellInput[], given: Partial<LineState> = {}) {
  const doc = new Y.Doc();
  let made = 0;
  const document = openDocument(doc, { newId: () => `new-${(made += 1)}` });
  fillDocument(doc, {
    format: 'wallflux-calculation',
    version: 1,
    title: '',
    settings: { unitSystem: 'SI', significantDigits: 4, ambientPressure: 101_325 },
    cells: cells.map((cell) => ({ ...cell, settings: { ...cell.settings } })),
  });
  const undoManager = new Y.UndoManager([doc.getMap('cells'), doc.getMap('settings')], {
    trackedOrigins: new Set([localOrigin]),
    captureTimeout: 0,
  });
  const engine = createEngine();
  const results = shallowRef<ReadonlyMap<string, CellResult>>(new Map());
  const names = shallowRef<readonly NamedValue[]>([]);
  const shown = shallowRef<readonly CellInput[]>(document.cells());
  const settings = shallowRef(document.settings());
  const apply = (delta: CalculationDelta) => {
    const next = new Map(results.value);
    for (const gone of delta.removed) next.delete(gone);
    for (const cell of delta.cells) next.set(cell.id, cell);
    results.value = next;
    names.value = delta.names;
  };
  apply(engine.update({ settings: settings.value, put: shown.value, order: shown.value.map((cell) => cell.id) }));
  document.observe((change) => {
    shown.value = document.cells();
    settings.value = document.settings();
    apply(engine.update(change));
  });
  const told = ref<{ cellId: string | undefined; writing: boolean }>({ cellId: undefined, writing: false });
  const line = ref<LineState>({
    kind: 'joined',
    since: undefined,
    waiting: 0,
    keptAt: Date.now(),
    reason: '',
    joined: 0,
    ...given,
  });
  const connection: SheetConnection = {
    document: shallowRef(document),
    cells: shown,
    settings,
    results,
    names,
    busy: ref(false),
    engineFailure: ref(),
    people: computed(() => []),
    line,
    awareness: new Awareness(doc),
    undoManager,
    canUndo: ref(true),
    undo: () => undoManager.undo(),
    redo: () => undoManager.redo(),
    tell: (cellId, writing) => {
      told.value = { cellId, writing };
    },
    tryAgain: () => undefined,
    forgetJoined: () => undefined,
  };
  return { connection, document, line, told };
}
