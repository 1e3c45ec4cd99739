import type { Diagnostic, Span } from '../../errors/diagnostic';
import { languageDiagnostic } from '../../errors/language-errors';
import type { Leaf } from './leaves';
import type { Search } from './problems';
import { wordBehindNumber } from './problems-units';

const endsOperand = new Set(['Number', 'Unit', 'Name', 'Member', ')', 'Coverage', 'Raised']);
const beginsOperand = new Set(['Number', 'Name', 'Member', '(']);
const binarySigns = new Set(['Times', 'Divide', 'Caret', 'Compare', 'AndSign', 'OrSign', 'Plus', 'Minus']);
const needsRight = new Set([...binarySigns, 'NotSign', 'PlusMinus']);
/** What may stand before an operand that has a sign of its own. */
const signs = new Set(['Plus', 'Minus', 'NotSign']);

/** Two operands side by side: multiplication is always written. */
export function missingSign(search: Search): Diagnostic | undefined {
  const { leaves } = search;
  for (const [index, left] of leaves.entries()) {
    const right = leaves[index + 1];
    if (left.name === 'Number' && right?.name !== 'Unit' && right?.span.from !== undefined) {
      const unit = wordBehindNumber(left, search);
      if (unit !== undefined) return unit;
    }
    if (right === undefined || !endsOperand.has(left.name) || !beginsOperand.has(right.name)) continue;
    const notation = left.name === 'Unit' ? pressureNotation(leaves, index, search) : undefined;
    if (notation !== undefined) return notation;
    const called = /^(Name|Member)$/.test(left.name) && right.name === '(';
    if (!called) return sideBySide(leaves, index, search);
  }
  return undefined;
}

/** `3 bar(g)`, `3 bar (abs)`, `3 bar a`: notations of other systems. */
function pressureNotation(leaves: readonly Leaf[], index: number, { reading }: Search): Diagnostic | undefined {
  const unit = leaves[index];
  if (unit === undefined) return undefined;
  const behind = /^\s*(?:\(\s*(g|a|abs|gauge)\s*\)|(abs|gauge|a)\b)/.exec(reading.source.slice(unit.span.to));
  const kind = behind?.[1] ?? behind?.[2];
  const known = /^(m?bar|[kM]?Pa|psi|at|inH2O|inHg)$/.test(unit.text);
  if (behind === null || kind === undefined || !known) return undefined;
  const gauge = kind.startsWith('g');
  const mended = gauge ? `${unit.text}g` : unit.text;
  const span = reading.span({ from: unit.span.from, to: unit.span.to + behind[0].length });
  const mend = { label: `Write ${mended}`, span, insert: mended };
  return languageDiagnostic(gauge ? 'GAUGE_NOTATION' : 'ABSOLUTE_NOTATION', span, { mended }, mend);
}

/** The left operand as it is to be written before a sign: a literal with its unit in parentheses. */
function leftOperand(leaves: readonly Leaf[], index: number): { text: string; from: number } {
  const leaf = leaves[index];
  const number = leaves[index - 1];
  if (leaf?.name === 'Unit' && number?.name === 'Number') {
    return { text: `(${number.text} ${leaf.text})`, from: number.span.from };
  }
  return { text: leaf?.name === ')' ? '(…)' : (leaf?.text ?? ''), from: leaf?.span.from ?? 0 };
}

function sideBySide(leaves: readonly Leaf[], index: number, { reading }: Search): Diagnostic | undefined {
  const left = leaves[index];
  const right = leaves[index + 1];
  if (left === undefined || right === undefined) return undefined;
  const gap = reading.span({ from: left.span.to, to: right.span.from });
  const between: Span = reading.span({ from: left.span.from, to: right.span.to });
  if (
    left.name === 'Number' &&
    right.name === 'Number' &&
    /^\d{1,3}$/.test(left.text) &&
    /^\d{3}(\.|$)/.test(right.text)
  ) {
    const parameters = { left: left.text, right: right.text };
    const mend = { label: `Write ${left.text}${right.text}`, span: gap, insert: '' };
    return languageDiagnostic('GROUPED_FIGURES', between, parameters, mend);
  }
  const operand = leftOperand(leaves, index);
  const rightText = right.name === '(' ? '(…)' : right.text;
  const plain = operand.text === '(…)' || left.name !== 'Unit';
  const mend = plain
    ? { label: 'Write *', span: gap, insert: '*' }
    : {
        label: `Write ${operand.text}*`,
        span: reading.span({ from: operand.from, to: right.span.from }),
        insert: `${operand.text}*`,
      };
  return languageDiagnostic('MISSING_SIGN', between, { left: operand.text, right: rightText }, mend);
}

/** A sign with nothing on one of its sides. */
export function operandProblem({ leaves, reading }: Search): Diagnostic | undefined {
  for (const [index, leaf] of leaves.entries()) {
    const before = leaves[index - 1];
    const after = leaves[index + 1];
    const sign = leaf.text;
    if (leaf.name === ',' && (before === undefined || before.name === '(' || before.name === ',')) {
      return languageDiagnostic('MISSING_ARGUMENT', reading.span(leaf.span));
    }
    if (leaf.name === ',' && (after === undefined || after.name === ')')) {
      return languageDiagnostic('MISSING_ARGUMENT', reading.span(leaf.span));
    }
    if (binarySigns.has(leaf.name) && !signs.has(leaf.name) && startsHere(before)) {
      return languageDiagnostic('MISSING_OPERAND_BEFORE', reading.span(leaf.span), { sign });
    }
    if (needsRight.has(leaf.name) && endsHere(after)) {
      return languageDiagnostic('MISSING_OPERAND_AFTER', reading.span(leaf.span), { sign });
    }
  }
  return undefined;
}

function startsHere(before: Leaf | undefined): boolean {
  return before === undefined || before.name === '(' || before.name === ',' || before.name === 'Equals';
}

function endsHere(after: Leaf | undefined): boolean {
  if (after === undefined || after.name === ')' || after.name === ',' || after.name === 'To') return true;
  return binarySigns.has(after.name) && !signs.has(after.name);
}

/** An uncertainty behind something that is no number. */
export function uncertaintyPlace({ leaves, reading }: Search): Diagnostic | undefined {
  const place = leaves.find((leaf, index) => {
    const before = leaves[index - 1]?.name;
    return /^(±|\+\/-)/.test(leaf.text) && before !== 'Number' && before !== 'Unit';
  });
  return place === undefined ? undefined : languageDiagnostic('UNCERTAINTY_PLACE', reading.span(place.span));
}
