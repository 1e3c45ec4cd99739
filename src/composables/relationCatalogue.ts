import type { Relation, RelationFamily } from '#engine';

export interface FoundFamily {
  family: RelationFamily;
  relations: readonly Relation[];
}

function heap(relation: Relation, family: RelationFamily): string {
  const { id, title, authors, year, source, wallCondition, notes = '' } = relation;
  return [id, title, authors, year, source, wallCondition, notes, family.title, family.geometry]
    .join(' ')
    .toLowerCase();
}

/** Families with the relations that carry every word somewhere; families without any are left out. */
export function findRelations(families: readonly RelationFamily[], sought: string): FoundFamily[] {
  const words = sought.toLowerCase().split(/\s+/).filter(Boolean);
  return families
    .map((family) => ({
      family,
      relations: family.relations.filter((relation) => {
        const text = heap(relation, family);
        return words.every((word) => text.includes(word));
      }),
    }))
    .filter(({ relations }) => relations.length > 0);
}
