import { readFileSync } from 'node:fs';
import { evaluateRelation, findRelation, validityOf, workThrough, type Relation, type ValidityResult } from '#engine';
import { readCsv } from '../../src-server/commands/reference/csv';

type Numbers = Readonly<Record<string, number>>;

/** An entry of the catalogue; throws when it is not carried. */
export function relation(id: string): Relation {
  const entry = findRelation(id);
  if (entry === undefined) throw new Error(`The catalogue has no ${id}.`);
  return entry.relation;
}

/** Result of a relation on plain numbers in the units of its symbols; throws where it has none. */
export function result(id: string, inputs: Numbers): number {
  const got = evaluateRelation(relation(id), new Map(Object.entries(inputs)));
  if (!got.ok) throw new Error(`${id}: ${got.reason}`);
  return got.value;
}

/** Whether a relation has a result for these numbers. */
export function hasResult(id: string, inputs: Numbers): boolean {
  return evaluateRelation(relation(id), new Map(Object.entries(inputs))).ok;
}

/** Conditions of a relation for a case, judged after its formula is worked through, by condition. */
export function judged(id: string, inputs: Numbers): Record<string, ValidityResult> {
  const given = new Map(Object.entries(inputs));
  const one = relation(id);
  const complete = one.inputs.every(({ symbol }) => given.has(symbol));
  const values = complete ? workThrough(one, given).values : given;
  return Object.fromEntries(validityOf(one, values).map((validity) => [validity.condition, validity]));
}

export interface CheckRow {
  id: string;
  inputs: Numbers;
  expected: number;
  tolerance: number;
  reference: string;
}

function readRows(): CheckRow[] {
  const text = readFileSync(new URL('../check-values/relations.csv', import.meta.url), 'utf8');
  return readCsv(text).map((row) => ({
    id: row.relation_id ?? '',
    inputs: JSON.parse(row.inputs_json ?? '{}') as Numbers,
    expected: Number(row.expected),
    tolerance: Number(row.relative_tolerance),
    reference: row.reference ?? '',
  }));
}

/** The check values of the catalogue; every row names where its number is from. */
export const checkRows: readonly CheckRow[] = readRows();
const byRelation = new Map<string, CheckRow[]>();
for (const row of checkRows) byRelation.set(row.id, [...(byRelation.get(row.id) ?? []), row]);

export function checkRowsOf(id: string): readonly CheckRow[] {
  return byRelation.get(id) ?? [];
}
