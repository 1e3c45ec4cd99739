import type { FindRoot } from './compute';
import { families } from './families/index';
import type { EvaluateNumbers } from './range';
import { rankAmong, type RankedRelation, type RankScope } from './rank';
import type { Relation, RelationFamily } from './types';

export { accuracyAt } from './accuracy';
export { activeBranches } from './branches';
export { computeRelation, type FindRoot } from './compute';
export { judgeValidity, worstGrade, type EvaluateNumbers } from './range';
export type { RankedRelation, RankScope } from './rank';
export { readRelation, type ReadFormulaLine } from './read';
export type * from './types';

/** Changes with every entry that computes, checks or prints otherwise than before. */
export const catalogueVersion = '2026.12.2';

export interface CatalogueEntry {
  relation: Relation;
  family: RelationFamily;
}

const byId = new Map<string, CatalogueEntry>(
  families.flatMap((family) => family.relations.map((relation) => [relation.id, { relation, family }])),
);

export function listFamilies(): readonly RelationFamily[] {
  return families;
}

/** All entries in the order of the catalogue. */
export function listRelations(): readonly CatalogueEntry[] {
  return [...byId.values()];
}

export function findRelation(id: string): CatalogueEntry | undefined {
  return byId.get(id);
}

/** All entries that answer the same question, the best fit for the case first; see `RankScope`. */
export function rankRelations(
  scope: RankScope,
  values: ReadonlyMap<string, number>,
  evaluate: EvaluateNumbers,
  findRoot: FindRoot,
): RankedRelation[] {
  return rankAmong(families, scope, values, evaluate, findRoot);
}
