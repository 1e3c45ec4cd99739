import type {
  Account,
  ChangeCalculationRequest,
  CreateCalculationRequest,
  RegisterRow,
  RevisionDetail,
} from '#contract';
import { fillDocument, type ExchangeCalculation } from '#document';
import * as Y from 'yjs';
import type { Database } from '../db/index';
import { notFound } from '../errors/index';
import {
  insertCalculation,
  nextNumber,
  registerRows,
  updateCalculation,
  type CalculationRow,
} from '../repositories/calculations';
import { appendUpdates } from '../repositories/documents';
import { insertRevision, listRevisions } from '../repositories/revisions';
import { appendTrail } from '../repositories/trail';
import { authorizeCalculation, authorizeProject } from './access';
import type { ServerContext } from './context';
import { currentContent } from './documents';
import { exampleById } from './examples';
import { revisionDetail } from './revisions';
import type { Summaries } from './summaries';

export async function register({ db }: ServerContext, account: Account, projectId: string): Promise<RegisterRow[]> {
  await authorizeProject(db, account, projectId, 'project.read');
  return registerRows(db, projectId, account.id);
}

async function startingContent(
  context: ServerContext,
  account: Account,
  start: CreateCalculationRequest['start'],
): Promise<ExchangeCalculation | undefined> {
  if (start.from === 'empty') return undefined;
  if (start.from === 'example') return exampleById(start.example);
  const { calculation } = await authorizeCalculation(context.db, account, start.calculationId, 'project.read');
  const latest = (await listRevisions(context.db, calculation.id)).at(-1);
  return latest === undefined ? undefined : currentContent(context.db, calculation, latest);
}

/** Writes a first content as an update of its author. */
export async function writeContent(
  db: Database,
  revisionId: string,
  personId: string,
  content: ExchangeCalculation,
): Promise<void> {
  const doc = new Y.Doc();
  fillDocument(doc, content);
  await appendUpdates(db, revisionId, [{ personId, content: Y.encodeStateAsUpdate(doc) }], () => true);
}

/** A new calculation with the next number of the project and a draft of revision A. */
export async function createCalculation(
  context: ServerContext,
  summaries: Summaries,
  account: Account,
  projectId: string,
  request: CreateCalculationRequest,
): Promise<RevisionDetail> {
  await authorizeProject(context.db, account, projectId, 'calculation.create');
  const content = await startingContent(context, account, request.start);
  const { calculationId, revisionId } = await context.db.transaction(async (transaction) => {
    const number = await nextNumber(transaction, projectId);
    const row = {
      project_id: projectId,
      number,
      title: request.title,
      group: request.group ?? '',
      created_by: account.id,
    };
    const created = await insertCalculation(transaction, row);
    const revision = await insertRevision(transaction, { calculation_id: created, letter: 'A', begun_by: account.id });
    await appendTrail(transaction, {
      projectId,
      calculationId: created,
      revisionId: revision,
      personId: account.id,
      act: 'calculation.create',
      sentence: `opened calculation ${number} ${request.title}`,
    });
    if (content !== undefined) await writeContent(transaction, revision, account.id, content);
    return { calculationId: created, revisionId: revision };
  });
  await summaries.compute(revisionId, account.id);
  context.events.publish({ kind: 'notice', notice: { about: 'trail', projectId, revisionId: null } });
  return calculationDetail(context, account, calculationId, undefined);
}

/** A calculation at one of its revisions; without a letter at the latest. */
export async function calculationDetail(
  context: ServerContext,
  account: Account,
  calculationId: string,
  letter: string | undefined,
): Promise<RevisionDetail> {
  const { calculation } = await authorizeCalculation(context.db, account, calculationId, 'project.read');
  const revisions = await listRevisions(context.db, calculation.id);
  const chosen = letter === undefined ? revisions.at(-1) : revisions.find((revision) => revision.letter === letter);
  if (chosen === undefined) throw notFound('revision');
  return revisionDetail(context, account, chosen.id);
}

export async function changeCalculation(
  context: ServerContext,
  account: Account,
  calculationId: string,
  request: ChangeCalculationRequest,
): Promise<RevisionDetail> {
  const { calculation } = await authorizeCalculation(context.db, account, calculationId, 'calculation.rename');
  const sentence = sentenceOf(calculation, request);
  if (sentence === undefined) return calculationDetail(context, account, calculationId, undefined);
  await context.db.transaction(async (transaction) => {
    await updateCalculation(transaction, calculationId, request);
    await appendTrail(transaction, {
      projectId: calculation.project_id,
      calculationId,
      personId: account.id,
      act: 'calculation.rename',
      sentence,
      detail: { ...request },
    });
  });
  context.events.publish({
    kind: 'notice',
    notice: { about: 'register', projectId: calculation.project_id, revisionId: null },
  });
  return calculationDetail(context, account, calculationId, undefined);
}

/** What a change does, in words; undefined when it changes nothing. */
function sentenceOf(calculation: CalculationRow, request: ChangeCalculationRequest): string | undefined {
  const { title = calculation.title, group = calculation.group } = request;
  const parts = [
    title === calculation.title ? '' : `renamed ${calculation.number} from "${calculation.title}" to "${title}"`,
    group === calculation.group ? '' : `put ${calculation.number} under "${group}"`,
  ].filter((part) => part !== '');
  return parts.length === 0 ? undefined : parts.join(' and ');
}
