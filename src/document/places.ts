import { generateKeyBetween, generateNKeysBetween } from 'fractional-indexing';

/** A cell's fractional key: cells stand in the order of their keys, ties in the order of their ids. */
export interface Placed {
  id: string;
  /** Empty when what stands in the document is no key; such cells stand on top. */
  place: string;
}

/** Repeated insertion at one spot lengthens keys by a sign for every six; a calculation of full size stays below. */
const longestPlace = 4000;

/** The key of a cell as it stands in the document; empty for anything that other keys cannot be made beside. */
export function readPlace(given: unknown): string {
  if (typeof given !== 'string' || given.length > longestPlace || !/^[A-Za-z][0-9A-Za-z]*$/.test(given)) return '';
  try {
    generateKeyBetween(given, null);
    generateKeyBetween(null, given);
    return given;
  } catch {
    return '';
  }
}

function compare(left: string, right: string): number {
  if (left === right) return 0;
  return left < right ? -1 : 1;
}

/** In the order of the sheet: by place, ties by id. */
export function inOrder<Cell extends Placed>(cells: readonly Cell[]): Cell[] {
  return [...cells].sort((a, b) => compare(a.place, b.place) || compare(a.id, b.id));
}

/** Keys for cells one after the other, in an empty sheet. */
export function firstPlaces(count: number): string[] {
  return generateNKeysBetween(null, null, count);
}

/**
 * The key of a cell right below `index` (-1 for the top) of cells in order. Two people who write at one
 * spot at the same time give their cells the same key, and nothing fits between equal keys: those below
 * that share the key are given new ones too, in the order in which they stand.
 */
export function placeBelow(cells: readonly Placed[], index: number): { place: string; replaced: Placed[] } {
  const above = cells[index]?.place ?? '';
  let next = index + 1;
  while (next < cells.length && cells[next]?.place === above) next += 1;
  const sharing = cells.slice(index + 1, next);
  const below = cells[next]?.place ?? null;
  const [place = '', ...others] = generateNKeysBetween(above === '' ? null : above, below, sharing.length + 1);
  return { place, replaced: sharing.map(({ id }, at) => ({ id, place: others[at] ?? '' })) };
}
