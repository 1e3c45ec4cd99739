import type { Tree } from '@lezer/common';
import type { Diagnostic } from '../../errors/diagnostic';
import { languageDiagnostic } from '../../errors/language-errors';
import { scanUnit, underOneSolidus, unitWords } from '../../units/resolve';
import { leavesOf, type Leaf } from './leaves';
import { plainFigures } from './literal';
import type { Reading } from './reading';

/** What reads otherwise than it looks: no errors, since the rule is plain, but easily meant otherwise. */
export function hintsOf(reading: Reading, tree: Tree): Diagnostic[] {
  const leaves = leavesOf(tree, reading.source);
  return leaves.flatMap((leaf, index) => {
    const number = leaves[index - 1];
    if (leaf.name !== 'Unit' || number === undefined) return [];
    const found =
      number.name === 'Number' ? [...literalHints(number, leaf, reading), fraction(leaves, index, reading)] : [];
    return [...found, afterDivisor(number, leaf, reading)].filter((hint) => hint !== undefined);
  });
}

/** `1/2 m` is 1/(2 m): right by the rule, and easily meant otherwise. */
function fraction(leaves: readonly Leaf[], index: number, reading: Reading): Diagnostic | undefined {
  const [before, above, sign, below, unit] = [-4, -3, -2, -1, 0].map((offset) => leaves[index + offset]);
  if (above?.name !== 'Number' || sign?.name !== 'Divide' || below === undefined || unit === undefined)
    return undefined;
  // In `a*1/2 m` or `2^1/2 m` the fraction is no literal of its own.
  if (before !== undefined && !/^(Equals|Plus|Minus|\(|,|Compare|Require)$/.test(before.name)) return undefined;
  if (/^[%‰]/.test(unit.text)) return undefined;
  const span = reading.span({ from: above.span.from, to: unit.span.to });
  const mended = `(${above.text}/${below.text})*1 ${unit.text}`;
  const parameters = { above: above.text, below: below.text, unit: unit.text };
  return languageDiagnostic('FRACTION_BEFORE_UNIT', span, parameters, {
    label: `Write ${mended}`,
    span,
    insert: mended,
  });
}

/** `W/m^2*K`: a factor behind a divisor without parentheses. */
function afterDivisor(before: Leaf, unit: Leaf, reading: Reading): Diagnostic | undefined {
  const scanned = scanUnit(unit.text);
  const mended = underOneSolidus(unit.text);
  const last = unitWords(unit.text).at(-1);
  if (scanned?.ambiguous !== true || mended === undefined || last === undefined) return undefined;
  const span = reading.span(unit.span);
  const parameters = { unit: unit.text, display: scanned.unit.display, mended };
  const divide = { label: `Write ${mended}`, span, insert: mended };
  if (before.name !== 'Number') return languageDiagnostic('TARGET_AFTER_DIVISOR', span, parameters, divide);
  const kept = unit.text.slice(0, last.from).replace(/[\s*·⋅×]+$/, '');
  const product = `(${before.text} ${kept})*${unit.text.slice(last.from)}`;
  // With room around its sign the last factor looks like a name that is multiplied by.
  const spaced = /\s[*·⋅×]\s+$/.test(unit.text.slice(0, last.from));
  const whole = reading.span({ from: before.span.from, to: unit.span.to });
  const multiply = { label: `Write ${product}`, span: whole, insert: product };
  return languageDiagnostic('UNIT_AFTER_DIVISOR', span, { ...parameters, product }, spaced ? multiply : divide);
}

function literalHints(number: Leaf, unit: Leaf, reading: Reading): Diagnostic[] {
  const span = reading.span(unit.span);
  if (unit.text === 'C')
    return [languageDiagnostic('COULOMB', span, {}, { label: 'Write degC', span, insert: 'degC' })];
  if (unit.text === 'F') return [languageDiagnostic('FARAD', span, {}, { label: 'Write degF', span, insert: 'degF' })];
  const notation = notationProblem(unit.text);
  if (notation !== undefined) {
    const { code, mended, letter } = notation;
    const mend = { label: `Write ${mended}`, span, insert: mended };
    return [languageDiagnostic(code, span, { unit: unit.text, mended, letter }, mend)];
  }
  if (unit.text !== 'rpm') return [];
  const value = String(Number(((Number(plainFigures(number.text)) * 2 * Math.PI) / 60).toPrecision(5)));
  const parameters = { number: number.text, value };
  return [languageDiagnostic('REVOLUTIONS', span, parameters, { label: 'Write 1/min', span, insert: '1/min' })];
}

const pressures = 'm?bar|[kM]?Pa|psi|at|inH2O|inHg';
const letterNames: Readonly<Record<string, string>> = { C: 'coulomb', F: 'farad', K: 'kelvin' };

/** Products of units that nobody means: `bar g` is gauge pressure, `deg C` a temperature. */
function notationProblem(
  unit: string,
): { code: 'GAUGE_NOTATION' | 'DEGREE_NOTATION'; mended: string; letter: string } | undefined {
  const gauge = new RegExp(`^(${pressures})\\s+g$`).exec(unit)?.[1];
  if (gauge !== undefined) return { code: 'GAUGE_NOTATION', mended: `${gauge}g`, letter: 'gram' };
  const letter = /^(?:deg|°)(?:\s+|\s*[·*]\s*)([CFK])$/.exec(unit)?.[1];
  if (letter === undefined) return undefined;
  return { code: 'DEGREE_NOTATION', mended: letter === 'K' ? 'K' : `deg${letter}`, letter: letterNames[letter] ?? '' };
}
