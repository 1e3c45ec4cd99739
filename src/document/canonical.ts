/**
 * JSON with sorted keys and numbers rounded to 12 significant digits: engines differ in the last bits
 * of exp and pow, and a fingerprint must not.
 */
export function canonicalJson(value: unknown): string {
  if (typeof value === 'number') return Number.isFinite(value) ? JSON.stringify(Number(value.toPrecision(12))) : 'null';
  if (Array.isArray(value)) return `[${value.map((part) => canonicalJson(part ?? null)).join(',')}]`;
  if (typeof value === 'object' && value !== null) {
    const entries = Object.entries(value)
      .filter(([, part]) => part !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : 1));
    return `{${entries.map(([key, part]) => `${JSON.stringify(key)}:${canonicalJson(part)}`).join(',')}}`;
  }
  return JSON.stringify(value) ?? 'null';
}
