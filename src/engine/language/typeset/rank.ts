/** How strongly a typeset part holds together; a weaker part gets parentheses where a stronger one is needed. */
export const rank = {
  either: 0,
  both: 1,
  condition: 2,
  sum: 3,
  /** Begins with a sign: may lead a sum or a product, never follow another sign. */
  sign: 4,
  product: 5,
  fraction: 6,
  power: 7,
  atom: 8,
} as const;

export interface Typeset {
  latex: string;
  rank: number;
}

export function parenthesised(latex: string): string {
  return `\\left(${latex}\\right)`;
}

/** The part, in parentheses when it holds less than needed. */
export function wrap(part: Typeset, least: number): string {
  return part.rank >= least ? part.latex : parenthesised(part.latex);
}
