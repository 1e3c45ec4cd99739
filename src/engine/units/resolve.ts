import { dimensionless, divideDimensions, isDimensionless, multiplyDimensions, powerOfDimension } from './dimension';
import { findUnit, unitNames, type UnitEntry } from './table';
import type { Dimension, ResolvedUnit } from './types';

interface Factor {
  entry: UnitEntry;
  exponent: number;
}

export interface ScannedUnit {
  unit: ResolvedUnit;
  /** Offset behind the last character that belongs to the unit. */
  end: number;
}

const word = /[A-Za-zµμΩÅ°ΔΔ%‰€][A-Za-z0-9_°]*/y;
const superscripts: Readonly<Record<string, string>> = { '⁻': '-', '⁰': '0', '¹': '1', '²': '2', '³': '3', '⁴': '4', '⁵': '5', '⁶': '6', '⁷': '7', '⁸': '8', '⁹': '9' };
const superscriptOf = Object.fromEntries(Object.entries(superscripts).map(([sign, digit]) => [digit, sign]));

function match(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  const sticky = new RegExp(pattern.source, 'yu');
  sticky.lastIndex = at;
  return sticky.exec(text);
}

function skipSpaces(text: string, at: number): number {
  while (text[at] === ' ' || text[at] === '\t' || text[at] === '\u00a0') at += 1;
  return at;
}

