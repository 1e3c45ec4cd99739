import fc from 'fast-check';
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { unitTable } from '../../../src/engine/units/index';
import {
  conditionLatex,
  expressionLatex,
  figuresLatex,
  memberLatex,
  namesOf,
  readExpressionText,
  substitutedLatex,
  symbolLatex,
} from '../../../src/engine/language/index';

/** KaTeX takes it without an error; `strict` would only speak of an upright µ, which is set as text. */
const render = (latex: string) => katex.renderToString(latex, { throwOnError: true, strict: 'ignore' });
const typeset = (source: string) => expressionLatex(readExpressionText(source)!);

describe('symbols', () => {
  // SI brochure, 5.4.1 and ISO 80000-1, 7.1 (from memory): quantities italic, words in subscripts upright.
  it.each([
    ['T', 'T'],
    ['T_wall', 'T_{\\mathrm{wall}}'],
    ['rho_b', '\\rho_{\\mathrm{b}}'],
    ['V_dot', '\\dot{V}'],
    ['V_dot_in', '\\dot{V}_{\\mathrm{in}}'],
    ['T_bar', '\\bar{T}'],
    ['Re', '\\mathrm{Re}'],
    ['Nu_D', '\\mathrm{Nu}_{\\mathrm{D}}'],
    ['cp', 'c_{p}'],
    ['T_inf', 'T_{\\infty}'],
    ['Delta_T_lm', '\\Delta T_{\\mathrm{lm}}'],
    ['dp', '\\Delta p'],
    ['T1', 'T_{\\mathrm{1}}'],
    ['T_1', 'T_{\\mathrm{1}}'],
    ['rho1', '\\rho_{\\mathrm{1}}'],
    ['q_alpha', 'q_{\\alpha}'],
    ["q''", "q''"],
    ['LMTD', '\\mathrm{LMTD}'],
    ['eD', '\\mathit{eD}'],
  ])('%s', (name, latex) => {
    expect(symbolLatex(name)).toBe(latex);
  });

  it('a value of another cell carries its name', () => {
    expect(memberLatex('w', 'cp')).toBe('c_{p,\\mathrm{w}}');
    expect(memberLatex('tube', 'Nu')).toBe('\\mathrm{Nu}_{\\mathrm{tube}}');
  });

  it('any name can be set', () => {
    const names = fc.stringMatching(/^[A-Za-zé_][A-Za-z0-9_é']{0,12}$/);
    fc.assert(
      fc.property(names, (name) => void render(symbolLatex(name))),
      { numRuns: 500 },
    );
  });
});

describe('expressions as written by hand', () => {
  it.each([
    ['Nu*k/d_i', '\\frac{\\mathrm{Nu}\\,k}{d_{\\mathrm{i}}}'],
    ['4*V_dot/(n*pi*d_i^2)', '\\frac{4\\,\\dot{V}}{n\\,\\pi\\,d_{\\mathrm{i}}^{2}}'],
    ['0.023*Re^0.8*Pr^0.3', '0.023\\,\\mathrm{Re}^{0.8}\\,\\mathrm{Pr}^{0.3}'],
    ['(T_a + T_b)/2', '\\frac{T_{\\mathrm{a}}+T_{\\mathrm{b}}}{2}'],
    ['(mu/mu_w)^(1/3)', '\\left(\\frac{\\mu}{\\mu_{\\mathrm{w}}}\\right)^{1/3}'],
    ['(a + b)*c', '\\left(a+b\\right)\\,c'],
    ['(a*b)*c', 'a\\,b\\,c'],
    ['a - (b + c)', 'a-\\left(b+c\\right)'],
    ['a + (b + c)', 'a+b+c'],
    ['a*(-b)', 'a\\,\\left(-b\\right)'],
    ['-a*b', '-a\\,b'],
    ['2*3', '2\\times 3'],
    ['1.2e5*a', '1.2\\times 10^{5}\\,a'],
    ['sqrt(a^2 + b^2)', '\\sqrt{a^{2}+b^{2}}'],
    ['abs(a - b)', '\\left|a-b\\right|'],
    ['5 W/(m^2 K)', '5\\,\\mathrm{W/(m^{2}{\\cdot}K)}'],
    ['(3 m)^2', '\\left(3\\,\\mathrm{m}\\right)^{2}'],
    ['850 ± 5 %', '850\\pm 5\\,\\mathrm{\\%}'],
    ['-5 degC - T', '-5\\,\\mathrm{{^\\circ}C}-T'],
    ['a*(2 + b)', 'a\\,\\left(2+b\\right)'],
    ['a*(-5 degC)', 'a\\times \\left(-5\\,\\mathrm{{^\\circ}C}\\right)'],
    ['if(Re < 2300, a, b)', '\\begin{cases}a&\\text{if }\\mathrm{Re} < 2\\,300\\\\b&\\text{otherwise}\\end{cases}'],
    ['besselI(0, x)', '\\mathrm{I}_{0}\\left(x\\right)'],
  ])('%s', (source, latex) => {
    expect(typeset(source)).toBe(latex);
    render(latex);
  });

  it('conditions, with parentheses only where they are needed', () => {
    const condition = (source: string) => conditionLatex(readExpressionText(source)!);
    expect(condition('0.5 <= Pr <= 2000')).toBe('0.5 \\le \\mathrm{Pr} \\le 2\\,000');
    expect(condition('a < b and (c > d or e == f)')).toBe(
      'a < b\\ \\text{and}\\ \\left(c > d\\ \\text{or}\\ e = f\\right)',
    );
  });

  it('figures in threes, powers of ten with a cross (SI brochure, 5.4.4)', () => {
    expect(figuresLatex('12345.6789')).toBe('12\\,345.678\\,9');
    expect(figuresLatex('1.2e5')).toBe('1.2\\times 10^{5}');
    expect(figuresLatex('1e-6')).toBe('10^{-6}');
    expect(figuresLatex('.5')).toBe('0.5');
    expect(figuresLatex('0.0158')).toBe('0.0158');
  });

  it('Re Pr is a product of two, not a variable RePr', () => {
    expect(typeset('Re*Pr')).toBe('\\mathrm{Re}\\,\\mathrm{Pr}');
    expect(symbolLatex('RePr')).toBe('\\mathit{RePr}');
  });
});

describe('values in place of names', () => {
  const values: Record<string, { latex: string; single: boolean }> = {
    V_dot: { latex: '38.5\\,\\mathrm{m^3/h}', single: false },
    d_i: { latex: '15.75\\,\\mathrm{mm}', single: false },
    n: { latex: '62', single: true },
    t: { latex: '-5.0\\,\\mathrm{{^\\circ}C}', single: false },
  };
  const substitute = (source: string) =>
    substitutedLatex(readExpressionText(source)!, (use) => (use.type === 'name' ? values[use.name] : undefined));

  it('stand with their units, parted by a cross, in parentheses under a power', () => {
    expect(substitute('4*V_dot/(n*pi*d_i^2)')).toBe(
      '\\frac{4\\times 38.5\\,\\mathrm{m^3/h}}{62\\times \\pi\\times \\left(15.75\\,\\mathrm{mm}\\right)^{2}}',
    );
  });

  it('keep their sign apart', () => {
    expect(substitute('d_i - t')).toBe('15.75\\,\\mathrm{mm}-\\left(-5.0\\,\\mathrm{{^\\circ}C}\\right)');
    expect(substitute('n*t')).toBe('62\\times \\left(-5.0\\,\\mathrm{{^\\circ}C}\\right)');
  });

  it('a name without a value stays a symbol', () => {
    expect(substitute('n*w.rho')).toBe('62\\times \\rho_{\\mathrm{w}}');
  });
});

describe('lists', () => {
  it('names and members used, with their places', () => {
    const source = 'w.rho*u*max(d_i, u)';
    const used = namesOf(readExpressionText(source)!).map(({ span }) => source.slice(span.from, span.to));
    expect(used).toEqual(['w.rho', 'u', 'd_i', 'u']);
  });

  it('every unit of the table can be set upright', () => {
    for (const { names } of unitTable) {
      const expression = readExpressionText(`5 ${names[0] ?? ''}`)!;
      expect(expression, names[0]).toBeDefined();
      render(expressionLatex(expression));
    }
  });
});
