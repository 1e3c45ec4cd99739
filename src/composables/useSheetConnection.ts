import { computed, onScopeDispose, ref, shallowRef } from 'vue';
import { uuidv4 } from 'lib0/random';
import * as Y from 'yjs';
import { localOrigin, openDocument, type CalculationDocument, type DocumentCell } from '#document';
import type { CalculationSettings } from '#engine';
import type { SheetConnection } from './sheetConnection';
import { useEngineResults } from './useEngineResults';
import { usePeopleHere } from './usePeopleHere';
import { useSyncLine } from './useSyncLine';

/** Changes of one person within this time are one step of undo, in ms. */
const oneStep = 500;

/**
 * Opens the shared document of a revision for a person, with everything live that belongs to it. Where
 * `mayWrite` says no, undo and redo do nothing: they would write as well.
 */
export function useSheetConnection(
  revisionId: string,
  person: { id: string; name: string; initials: string },
  mayWrite: () => boolean = () => true,
): SheetConnection {
  const doc = new Y.Doc();
  const opened = openDocument(doc, { newId: uuidv4 });
  const { awareness, line, tryAgain, forgetJoined } = useSyncLine(doc, revisionId, person.id);
  awareness.setLocalStateField('user', { id: person.id, name: person.name, initials: person.initials });

  const cells = shallowRef<readonly DocumentCell[]>(opened.cells());
  const settings = shallowRef<CalculationSettings>(opened.settings());
  const endObserving = opened.observe((change) => {
    cells.value = opened.cells();
    if (change.settings !== undefined) settings.value = change.settings;
  });
  const { results, names, busy, failure } = useEngineResults(opened);

  const undoManager = new Y.UndoManager([doc.getMap('cells'), doc.getMap('settings')], {
    trackedOrigins: new Set([localOrigin]),
    captureTimeout: oneStep,
  });
  // Every act on cells is a step of its own; only what is typed in a row is one step.
  const endStep = ({ origin }: Y.Transaction) => {
    if (origin === localOrigin) undoManager.stopCapturing();
  };
  doc.on('beforeTransaction', endStep);
  doc.on('afterTransaction', endStep);
  const canUndo = ref(false);
  const readStack = () => {
    canUndo.value = undoManager.canUndo();
  };
  for (const event of ['stack-item-added', 'stack-item-popped', 'stack-cleared'] as const)
    undoManager.on(event, readStack);

  onScopeDispose(() => {
    endObserving();
    undoManager.destroy();
    doc.destroy();
  });

  const writable = () => mayWrite() && line.value.kind !== 'refused' && line.value.kind !== 'waiting';
  const document = computed<CalculationDocument | undefined>(() =>
    line.value.kind === 'waiting' ? undefined : opened,
  );
  return {
    document: document as SheetConnection['document'],
    cells,
    settings,
    results,
    names,
    busy,
    engineFailure: failure,
    people: usePeopleHere(awareness, person),
    line,
    awareness,
    undoManager,
    canUndo,
    undo: () => (writable() ? undoManager.undo() : undefined),
    redo: () => (writable() ? undoManager.redo() : undefined),
    tell(cellId, writing) {
      awareness.setLocalStateField('cell', cellId);
      awareness.setLocalStateField('writing', writing);
    },
    tryAgain: () => void tryAgain(),
    forgetJoined,
  };
}
