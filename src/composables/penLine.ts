import type { CellKind } from '#engine';
import type { SheetCell } from './sheetContext';

const assignment = /^\s*[\p{L}_][\p{L}\p{N}_']*\s*=(?!=)/u;
const language = /^\s*(?:require\b|#)/;

/** Plain words make a text cell; a name followed by `=` (or a requirement, or a note) makes an expression. */
export function penKind(text: string): CellKind {
  return assignment.test(text) || language.test(text) ? 'expressions' : 'text';
}

/** The number that a cell after the one given would have: `5.3`. */
export function penNumber(cells: readonly SheetCell[], after: string | null): string {
  const before = after === null ? undefined : cells.find((cell) => cell.id === after);
  if (before === undefined) return '0.1';
  if (before.kind === 'section') return `${before.number}.1`;
  const [section = '0', within = '0'] = before.number.split('.');
  return `${section}.${Number(within) + 1}`;
}

/** A name that no cell uses yet: `w`, `w2`, `w3`. */
export function freeName(cells: readonly SheetCell[], base: string): string {
  const taken = new Set(cells.map((cell) => cell.settings.name));
  if (!taken.has(base)) return base;
  let number = 2;
  while (taken.has(`${base}${number}`)) number += 1;
  return `${base}${number}`;
}
