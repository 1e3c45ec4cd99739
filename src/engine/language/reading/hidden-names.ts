import type { Diagnostic } from '../../errors/diagnostic';
import { languageDiagnostic } from '../../errors/language-errors';
import { unitWords } from '../../units/resolve';
import type { Expression, Line, NumberNode } from '../tree';
import { partsOf } from '../walk';

function literalsOf(expression: Expression): NumberNode[] {
  return expression.type === 'number' ? [expression] : partsOf(expression).flatMap(literalsOf);
}

/** The written sign before a word of a unit, where the words behind it could also be names with signs between them. */
function signBefore(unit: string, from: number): { sign: string; at: number } | undefined {
  const before = /([*·⋅×/])\s*\(*\s*$/.exec(unit.slice(0, from));
  const sign = before?.[1];
  if (before === null || sign === undefined) return undefined;
  // Two words with a space between them are a product only as units.
  const sideBySide = /[^\s*·⋅×/()]\s+[^\s*·⋅×/()]/.test(unit.slice(before.index));
  return sideBySide ? undefined : { sign, at: before.index };
}

function hintFor(literal: NumberNode, isName: (word: string) => boolean): Diagnostic | undefined {
  const unit = literal.unit?.unit.text ?? '';
  for (const { word, from } of unitWords(unit)) {
    const before = isName(word) ? signBefore(unit, from) : undefined;
    if (before === undefined || literal.unit === undefined) continue;
    const rest = unit.slice(before.at + before.sign.length).trim();
    const mended = `(${literal.text} ${unit.slice(0, before.at).trim()})${before.sign}${rest}`;
    const parameters = { word, unit, mended };
    const span = { from: literal.span.from, to: literal.unit.span.to };
    const mend = literal.uncertainty === undefined ? { label: `Write ${mended}`, span, insert: mended } : undefined;
    return languageDiagnostic('UNIT_OR_NAME', literal.unit.span, parameters, mend);
  }
  return undefined;
}

/**
 * Hints where a word of a unit is also the name of a value and could have been meant as one:
 * `5 kW/m` and `0.5 m * L`, never `5 m`, since a name cannot stand directly behind a number.
 */
export function hiddenNameHints(line: Line, isName: (word: string) => boolean): Diagnostic[] {
  if (line.expression === undefined) return [];
  const warned = line.diagnostics.filter(({ code }) => code === 'UNIT_AFTER_DIVISOR').map(({ span }) => span?.from);
  return literalsOf(line.expression)
    .filter((literal) => !warned.includes(literal.unit?.span.from))
    .map((literal) => hintFor(literal, isName))
    .filter((hint) => hint !== undefined);
}
