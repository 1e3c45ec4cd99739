import katex, { type KatexOptions, type TrustContext } from 'katex';

/** Upright two-letter symbols that may follow a figure as units do, but are quantities. */
const characteristicNumbers = /^(?:Re|Pr|Nu|Gr|Ra|Pe|Gz|Bi|Fo|Ec|Ma|We|Bo|Ja|Sc|Sh|Le|Ri|Gn|Fr|Eu|Kn)$/;

/** Offset behind the brace that closes the one open at `from`. */
function closingBrace(latex: string, from: number): number {
  let depth = 1;
  for (let at = from; at < latex.length; at += 1) {
    if (latex[at] === '{') depth += 1;
    else if (latex[at] === '}') depth -= 1;
    if (depth === 0) return at;
  }
  return latex.length;
}

/** Units stand behind figures as `\\,\\mathrm{…}`: marks them, so that they are set in the second ink. */
export function markUnits(latex: string): string {
  const begin = /(?<=[\d}])\\,\\mathrm\{/g;
  let marked = '';
  let done = 0;
  for (let found = begin.exec(latex); found !== null; found = begin.exec(latex)) {
    const from = found.index + found[0].length;
    const to = closingBrace(latex, from);
    const unit = latex.slice(from, to);
    if (characteristicNumbers.test(unit)) continue;
    // KaTeX has no upright µ: the class sets its italic one upright.
    const upright = unit.replace(/\\text\{µ\}/g, '\\mu ').replace(/\{\^\\circ\}/g, '°');
    marked += `${latex.slice(done, found.index)}\\,\\unit{${upright}}`;
    done = to + 1;
  }
  return marked + latex.slice(done);
}

/** `\unit{…}` sets a unit upright and in the second ink; the class is the only markup that formulas may carry. */
const macros = { '\\unit': '\\htmlClass{u}{\\mathrm{#1}}' };

/** `line`: a line of the pad, fractions at full size; `words`: within running text; `block`: set apart. */
export type MathStyle = 'line' | 'words' | 'block';

function trusted(context: TrustContext): boolean {
  return context.command === '\\htmlClass' && context.class === 'u';
}

function optionsFor(display: boolean): KatexOptions {
  return {
    displayMode: display,
    output: 'htmlAndMathml',
    throwOnError: false,
    errorColor: 'inherit',
    strict: 'ignore',
    trust: trusted,
    maxSize: 20,
    maxExpand: 500,
    macros: { ...macros },
  };
}

/**
 * Typesets LaTeX into an element. `render` builds DOM nodes, so that a strict content security
 * policy holds: nothing of the formula passes through an HTML parser.
 */
export function renderMath(element: HTMLElement, latex: string, style: MathStyle): void {
  const marked = markUnits(latex);
  katex.render(style === 'line' ? `\\displaystyle ${marked}` : marked, element, optionsFor(style === 'block'));
}

/** Whether a typeset line needs the room of a fraction (50px instead of 40px). */
export function isTall(latex: string | undefined): boolean {
  return latex !== undefined && /\\(?:d?frac|sqrt\[|begin\{cases\}|sum|int)/.test(latex);
}
