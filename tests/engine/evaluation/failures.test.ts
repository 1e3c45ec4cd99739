import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cellOf, codes, last, pointedAt, problems } from '../calculation/sheet';

describe('a line without a result', () => {
  it.each([
    ['a = 5 W\nx = a/(3 K - 3 K)', 'Division by zero: 3 K - 3 K is 0 K.', 'a/(3 K - 3 K)'],
    ['T_1 = 20 degC\nx = 5 W/(T_1 - T_1)', 'Division by zero: T_1 - T_1 is 0 K.', '5 W/(T_1 - T_1)'],
    ['x = 1/0', 'Division by zero: the divisor is 0.', '1/0'],
    ['a = 0 m\nx = a^-2', 'Division by zero: a is 0 m to the power of −2.', 'a^-2'],
    ['x = ln(-2)', 'No result: logarithm of a value that is not positive: −2.', 'ln(-2)'],
    ['a = -4 m^2\nx = sqrt(a)', 'No result: square root of a negative value: a is −4.000 m².', 'sqrt(a)'],
    ['a = -4\nx = 1 + a^0.8', 'A negative value has a power to whole exponents only: a is −4, exponent 0.8.', 'a^0.8'],
    [
      'a = -8\nx = a^(1/3)',
      'A negative value has a power to whole exponents only: a is −8, exponent 0.333333.',
      'a^(1/3)',
    ],
    ['a = 2\nx = acos(a)', 'No result: arccosine of a value outside −1 to 1: a is 2.', 'acos(a)'],
    ['a = 1000\nx = exp(a)', 'The result is too large to be computed: a is 1 000.', 'exp(a)'],
    ['a = 1e200\nx = a*a', 'The result is too large to be computed: a is 1.000×10²⁰⁰, a is 1.000×10²⁰⁰.', 'a*a'],
  ])('says why, with the values behind it: %s', (source, message, place) => {
    const [problem, ...more] = problems(source);
    expect(problem?.message.replace(/\u00a0/g, ' ')).toBe(message);
    expect(pointedAt(source, problem)).toBe(place);
    expect(more).toEqual([]);
    expect(last(source).value).toBeUndefined();
  });

  it('is an overflow where a literal or the unit asked for cannot hold the value', () => {
    expect(codes('x = 1e308 km')).toEqual(['OVERFLOW']);
    expect(codes('x = 1e305 kg to ng')).toEqual(['OVERFLOW']);
    expect(last('x = 1e305 kg').value?.si).toBe(1e305);
    expect(last('a = 1e307 m\nx = 2*a', { unitSystem: 'US' }).value?.text).toBe('2.000×10³⁰⁷');
  });

  it('lets those wait that need it, and no others', () => {
    const cell = cellOf('a = 1/0\nb = 2*a\nc = b + 1\nd = 3');
    expect(cell.lines.map(({ waitsFor }) => waitsFor)).toEqual([[], ['a'], ['b'], []]);
    expect(cell.lines.map(({ diagnostics }) => diagnostics.length)).toEqual([1, 0, 0, 0]);
  });
});

/** Plain expressions in which much can go wrong. */
const { risky } = fc.letrec<{ risky: string }>((tie) => ({
  risky: fc.oneof(
    { depthSize: 'medium' },
    fc.constantFrom('0', '1', '-1', '0.5', '-2.5', '1e300', '-1e-300', '3', '1e-320', 'pi', '710'),
    fc
      .tuple(tie('risky'), fc.constantFrom('+', '-', '*', '/', '^'), tie('risky'))
      .map(([left, sign, right]) => `(${left}) ${sign} (${right})`),
    fc
      .tuple(
        fc.constantFrom('sqrt', 'cbrt', 'exp', 'ln', 'log10', 'tan', 'asin', 'acosh', 'atanh', 'sinh', 'erf', 'erfc'),
        tie('risky'),
      )
      .map(([name, x]) => `${name}(${x})`),
    fc
      .tuple(
        fc.constantFrom('besselJ', 'besselI', 'besselK'),
        fc.constantFrom('0', '1', '7', '100', '-1', '0.5'),
        tie('risky'),
      )
      .map(([name, n, x]) => `${name}(${n}, ${x})`),
    fc.tuple(tie('risky'), tie('risky'), tie('risky')).map(([test, x, y]) => `if(${test} > 0, ${x}, ${y})`),
    fc.tuple(tie('risky'), tie('risky')).map(([x, y]) => `max(${x}, ${y}, 1)`),
  ),
}));

describe('whatever is computed', () => {
  it('is a finite number or an error with a sentence, never NaN or Infinity', () => {
    const met = new Map<string, number>();
    fc.assert(
      fc.property(risky, (expression) => {
        const { value, diagnostics } = last(`x = ${expression}`);
        const errors = diagnostics.filter(({ severity }) => severity === 'error');
        if (value === undefined) expect(errors).toHaveLength(1);
        else expect(Number.isFinite(value.si)).toBe(true);
        expect(JSON.stringify([value, diagnostics])).not.toMatch(/NaN|Infinity|undefined|FAULT/);
        const code = errors[0]?.code ?? 'value';
        met.set(code, (met.get(code) ?? 0) + 1);
      }),
      { numRuns: 3000 },
    );
    for (const code of ['value', 'DIVISION_BY_ZERO', 'NO_VALUE', 'OVERFLOW'])
      expect(met.get(code) ?? 0).toBeGreaterThan(20);
  });
});
