import type { Diagnostic } from '../../errors/diagnostic';
import { languageDiagnostic } from '../../errors/language-errors';
import type { Leaf } from './leaves';
import type { Search } from './problems';

/** Signs of other notations, and what stands for them here. */
const instead: Readonly<Record<string, string>> = {
  '÷': '/',
  ':': '/',
  '[': '(',
  '{': '(',
  ']': ')',
  '}': ')',
  '√': 'sqrt( )',
  '!': 'not',
  '&': 'and',
  '|': 'or',
  '∑': 'sum( )',
  ';': 'a new line',
  $: 'USD directly behind a number',
  '~': '==',
  '≈': '==',
  '≡': '==',
  '%': 'a unit % directly behind a number',
  "'": 'ft directly behind a number',
  '"': 'in directly behind a number',
  '°': 'degC directly behind a number',
};

/** `**` for a power, and signs that the language does not have. */
export function unknownSign({ leaves, reading }: Search): Diagnostic | undefined {
  for (const [index, leaf] of leaves.entries()) {
    const next = leaves[index + 1];
    if (leaf.text === '*' && next?.text === '*' && next.span.from === leaf.span.to) {
      const span = reading.span({ from: leaf.span.from, to: next.span.to });
      return languageDiagnostic('POWER_SIGN', span, {}, { label: 'Write ^', span, insert: '^' });
    }
    if (leaf.name !== '⚠') continue;
    const sign = /^\s*(\P{L})/u.exec(leaf.text)?.[1];
    if (sign === undefined || /[\s\d±]/.test(sign) || behindNumber(leaves, index)) continue;
    const span = reading.span(leaf.span);
    if (sign === ':' && next?.name === 'Equals') {
      const parameters = { sign: '":="', instead: '=' };
      return languageDiagnostic('SIGN_INSTEAD', span, parameters, { label: 'Write =', span, insert: '' });
    }
    const better = Object.hasOwn(instead, sign) ? instead[sign] : undefined;
    if (better === undefined) return languageDiagnostic('UNKNOWN_SIGN', span, { sign: `"${sign}"` });
    const mend =
      better.length === 1 && leaf.text.length === 1 ? { label: `Write ${better}`, span, insert: better } : undefined;
    return languageDiagnostic('SIGN_INSTEAD', span, { sign: `"${sign}"`, instead: better }, mend);
  }
  return undefined;
}

/** Behind a number a sign such as ° begins a word that is meant as a unit. */
function behindNumber(leaves: readonly Leaf[], index: number): boolean {
  return leaves[index - 1]?.name === 'Number' && /^[°%‰′″€£℃℉]/.test(leaves[index]?.text ?? '');
}

/** Parentheses that do not pair. */
export function parenthesisProblem({ leaves, reading }: Search): Diagnostic | undefined {
  const open: Leaf[] = [];
  for (const [index, leaf] of leaves.entries()) {
    if (leaf.name === '(') open.push(leaf);
    if (leaf.name !== ')') continue;
    if (open.pop() === undefined) return languageDiagnostic('UNOPENED', reading.span(leaf.span));
    const before = leaves[index - 1];
    const called = /^(Name|Member)$/.test(leaves[index - 2]?.name ?? '');
    if (before?.name === '(' && !called) {
      return languageDiagnostic('EMPTY_GROUP', reading.span({ from: before.span.from, to: leaf.span.to }));
    }
  }
  const [first] = open;
  if (first === undefined) return undefined;
  const last = leaves.at(-1);
  if (last?.name === '(') return languageDiagnostic('UNCLOSED', reading.span(first.span));
  const end = reading.span({ from: last?.span.to ?? 0, to: last?.span.to ?? 0 });
  const mend = { label: 'Close it at the end', span: end, insert: ')'.repeat(open.length) };
  return languageDiagnostic('UNCLOSED', reading.span(first.span), {}, mend);
}
