import { findUnit, type UnitEntry } from './table';

export interface UnitFactor {
  entry: UnitEntry;
  exponent: number;
  /** The word as written, and where it stands in the text. */
  word: string;
  at: number;
}

export interface ScannedFactors {
  factors: UnitFactor[];
  /** Offset behind the last character that belongs to the unit. */
  end: number;
  /** A factor follows a divisor without parentheses, as in `W/m^2*K`: read from left to right, easily meant otherwise. */
  ambiguous: boolean;
}

/** Parentheses in a unit nest no deeper than this. */
const deepest = 8;
const largestExponent = 24;

const word = /[\p{L}°%‰′″€£℃℉][\p{L}\d_°₂€£]*/uy;
/** Figures may be parted in threes, as everywhere. */
const figures = '\\d+(?:[\\u00a0\\u202f\\u2009]\\d{3})*(?:\\.\\d+)?';
const exponentPattern = new RegExp(
  `\\s*\\^\\s*(?:([-−+]?${figures})(?![\\d.])|\\(\\s*([-−+]?${figures})\\s*(?:\\/\\s*(\\d+)\\s*)?\\))`,
  'uy',
);
const raisedPattern = /[⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+/uy;
const raisedSigns = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function match(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  pattern.lastIndex = at;
  return pattern.exec(text);
}

function skipSpaces(text: string, at: number): number {
  while (text[at] === ' ' || text[at] === '\t' || text[at] === '\u00a0' || text[at] === '\u202f') at += 1;
  return at;
}

/** Exponent after a unit: `^2`, `^-1`, `^(1/2)`, `²`, `⁻¹`. */
function scanExponent(text: string, at: number): { exponent: number; end: number } {
  const raised = match(raisedPattern, text, at);
  if (raised !== null) {
    const digits = [...raised[0]].map((sign) => (sign === '⁻' ? '-' : String(raisedSigns.indexOf(sign)))).join('');
    return { exponent: Number(digits), end: at + raised[0].length };
  }
  const caret = match(exponentPattern, text, at);
  if (caret === null) return { exponent: 1, end: at };
  const number = (part: string | undefined) =>
    Number((part ?? '1').replace('−', '-').replace(/[\u00a0\u202f\u2009]/g, ''));
  const exponent = caret[1] !== undefined ? number(caret[1]) : number(caret[2]) / number(caret[3]);
  return { exponent, end: at + caret[0].length };
}

/** A word of the table, or one with its power written behind it: `m2`, `s3`. */
function findWord(found: string): { entry: UnitEntry; power: number } | undefined {
  const plain = found.replace(/₂/g, '2');
  const entry = findUnit(plain);
  if (entry !== undefined) return { entry, power: 1 };
  const powered = /^([^\d]+)([2-4])$/u.exec(plain);
  const base = powered?.[1] === undefined ? undefined : findUnit(powered[1]);
  // Powers are written without a sign on units of length and time only: `degC2` or `bar2` mean something else.
  if (base === undefined || !/^(length|time)$/.test(base.definition.kind)) return undefined;
  return { entry: base, power: Number(powered?.[2]) };
}

function scanWord(text: string, at: number): ScannedFactors | undefined {
  const found = match(word, text, at)?.[0];
  if (found === undefined) return undefined;
  const known = findWord(found);
  if (known === undefined) return undefined;
  const behind = at + found.length;
  // `m.x` is a member of something named like the unit.
  if (text[behind] === '.' && /[\p{L}]/u.test(text[behind + 1] ?? '')) return undefined;
  const { exponent, end } = scanExponent(text, behind);
  if (!(Math.abs(exponent) <= largestExponent)) return undefined;
  return {
    factors: [{ entry: known.entry, exponent: exponent * known.power, word: found, at }],
    end,
    ambiguous: false,
  };
}

function scanGroup(text: string, at: number, depth: number): ScannedFactors | undefined {
  const inner = scanFactors(text, skipSpaces(text, at + 1), depth + 1);
  if (inner === undefined) return undefined;
  const close = skipSpaces(text, inner.end);
  if (text[close] !== ')') return undefined;
  const { exponent, end } = scanExponent(text, close + 1);
  const factors = inner.factors.map((factor) => ({ ...factor, exponent: factor.exponent * exponent }));
  return { factors, end, ambiguous: inner.ambiguous };
}

function scanAtom(text: string, at: number, depth: number): ScannedFactors | undefined {
  if (depth > deepest) return undefined;
  return text[at] === '(' ? scanGroup(text, at, depth) : scanWord(text, at);
}

/**
 * Reads the product or quotient of units that begins at `at`, as far as it goes: it ends before an
 * operator that no unit follows. Undefined when no unit begins there.
 */
export function scanFactors(text: string, at: number, depth = 0): ScannedFactors | undefined {
  // `1/s`, as reciprocal units are written.
  const reciprocal = /^1\s*\/\s*/.exec(text.slice(at, at + 8));
  const first = scanAtom(text, at + (reciprocal?.[0].length ?? 0), depth);
  if (first === undefined) return undefined;
  const factors = reciprocal === null ? [...first.factors] : inverted(first.factors);
  let { end, ambiguous } = first;
  let divided = reciprocal !== null;
  for (;;) {
    const gap = skipSpaces(text, end);
    const operator = text[gap];
    const written = operator === '/' || operator === '*' || operator === '·' || operator === '⋅' || operator === '×';
    if (!written && (gap === end || operator === '(')) break;
    const next = scanAtom(text, written ? skipSpaces(text, gap + 1) : gap, depth);
    if (next === undefined) break;
    factors.push(...(operator === '/' ? inverted(next.factors) : next.factors));
    ambiguous ||= next.ambiguous || (divided && operator !== '/');
    divided ||= operator === '/';
    end = next.end;
  }
  return { factors, end, ambiguous };
}

function inverted(factors: readonly UnitFactor[]): UnitFactor[] {
  return factors.map((factor) => ({ ...factor, exponent: -factor.exponent }));
}
