import * as Y from 'yjs';
import { documentLimits, measureDocument } from '#document';

/** `known`: it says nothing that is not there already. */
export type Verdict = 'news' | 'known' | 'too large';

/** A document larger than this takes no more updates, in bytes. */
const largestDocument = 30_000_000;
/** No update makes a cell in fewer bytes. */
const bytesOfCell = 10;

/**
 * A second copy of a document on which updates are tried before they are stored: what can be decoded can
 * still be impossible to apply, and once it were in the database nobody could open the document again.
 * Made when it is needed; holds what is being written, too.
 */
export class Trial {
  private copy: Y.Doc | undefined;
  private told = false;
  /** Bytes that can come before the limits can be reached at all. */
  private room = 0;

  constructor(private readonly doc: Y.Doc) {}

  /** Tries an update, and keeps it for what comes after. Throws on one that cannot be applied. */
  take(update: Uint8Array): Verdict {
    const copy = this.copy ?? this.make();
    const waiting = waitingIn(copy);
    this.told = false;
    try {
      Y.applyUpdate(copy, update);
    } catch (error) {
      this.forget();
      throw error;
    }
    this.room -= update.length;
    if (this.room < 0 && this.exceeds(copy)) {
      this.forget();
      return 'too large';
    }
    return this.told || waitingIn(copy) !== waiting ? 'news' : 'known';
  }

  /** What was tried and is not in the document is taken back: it was not written. */
  forget(): void {
    this.copy?.destroy();
    this.copy = undefined;
  }

  private make(): Y.Doc {
    const copy = new Y.Doc();
    Y.applyUpdate(copy, Y.encodeStateAsUpdate(this.doc));
    copy.on('update', () => {
      this.told = true;
    });
    this.copy = copy;
    this.room = 0;
    return copy;
  }

  /** Measures exactly. A document that is too large already may become smaller. */
  private exceeds(copy: Y.Doc): boolean {
    const { cells, longestSource, excess } = measureDocument(copy);
    const size = Y.encodeStateAsUpdate(copy).length;
    if (size > largestDocument) return size > Y.encodeStateAsUpdate(this.doc).length;
    if (excess > 0) return excess > measureDocument(this.doc).excess;
    this.room = Math.min(
      largestDocument - size,
      documentLimits.sourceLength - longestSource,
      (documentLimits.cells - cells) * bytesOfCell,
    );
    return false;
  }
}

/** Bytes of what waits for something that has not come yet: a line that comes back tells late things first. */
function waitingIn({ store }: Y.Doc): number {
  return (store.pendingStructs?.update.length ?? 0) + (store.pendingDs?.length ?? 0);
}

/** Whether an update says anything that a document does not hold yet. Costs no copy of the document. */
export function isNews(doc: Y.Doc, update: Uint8Array): boolean {
  const { structs, ds } = Y.decodeUpdate(update);
  const beyond = structs.some(
    (struct) =>
      !(struct instanceof Y.Skip) && struct.id.clock + struct.length > Y.getState(doc.store, struct.id.client),
  );
  if (beyond) return true;
  const deleted = Y.createDeleteSetFromStructStore(doc.store);
  for (const [client, ranges] of ds.clients) {
    for (const { clock, len } of ranges) if (!covered(deleted.clients.get(client) ?? [], clock, len)) return true;
  }
  return false;
}

function covered(ranges: readonly { clock: number; len: number }[], clock: number, length: number): boolean {
  let from = clock;
  for (const range of ranges) {
    if (range.clock > from) break;
    from = Math.max(from, range.clock + range.len);
  }
  return from >= clock + length;
}
