/** Whether two results are the same to every program and eye. Only plain objects, arrays, maps and single values. */
export function same(left: unknown, right: unknown): boolean {
  if (Object.is(left, right)) return true;
  if (typeof left !== 'object' || typeof right !== 'object' || left === null || right === null) return false;
  if (Array.isArray(left)) return Array.isArray(right) && sameItems(left, right, same);
  if (left instanceof Map) return right instanceof Map && sameMaps(left, right);
  return sameFields(left as Readonly<Record<string, unknown>>, right as Readonly<Record<string, unknown>>);
}

export function sameItems<T>(
  left: readonly T[],
  right: readonly T[],
  equal: (a: T, b: T) => boolean = Object.is,
): boolean {
  if (left.length !== right.length) return false;
  for (const [index, item] of left.entries()) if (!equal(item, right[index] as T)) return false;
  return true;
}

function sameMaps(left: ReadonlyMap<unknown, unknown>, right: ReadonlyMap<unknown, unknown>): boolean {
  if (left.size !== right.size) return false;
  for (const [key, value] of left) if (!right.has(key) || !same(value, right.get(key))) return false;
  return true;
}

/** An absent field and one that is undefined are the same. */
function sameFields(left: Readonly<Record<string, unknown>>, right: Readonly<Record<string, unknown>>): boolean {
  for (const key in left) if (!same(left[key], right[key])) return false;
  for (const key in right) if (!(key in left) && right[key] !== undefined) return false;
  return true;
}
