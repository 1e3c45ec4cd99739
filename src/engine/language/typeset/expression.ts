import type {
  BinaryNode,
  ComparisonNode,
  Expression,
  LogicalNode,
  MemberNode,
  NameNode,
  NumberNode,
  UnaryNode,
} from '../tree';
import { literalOf, ungrouped } from '../walk';
import { callPart } from './call';
import { figuresLatex } from './figures';
import { rank, wrap, type Typeset } from './rank';
import { memberLatex, symbolLatex } from './symbol';

export { figuresLatex } from './figures';

/** LaTeX of a name, and whether a power may stand on it without parentheses. */
export interface Piece {
  latex: string;
  single: boolean;
}

export interface Setting {
  piece(use: NameNode | MemberNode): Piece;
  /** Sign between factors: a thin space between symbols, a cross between figures. */
  cross: boolean;
}

const comparisonSigns: Readonly<Record<ComparisonNode['operators'][number], string>> = {
  '<': '<',
  '<=': '\\le',
  '>': '>',
  '>=': '\\ge',
  '==': '=',
  '!=': '\\ne',
};

function numberPart(node: NumberNode): Typeset {
  const unit = node.unit === undefined ? '' : `\\,${node.unit.unit.latex}`;
  const latex = figuresLatex(node.text) + unit;
  if (node.uncertainty !== undefined) {
    return { latex: `${latex}\\pm ${uncertaintyLatex(node.uncertainty, node)}`, rank: rank.sum };
  }
  if (node.text.startsWith('-')) return { latex, rank: rank.sign };
  return { latex, rank: unit === '' && !/[eE]/.test(node.text) ? rank.atom : rank.product };
}

/** The standard uncertainty, in per cent or in the unit of the value. */
function uncertaintyLatex({ value, relative }: NonNullable<NumberNode['uncertainty']>, node: NumberNode): string {
  const figures = figuresLatex(String(Number((relative ? value * 100 : value).toPrecision(6))).replace('+', ''));
  if (relative) return `${figures}\\,\\mathrm{\\%}`;
  return node.unit === undefined ? figures : `${figures}\\,${node.unit.unit.latex}`;
}

function namePart(node: NameNode | MemberNode, setting: Setting): Typeset {
  const { latex, single } = setting.piece(node);
  if (/^[-−]/.test(latex)) return { latex, rank: rank.sign };
  return { latex, rank: single ? rank.atom : rank.product };
}

function unaryPart(node: UnaryNode, setting: Setting): Typeset {
  const operand = partOf(node.operand, setting);
  if (node.operator === 'not') return { latex: `\\lnot ${wrap(operand, rank.sum)}`, rank: rank.condition };
  return { latex: `${node.operator}${wrap(operand, rank.product)}`, rank: rank.sign };
}

/** Inside exponents quotients stay on the line: x^{1/3}. */
function exponentLatex(expression: Expression, setting: Setting): string {
  const inner = ungrouped(expression);
  if (inner.type === 'unary' && inner.operator === '-') return `-${exponentLatex(inner.operand, setting)}`;
  if (inner.type !== 'binary' || inner.operator !== '/') return partOf(inner, setting).latex;
  return `${wrap(partOf(inner.left, setting), rank.sign)}/${wrap(partOf(inner.right, setting), rank.fraction)}`;
}

/** Before figures a thin space would not be seen as a sign. */
function beginsWithFigures(expression: Expression, latex: string): boolean {
  return /^\d/.test(latex) || (latex.startsWith('\\left(') && literalOf(expression) !== undefined);
}

function productPart(node: BinaryNode, setting: Setting): Typeset {
  const left = partOf(node.left, setting);
  const right = wrap(partOf(node.right, setting), rank.product);
  const sign = setting.cross || beginsWithFigures(node.right, right) ? '\\times ' : '\\,';
  const leading = left.rank === rank.sign;
  return { latex: `${wrap(left, rank.sign)}${sign}${right}`, rank: leading ? rank.sign : rank.product };
}

function sumPart(node: BinaryNode, setting: Setting): Typeset {
  const left = wrap(partOf(node.left, setting), rank.sum);
  const right = partOf(node.right, setting);
  // Behind a sign stands no other sign; behind a minus a sum keeps its parentheses.
  const plain = right.rank >= rank.product || (node.operator === '+' && right.rank === rank.sum);
  const shown = plain ? right.latex : wrap(right, rank.atom);
  return { latex: `${left}${node.operator}${shown}`, rank: rank.sum };
}

function binaryPart(node: BinaryNode, setting: Setting): Typeset {
  switch (node.operator) {
    case '*':
      return productPart(node, setting);
    case '/': {
      const above = partOf(ungrouped(node.left), setting).latex;
      const below = partOf(ungrouped(node.right), setting).latex;
      return { latex: `\\frac{${above}}{${below}}`, rank: rank.fraction };
    }
    case '^': {
      const base = wrap(partOf(node.left, setting), rank.atom);
      // Primes are superscripts themselves.
      const carrier = base.endsWith("'") ? `{${base}}` : base;
      return { latex: `${carrier}^{${exponentLatex(node.right, setting)}}`, rank: rank.power };
    }
    default:
      return sumPart(node, setting);
  }
}

function comparisonPart(node: ComparisonNode, setting: Setting): Typeset {
  const sides = node.operands.map((operand) => wrap(partOf(operand, setting), rank.sum));
  const latex = sides.reduce((text, side, index) => {
    const operator = node.operators[index - 1];
    return `${text} ${operator === undefined ? '' : comparisonSigns[operator]} ${side}`;
  });
  return { latex, rank: rank.condition };
}

function logicalPart(node: LogicalNode, setting: Setting): Typeset {
  const own = node.operator === 'and' ? rank.both : rank.either;
  const [left, right] = [node.left, node.right].map((side) => wrap(partOf(side, setting), own));
  return { latex: `${left ?? ''}\\ \\text{${node.operator}}\\ ${right ?? ''}`, rank: own };
}

/** One part with the rank that decides on parentheses; parentheses as written stay only where needed. */
export function partOf(expression: Expression, setting: Setting): Typeset {
  switch (expression.type) {
    case 'number':
      return numberPart(expression);
    case 'name':
    case 'member':
      return namePart(expression, setting);
    case 'group':
      return partOf(expression.inner, setting);
    case 'unary':
      return unaryPart(expression, setting);
    case 'binary':
      return binaryPart(expression, setting);
    case 'comparison':
      return comparisonPart(expression, setting);
    case 'logical':
      return logicalPart(expression, setting);
    case 'call':
      return callPart(expression, (argument) => partOf(argument, setting));
    case 'missing':
      return { latex: '\\square', rank: rank.atom };
  }
}

function symbolPiece(use: NameNode | MemberNode): Piece {
  const latex = use.type === 'name' ? symbolLatex(use.name) : memberLatex(use.object, use.property);
  return { latex, single: !latex.startsWith('\\Delta ') };
}

/** The expression as an engineer would write it by hand. */
export function expressionLatex(expression: Expression): string {
  return partOf(expression, { piece: symbolPiece, cross: false }).latex;
}

/** A condition as an engineer would write it; the same as an expression. */
export const conditionLatex = expressionLatex;

/**
 * The same with values in place of names: `lookup` answers figures with their unit in LaTeX. A
 * name without a value stays a symbol.
 */
export function substitutedLatex(
  expression: Expression,
  lookup: (use: NameNode | MemberNode) => Piece | undefined,
): string {
  return partOf(expression, { piece: (use) => lookup(use) ?? symbolPiece(use), cross: true }).latex;
}
