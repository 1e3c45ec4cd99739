import type { Diagnostic } from '../../errors/diagnostic';
import { languageDiagnostic } from '../../errors/language-errors';
import type { Leaf } from './leaves';
import type { Search } from './problems';

const words = /^(Require|To|NotSign|AndSign|OrSign)$/;

/** What stands wrongly on the left of `=`, or an `=` where it has no place. */
export function equalsProblem(search: Search): Diagnostic | undefined {
  const { leaves, reading } = search;
  const places = leaves.flatMap((leaf, index) => (leaf.name === 'Equals' ? [index] : []));
  const [first] = places;
  if (first === undefined) return undefined;
  const left = leaves.slice(0, first);
  if (left[0]?.name === 'Require' || depth(left) > 0) return singleEquals(search, first);
  const [only] = left;
  if (left.length !== 1 || only === undefined || only.name !== 'Name') {
    const wrong = leftProblem(left);
    const span = reading.span({
      from: only?.span.from ?? 0,
      to: leaves[first - 1]?.span.to ?? leaves[first]?.span.to ?? 0,
    });
    return languageDiagnostic(wrong.code, span, wrong.parameters);
  }
  const [, second] = places;
  if (second === undefined) return undefined;
  if (depth(leaves.slice(0, second)) > 0) return singleEquals(search, second);
  return languageDiagnostic('SECOND_EQUALS', reading.span(leaves[second]?.span ?? { from: 0, to: 0 }));
}

function leftProblem(left: readonly Leaf[]): {
  code: 'RESERVED_WORD' | 'DEFINED_MEMBER' | 'LEFT_SIDE';
  parameters: Record<string, string>;
} {
  const [only] = left;
  if (left.length === 1 && only !== undefined && words.test(only.name)) {
    return { code: 'RESERVED_WORD', parameters: { word: only.text } };
  }
  if (left.length === 1 && only?.name === 'Member') {
    return { code: 'DEFINED_MEMBER', parameters: { name: only.text, object: only.text.split('.')[0] ?? '' } };
  }
  return { code: 'LEFT_SIDE', parameters: {} };
}

function singleEquals({ leaves, reading }: Search, index: number): Diagnostic {
  const span = reading.span(leaves[index]?.span ?? { from: 0, to: 0 });
  return languageDiagnostic('SINGLE_EQUALS', span, {}, { label: 'Write ==', span, insert: '==' });
}

function depth(leaves: readonly Leaf[]): number {
  return leaves.reduce((count, leaf) => count + (leaf.name === '(' ? 1 : leaf.name === ')' ? -1 : 0), 0);
}

/** A comma between figures: which of the two readings is meant is asked, not guessed. */
export function commaProblem({ leaves, reading }: Search): Diagnostic | undefined {
  const calls: boolean[] = [];
  for (const [index, leaf] of leaves.entries()) {
    if (leaf.name === '(') calls.push(/^(Name|Member)$/.test(leaves[index - 1]?.name ?? ''));
    if (leaf.name === ')') calls.pop();
    if (leaf.name !== ',' || calls.at(-1) === true) continue;
    const [left, right] = [leaves[index - 1], leaves[index + 1]];
    const touching = left?.span.to === leaf.span.from && right?.span.from === leaf.span.to;
    if (left?.name !== 'Number' || right?.name !== 'Number' || !touching) {
      return languageDiagnostic('UNREADABLE', reading.span(leaf.span), { text: '","' });
    }
    return figuresWithComma(left, right, reading.span({ from: left.span.from, to: right.span.to }));
  }
  return undefined;
}

function figuresWithComma(left: Leaf, right: Leaf, span: Diagnostic['span'] & object): Diagnostic {
  const text = `${left.text},${right.text}`;
  const decimal = `${left.text}.${right.text}`;
  if (/^\d{1,3}$/.test(left.text) && /^\d{3}$/.test(right.text) && left.text !== '0') {
    return languageDiagnostic('COMMA_AMBIGUOUS', span, { text, decimal, grouped: left.text + right.text });
  }
  const grouped = right.text.includes('.');
  const mended = grouped ? left.text + right.text : decimal;
  return languageDiagnostic('DECIMAL_COMMA', span, { mended }, { label: `Write ${mended}`, span, insert: mended });
}
