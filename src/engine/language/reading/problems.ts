import type { Tree } from '@lezer/common';
import type { Diagnostic, Span } from '../../errors/diagnostic';
import { languageDiagnostic } from '../../errors/language-errors';
import { firstError, leavesOf, type Leaf } from './leaves';
import { equalsProblem, commaProblem } from './problems-equals';
import { missingSign, operandProblem, uncertaintyPlace } from './problems-operands';
import { parenthesisProblem, unknownSign } from './problems-signs';
import { targetProblem } from './problems-units';
import type { Reading } from './reading';

/** What a search for one kind of mistake gets: the tokens of the line, and the line. */
export interface Search {
  leaves: readonly Leaf[];
  reading: Reading;
}

type Find = (search: Search) => Diagnostic | undefined;

/** In this order where two are found at the same place. */
const searches: readonly Find[] = [
  equalsProblem,
  targetProblem,
  commaProblem,
  missingSign,
  operandProblem,
  uncertaintyPlace,
  parenthesisProblem,
];

/** What is left out at the end of a statement without being an error of the grammar. */
function unfinished({ leaves, reading }: Search, tree: Tree): Diagnostic | undefined {
  const [statement] = ['Assignment', 'Requirement'].flatMap((name) => tree.topNode.getChildren(name));
  if (statement === undefined) return undefined;
  const last = leaves.filter((leaf) => leaf.name !== 'Note' && leaf.name !== 'To' && leaf.name !== 'Unit').at(-1);
  if (last === undefined || (last.name !== 'Equals' && last.name !== 'Require')) return undefined;
  const code = last.name === 'Equals' ? 'MISSING_RIGHT_SIDE' : 'MISSING_CONDITION';
  return languageDiagnostic(code, reading.span(last.span));
}

/** Where nothing better is known: the stretch that the grammar could not take. */
function unreadable({ leaves, reading }: Search, broken: Span): Diagnostic {
  const text = reading.source.slice(broken.from, broken.to).trim();
  if (text !== '') return languageDiagnostic('UNREADABLE', reading.span(broken), { text: `"${text}"` });
  const before = leaves.filter((leaf) => leaf.span.to <= broken.from).at(-1)?.span ?? { from: 0, to: broken.to };
  return languageDiagnostic('UNFINISHED', reading.span(before));
}

/** What cannot be read in a line: one sentence at its place, the first where there are several. */
export function problemsOf(reading: Reading, tree: Tree): Diagnostic[] {
  const leaves = leavesOf(tree, reading.source).filter((leaf) => leaf.name !== 'Note');
  const search = { leaves, reading };
  const incomplete = unfinished(search, tree);
  if (incomplete !== undefined) return [incomplete];
  const broken = firstError(tree);
  if (broken === undefined) return [];
  // A sign that the language does not have is the cause of whatever else looks wrong.
  const foreign = unknownSign(search);
  if (foreign !== undefined) return [foreign];
  const found = searches.map((find) => find(search)).filter((one) => one !== undefined);
  if (found.length === 0) return [unreadable(search, broken)];
  return [found.reduce((first, next) => ((next.span?.from ?? 0) < (first.span?.from ?? 0) ? next : first))];
}
