import { findCalculation } from '../repositories/calculations';
import { listRemarks, listTicks } from '../repositories/check';
import { findRevision } from '../repositories/revisions';
import { saveSummary } from '../repositories/summaries';
import type { ServerContext } from './context';
import { computeContent, currentContent } from './documents';

/** How long to wait for more changes before the figures of the register are computed, in ms. */
const patience = 1000;

/** Keeps the figures of the register: computed a moment after the last change, once for many. */
export class Summaries {
  private readonly waiting = new Map<string, { timer: NodeJS.Timeout; changedBy: string | undefined }>();

  constructor(private readonly context: ServerContext) {}

  /** Content (with the person who wrote), ticks or remarks of a revision changed. */
  touch(revisionId: string, changedBy?: string): void {
    const before = this.waiting.get(revisionId);
    if (before !== undefined) clearTimeout(before.timer);
    const timer = setTimeout(() => {
      const entry = this.waiting.get(revisionId);
      this.waiting.delete(revisionId);
      this.compute(revisionId, entry?.changedBy).catch((error: unknown) =>
        this.context.log.error({ error, revisionId }, 'summary failed'),
      );
    }, patience);
    timer.unref();
    this.waiting.set(revisionId, { timer, changedBy: changedBy ?? before?.changedBy });
  }

  /** Computes and keeps the figures at once. */
  async compute(revisionId: string, changedBy?: string): Promise<void> {
    const { db, events } = this.context;
    const revision = await findRevision(db, revisionId);
    const calculation = revision && (await findCalculation(db, revision.calculation_id));
    if (revision === undefined || calculation === undefined) return;
    const content = await currentContent(db, calculation, revision);
    const results = computeContent(content);
    const ticks = new Map((await listTicks(db, revisionId)).map((tick) => [tick.cellId, tick.fingerprint]));
    const remarks = await listRemarks(db, revisionId);
    const tickable = content.cells.filter((cell) => cell.kind !== 'section');
    const isTicked = (id: string) => ticks.get(id) === results.cells[id]?.fingerprint;
    await saveSummary(
      db,
      revisionId,
      {
        cells: tickable.length,
        ticked: tickable.filter((cell) => ticks.has(cell.id) && isTicked(cell.id)).length,
        changed: tickable.filter((cell) => ticks.has(cell.id) && !isTicked(cell.id)).length,
        open_remarks: remarks.filter((remark) => remark.state !== 'closed').length,
        tbv: content.cells.filter((cell) => (cell.settings.tbv ?? '') !== '').length,
        outside_range: tickable.filter((cell) => results.cells[cell.id]?.relation?.grade === 'outside').length,
      },
      changedBy,
    );
    events.publish({ kind: 'notice', notice: { about: 'register', projectId: calculation.project_id, revisionId } });
  }

  stop(): void {
    for (const { timer } of this.waiting.values()) clearTimeout(timer);
    this.waiting.clear();
  }
}
