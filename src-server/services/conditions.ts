import type { Condition, Conditions, Meaning, Person, Remark, RevisionState, Signature, Tick } from '#contract';
import type { CalculationResult } from '#engine';
import type { ExchangeCalculation } from '#document';
import type { Database } from '../db/index';
import { listRemarks, listTicks } from '../repositories/check';
import { listPreparers, listSignatures, listWriters } from '../repositories/revisions';
import type { RevisionAccess } from './access';
import { cellNumbers } from './cell-numbers';
import { computeContent, contentFingerprint, currentContent, differingNames } from './documents';

/** Everything that the conditions of an act are judged by, from one reading of the database. */
export interface RevisionFacts {
  content: ExchangeCalculation;
  results: CalculationResult;
  fingerprint: string;
  conditions: Condition[];
  ticks: Tick[];
  remarks: Remark[];
  /** Those that are not void. */
  signatures: Signature[];
}

type Item = Condition['items'][number];
const of = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;

function ticksCondition(
  content: ExchangeCalculation,
  results: CalculationResult,
  ticks: ReadonlyMap<string, string>,
  names: readonly string[],
): Condition {
  const cells = content.cells.filter((cell) => cell.kind !== 'section');
  const open = cells.filter((cell) => ticks.get(cell.id) !== results.cells[cell.id]?.fingerprint);
  const lapsed = open.filter((cell) => ticks.has(cell.id)).length;
  const by = [...new Set(names)].join(', ');
  const sentence =
    open.length === 0
      ? `all ${of(cells.length, 'cell', 'cells')}${by === '' ? '' : `, by ${by}`}`
      : `${of(open.length, 'cell', 'cells')} of ${cells.length} not ticked${lapsed > 0 ? `, ${lapsed} of them changed since` : ''}`;
  return { id: 'ticks', met: open.length === 0 && cells.length > 0, sentence, items: [] };
}

function rangesCondition(
  content: ExchangeCalculation,
  results: CalculationResult,
  numbers: ReadonlyMap<string, string>,
): Condition {
  const outside = content.cells.filter((cell) => results.cells[cell.id]?.relation?.grade === 'outside');
  const items: Item[] = outside
    .filter((cell) => (cell.settings.keepReason ?? '') === '')
    .map((cell) => ({
      key: `range:${cell.id}`,
      cellId: cell.id,
      sentence: `${numbers.get(cell.id) ?? ''}: ${results.cells[cell.id]?.relation?.title ?? 'relation'} is outside its stated range`,
    }));
  const kept = outside.length - items.length;
  const sentence =
    items.length > 0
      ? `${of(items.length, 'relation', 'relations')} outside the stated range`
      : kept > 0
        ? `${of(kept, 'relation', 'relations')} kept outside the stated range, with reasons`
        : 'every relation inside what its source states';
  return { id: 'ranges', met: items.length === 0, sentence, items };
}

function requirementsCondition(
  content: ExchangeCalculation,
  results: CalculationResult,
  numbers: ReadonlyMap<string, string>,
): Condition {
  const all = content.cells.flatMap((cell) =>
    (results.cells[cell.id]?.lines ?? []).filter((line) => line.kind === 'require').map((line) => ({ cell, line })),
  );
  const items = all
    .filter(({ line }) => line.satisfied !== true)
    .map(({ cell, line }): Item => ({
      key: `requirement:${cell.id}:${line.line}`,
      cellId: cell.id,
      sentence: `${numbers.get(cell.id) ?? ''}: a requirement ${line.satisfied === false ? 'does not hold' : 'could not be evaluated'}`,
    }));
  const sentence =
    all.length === 0
      ? 'none is stated'
      : items.length === 0
        ? `${of(all.length, 'requirement holds', 'requirements hold')}`
        : `${items.length} of ${all.length} not met`;
  return { id: 'requirements', met: items.length === 0, sentence, items };
}

function tbvCondition(content: ExchangeCalculation, numbers: ReadonlyMap<string, string>): Condition {
  const items = content.cells
    .filter((cell) => (cell.settings.tbv ?? '') !== '')
    .map((cell): Item => ({
      key: `tbv:${cell.id}`,
      cellId: cell.id,
      sentence: `${numbers.get(cell.id) ?? ''}: ${cell.settings.tbv ?? ''}`,
    }));
  return {
    id: 'tbv',
    met: items.length === 0,
    sentence: items.length === 0 ? 'nothing left' : `${items.length} left`,
    items,
  };
}

