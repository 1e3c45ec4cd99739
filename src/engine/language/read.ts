import type { SyntaxNode } from '@lezer/common';
import type { Diagnostic } from '../errors/diagnostic';
import { plainUnit, scanUnit } from '../units/resolve';
import { parser } from './grammar/parser';
import { canonicalName } from './names';
import { problemsOfLine } from './problems';
import type { BinaryNode, ComparisonNode, Expression, Line, NumberNode, UnitNode } from './tree';

/** Deeper nesting than this is refused: no calculation needs it, and a stack has an end. */
export const deepestNesting = 100;

type Text = (node: SyntaxNode) => string;

const plainSigns: Readonly<Record<string, string>> = { '−': '-', '·': '*', '×': '*', '≤': '<=', '≥': '>=', '≠': '!=' };
const plain = (sign: string) => plainSigns[sign] ?? sign;

class TooDeep extends Error {}

function children(node: SyntaxNode): SyntaxNode[] {
  const list: SyntaxNode[] = [];
  for (let child = node.firstChild; child !== null; child = child.nextSibling) list.push(child);
  return list;
}

const expressionNodes = new Set([
  'Literal', 'NameUse', 'Member', 'Call', 'Group', 'Negative', 'Not', 'Power', 'Product', 'Sum', 'Comparison', 'And', 'Or',
]);

function span(node: SyntaxNode): { from: number; to: number } {
  return { from: node.from, to: node.to };
}

function readUnit(node: SyntaxNode | null, text: Text): UnitNode | undefined {
  if (node === null) return undefined;
  return { span: span(node), unit: scanUnit(text(node))?.unit ?? plainUnit };
}

function readLiteral(node: SyntaxNode, text: Text): NumberNode {
  const figures = text(node.getChild('Number') ?? node).replace('−', '-');
  const unit = readUnit(node.getChild('Unit'), text);
  const literal: NumberNode = { type: 'number', span: span(node), value: Number(figures), text: figures, unit };
  const given = node.getChild('Uncertainty');
  const amount = given?.getChild('Number');
  if (given && amount) {
    const amountUnit = readUnit(given.getChild('Unit'), text);
    const coverage = given.getChild('Coverage');
    const k = coverage ? Number(/[\d.]+/.exec(text(coverage))?.[0] ?? 1) : 1;
    const relative = amountUnit?.unit.display === '%' && unit?.unit.display !== '%';
    const scale = relative ? 0.01 : amountUnit === undefined || unit === undefined ? 1 : amountUnit.unit.factor / unit.unit.factor;
    literal.uncertainty = { value: (Number(text(amount)) * scale) / k, relative };
  }
  return literal;
}

function readComparison(node: SyntaxNode, text: Text, depth: number): ComparisonNode {
  const [left, right] = operands(node, text, depth);
  const operator = plain(text(node.getChild('Compare') ?? node)) as ComparisonNode['operators'][number];
  if (left.type === 'comparison') {
    return { ...left, span: span(node), operands: [...left.operands, right], operators: [...left.operators, operator] };
  }
  return { type: 'comparison', span: span(node), operands: [left, right], operators: [operator] };
}

function operands(node: SyntaxNode, text: Text, depth: number): [Expression, Expression] {
  const [left, right] = children(node).filter((child) => expressionNodes.has(child.name));
  const missing: Expression = { type: 'missing', span: { from: node.to, to: node.to } };
  return [left ? readExpression(left, text, depth + 1) : missing, right ? readExpression(right, text, depth + 1) : missing];
}

function readBinary(node: SyntaxNode, text: Text, depth: number): BinaryNode {
  const [left, right] = operands(node, text, depth);
  const sign = children(node).find((child) => ['Plus', 'Minus', 'Times', 'Divide', 'Caret'].includes(child.name));
  return { type: 'binary', span: span(node), operator: plain(sign ? text(sign) : '+') as BinaryNode['operator'], left, right };
}

function readInner(node: SyntaxNode, text: Text, depth: number): Expression {
  const inner = children(node).find((child) => expressionNodes.has(child.name));
  return inner ? readExpression(inner, text, depth + 1) : { type: 'missing', span: span(node) };
}

