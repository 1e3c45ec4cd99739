import type { Condition, Conditions } from '#contract';
import type { CalculationResult } from '#engine';
import type { ExchangeCalculation } from '#document';
import type { Database } from '../db/index';
import { listRemarks, listTicks } from '../repositories/check';
import { listSignatures, listWriters } from '../repositories/revisions';
import type { RevisionAccess } from './access';
import { computeContent, contentFingerprint, currentContent } from './documents';

/** Everything that the conditions of an act are judged by, from one reading of the database. */
export interface RevisionFacts {
  content: ExchangeCalculation;
  results: CalculationResult;
  fingerprint: string;
  conditions: Condition[];
}

type Item = Condition['items'][number];
const of = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;

/** Number of a cell as the sheet shows it: section and place in it. */
function numbersOf(content: ExchangeCalculation): Map<string, string> {
  let section = 0;
  let within = 0;
  return new Map(
    content.cells.map((cell) => {
      if (cell.kind === 'section') {
        section += 1;
        within = 0;
        return [cell.id, String(section)];
      }
      within += 1;
      return [cell.id, `${section}.${within}`];
    }),
  );
}

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

/** Reads a revision and judges everything that may stand between it and being checked or locked. */
export async function revisionFacts(db: Database, access: RevisionAccess, personId: string): Promise<RevisionFacts> {
  const { calculation, revision } = access;
  const content = await currentContent(db, calculation, revision);
  const results = computeContent(content);
  const fingerprint = contentFingerprint(content);
  const numbers = numbersOf(content);
  const ticks = await listTicks(db, revision.id);
  const remarks = await listRemarks(db, revision.id);
  const open = remarks.filter((remark) => remark.state !== 'closed').length;
  const writers = await listWriters(db, revision.id);
  const signatures = (await listSignatures(db, [revision.id])).get(revision.id) ?? [];
  const prepared = signatures.find((signature) => signature.meaning === 'prepared');
  const wrote = writers.some((writer) => writer.id === personId);
  const conditions: Condition[] = [
    ticksCondition(
      content,
      results,
      new Map(ticks.map((tick) => [tick.cellId, tick.fingerprint])),
      ticks.map((tick) => tick.person.name),
    ),
    {
      id: 'remarks',
      met: open === 0,
      sentence:
        remarks.length === 0
          ? 'none asked'
          : open === 0
            ? `${remarks.length} of ${remarks.length} closed`
            : `${open} of ${remarks.length} still open`,
      items: [],
    },
    rangesCondition(content, results, numbers),
    errorsCondition(content, results, numbers),
    requirementsCondition(content, results, numbers),
    tbvCondition(content, numbers),
    {
      id: 'independence',
      met: !wrote,
      sentence: wrote ? 'you wrote in this revision' : 'you wrote nothing in this revision',
      items: [],
    },
    {
      id: 'signatures',
      met: prepared?.fingerprint === fingerprint,
      sentence:
        prepared === undefined
          ? 'not signed as prepared, or changed since'
          : prepared.fingerprint === fingerprint
            ? `prepared: ${prepared.person.name}`
            : 'changed since it was signed as prepared',
      items: [],
    },
  ];
  return { content, results, fingerprint, conditions };
}

export function conditionsOf({ fingerprint, conditions }: RevisionFacts): Conditions {
  return { contentFingerprint: fingerprint, conditions };
}
