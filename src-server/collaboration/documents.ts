import type { ServerContext } from '../services/context';
import { SharedDocument, type DocumentCallbacks } from './shared-document';

export interface Seat {
  document: Promise<SharedDocument>;
  leave(): void;
}

interface OpenDocument {
  loading: Promise<SharedDocument>;
  document: SharedDocument | undefined;
  /** Browsers at it, those included for which it is still being loaded. */
  seats: number;
}

/** The documents that are open in this process: each loaded once, freed when its last browser has gone. */
export class Documents {
  private readonly byRevision = new Map<string, OpenDocument>();
  private readonly freeing = new Set<Promise<void>>();

  constructor(
    private readonly context: ServerContext,
    private readonly callbacks: (revisionId: string) => DocumentCallbacks,
  ) {}

  /** A seat at a document. It is held from this moment on, also while the document is being loaded. */
  sit(revisionId: string): Seat {
    const open = this.byRevision.get(revisionId) ?? this.load(revisionId);
    open.seats += 1;
    let seated = true;
    return {
      document: open.loading,
      leave: () => {
        if (!seated) return;
        seated = false;
        open.seats -= 1;
        if (open.seats === 0) this.free(revisionId, open);
      },
    };
  }

  private load(revisionId: string): OpenDocument {
    const loading = SharedDocument.open(revisionId, this.context, this.callbacks(revisionId));
    const open: OpenDocument = { loading, document: undefined, seats: 0 };
    this.byRevision.set(revisionId, open);
    loading.then(
      (document) => {
        open.document = document;
      },
      () => {
        // The next one who comes tries again.
        if (this.byRevision.get(revisionId) === open) this.byRevision.delete(revisionId);
      },
    );
    return open;
  }

  private free(revisionId: string, open: OpenDocument): void {
    const work = this.closeWhenEmpty(revisionId, open)
      .catch((error: unknown) => this.context.log.error({ error, revisionId }, 'document was not closed'))
      .finally(() => this.freeing.delete(work));
    this.freeing.add(work);
  }

  private async closeWhenEmpty(revisionId: string, open: OpenDocument): Promise<void> {
    const { document } = open;
    if (document === undefined) return;
    // Only what is written through can be loaded by whoever comes next.
    await document.settled();
    if (open.seats > 0 || this.byRevision.get(revisionId) !== open) return;
    this.byRevision.delete(revisionId);
    await document.close();
  }

  /** Those that are loaded. */
  all(): SharedDocument[] {
    return [...this.byRevision.values()].flatMap(({ document }) => document ?? []);
  }

  /** Waits until every document that nobody sits at is closed. */
  async freed(): Promise<void> {
    while (this.freeing.size > 0) await Promise.all(this.freeing);
  }
}
