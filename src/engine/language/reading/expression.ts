import type { SyntaxNode } from '@lezer/common';
import { canonicalName } from '../names';
import type { BinaryNode, CallNode, ComparisonNode, Expression, UnaryNode } from '../tree';
import { childrenOf } from './leaves';
import { loweredFigures, readLiteral } from './literal';
import type { Reading } from './reading';

/** Deeper nesting than this is refused: no calculation needs it, and a stack has an end. */
export const deepestNesting = 250;

export class TooDeep extends Error {}

const expressionNodes = new Set([
  'Literal',
  'NameUse',
  'Member',
  'Call',
  'Group',
  'Negative',
  'Not',
  'Power',
  'Product',
  'Sum',
  'Comparison',
  'And',
  'Or',
]);
const signNodes = new Set(['Plus', 'Minus', 'Times', 'Divide', 'Caret']);
const plainSigns: Readonly<Record<string, string>> = {
  '−': '-',
  '·': '*',
  '⋅': '*',
  '×': '*',
  '≤': '<=',
  '≥': '>=',
  '≠': '!=',
};
const plain = (sign: string) => plainSigns[sign] ?? sign;

/** The node of the line's expression, where it has one. */
export function expressionChild(node: SyntaxNode): SyntaxNode | undefined {
  return childrenOf(node).find((child) => expressionNodes.has(child.name));
}

type Reader = (reading: Reading, node: SyntaxNode, depth: number) => Expression;

function operands(reading: Reading, node: SyntaxNode, depth: number): [Expression, Expression] {
  const [left, right] = childrenOf(node).filter((child) => expressionNodes.has(child.name));
  const missing: Expression = { type: 'missing', span: reading.span({ from: node.to, to: node.to }) };
  return [
    left === undefined ? missing : readExpression(reading, left, depth + 1),
    right === undefined ? missing : readExpression(reading, right, depth + 1),
  ];
}

function inner(reading: Reading, node: SyntaxNode, depth: number): Expression {
  const child = expressionChild(node);
  if (child !== undefined) return readExpression(reading, child, depth + 1);
  return { type: 'missing', span: reading.span(node) };
}

/** x²^3 is (x²)^3: the group says so in print, too. */
function grouped(base: Expression): Expression {
  return base.type === 'binary' && base.operator === '^' ? { type: 'group', span: base.span, inner: base } : base;
}

const readBinary: Reader = (reading, node, depth) => {
  const [first, right] = operands(reading, node, depth);
  const left = node.name === 'Power' ? grouped(first) : first;
  const sign = childrenOf(node).find((child) => signNodes.has(child.name));
  const operator = plain(sign === undefined ? '+' : reading.text(sign)) as BinaryNode['operator'];
  return { type: 'binary', span: reading.span(node), operator, left, right };
};

const readPower: Reader = (reading, node, depth) => {
  const raised = node.getChild('Raised');
  if (raised === null) return readBinary(reading, node, depth);
  const text = loweredFigures(reading.text(raised));
  const [base] = operands(reading, node, depth);
  const left: Expression = grouped(base);
  const figures = text.replace('-', '');
  const value: Expression = { type: 'number', span: reading.span(raised), value: Number(figures), text: figures };
  const right: Expression = text.startsWith('-')
    ? { type: 'unary', span: reading.span(raised), operator: '-', operand: value }
    : value;
  return { type: 'binary', span: reading.span(node), operator: '^', left, right };
};

const readComparison: Reader = (reading, node, depth) => {
  const [left, right] = operands(reading, node, depth);
  const sign = node.getChild('Compare');
  const operator = plain(sign === null ? '==' : reading.text(sign)) as ComparisonNode['operators'][number];
  const span = reading.span(node);
  if (left.type === 'comparison') {
    return { ...left, span, operands: [...left.operands, right], operators: [...left.operators, operator] };
  }
  return { type: 'comparison', span, operands: [left, right], operators: [operator] };
};

const readLogical: Reader = (reading, node, depth) => {
  const [left, right] = operands(reading, node, depth);
  return { type: 'logical', span: reading.span(node), operator: node.name === 'And' ? 'and' : 'or', left, right };
};

/** The sign of a level belongs to its figures: -5 degC is five degrees below zero, not minus 278 K. */
function signed(unary: UnaryNode): Expression {
  const { operand, operator, span } = unary;
  if (operand.type !== 'number' || operand.unit?.unit.level === undefined || operand.text.startsWith('-')) return unary;
  if (operator === '+') return { ...operand, span };
  return { ...operand, span, value: -operand.value, text: `-${operand.text}` };
}

const readSign: Reader = (reading, node, depth) => {
  const operator = node.getChild('Plus') === null ? '-' : '+';
  return signed({ type: 'unary', span: reading.span(node), operator, operand: inner(reading, node, depth) });
};

function readMember(reading: Reading, node: SyntaxNode): Expression {
  const [object = '', property = ''] = reading.text(node).split('.');
  return {
    type: 'member',
    span: reading.span(node),
    object: canonicalName(object),
    property: canonicalName(property),
  };
}

function readCall(reading: Reading, node: SyntaxNode, depth: number): CallNode {
  const name = node.getChild('FunctionName') ?? node;
  const list = node.getChild('Arguments');
  const given = list === null ? [] : childrenOf(list).filter((child) => expressionNodes.has(child.name));
  return {
    type: 'call',
    span: reading.span(node),
    name: reading.text(name).split('.').map(canonicalName).join('.'),
    nameSpan: reading.span(name),
    arguments: given.map((argument) => readExpression(reading, argument, depth + 1)),
  };
}

const readers: Readonly<Record<string, Reader>> = {
  Literal: readLiteral,
  NameUse: (reading, node) => ({
    type: 'name',
    span: reading.span(node),
    name: canonicalName(reading.text(node)),
  }),
  Member: readMember,
  Call: readCall,
  Group: (reading, node, depth) => ({ type: 'group', span: reading.span(node), inner: inner(reading, node, depth) }),
  Negative: readSign,
  Not: (reading, node, depth) => ({
    type: 'unary',
    span: reading.span(node),
    operator: 'not',
    operand: inner(reading, node, depth),
  }),
  Comparison: readComparison,
  And: readLogical,
  Or: readLogical,
  Power: readPower,
  Product: readBinary,
  Sum: readBinary,
};

/** The tree of one expression; parts that could not be read are `missing`. Throws TooDeep. */
export function readExpression(reading: Reading, node: SyntaxNode, depth = 0): Expression {
  if (depth > deepestNesting) throw new TooDeep();
  const reader = readers[node.name];
  return reader === undefined ? { type: 'missing', span: reading.span(node) } : reader(reading, node, depth);
}
