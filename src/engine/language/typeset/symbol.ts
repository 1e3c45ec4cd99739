import { greekNames } from '../names';

/** Characteristic numbers, written with two letters; upright here so that they read as one symbol. */
const groups = new Set(
  (
    'Re Pr Nu Gr Ra Pe Gz Bi Fo St Ri Ec Ma We Bo Ja Sc Sh Le Gn Fr Eu Kn De Ta Co Ca Ar Bd Br Cf Da Dn El Ga Ha Ka ' +
    'Ku Lu Mo Oh Ro Sr Ste Str Su Wi Wo Xe'
  ).split(' '),
);
const accents: Readonly<Record<string, string>> = {
  dot: '\\dot',
  bar: '\\bar',
  mean: '\\overline',
  hat: '\\hat',
  tilde: '\\tilde',
};
/** Greek letters whose command is not their name. */
const commands: Readonly<Record<string, string>> = {
  inf: '\\infty',
  infty: '\\infty',
  epsilon: '\\varepsilon',
  phi: '\\varphi',
  omicron: 'o',
};
/** Symbols that have a subscript by custom, written without an underscore. */
const customary: Readonly<Record<string, readonly [base: string, subscript: string]>> = {
  cp: ['c', 'p'],
  cv: ['c', 'v'],
};

/** Own keys only: `constructor` is a name like any other. */
function own<T>(list: Readonly<Record<string, T>>, key: string): T | undefined {
  return Object.hasOwn(list, key) ? list[key] : undefined;
}

function isGreek(word: string): boolean {
  return greekNames.has(word) || word === 'infty';
}

function greekLatex(word: string): string {
  return own(commands, word) ?? `\\${word}`;
}

/** Letters outside LaTeX's mathematics (é, ß) are set as text. */
function lettersLatex(letters: string, style: 'mathrm' | 'mathit'): string {
  if (/^[\x20-\x7e]*$/.test(letters)) return `\\${style}{${letters}}`;
  return style === 'mathrm' ? `\\text{${letters}}` : `\\textit{${letters}}`;
}

interface Base {
  latex: string;
  subscripts: string[];
}

function baseOf(word: string): Base {
  const custom = own(customary, word);
  if (custom !== undefined) return { latex: custom[0], subscripts: [custom[1]] };
  if (isGreek(word)) return { latex: greekLatex(word), subscripts: [] };
  if (groups.has(word)) return { latex: `\\mathrm{${word}}`, subscripts: [] };
  // `dp`, `dT`: a difference, as it is commonly typed.
  const change = /^d([A-Za-z])$/.exec(word)?.[1];
  if (change !== undefined) return { latex: `\\Delta ${change}`, subscripts: [] };
  // `T1`, `rho2`: figures at the end are a subscript.
  const figured = /^([^\d]+)(\d+)$/.exec(word);
  if (figured?.[1] !== undefined && figured[2] !== undefined && (figured[1].length <= 2 || isGreek(figured[1]))) {
    const base = baseOf(figured[1]);
    return { latex: base.latex, subscripts: [...base.subscripts, `\\mathrm{${figured[2]}}`] };
  }
  if (word.length === 1) return { latex: /[A-Za-z]/.test(word) ? word : lettersLatex(word, 'mathit'), subscripts: [] };
  return { latex: lettersLatex(word, /^[A-Z]{2,}$/.test(word) ? 'mathrm' : 'mathit'), subscripts: [] };
}

function subscriptLatex(part: string): string {
  return isGreek(part) ? greekLatex(part) : lettersLatex(part, 'mathrm');
}

function withSubscripts(latex: string, subscripts: readonly string[], primes: string): string {
  const low = subscripts.length === 0 ? '' : `_{${subscripts.join(',')}}`;
  return `${latex}${low}${primes}`;
}

/**
 * A name as a symbol: `T_wall`, `rho_b`, `V_dot_in`. Quantities stand italic, words in a subscript
 * and characteristic numbers upright (SI brochure, 5.4; ISO 80000-1, 7.1).
 */
export function symbolLatex(name: string): string {
  const primes = "'".repeat(name.split("'").length - 1);
  const [first = '', ...rest] = name
    .replace(/'/g, '')
    .split('_')
    .filter((part) => part !== '');
  if (first === 'Delta' && rest.length > 0) return `\\Delta ${symbolLatex(rest.join('_'))}${primes}`;
  if (first === '') return lettersLatex('?', 'mathrm');
  const accentAt = rest.findIndex((part) => own(accents, part) !== undefined);
  const base = baseOf(first);
  const accent = accentAt < 0 ? undefined : own(accents, rest[accentAt] ?? '');
  const latex = accent === undefined ? base.latex : `${accent}{${base.latex}}`;
  const low = rest.filter((_, index) => index !== accentAt).map(subscriptLatex);
  return withSubscripts(latex, [...base.subscripts, ...low], primes);
}

/** `w.rho` as ρ with the cell's name low: the symbol of another cell's value shows where it comes from. */
export function memberLatex(object: string, property: string): string {
  return symbolLatex(`${property}_${object}`);
}
