import { computed, onScopeDispose, ref } from 'vue';
import * as decoding from 'lib0/decoding';
import { IndexeddbPersistence } from 'y-indexeddb';
import { WebsocketProvider } from 'y-websocket';
import type * as Y from 'yjs';
import { syncClose, syncMessage, syncPath } from '#contract';
import type { LineState } from './sheetConnection';
import { useKeptCount } from './useKeptCount';

/** Own changes that are not kept after this long, while there is a line, are worth a word; in ms. */
const patience = 5000;

const closeReasons: Readonly<Record<number, string>> = {
  [syncClose.notSignedIn]: 'You are signed out. Sign in again; what you wrote stays in this browser.',
  [syncClose.forbidden]: 'You have no access to this sheet any more.',
  [syncClose.notFound]: 'This sheet is not there, or you are not a member of its project.',
};
const refusals: Readonly<Record<string, string>> = {
  WRONG_STATE: 'The revision was checked or locked meanwhile: your last changes were not taken.',
  FORBIDDEN: 'You may not write in this sheet any more: your last changes were not taken.',
  TOO_LARGE: 'The sheet has become too large: your last changes were not taken.',
};

/** Joins a document to the server and to this browser's own store, and says how it stands. */
export function useSyncLine(doc: Y.Doc, revisionId: string, personId: string) {
  const { protocol, host } = window.location;
  const address = `${protocol === 'https:' ? 'wss:' : 'ws:'}//${host}${syncPath}`;
  const store = new IndexeddbPersistence(`wallflux ${personId} ${revisionId}`, doc);
  const provider = new WebsocketProvider(address, revisionId, doc, { disableBc: true, maxBackoffTime: 4000 });
  const count = useKeptCount();
  const stored = ref(false);
  const synced = ref(false);
  const offlineSince = ref<number>();
  const notKeptSince = ref<number>();
  const refused = ref('');

  provider.messageHandlers[syncMessage.kept] = (_encoder, decoder) => {
    const updates = decoding.readVarUint(decoder);
    const first = decoding.readVarUint(decoder) === 1;
    count.told(updates, first, decoding.readFloat64(decoder));
    if (count.waiting.value === 0) notKeptSince.value = undefined;
  };
  provider.messageHandlers[syncMessage.refused] = (_encoder, decoder) => {
    stop(refusals[decoding.readVarString(decoder)] ?? 'Your last changes were not taken.');
  };
  function stop(reason: string): void {
    refused.value = reason;
    provider.disconnect();
  }

  void store.whenSynced.then(() => {
    stored.value = true;
  });
  provider.on('status', ({ status }: { status: string }) => {
    if (status === 'connected') {
      count.lineOpened();
      offlineSince.value = undefined;
    } else if (status === 'disconnected') {
      count.lineBroke();
      offlineSince.value ??= Date.now();
    }
  });
  provider.on('connection-close', (event: CloseEvent | null) => {
    const reason = event === null ? undefined : closeReasons[event.code];
    if (reason !== undefined) stop(reason);
    offlineSince.value ??= Date.now();
  });
  provider.on('sync', (now: boolean) => {
    if (now) synced.value = true;
  });

  const onUpdate = (_update: Uint8Array, _origin: unknown, _doc: Y.Doc, transaction: Y.Transaction) => {
    // What the provider and the store bring in is not one's own; undo is.
    if (!transaction.local || _origin === provider || _origin === store) return;
    count.written(provider.wsconnected);
    notKeptSince.value ??= Date.now();
  };
  doc.on('update', onUpdate);

  const now = ref(Date.now());
  const clock = setInterval(() => {
    now.value = Date.now();
  }, 1000);

  onScopeDispose(() => {
    clearInterval(clock);
    doc.off('update', onUpdate);
    provider.destroy();
    void store.destroy();
  });

  const line = computed<LineState>(() => {
    const state = (kind: LineState['kind'], since?: number): LineState => ({
      kind,
      since,
      waiting: count.waiting.value,
      keptAt: count.keptAt.value,
      reason: refused.value,
      joined: count.joined.value,
    });
    if (refused.value !== '') return state('refused');
    const known = synced.value || (stored.value && doc.getMap('cells').size > 0);
    if (!known)
      return offlineSince.value !== undefined && now.value - offlineSince.value > 2000
        ? state('offline', offlineSince.value)
        : state('waiting');
    if (offlineSince.value !== undefined) return state('offline', offlineSince.value);
    if (count.waiting.value > 0 && notKeptSince.value !== undefined && now.value - notKeptSince.value > patience)
      return state('not kept', notKeptSince.value);
    return synced.value ? state('joined') : state('waiting');
  });

  return {
    awareness: provider.awareness,
    line,
    /** Of a refused sheet: lets go of what was not taken and begins anew from what the server has. */
    async tryAgain() {
      if (refused.value === '') provider.connect();
      else {
        await store.clearData();
        window.location.reload();
      }
    },
    forgetJoined() {
      count.joined.value = 0;
    },
  };
}
