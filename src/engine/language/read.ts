import type { SyntaxNode } from '@lezer/common';
import { languageDiagnostic } from '../errors/language-errors';
import { parser } from './grammar/parser';
import { splitLines, type SourceLine } from './lines';
import { canonicalName } from './names';
import { deepestNesting, expressionChild, readExpression, TooDeep } from './reading/expression';
import { hintsOf } from './reading/hints';
import { readUnit } from './reading/literal';
import { problemsOf } from './reading/problems';
import { Reading } from './reading/reading';
import type { Expression, Line } from './tree';

export { deepestNesting } from './reading/expression';

/** A longer line is refused unread. */
export const longestLine = 10_000;

const kinds: Readonly<Record<string, Line['kind']>> = {
  Assignment: 'assignment',
  Requirement: 'require',
  ExpressionLine: 'expression',
};

function readStatement(reading: Reading, line: Line, node: SyntaxNode): void {
  const definition = node.getChild('Definition')?.getChild('Name');
  line.kind = kinds[node.name] ?? 'expression';
  line.span = reading.span(node);
  if (definition) {
    line.name = canonicalName(reading.text(definition));
    line.nameSpan = reading.span(definition);
  }
  line.target = readUnit(reading, node.getChild('Target')?.getChild('Unit'));
  const body = expressionChild(node);
  const end = reading.span({ from: node.to, to: node.to });
  line.expression = body === undefined ? { type: 'missing', span: end } : readExpression(reading, body);
}

/** Reads the statement of a line; one that nests too deep is refused as a whole. */
function readWithinLimits(reading: Reading, line: Line, node: SyntaxNode): void {
  try {
    readStatement(reading, line, node);
  } catch (error) {
    if (!(error instanceof TooDeep)) throw error;
    line.expression = { type: 'missing', span: line.span };
    reading.report(languageDiagnostic('TOO_DEEP', line.span, { limit: deepestNesting }));
  }
}

function readLine(source: string, { from, to, number }: SourceLine): Line {
  const line: Line = { kind: 'blank', number, span: { from, to }, diagnostics: [] };
  if (to - from > longestLine) {
    const tooLong = languageDiagnostic('TOO_LONG', line.span, { limit: longestLine });
    return { ...line, kind: 'expression', expression: { type: 'missing', span: line.span }, diagnostics: [tooLong] };
  }
  const reading = new Reading(source.slice(from, to), from);
  const tree = parser.parse(reading.source);
  const note = tree.topNode.getChild('Note');
  if (note !== null) {
    line.kind = 'note';
    line.note = reading.text(note).slice(1).trim();
  }
  const statement = Object.keys(kinds).flatMap((kind) => tree.topNode.getChildren(kind))[0];
  if (statement !== undefined) readWithinLimits(reading, line, statement);
  line.diagnostics = [...problemsOf(reading, tree), ...reading.diagnostics, ...hintsOf(reading, tree)];
  if (line.diagnostics.some(({ severity }) => severity === 'error')) {
    // Nothing may be computed from the part of a line that could be read.
    if (statement === undefined) line.kind = 'expression';
    line.expression = { type: 'missing', span: line.span };
  }
  return line;
}

/**
 * Reads the lines of a cell. Never throws on what an engineer types: what cannot be read is a
 * diagnostic of its line, and the other lines are read as if it were not there.
 */
export function readLines(source: string): Line[] {
  return splitLines(source).map((line) => readLine(source, line));
}

/** Reads one expression (a condition, a binding); undefined when it cannot be read. */
export function readExpressionText(source: string): Expression | undefined {
  const [line, ...more] = readLines(source);
  const failed = line?.diagnostics.some((diagnostic) => diagnostic.severity === 'error') ?? true;
  if (line?.kind !== 'expression' || more.length > 0 || failed) return undefined;
  return line.expression;
}
