import type { CalculationResult } from '#engine';
import type { ExchangeCalculation } from '#document';
import type { Remark, Tick } from '#contract';
import { findCalculation } from '../repositories/calculations';
import { listRemarks, listTicks } from '../repositories/check';
import { findRevision } from '../repositories/revisions';
import { databaseNow, saveSummary, staleSummaries, type Summary } from '../repositories/summaries';
import type { ServerContext } from './context';
import { computeContent, currentContent } from './documents';

/** How long to wait for more changes before the figures of the register are computed, in ms. */
const patience = 1000;
/** But no longer than this after the first change, while somebody writes on and on. */
const longestWait = 5000;

interface Waiting {
  timer: NodeJS.Timeout;
  since: number;
  changedBy: string | undefined;
}

/** The figures that the register shows of a revision. */
export function summaryOf(
  { cells }: Pick<ExchangeCalculation, 'cells'>,
  results: CalculationResult,
  ticks: readonly Pick<Tick, 'cellId' | 'fingerprint'>[],
  remarks: readonly Pick<Remark, 'state'>[],
): Summary {
  const shown = cells.filter((cell) => cell.kind !== 'section');
  const tickOf = new Map(ticks.map((tick) => [tick.cellId, tick.fingerprint]));
  const ticked = shown.filter((cell) => tickOf.has(cell.id));
  const valid = ticked.filter((cell) => tickOf.get(cell.id) === results.cells[cell.id]?.fingerprint);
  const count = (holds: (id: string) => boolean | undefined) => shown.filter(({ id }) => holds(id) === true).length;
  return {
    cells: shown.length,
    ticked: valid.length,
    changed: ticked.length - valid.length,
    open_remarks: remarks.filter((remark) => remark.state !== 'closed').length,
    tbv: cells.filter((cell) => (cell.settings.tbv ?? '') !== '').length,
    outside_range: count((id) => results.cells[id]?.relation?.grade === 'outside'),
    requirements_failed: shown.flatMap(({ id }) =>
      (results.cells[id]?.lines ?? []).filter((line) => line.kind === 'require' && line.satisfied !== true),
    ).length,
    errors: count((id) => results.cells[id]?.diagnostics.some((diagnostic) => diagnostic.severity === 'error')),
  };
}

/** Keeps the figures of the register: computed a moment after the last change, once for many. */
export class Summaries {
  private readonly waiting = new Map<string, Waiting>();
  /** The computation that runs for a revision: the next waits for it, so that the younger figures stay. */
  private readonly running = new Map<string, Promise<void>>();

  constructor(private readonly context: ServerContext) {}

  /** Content (with the person who wrote), ticks or remarks of a revision changed. */
  touch(revisionId: string, changedBy?: string): void {
    const before = this.waiting.get(revisionId);
    if (before !== undefined) clearTimeout(before.timer);
    const since = before?.since ?? Date.now();
    const delay = Math.max(0, Math.min(patience, since + longestWait - Date.now()));
    const timer = setTimeout(() => void this.settle(revisionId), delay);
    timer.unref();
    this.waiting.set(revisionId, { timer, since, changedBy: changedBy ?? before?.changedBy });
  }

  /** Computes and keeps the figures at once. */
  async compute(revisionId: string, changedBy?: string | null): Promise<void> {
    const before = this.running.get(revisionId) ?? Promise.resolve();
    const next = before.catch(() => undefined).then(() => this.write(revisionId, changedBy));
    this.running.set(revisionId, next);
    try {
      await next;
    } finally {
      if (this.running.get(revisionId) === next) this.running.delete(revisionId);
    }
  }

  /** After a start: figures that a server which ended suddenly left behind. */
  async catchUp(): Promise<void> {
    for (const { revisionId, changedBy } of await staleSummaries(this.context.db))
      await this.compute(revisionId, changedBy);
  }

  /** Computes at once what still waits; nothing may be touched afterwards. */
  async stop(): Promise<void> {
    await Promise.all([...this.waiting.keys()].map((revisionId) => this.settle(revisionId)));
    await Promise.allSettled(this.running.values());
  }

  /** Never throws: the figures are made good at the next change or start. */
  private async settle(revisionId: string): Promise<void> {
    const entry = this.waiting.get(revisionId);
    if (entry === undefined) return;
    clearTimeout(entry.timer);
    this.waiting.delete(revisionId);
    try {
      await this.compute(revisionId, entry.changedBy);
    } catch (error) {
      this.context.log.error({ error, revisionId }, 'summary failed');
    }
  }

  private async write(revisionId: string, changedBy?: string | null): Promise<void> {
    const { db, events } = this.context;
    const revision = await findRevision(db, revisionId);
    const calculation = revision && (await findCalculation(db, revision.calculation_id));
    if (revision === undefined || calculation === undefined) return;
    // Before anything is read: what comes in meanwhile is younger, and makes the figures stale.
    const computedAt = await databaseNow(db);
    const content = await currentContent(db, calculation, revision);
    const ticks = await listTicks(db, revisionId);
    const remarks = await listRemarks(db, revisionId);
    const summary = summaryOf(content, computeContent(content), ticks, remarks);
    await saveSummary(db, revisionId, summary, computedAt, changedBy);
    events.publish({ kind: 'notice', notice: { about: 'register', projectId: calculation.project_id, revisionId } });
  }
}
