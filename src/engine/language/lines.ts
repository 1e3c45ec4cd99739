/** What can only be the begin of a line of its own, even inside a parenthesis left open. */
const freshLine = /^[ \t\r]*(?:#|require\b|[\p{L}_][\p{L}\p{M}\d_'₀-₉]*[ \t]*=(?!=)|\n|$)/u;

/** A parenthesis must close within so many characters, so that one left open costs little to look for. */
const reach = 4000;

/** Levels of parentheses that stand open behind one physical line, notes left out. */
function depthBehind(text: string, depth: number): number {
  for (const sign of text) {
    if (sign === '#') break;
    if (sign === '(') depth += 1;
    if (sign === ')') depth -= 1;
    if (depth <= 0 && sign === ')') return 0;
  }
  return depth;
}

/**
 * Whether a line with `depth` open parentheses goes on in the text behind its end: only when they
 * are closed before a line begins that can but be one of its own. So a parenthesis left open while
 * writing does not swallow the lines below.
 */
export function goesOn(following: string, depth: number): boolean {
  if (depth <= 0) return false;
  let rest = following.slice(0, reach);
  for (;;) {
    if (freshLine.test(rest)) return false;
    const end = rest.indexOf('\n');
    const line = end < 0 ? rest : rest.slice(0, end);
    depth = depthBehind(line, depth);
    if (depth === 0) return true;
    if (end < 0) return false;
    rest = rest.slice(end + 1);
  }
}

export interface SourceLine {
  from: number;
  to: number;
  /** Zero-based number of its first physical line. */
  number: number;
}

/** Parts a source into logical lines: one physical line each, or several inside parentheses. */
export function splitLines(source: string): SourceLine[] {
  const lines: SourceLine[] = [];
  let from = 0;
  let number = 0;
  let begin = 0;
  let depth = 0;
  for (let physical = 0; begin <= source.length; physical += 1) {
    const found = source.indexOf('\n', begin);
    const to = found < 0 ? source.length : found;
    depth = depthOf(source.slice(begin, to), depth);
    if (!goesOn(source.slice(to + 1, to + 1 + reach), depth) || found < 0) {
      lines.push({ from, to, number });
      from = to + 1;
      number = physical + 1;
      depth = 0;
    }
    begin = to + 1;
  }
  return lines;
}

/** As `depthBehind`, over a whole line: what closes may open again. */
function depthOf(text: string, depth: number): number {
  for (const sign of text) {
    if (sign === '#') break;
    if (sign === '(') depth += 1;
    if (sign === ')') depth = Math.max(0, depth - 1);
  }
  return depth;
}
