import type { RangeGrade, ValidityResult } from '../calculation/types';
import { accuracyAt } from './accuracy';
import { computeRelation, type FindRoot } from './compute';
import { judgeValidity, worstGrade, type EvaluateNumbers } from './range';
import type { Geometry, Relation, RelationFamily } from './types';

/** Which entries are set against each other. Left out: no restriction. */
export interface RankScope {
  geometry?: Geometry | undefined;
  family?: string | undefined;
  /** Symbol of the result, such as `Nu`: a friction factor is no rival of a Nusselt number. */
  output?: string | undefined;
}

/** How an entry of the catalogue fits a case. */
export interface RankedRelation {
  relation: Relation;
  family: RelationFamily;
  /** Worst grade of all conditions; `unchecked` where the values do not tell. */
  grade: RangeGrade;
  validity: ValidityResult[];
  /** The result in the unit of the output, where the values suffice. */
  output: number | undefined;
  /** Stated accuracy at this case as a fraction; 0 for an exact relation. */
  accuracy: number | undefined;
  /** Inputs of the formula that the case does not give. */
  missing: string[];
}

const order: readonly RangeGrade[] = ['inside', 'edge', 'unchecked', 'outside'];

function judged(
  relation: Relation,
  family: RelationFamily,
  given: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
  findRoot: FindRoot,
): RankedRelation {
  const missing = relation.inputs.filter((input) => !given.has(input.symbol)).map((input) => input.symbol);
  const { values } = missing.length === 0 ? computeRelation(relation, given, evaluate, findRoot) : { values: given };
  const validity = judgeValidity(relation, values, evaluate);
  const output = missing.length === 0 ? values.get(relation.output.symbol) : undefined;
  // Without a result a case that breaks no condition is still not known to fit.
  const worst = worstGrade(validity.map((one) => one.grade));
  const grade = output === undefined && worst !== 'outside' ? 'unchecked' : worst;
  const accuracy = accuracyAt(relation, values, evaluate) ?? (/^exact\b/.test(relation.accuracy) ? 0 : undefined);
  return { relation, family, grade, validity, output, accuracy, missing };
}

/** Better first: what gives a result, fit, stated accuracy, confirmation. Equal ones keep the catalogue's order. */
function compare(a: RankedRelation, b: RankedRelation): number {
  const [first, second] = [a.accuracy ?? Infinity, b.accuracy ?? Infinity];
  const byAccuracy = first === second ? 0 : first - second;
  return (
    Number(a.output === undefined) - Number(b.output === undefined) ||
    order.indexOf(a.grade) - order.indexOf(b.grade) ||
    byAccuracy ||
    Number(b.relation.confirmed) - Number(a.relation.confirmed)
  );
}

/**
 * The entries of some families that answer the same question, the best fit for a case first.
 * `values` holds what the case gives, by symbol, in the units of the symbols.
 */
export function rankAmong(
  families: readonly RelationFamily[],
  scope: RankScope,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
  findRoot: FindRoot,
): RankedRelation[] {
  return families
    .filter(({ geometry }) => scope.geometry === undefined || scope.geometry === geometry)
    .filter(({ id }) => scope.family === undefined || scope.family === id)
    .flatMap((family) =>
      family.relations
        .filter(({ output }) => scope.output === undefined || scope.output === output.symbol)
        .map((relation) => judged(relation, family, values, evaluate, findRoot)),
    )
    .sort(compare);
}
