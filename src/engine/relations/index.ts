import { families } from './families/index';
import type { Relation, RelationFamily } from './types';

export { computeRelation, type FindRoot } from './compute';
export { judgeValidity, worstGrade, type EvaluateNumbers } from './range';
export { readRelation, type ReadFormulaLine } from './read';
export type * from './types';

/** Changes with every entry that computes, checks or prints otherwise than before. */
export const catalogueVersion = '2026.12.1';

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

export function findRelation(id: string): CatalogueEntry | undefined {
  return byId.get(id);
}
