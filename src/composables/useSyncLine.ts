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
/** A server that could not keep what it was sent is asked again after this long, and up to so much more; in ms. */
const pauseAfterFailure = { least: 2000, more: 2000 } as const;
/** Codes of the websocket protocol itself. */
const closeCode = { messageTooLarge: 1009, tryAgainLater: 1013 } as const;

const tooLarge = 'The sheet has become too large: your last changes were not taken.';
/** Why the line stays closed; the browser's copy of the sheet is kept. */
const closeReasons: Readonly<Record<number, string>> = {
  [syncClose.notSignedIn]: 'You are signed out. Sign in again; what you wrote stays in this browser.',
  [syncClose.forbidden]: 'You have no access to this sheet any more.',
  [syncClose.notFound]: 'This sheet is not there, or you are not a member of its project.',
  [syncClose.tooMany]: 'Too many windows are open at this sheet. Close some, then load the page again.',
};
const refusals: Readonly<Record<string, string>> = {
  WRONG_STATE: 'The revision was checked or locked meanwhile: your last changes were not taken.',
  FORBIDDEN: 'You may not write in this sheet any more: your last changes were not taken.',
  TOO_LARGE: tooLarge,
};

/** Joins a document to the server and to this browser's own store, and says how it stands. */
export function useSyncLine(doc: Y.Doc, revisionId: string, personId: string) {
  const { protocol, host } = window.location;
  const address = `${protocol === 'https:' ? 'wss:' : 'ws:'}//${host}${syncPath}`;
  const store = new IndexeddbPersistence(`wallflux ${personId} ${revisionId}`, doc);
  const provider = new WebsocketProvider(address, revisionId, doc, { disableBc: true, maxBackoffTime: 4000 });
  const { awareness } = provider;
  const count = useKeptCount();
  const stored = ref(false);
  const synced = ref(false);
  const offlineSince = ref<number>();
  const notKeptSince = ref<number>();
  /** The server had a line, but could not keep what it was sent. */
  const failing = ref(false);
  const stopped = ref<{ reason: string; letGo: boolean }>();
  let pause: ReturnType<typeof setTimeout> | undefined;

  // The stock client also sends back what it hears of others: at a full sheet that is most of the traffic.
  const tellAll = provider._awarenessUpdateHandler;
  awareness.off('update', tellAll);
  const tellOwn = ({ added, updated, removed }: Record<'added' | 'updated' | 'removed', number[]>) => {
    const own = (ids: number[]) => ids.filter((id) => id === doc.clientID);
    const change = { added: own(added), updated: own(updated), removed: own(removed) };
    if (Object.values(change).some((ids) => ids.length > 0)) tellAll(change, undefined);
  };
  awareness.on('update', tellOwn);

  provider.messageHandlers[syncMessage.kept] = (_encoder, decoder) => {
    const updates = decoding.readVarUint(decoder);
    const first = decoding.readVarUint(decoder) === 1;
    count.told(updates, first, decoding.readFloat64(decoder));
    if (count.waiting.value > 0) return;
    notKeptSince.value = undefined;
    failing.value = false;
  };
  provider.messageHandlers[syncMessage.refused] = (_encoder, decoder) => {
    stop(refusals[decoding.readVarString(decoder)] ?? 'Your last changes were not taken.', true);
  };
  function stop(reason: string, letGo: boolean): void {
    stopped.value ??= { reason, letGo };
    provider.disconnect();
  }
  /** Goes on by itself after a pause, so that a server in trouble is not asked without end. */
  function waitAWhile(): void {
    failing.value = true;
    provider.shouldConnect = false;
    clearTimeout(pause);
    pause = setTimeout(connect, pauseAfterFailure.least + Math.random() * pauseAfterFailure.more);
  }
  function connect(): void {
    if (stopped.value === undefined) provider.connect();
  }

  void store.whenSynced.then(() => {
    stored.value = true;
  });
  provider.on('status', ({ status }: { status: string }) => {
    if (status === 'connected') {
      count.lineOpened();
      offlineSince.value = undefined;
      // Others let go of us when the line broke; only what is newer than that counts with them.
      awareness.setLocalState(awareness.getLocalState());
    } else if (status === 'disconnected') {
      count.lineBroke();
      offlineSince.value ??= Date.now();
    }
  });
  provider.on('connection-close', (event: CloseEvent | null) => {
    offlineSince.value ??= Date.now();
    if (event === null) return;
    const reason = closeReasons[event.code];
    if (reason !== undefined) stop(reason, false);
    else if (event.code === closeCode.messageTooLarge) stop(tooLarge, true);
    else if (event.code === closeCode.tryAgainLater) waitAWhile();
  });
  provider.on('sync', (now: boolean) => {
    if (now) synced.value = true;
  });

  const onUpdate = (_update: Uint8Array, origin: unknown) => {
    // What the server brings is not one's own. What the store brings is sent like a change, and answered like one;
    // without a line it goes over with the first exchange and is no change that waits.
    if (origin === provider || (origin === store && !provider.wsconnected)) return;
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
    clearTimeout(pause);
    doc.off('update', onUpdate);
    provider.destroy();
    awareness.off('update', tellOwn);
    void store.destroy();
  });

  const line = computed<LineState>(() => {
    const state = (kind: LineState['kind'], since?: number): LineState => ({
      kind,
      since,
      waiting: count.waiting.value,
      keptAt: count.keptAt.value,
      reason: stopped.value?.reason ?? '',
      letGo: stopped.value?.letGo ?? false,
      joined: count.joined.value,
    });
    if (stopped.value !== undefined) return state('refused');
    const known = synced.value || (stored.value && doc.getMap('cells').size > 0);
    if (!known)
      return offlineSince.value !== undefined && now.value - offlineSince.value > 2000
        ? state('offline', offlineSince.value)
        : state('waiting');
    const waits = count.waiting.value > 0 && notKeptSince.value !== undefined;
    if (waits && failing.value) return state('not kept', notKeptSince.value);
    if (offlineSince.value !== undefined) return state('offline', offlineSince.value);
    if (waits && now.value - (notKeptSince.value ?? 0) > patience) return state('not kept', notKeptSince.value);
    return synced.value ? state('joined') : state('waiting');
  });

  return {
    awareness,
    line,
    /** Without a line: tries it now. What was refused is let go, and the sheet begins anew from what the server has. */
    async tryAgain() {
      if (stopped.value === undefined) {
        connect();
        return;
      }
      if (stopped.value.letGo) await store.clearData();
      window.location.reload();
    },
    forgetJoined() {
      count.joined.value = 0;
    },
  };
}
