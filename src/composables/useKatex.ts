import katex, { type KatexOptions, type TrustContext } from 'katex';

/** `\unit{…}` sets a unit upright and in the second ink; the class is the only markup that formulas may carry. */
const macros = { '\\unit': '\\htmlClass{u}{\\mathrm{#1}}' };

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
export function renderMath(element: HTMLElement, latex: string, display = false): void {
  katex.render(latex, element, optionsFor(display));
}

/** Whether a typeset line needs the room of a fraction (50px instead of 40px). */
export function isTall(latex: string | undefined): boolean {
  return latex !== undefined && /\\(?:d?frac|sqrt\[|begin\{cases\}|sum|int)/.test(latex);
}