/** Exponent after a unit: `^2`, `^-1`, `^(1/2)`, `²`, `⁻¹`. */
function scanExponent(text: string, at: number): { exponent: number; end: number } {
  const superscript = match(/[⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+/, text, at);
  if (superscript !== null) {
    const digits = [...superscript[0]].map((sign) => superscripts[sign]).join('');
    return { exponent: Number(digits), end: at + superscript[0].length };
  }
  const caret = match(/\s*\^\s*(?:(-?\d+)(?![\d.])|\(\s*(-?\d+)\s*(?:\/\s*(\d+)\s*)?\))/, text, at);
  if (caret === null) return { exponent: 1, end: at };
  const exponent = caret[1] !== undefined ? Number(caret[1]) : Number(caret[2]) / Number(caret[3] ?? 1);
  return { exponent, end: at + caret[0].length };
}

function scanAtom(text: string, at: number): { factors: Factor[]; end: number } | undefined {
  if (text[at] === '(') {
    const inner = scanProduct(text, skipSpaces(text, at + 1), 1);
    if (inner === undefined) return undefined;
    const close = skipSpaces(text, inner.end);
    if (text[close] !== ')') return undefined;
    const { exponent, end } = scanExponent(text, close + 1);
    return { factors: inner.factors.map((factor) => ({ ...factor, exponent: factor.exponent * exponent })), end };
  }
  const found = match(word, text, at);
  if (found === null) return undefined;
  const entry = findUnit(found[0]);
  if (entry === undefined) return undefined;
  const behind = at + found[0].length;
  // `m(` would be a call of something named like the unit, `m.x` a member of it.
  if (text[behind] === '.' && /[A-Za-z]/.test(text[behind + 1] ?? '')) return undefined;
  const { exponent, end } = scanExponent(text, behind);
  return { factors: [{ entry, exponent }], end };
}

/** A product or quotient, taken as far as it goes: it ends before an operator that no unit follows. */
function scanProduct(text: string, at: number, depth = 0): { factors: Factor[]; end: number } | undefined {
  const first = depth < 8 ? scanAtom(text, at) : undefined;
  if (first === undefined) return undefined;
  const factors = [...first.factors];
  let { end } = first;
  for (;;) {
    const gap = skipSpaces(text, end);
    const operator = text[gap];
    const explicit = operator === '/' || operator === '*' || operator === '·' || operator === '×';
    if (!explicit && gap === end) break;
    const from = explicit ? skipSpaces(text, gap + 1) : gap;
    if (!explicit && text[from] === '(') break;
    const next = scanAtom(text, from);
    if (next === undefined) break;
    const sign = operator === '/' ? -1 : 1;
    factors.push(...next.factors.map((factor) => ({ ...factor, exponent: factor.exponent * sign })));
    end = next.end;
  }
  return { factors, end };
}

function exponentText(exponent: number): string {
  if (exponent === 1) return '';
  return Number.isInteger(exponent) ? [...String(exponent)].map((digit) => superscriptOf[digit] ?? digit).join('') : `^${exponent}`;
}

function latexName(shown: string): string {
  return shown
    .replace(/%/g, '\\%')
    .replace(/°/g, '{^\\circ}')
    .replace(/µ/g, '\\text{µ}')
    .replace(/Ω/g, '\\Omega ')
    .replace(/Δ/g, '\\Delta ')
    .replace(/₂/g, '_2')
    .replace(/ /g, '\\ ');
}

/** Writes a quotient with one solidus: `W/(m²·K)`; negative powers only when nothing stands above. */
function write(factors: readonly Factor[], name: (shown: string) => string, power: (exponent: number) => string, dot: string): string {
  const above = factors.filter((factor) => factor.exponent > 0);
  const below = factors.filter((factor) => factor.exponent < 0);
  const part = (list: readonly Factor[], sign: number) => list.map(({ entry, exponent }) => name(entry.shown) + power(exponent * sign)).join(dot);
  if (below.length === 0) return part(above, 1);
  if (above.length === 0) return part(below, 1);
  const denominator = part(below, -1);
  return `${part(above, 1)}/${below.length > 1 ? `(${denominator})` : denominator}`;
}

function resolveFactors(factors: readonly Factor[], text: string): ResolvedUnit | undefined {
  const [only] = factors;
  const alone = factors.length === 1 && only?.exponent === 1 ? only.entry : undefined;
  let dimension: Dimension = dimensionless;
  let factor = 1;
  for (const { entry, exponent } of factors) {
    if (entry.definition.level === 'gauge pressure' && alone === undefined) return undefined;
    const part = powerOfDimension(entry.definition.dimension, Math.abs(exponent));
    if (part === undefined) return undefined;
    dimension = exponent > 0 ? multiplyDimensions(dimension, part) : divideDimensions(dimension, part);
    factor *= (entry.definition.factor * entry.prefixFactor) ** exponent;
  }
  const latexPower = (exponent: number) => (exponent === 1 ? '' : `^{${exponent}}`);
  return {
    text,
    factor,
    // A level unit inside a product means its interval, as in W/(m² °C).
    offset: alone?.definition.offset ?? 0,
    dimension,
    level: alone?.definition.level,
    display: write(factors, (shown) => shown, exponentText, '·'),
    latex: `\\mathrm{${write(factors, latexName, latexPower, '{\\cdot}')}}`,
  };
}

/** Reads the unit that begins at `at`, as far as it goes; undefined when no unit begins there. */
export function scanUnit(text: string, at = 0): ScannedUnit | undefined {
  const scanned = scanProduct(text, at);
  if (scanned === undefined) return undefined;
  const unit = resolveFactors(scanned.factors, text.slice(at, scanned.end));
  return unit === undefined ? undefined : { unit, end: scanned.end };
}

/** Resolves a whole unit text; `1` and the empty text are the plain number. Undefined when it is no unit. */
export function resolveUnit(text: string): ResolvedUnit | undefined {
  const trimmed = text.trim();
  if (trimmed === '' || trimmed === '1') return plainUnit;
  // `1/K` is written so in tables of units.
  const reciprocal = /^1\s*\/\s*/.exec(trimmed);
  if (reciprocal !== null) {
    const below = scanProduct(trimmed, reciprocal[0].length);
    if (below === undefined || below.end !== trimmed.length) return undefined;
    return resolveFactors(below.factors.map((factor) => ({ ...factor, exponent: -factor.exponent })), trimmed);
  }
  const scanned = scanUnit(trimmed);
  return scanned?.end === trimmed.length ? scanned.unit : undefined;
}

export const plainUnit: ResolvedUnit = { text: '', factor: 1, offset: 0, dimension: dimensionless, display: '', latex: '' };

/** Number of single-character edits between two words (Levenshtein 1966). */
export function editDistance(left: string, right: string): number {
  let row = [...Array(right.length + 1).keys()];
  for (let i = 1; i <= left.length; i += 1) {
    const next = [i];
    for (let j = 1; j <= right.length; j += 1) {
      const substitution = (row[j - 1] ?? 0) + (left[i - 1] === right[j - 1] ? 0 : 1);
      next.push(Math.min(substitution, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
    }
    row = next;
  }
  return row[right.length] ?? 0;
}

/** The unit name nearest to a word, for error sentences; undefined when none is near. */
export function nearestUnit(name: string): string | undefined {
  let best: string | undefined;
  let least = Math.min(3, Math.max(1, Math.floor(name.length / 2) + 1));
  for (const candidate of unitNames()) {
    if (Math.abs(candidate.length - name.length) >= least) continue;
    const caseOnly = candidate.toLowerCase() === name.toLowerCase() ? 0.5 : 1;
    const distance = editDistance(candidate.toLowerCase(), name.toLowerCase()) + caseOnly - 0.5;
    if (distance < least) {
      least = distance;
      best = candidate;
    }
  }
  return best;
}

export function isUnitless(unit: ResolvedUnit): boolean {
  return isDimensionless(unit.dimension);
}
