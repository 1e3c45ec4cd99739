import type { CallNode, Expression } from '../tree';
import { rank, type Typeset } from './rank';

/** Names of functions as LaTeX has them; all stand upright (ISO 80000-2). */
const functionNames: Readonly<Record<string, string>> = {
  exp: '\\exp',
  ln: '\\ln',
  log10: '\\log_{10}',
  sin: '\\sin',
  cos: '\\cos',
  tan: '\\tan',
  sinh: '\\sinh',
  cosh: '\\cosh',
  tanh: '\\tanh',
  asin: '\\arcsin',
  acos: '\\arccos',
  atan: '\\arctan',
  min: '\\min',
  max: '\\max',
};
const besselFunctions: Readonly<Record<string, string>> = { besselI: 'I', besselJ: 'J', besselK: 'K', besselY: 'Y' };

function functionName(name: string): string {
  if (Object.hasOwn(functionNames, name)) return functionNames[name] ?? '';
  const letters = name.replace(/_/g, '\\_').replace(/'/g, "{'}");
  return /^[\x20-\x7e]*$/.test(letters) ? `\\operatorname{${letters}}` : `\\text{${letters}}`;
}

function casesLatex([condition = '', yes = '', no = '']: readonly string[]): string {
  return `\\begin{cases}${yes}&\\text{if }${condition}\\\\${no}&\\text{otherwise}\\end{cases}`;
}

/** A call: roots and bars as signs, `if` as cases, all else as name and arguments. */
export function callPart(node: CallNode, set: (argument: Expression) => Typeset): Typeset {
  const parts = node.arguments.map((argument) => set(argument).latex);
  const [first = ''] = parts;
  switch (node.name) {
    case 'sqrt':
      return { latex: `\\sqrt{${first}}`, rank: rank.atom };
    case 'cbrt':
      return { latex: `\\sqrt[3]{${first}}`, rank: rank.atom };
    case 'abs':
      return { latex: `\\left|${first}\\right|`, rank: rank.atom };
    case 'if':
      // The cases end at the right without a bracket: a factor behind them needs one.
      return { latex: casesLatex(parts), rank: rank.sum };
  }
  const bessel = Object.hasOwn(besselFunctions, node.name) ? besselFunctions[node.name] : undefined;
  if (bessel !== undefined && parts.length === 2) {
    return { latex: `\\mathrm{${bessel}}_{${first}}\\left(${parts[1] ?? ''}\\right)`, rank: rank.power };
  }
  return { latex: `${functionName(node.name)}\\left(${parts.join(',\\,')}\\right)`, rank: rank.power };
}