function readExpression(node: SyntaxNode, text: Text, depth: number): Expression {
  if (depth > deepestNesting) throw new TooDeep();
  switch (node.name) {
    case 'Literal':
      return readLiteral(node, text);
    case 'NameUse':
      return { type: 'name', span: span(node), name: canonicalName(text(node)) };
    case 'Member': {
      const [object = '', property = ''] = text(node).split('.');
      return { type: 'member', span: span(node), object: canonicalName(object), property: canonicalName(property) };
    }
    case 'Call': {
      const name = node.getChild('FunctionName');
      const list = node.getChild('Arguments');
      const given = list ? children(list).filter((child) => expressionNodes.has(child.name)) : [];
      return {
        type: 'call',
        span: span(node),
        name: name ? text(name) : '',
        nameSpan: span(name ?? node),
        arguments: given.map((argument) => readExpression(argument, text, depth + 1)),
      };
    }
    case 'Group':
      return { type: 'group', span: span(node), inner: readInner(node, text, depth) };
    case 'Negative': {
      const operator = node.getChild('Plus') ? '+' : '-';
      return { type: 'unary', span: span(node), operator, operand: readInner(node, text, depth) };
    }
    case 'Not':
      return { type: 'unary', span: span(node), operator: 'not', operand: readInner(node, text, depth) };
    case 'Comparison':
      return readComparison(node, text, depth);
    case 'And':
    case 'Or': {
      const [left, right] = operands(node, text, depth);
      return { type: 'logical', span: span(node), operator: node.name === 'And' ? 'and' : 'or', left, right };
    }
    case 'Power':
    case 'Product':
    case 'Sum':
      return readBinary(node, text, depth);
    default:
      return { type: 'missing', span: span(node) };
  }
}

function readStatement(line: Line, node: SyntaxNode, text: Text): void {
  const definition = node.getChild('Definition');
  const body = children(node).find((child) => expressionNodes.has(child.name));
  line.kind = node.name === 'Assignment' ? 'assignment' : node.name === 'Requirement' ? 'require' : 'expression';
  line.span = span(node);
  if (definition) {
    line.name = canonicalName(text(definition));
    line.nameSpan = span(definition);
  }
  line.target = readUnit(node.getChild('Target')?.getChild('Unit') ?? null, text);
  line.expression = body ? readExpression(body, text, 0) : { type: 'missing', span: { from: node.to, to: node.to } };
}

/** Character ranges of the logical lines: a line goes on where the tree runs over its end. */
function logicalLines(source: string, statements: readonly SyntaxNode[]): { from: number; to: number; number: number }[] {
  const lines: { from: number; to: number; number: number }[] = [];
  let from = 0;
  let number = 0;
  while (from <= source.length) {
    const found = source.indexOf('\n', from);
    let to = found < 0 ? source.length : found;
    const running = statements.find((statement) => statement.from >= from && statement.from < to && statement.to > to);
    if (running) {
      const next = source.indexOf('\n', running.to);
      to = next < 0 ? source.length : next;
    }
    lines.push({ from, to, number });
    number += source.slice(from, to + 1).split('\n').length - 1;
    from = to + 1;
  }
  return lines;
}

/**
 * Reads the lines of a cell. Never throws on what an engineer types: what cannot be read is a
 * diagnostic of its line, and the other lines are read as if it were not there.
 */
export function readLines(source: string): Line[] {
  const tree = parser.parse(source);
  const text: Text = (node) => source.slice(node.from, node.to);
  const all = children(tree.topNode);
  const statements = all.filter((node) => ['Assignment', 'Requirement', 'ExpressionLine'].includes(node.name));
  return logicalLines(source, statements).map(({ from, to, number }) => {
    const line: Line = { kind: 'blank', number, span: { from, to }, diagnostics: [] };
    const within = all.filter((node) => node.from >= from && node.from <= to && node.to <= to);
    const note = within.find((node) => node.name === 'Note');
    if (note) {
      line.note = text(note).slice(1).trim();
      line.kind = 'note';
    }
    const [statement] = within.filter((node) => statements.some((one) => one.from === node.from && one.name === node.name));
    const problems: Diagnostic[] = problemsOfLine(source, { from, to: note?.from ?? to }, tree);
    try {
      if (statement) readStatement(line, statement, text);
    } catch (error) {
      if (!(error instanceof TooDeep)) throw error;
      line.expression = { type: 'missing', span: line.span };
      problems.unshift({ code: 'TOO_DEEP', severity: 'error', message: `This line nests deeper than ${deepestNesting} levels; split it.`, span: line.span });
    }
    if (!statement && problems.length > 0) line.kind = 'expression';
    line.diagnostics = problems;
    return line;
  });
}

/** Reads one expression (a condition, a binding); undefined when it cannot be read. */
export function readExpressionText(source: string): Expression | undefined {
  const [line] = readLines(source);
  if (line?.expression === undefined || line.diagnostics.some((diagnostic) => diagnostic.severity === 'error')) return undefined;
  return line.expression;
}

