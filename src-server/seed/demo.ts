import type { Account } from '#contract';
import { openDocument, type CalculationDocument, type ExchangeCalculation } from '#document';
import type { CellResult } from '#engine';
import * as Y from 'yjs';
import { appendUpdates } from '../repositories/documents';
import { authorizeRevision } from '../services/access';
import { createCalculation, writeContent } from '../services/calculations';
import type { ServerContext } from '../services/context';
import { computeContent, currentContent, loadDocument } from '../services/documents';
import { lockRevision } from '../services/locking';
import { answerRemark, askRemark, setClosed } from '../services/remarks';
import { beginRevision, revisionConditions } from '../services/revisions';
import { handOver, signCheck } from '../services/signing';
import type { Summaries } from '../services/summaries';
import { tickCell } from '../services/ticks';

/** Passphrase of all demo accounts, printed at the start. */
export const demoPassword = 'velvet-heron-42';

export interface Team {
  engineer: Account;
  second: Account;
  checker: Account;
  lead: Account;
}

/** The people of a project at work: everything is done through the services, so that trail, ticks and signatures are real. */
export class Demo {
  constructor(
    private readonly context: ServerContext,
    private readonly summaries: Summaries,
    private readonly projectId: string,
    readonly team: Team,
  ) {}

  async fromExample(by: Account, title: string, group: string, example: string): Promise<string> {
    const start = { from: 'example' as const, example };
    const detail = await createCalculation(this.context, this.summaries, by, this.projectId, { title, group, start });
    return detail.revision.id;
  }

  async fromContent(by: Account, group: string, content: ExchangeCalculation): Promise<string> {
    const request = { title: content.title, group, start: { from: 'empty' as const } };
    const { revision } = await createCalculation(this.context, this.summaries, by, this.projectId, request);
    await writeContent(this.context.db, revision.id, by.id, content);
    await this.summaries.compute(revision.id, by.id);
    return revision.id;
  }

  /** Changes the sheet as the person's browser would. */
  async edit(revisionId: string, by: Account, change: (document: CalculationDocument) => void): Promise<void> {
    const { doc } = await loadDocument(this.context.db, revisionId);
    const before = Y.encodeStateVector(doc);
    change(openDocument(doc, { newId: () => `d${doc.clientID.toString(36)}` }));
    const content = Y.encodeStateAsUpdate(doc, before);
    await appendUpdates(this.context.db, revisionId, [{ personId: by.id, content }], () => true);
    await this.summaries.compute(revisionId, by.id);
  }

  private async fingerprint(by: Account, revisionId: string): Promise<string> {
    return (await revisionConditions(this.context, by, revisionId)).contentFingerprint;
  }

  async handOver(revisionId: string, by: Account): Promise<void> {
    await handOver(this.context, by, revisionId, {
      password: demoPassword,
      contentFingerprint: await this.fingerprint(by, revisionId),
      checkerId: this.team.checker.id,
    });
  }

  /** The cells that can be ticked, with their results. */
  async results(revisionId: string): Promise<CellResult[]> {
    const { db } = this.context;
    const access = await authorizeRevision(db, this.team.checker.id, revisionId, 'revision.read');
    const content = await currentContent(db, access.calculation, access.revision);
    const results = computeContent(content);
    return content.cells.flatMap((cell) => (cell.kind === 'section' ? [] : (results.cells[cell.id] ?? [])));
  }

  async tick(revisionId: string, most = Infinity): Promise<void> {
    for (const cell of (await this.results(revisionId)).slice(0, most))
      await tickCell(this.context, this.summaries, this.team.checker, revisionId, cell.id, cell.fingerprint);
  }

  async check(revisionId: string): Promise<void> {
    const { checker } = this.team;
    await this.tick(revisionId);
    await signCheck(this.context, checker, revisionId, {
      password: demoPassword,
      contentFingerprint: await this.fingerprint(checker, revisionId),
    });
  }

  /** Locks; `reasons` in the order of what is left open. */
  async lock(revisionId: string, changeNote: string, ...reasons: string[]): Promise<void> {
    const { lead } = this.team;
    const { contentFingerprint, conditions } = await revisionConditions(this.context, lead, revisionId);
    const items = conditions.flatMap((condition) => condition.items);
    await lockRevision(this.context, lead, revisionId, {
      password: demoPassword,
      contentFingerprint,
      changeNote,
      reasons: Object.fromEntries(items.map((item, index) => [item.key, reasons[index] ?? ''])),
    });
  }

  /** Hands over, ticks everything, checks and locks. */
  async issue(revisionId: string, by: Account, changeNote: string, ...reasons: string[]): Promise<void> {
    await this.handOver(revisionId, by);
    await this.check(revisionId);
    await this.lock(revisionId, changeNote, ...reasons);
  }

  async begin(revisionId: string, by: Account): Promise<string> {
    const { calculation } = await authorizeRevision(this.context.db, by.id, revisionId, 'revision.begin');
    return (await beginRevision(this.context, this.summaries, by, calculation.id)).revision.id;
  }

  async remark(revisionId: string, cellId: string, text: string, answer?: string, close = false): Promise<void> {
    const { checker, engineer } = this.team;
    const remarks = await askRemark(this.context, this.summaries, checker, revisionId, { cellId, text });
    const id = remarks.at(-1)?.id ?? '';
    if (answer !== undefined) await answerRemark(this.context, this.summaries, engineer, id, answer);
    if (close) await setClosed(this.context, this.summaries, checker, id, true);
  }
}
