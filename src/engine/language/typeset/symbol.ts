import { greekNames } from '../names';

/** Characteristic numbers, written with two letters, upright here so that they read as one symbol. */
const groups = new Set(['Re', 'Pr', 'Nu', 'Gr', 'Ra', 'Pe', 'Gz', 'Bi', 'Fo', 'St', 'Ri', 'Ec', 'Ma', 'We', 'Bo', 'Ja', 'Sc', 'Sh', 'Le', 'Gn', 'Fr', 'Eu', 'Kn', 'De', 'Ta', 'Co', 'Ca', 'Ar', 'Bd']);
const accents: Readonly<Record<string, string>> = { dot: '\\dot', bar: '\\bar', hat: '\\hat', tilde: '\\tilde' };
/** Greek letters that KaTeX has no command for, since they look like Latin ones. */
const greekCommands: Readonly<Record<string, string>> = { inf: '\\infty', partial: '\\partial', nabla: '\\nabla', epsilon: '\\varepsilon', phi: '\\varphi' };

function greekLatex(word: string): string {
  return `${greekCommands[word] ?? `\\${word}`} `;
}

function baseLatex(base: string): string {
  if (greekNames.has(base)) return greekLatex(base).trimEnd();
  if (groups.has(base)) return `\\mathrm{${base}}`;
  const change = /^(?:Delta|d)([A-Za-z])$/.exec(base);
  if (change !== null) return `\\Delta ${change[1] ?? ''}`;
  const greekBegin = [...greekNames].find((word) => base.startsWith(word) && /^\d+$/.test(base.slice(word.length)));
  if (greekBegin !== undefined) return `${greekLatex(greekBegin).trimEnd()}_{${base.slice(greekBegin.length)}}`;
  if (base.length === 1) return base;
  return /^[A-Z]{2,}$/.test(base) ? `\\mathrm{${base}}` : `\\mathit{${base}}`;
}

function subscriptLatex(part: string): string {
  return greekNames.has(part) ? greekLatex(part).trimEnd() : `\\mathrm{${part}}`;
}

/** A name as a symbol: `T_wall`, `rho_b`, `V_dot_in`; words in the subscript stand upright (ISO 80000-1, 7.1). */
export function symbolLatex(name: string): string {
  const [base = '', ...rest] = name.split('_').filter((part) => part !== '');
  if (base === 'Delta' && rest.length > 0) return `\\Delta ${symbolLatex(rest.join('_'))}`;
  const accent = rest.find((part) => accents[part] !== undefined);
  const body = accent === undefined ? baseLatex(base) : `${accents[accent] ?? ''}{${baseLatex(base)}}`;
  const low = rest.filter((part) => accents[part] === undefined).map(subscriptLatex);
  if (low.length === 0) return body;
  return /_\{\d+\}$/.test(body) ? `{${body}}_{${low.join(',')}}` : `${body}_{${low.join(',')}}`;
}

/** `w.rho` as ρ with the cell's name low: the value of another cell shows where it comes from. */
export function memberLatex(object: string, property: string): string {
  return symbolLatex(`${property}_${object}`);
}
