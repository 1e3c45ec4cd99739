import type { Relation, RelationFamily } from '#engine';
import { foldForSearch } from './searchText';

export interface FoundFamily {
  family: RelationFamily;
  relations: readonly Relation[];
}

function heap(relation: Relation, family: RelationFamily): string {
  const { id, title, authors, year, source, wallCondition, notes = '' } = relation;
  return foldForSearch(
    [id, title, authors, year, source, wallCondition, notes, family.title, family.geometry].join(' '),
  );
}

/** Families with the relations that carry every word somewhere; families without any are left out. */
export function findRelations(families: readonly RelationFamily[], sought: string): FoundFamily[] {
  const words = foldForSearch(sought).split(/\s+/).filter(Boolean);
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