function errorsCondition(
  content: ExchangeCalculation,
  results: CalculationResult,
  numbers: ReadonlyMap<string, string>,
): Condition {
  const wrong = content.cells.filter((cell) =>
    results.cells[cell.id]?.diagnostics.some((diagnostic) => diagnostic.severity === 'error'),
  );
  const list = wrong.map((cell) => numbers.get(cell.id)).join(', ');
  return {
    id: 'errors',
    met: wrong.length === 0,
    sentence: wrong.length === 0 ? 'every line has a result' : `no result in ${list}`,
    items: [],
  };
}

function remarksCondition(remarks: readonly Remark[]): Condition {
  const open = remarks.filter((remark) => remark.state !== 'closed').length;
  const closed = remarks.length === 0 ? 'none asked' : `${remarks.length} of ${remarks.length} closed`;
  return {
    id: 'remarks',
    met: open === 0,
    sentence: open === 0 ? closed : `${open} of ${remarks.length} still open`,
    items: [],
  };
}

function recomputedCondition(content: ExchangeCalculation, results: CalculationResult): Condition {
  const other = differingNames(content, results);
  return {
    id: 'recomputed',
    met: other.length === 0,
    sentence:
      other.length === 0
        ? `computed twice on the server, ${of(results.names.length, 'value', 'values')} equal to 12 digits`
        : `the second pass gave other values for ${other.join(', ')}`,
    items: [],
  };
}

/** Whoever wrote in a revision, or signed it as prepared, does not check it. */
function independenceCondition(writers: readonly Person[], preparedBy: readonly string[], personId: string): Condition {
  const wrote = writers.some((writer) => writer.id === personId);
  const prepared = preparedBy.includes(personId);
  return {
    id: 'independence',
    met: !wrote && !prepared,
    sentence: wrote
      ? 'you wrote in this revision'
      : prepared
        ? 'you signed this revision as prepared'
        : 'you wrote nothing in this revision',
    items: [],
  };
}

/** Whether the signatures that the state needs are bound to exactly what the sheet says now. */
function signaturesCondition(state: RevisionState, signatures: readonly Signature[], fingerprint: string): Condition {
  const needed: readonly Meaning[] = state === 'checked' ? ['prepared', 'checked'] : ['prepared'];
  const given = needed.map((meaning) => ({
    meaning,
    signature: signatures.find((signature) => signature.meaning === meaning),
  }));
  const open = given.find(({ signature }) => signature?.fingerprint !== fingerprint);
  const sentence =
    open === undefined
      ? given.map(({ meaning, signature }) => `${meaning}: ${signature?.person.name ?? ''}`).join(', ')
      : open.signature === undefined
        ? `not signed as ${open.meaning}, or changed since`
        : `changed since it was signed as ${open.meaning}`;
  return { id: 'signatures', met: open === undefined, sentence, items: [] };
}

/** Reads a revision and judges everything that may stand between it and being checked or locked. */
export async function revisionFacts(db: Database, access: RevisionAccess, personId: string): Promise<RevisionFacts> {
  const { calculation, revision } = access;
  const content = await currentContent(db, calculation, revision);
  const results = computeContent(content);
  const fingerprint = contentFingerprint(content);
  const numbers = cellNumbers(content);
  const ticks = await listTicks(db, revision.id);
  const remarks = await listRemarks(db, revision.id);
  const writers = await listWriters(db, revision.id);
  const signatures = (await listSignatures(db, [revision.id])).get(revision.id) ?? [];
  const preparedBy = await listPreparers(db, revision.id);
  const conditions: Condition[] = [
    ticksCondition(
      content,
      results,
      new Map(ticks.map((tick) => [tick.cellId, tick.fingerprint])),
      ticks.map((tick) => tick.person.name),
    ),
    remarksCondition(remarks),
    rangesCondition(content, results, numbers),
    errorsCondition(content, results, numbers),
    requirementsCondition(content, results, numbers),
    tbvCondition(content, numbers),
    recomputedCondition(content, results),
    independenceCondition(writers, preparedBy, personId),
    signaturesCondition(revision.state, signatures, fingerprint),
  ];
  return { content, results, fingerprint, conditions, ticks, remarks, signatures };
}

export function conditionsOf({ fingerprint, conditions }: RevisionFacts): Conditions {
  return { contentFingerprint: fingerprint, conditions };
}
