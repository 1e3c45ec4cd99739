import { evaluateNumbers } from '../evaluation/index';
import type { Expression } from '../language/index';
import { findRoot } from '../numerics/roots';
import {
  accuracyAt,
  activeBranches,
  computeRelation,
  judgeValidity,
  rankRelations as rankAll,
  type RankedRelation,
  type RankScope,
} from '../relations/index';
import type { Relation } from '../relations/types';
import type { ActiveBranch, ValidityResult } from './types';

/** Value of an expression on plain numbers; undefined when it has none. */
export function numberOf(expression: Expression, values: ReadonlyMap<string, number>): number | undefined {
  const evaluated = evaluateNumbers(expression, values);
  return evaluated.ok ? evaluated.value : undefined;
}

function rootOf(at: (x: number) => number | undefined, low: number, high: number): number | undefined {
  const found = findRoot(at, low, high);
  return found.converged ? found.root : undefined;
}

/** Works a relation through on plain numbers in the units of its symbols. */
export function workThrough(
  relation: Relation,
  given: ReadonlyMap<string, number>,
): { values: Map<string, number>; failed?: string } {
  return computeRelation(relation, given, numberOf, rootOf);
}

export function validityOf(relation: Relation, values: ReadonlyMap<string, number>): ValidityResult[] {
  return judgeValidity(relation, values, numberOf);
}

/** Active sides of the piecewise lines of a relation. */
export function branchesOf(relation: Relation, values: ReadonlyMap<string, number>): ActiveBranch[] {
  return activeBranches(relation, values, numberOf);
}

/** Stated accuracy at a case, as a fraction; undefined where the source states none. */
export function statedAccuracyOf(relation: Relation, values: ReadonlyMap<string, number>): number | undefined {
  return accuracyAt(relation, values, numberOf);
}

/** All relations that answer the same question, the best fit for the values of a case first. */
export function rankRelations(scope: RankScope, values: ReadonlyMap<string, number>): RankedRelation[] {
  return rankAll(scope, values, numberOf, rootOf);
}

/** The result of a relation as a plain number in the unit of its output, or why there is none. */
export function evaluateRelation(
  relation: Relation,
  given: ReadonlyMap<string, number>,
): { ok: true; value: number } | { ok: false; reason: string } {
  const missing = relation.inputs.filter((input) => !given.has(input.symbol)).map((input) => input.symbol);
  if (missing.length > 0) return { ok: false, reason: `not given: ${missing.join(', ')}` };
  const { values, failed } = workThrough(relation, given);
  const value = values.get(relation.output.symbol);
  if (failed !== undefined || value === undefined)
    return { ok: false, reason: `no value for ${failed ?? relation.output.symbol}` };
  return { ok: true, value };
}
