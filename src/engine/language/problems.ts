import type { SyntaxNode, Tree } from '@lezer/common';
import type { Diagnostic, Span } from '../errors/diagnostic';
import { nearestUnit } from '../units/resolve';

interface Leaf {
  name: string;
  text: string;
  span: Span;
}

const endsOperand = new Set(['Number', 'Unit', 'Name', 'Member', ')', 'Coverage']);
const beginsOperand = new Set(['Number', 'Name', 'Member', '(']);

/** Tokens of a line in order. */
function leavesOf(tree: Tree, source: string, { from, to }: Span): Leaf[] {
  const leaves: Leaf[] = [];
  tree.iterate({
    from,
    to,
    enter(node) {
      if (node.from < from || node.to > to || node.node.firstChild !== null || node.from === node.to) return;
      leaves.push({ name: node.name, text: source.slice(node.from, node.to), span: { from: node.from, to: node.to } });
    },
  });
  return leaves;
}

function firstError(tree: Tree, { from, to }: Span): SyntaxNode | undefined {
  let found: SyntaxNode | undefined;
  tree.iterate({
    from,
    to,
    enter(node) {
      if (found === undefined && node.type.isError && node.from >= from && node.from <= to) found = node.node;
    },
  });
  return found;
}

function error(code: string, message: string, span: Span, mend?: Diagnostic['mend']): Diagnostic {
  return { code, severity: 'error', message, span, ...(mend === undefined ? {} : { mend }) };
}

/** Two operands side by side: multiplication is always written. */
function missingSign(leaves: readonly Leaf[], source: string): Diagnostic | undefined {
  for (let index = 1; index < leaves.length; index += 1) {
    const left = leaves[index - 1];
    const right = leaves[index];
    if (left === undefined || right === undefined) continue;
    const called = left.name === 'Name' && right.name === '(';
    if (!endsOperand.has(left.name) || !beginsOperand.has(right.name) || called) continue;
    const pair = { from: left.span.from, to: right.span.to };
    if (left.name === 'Number' && right.name === 'Name') return unknownUnit(right, left);
    return error(
      'MISSING_SIGN',
      `Between "${left.text}" and "${right.text}" a sign is missing; multiplication is written with *.`,
      pair,
      { label: `Write ${left.text}*${right.text}`, span: { from: left.span.to, to: right.span.from }, insert: source.includes(' ') ? ' * ' : '*' },
    );
  }
  return undefined;
}

function unknownUnit(word: Leaf, number: Leaf): Diagnostic {
  const near = nearestUnit(word.text);
  return error(
    'UNKNOWN_UNIT',
    `"${word.text}" is no unit${near === undefined ? '' : `; the nearest is ${near}`}. To multiply, write ${number.text}*${word.text}.`,
    word.span,
    near === undefined
      ? { label: `Write ${number.text}*${word.text}`, span: { from: number.span.to, to: word.span.from }, insert: '*' }
      : { label: `Write ${near}`, span: word.span, insert: near },
  );
}

function unbalanced(leaves: readonly Leaf[]): Diagnostic | undefined {
  const open: Leaf[] = [];
  for (const leaf of leaves) {
    if (leaf.text === '(') open.push(leaf);
    if (leaf.text === ')' && open.pop() === undefined) return error('UNBALANCED', 'This parenthesis closes nothing.', leaf.span);
  }
  const [first] = open;
  return first === undefined ? undefined : error('UNBALANCED', 'This parenthesis is not closed.', first.span);
}

/** `1/2 m` is 1/(2 m): right by the rule, and easily meant otherwise. */
function fractionBeforeUnit(leaves: readonly Leaf[]): Diagnostic | undefined {
  for (let index = 0; index + 3 < leaves.length; index += 1) {
    const [above, sign, below, unit] = leaves.slice(index, index + 4);
    if (above?.name !== 'Number' || sign?.name !== 'Divide' || below?.name !== 'Number' || unit?.name !== 'Unit') continue;
    if (/%|‰/.test(unit.text)) continue;
    const text = `${above.text}/${below.text}`;
    return {
      code: 'FRACTION_BEFORE_UNIT',
      severity: 'hint',
      message: `${text} ${unit.text} is ${above.text}/(${below.text} ${unit.text}). For ${text} of a ${unit.text} write (${text})*1 ${unit.text}.`,
      span: { from: above.span.from, to: unit.span.to },
      mend: { label: `Write (${text})*1 ${unit.text}`, span: { from: above.span.from, to: unit.span.to }, insert: `(${text})*1 ${unit.text}` },
    };
  }
  return undefined;
}

function targetProblem(leaves: readonly Leaf[]): Diagnostic | undefined {
  const at = leaves.findIndex((leaf) => leaf.name === 'To');
  const behind = leaves[at + 1];
  if (at < 0 || behind?.name === 'Unit') return undefined;
  const to = leaves[at];
  if (behind === undefined && to !== undefined) return error('UNKNOWN_UNIT', 'After "to" stands the unit in which the result is shown.', to.span);
  if (behind === undefined) return undefined;
  const near = nearestUnit(behind.text);
  const mend = near === undefined ? undefined : { label: `Write ${near}`, span: behind.span, insert: near };
  return error('UNKNOWN_UNIT', `"${behind.text}" is no unit${near === undefined ? '' : `; the nearest is ${near}`}.`, behind.span, mend);
}

/** What cannot be read in a line, as one sentence at its place; and hints on what reads otherwise than it looks. */
export function problemsOfLine(source: string, span: Span, tree: Tree): Diagnostic[] {
  const leaves = leavesOf(tree, source, span);
  const hint = fractionBeforeUnit(leaves);
  const hints = hint === undefined ? [] : [hint];
  const broken = firstError(tree, span);
  if (broken === undefined) return hints;
  const named = targetProblem(leaves) ?? unbalanced(leaves) ?? missingSign(leaves, source);
  if (named !== undefined) return [named, ...hints];
  const written = source.slice(broken.from, Math.max(broken.to, broken.from)).trim();
  const place = broken.to > broken.from ? { from: broken.from, to: broken.to } : { from: Math.max(span.from, broken.from - 1), to: Math.max(broken.from, span.from + 1) };
  const message = written === '' ? 'Something is missing here: a line reads name = expression.' : `"${written}" cannot be read here.`;
  return [error('UNREADABLE', message, place), ...hints];
}
