import type { CallNode, Expression, MemberNode, NameNode, NumberNode } from '../tree';
import { ungrouped } from '../walk';
import { memberLatex, symbolLatex } from './symbol';

/** LaTeX of a name, and whether a power may stand on it without parentheses. */
export interface Piece {
  latex: string;
  single: boolean;
}

interface Setting {
  piece(use: NameNode | MemberNode): Piece;
  /** Sign between factors: a thin space between symbols, a cross between figures. */
  cross: boolean;
}

const enum Rank {
  condition,
  sum,
  product,
  sign,
  power,
  atom,
}

interface Typeset {
  latex: string;
  rank: Rank;
}

const functionNames: Readonly<Record<string, string>> = {
  exp: '\\exp', ln: '\\ln', log10: '\\log_{10}', sin: '\\sin', cos: '\\cos', tan: '\\tan', sinh: '\\sinh', cosh: '\\cosh', tanh: '\\tanh',
  asin: '\\arcsin', acos: '\\arccos', atan: '\\arctan', min: '\\min', max: '\\max', erf: '\\operatorname{erf}', erfc: '\\operatorname{erfc}',
};
const comparisonSigns: Readonly<Record<string, string>> = { '<': '<', '<=': '\\le', '>': '>', '>=': '\\ge', '==': '=', '!=': '\\ne' };

function wrap(part: Typeset, least: Rank): string {
  return part.rank >= least ? part.latex : `\\left(${part.latex}\\right)`;
}

/** Figures as written, thousands parted, with a power of ten for `1e6`. */
export function figuresLatex(text: string): string {
  const [mantissa = '', power] = text.split(/[eE]/);
  const [whole = '', decimals] = mantissa.split('.');
  const parted = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+(?!\d))/g, '\\,') : whole;
  const figures = decimals === undefined ? parted : `${parted === '' ? '0' : parted}.${decimals}`;
  if (power === undefined) return figures;
  const exponent = String(Number(power));
  return Number(mantissa) === 1 ? `10^{${exponent}}` : `${figures}{\\times}10^{${exponent}}`;
}

function numberPart(node: NumberNode): Typeset {
  const figures = figuresLatex(node.text);
  const unit = node.unit === undefined ? '' : `\\,${node.unit.unit.latex}`;
  const plain = unit === '' && !/[eE]/.test(node.text);
  return { latex: figures + unit, rank: plain ? Rank.atom : Rank.product };
}

function callPart(node: CallNode, setting: Setting): Typeset {
  const parts = node.arguments.map((argument) => part(argument, setting));
  const [first] = parts;
  const inner = first?.latex ?? '';
  if (node.name === 'sqrt') return { latex: `\\sqrt{${inner}}`, rank: Rank.atom };
  if (node.name === 'cbrt') return { latex: `\\sqrt[3]{${inner}}`, rank: Rank.atom };
  if (node.name === 'abs') return { latex: `\\left|${inner}\\right|`, rank: Rank.atom };
  if (node.name === 'if') {
    const [condition = '', yes = '', no = ''] = parts.map((each) => each.latex);
    return { latex: `\\begin{cases}${yes}&\\text{if }${condition}\\\\${no}&\\text{otherwise}\\end{cases}`, rank: Rank.sum };
  }
  const name = functionNames[node.name] ?? `\\operatorname{${node.name.replace(/_/g, '\\_')}}`;
  return { latex: `${name}\\left(${parts.map((each) => each.latex).join(',\\,')}\\right)`, rank: Rank.power };
}

/** Inside exponents quotients stay on the line: x^{1/3}. */
function exponentLatex(expression: Expression, setting: Setting): string {
  const inner = ungrouped(expression);
  if (inner.type === 'binary' && inner.operator === '/') {
    return `${wrap(part(inner.left, setting), Rank.product)}/${wrap(part(inner.right, setting), Rank.sign)}`;
  }
  return part(inner, setting).latex;
}

function startsWithFigure(latex: string): boolean {
  return /^(?:\\left\()?[\d.]/.test(latex);
}

function productPart(left: Expression, right: Expression, setting: Setting): Typeset {
  const above = wrap(part(left, setting), Rank.product);
  const below = wrap(part(right, setting), Rank.product);
  const sign = setting.cross || startsWithFigure(below) ? '\\times ' : '\\,';
  return { latex: `${above}${sign}${below}`, rank: Rank.product };
}

function part(expression: Expression, setting: Setting): Typeset {
  switch (expression.type) {
    case 'number':
      return numberPart(expression);
    case 'name':
    case 'member': {
      const { latex, single } = setting.piece(expression);
      return { latex, rank: single ? Rank.atom : Rank.product };
    }
    case 'group': {
      const inner = part(expression.inner, setting);
      return inner.rank >= Rank.power ? inner : { latex: `\\left(${inner.latex}\\right)`, rank: Rank.atom };
    }
    case 'unary': {
      if (expression.operator === 'not') return { latex: `\\lnot ${wrap(part(expression.operand, setting), Rank.sum)}`, rank: Rank.condition };
      return { latex: `${expression.operator}${wrap(part(expression.operand, setting), Rank.product)}`, rank: Rank.sum };
    }
    case 'binary': {
      if (expression.operator === '*') return productPart(expression.left, expression.right, setting);
      if (expression.operator === '/') {
        const above = part(ungrouped(expression.left), setting).latex;
        return { latex: `\\frac{${above}}{${part(ungrouped(expression.right), setting).latex}}`, rank: Rank.product };
      }
      if (expression.operator === '^') {
        const base = part(expression.left, setting);
        return { latex: `${wrap(base, Rank.atom)}^{${exponentLatex(expression.right, setting)}}`, rank: Rank.power };
      }
      const right = wrap(part(expression.right, setting), expression.operator === '-' ? Rank.product : Rank.sum);
      return { latex: `${wrap(part(expression.left, setting), Rank.sum)}${expression.operator}${right}`, rank: Rank.sum };
    }
    case 'comparison': {
      const sides = expression.operands.map((operand) => wrap(part(operand, setting), Rank.sum));
      const latex = sides.reduce((text, side, index) => `${text} ${comparisonSigns[expression.operators[index - 1] ?? ''] ?? ''} ${side}`);
      return { latex, rank: Rank.condition };
    }
    case 'logical':
      return { latex: `${part(expression.left, setting).latex}\\ \\text{${expression.operator}}\\ ${part(expression.right, setting).latex}`, rank: Rank.condition };
    case 'call':
      return callPart(expression, setting);
    case 'missing':
      return { latex: '\\square', rank: Rank.atom };
  }
}

function symbolPiece(use: NameNode | MemberNode): Piece {
  const latex = use.type === 'name' ? symbolLatex(use.name) : memberLatex(use.object, use.property);
  // A dotted or primed symbol takes a power as it stands; so does one with a subscript.
  return { latex, single: true };
}

/** The expression as an engineer would write it by hand. */
export function expressionLatex(expression: Expression): string {
  return part(ungrouped(expression), { piece: symbolPiece, cross: false }).latex;
}

/** The same with values in place of names; a name without a value stays a symbol. */
export function substitutedLatex(expression: Expression, lookup: (use: NameNode | MemberNode) => Piece | undefined): string {
  return part(ungrouped(expression), { piece: (use) => lookup(use) ?? symbolPiece(use), cross: true }).latex;
}
