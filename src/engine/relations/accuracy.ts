import type { EvaluateNumbers } from './range';
import { readRelation } from './read';
import type { Relation } from './types';

/**
 * Stated accuracy of a relation at a case, as a fraction: that of the first band of the range that
 * holds, else the general one. Undefined where the source states none.
 */
export function accuracyAt(
  relation: Relation,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
): number | undefined {
  const band = readRelation(relation).bands.find(({ when }) => evaluate(when, values) === 1);
  return band?.relativeAccuracy ?? relation.relativeAccuracy;
}
