import type { ReadFormulaLine } from './read';
import { readRelation } from './read';
import type { EvaluateNumbers } from './range';
import type { Relation } from './types';

/** Finds a zero of a function between two ends; undefined when there is none. Handed in. */
export type FindRoot = (evaluate: (x: number) => number | undefined, low: number, high: number) => number | undefined;

function lineValue(
  line: ReadFormulaLine,
  values: Map<string, number>,
  evaluate: EvaluateNumbers,
  findRoot: FindRoot,
): number | undefined {
  if (line.kind === 'assignment') return evaluate(line.expression, values);
  const low = evaluate(line.low, values);
  const high = evaluate(line.high, values);
  if (low === undefined || high === undefined) return undefined;
  const trial = new Map(values);
  const at = (x: number) => {
    trial.set(line.symbol, x);
    return evaluate(line.equation, trial);
  };
  return findRoot(at, low, high);
}

/**
 * Works through the formula lines of a relation on plain numbers. Answers the numbers given and all
 * that follow, by symbol; it stops at the first line without a value, which `failed` names.
 */
export function computeRelation(
  relation: Relation,
  given: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
  findRoot: FindRoot,
): { values: Map<string, number>; failed?: string } {
  const values = new Map(given);
  for (const line of readRelation(relation).formula) {
    const value = lineValue(line, values, evaluate, findRoot);
    if (value === undefined) return { values, failed: line.symbol };
    values.set(line.symbol, value);
  }
  return { values };
}
