import type { Diagnostic } from '../../errors/diagnostic';
import { languageDiagnostic } from '../../errors/language-errors';
import { unitProblem, unitProblemAt } from '../../units/suggest';
import type { Leaf } from './leaves';
import type { Search } from './problems';

const unitWord = /^\s*([\p{L}°%‰′″€£℃℉][\p{L}\p{M}\d_°₂]*)/u;
const languageWords = new Set(['to', 'and', 'or', 'not']);

/** A word behind a number that is no unit: a slip in a unit, or a sign left out. */
export function wordBehindNumber(number: Leaf, { reading }: Search): Diagnostic | undefined {
  const rest = reading.source.slice(number.span.to);
  const found = unitWord.exec(rest);
  const word = found?.[1];
  if (found === null || word === undefined || languageWords.has(word)) return undefined;
  const problem = unitProblemAt(rest.trimStart());
  const from = number.span.to + found[0].length - word.length;
  const span = reading.span({ from, to: from + word.length });
  if (problem === undefined) return undefined;
  const parameters = { problem: problem.sentence, number: number.text, word };
  if (problem.suggestion !== undefined) {
    const mend = { label: `Write ${problem.suggestion}`, span, insert: problem.suggestion };
    return languageDiagnostic('UNKNOWN_UNIT_OR_SIGN', span, parameters, mend);
  }
  if (problem.word !== word || problem.refused === true) return languageDiagnostic('UNKNOWN_UNIT', span, parameters);
  const gap = reading.span({ from: number.span.to, to: from });
  const mend = { label: `Write ${number.text}*${word}`, span: gap, insert: '*' };
  return languageDiagnostic('UNKNOWN_UNIT_OR_SIGN', span, parameters, mend);
}

/** What stands behind `to` must be a unit, to the end of the line. */
export function targetProblem({ leaves, reading }: Search): Diagnostic | undefined {
  const at = leaves.findIndex((leaf) => leaf.name === 'To');
  const to = leaves[at];
  if (to === undefined) return undefined;
  const [rest = ''] = reading.source.slice(to.span.to).split('#');
  const text = rest.trim();
  if (text === '') return languageDiagnostic('TARGET_MISSING', reading.span(to.span));
  const problem = unitProblem(text);
  if (problem === undefined) return undefined;
  const begin = to.span.to + rest.length - rest.trimStart().length;
  const from = begin + Math.max(0, text.indexOf(problem.word));
  const span = reading.span({ from, to: from + problem.word.length });
  const { suggestion } = problem;
  const mend = suggestion === undefined ? undefined : { label: `Write ${suggestion}`, span, insert: suggestion };
  return languageDiagnostic('UNKNOWN_UNIT', span, { problem: problem.sentence }, mend);
}
