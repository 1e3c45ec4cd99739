import fc from 'fast-check';
import { all, create } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { last } from '../calculation/sheet';

// Reference: mathjs 15.2.0, evaluating the same expressions with plain numbers and with its Units.
const math = create(all ?? {}, {});

/** A well-typed expression in our spelling and in that of mathjs. */
interface Twin {
  ours: string;
  theirs: string;
}

const twin = (ours: string, theirs = ours): Twin => ({ ours, theirs });
const figure = fc
  .double({ min: 0.1, max: 9.9, noNaN: true })
  .map((value) => twin(String(Number(value.toPrecision(4)))));

/** Functions that are well-conditioned where they are used here: rounding grows little, whatever stands inside. */
const calls = [
  'sqrt(#)',
  'cbrt(#)',
  'ln(1 + #)',
  'log10(1 + #)',
  'exp(tanh(#))',
  'sin(tanh(#))',
  'cos(tanh(#))',
  'atan(#)',
  'erf(#)',
];
const exponents = [
  '2',
  '3',
  '-2',
  '-1',
  '0.5',
  '1.5',
  '0.25',
  '0.75',
  '2.25',
  '0.8',
  '-0.4',
  '(1/3)',
  '(2/3)',
  '(4/3)',
  '-1.5',
];

/** Plain expressions, all of them positive: nothing cancels, so that relative differences mean something. */
const { plain } = fc.letrec<{ plain: Twin }>((tie) => ({
  plain: fc.oneof(
    { depthSize: 'medium' },
    figure,
    fc
      .tuple(tie('plain'), fc.constantFrom('+', '*', '/'), tie('plain'))
      .map(([a, sign, b]) => twin(`(${a.ours} ${sign} ${b.ours})`, `(${a.theirs} ${sign} ${b.theirs})`)),
    fc
      .tuple(tie('plain'), fc.constantFrom(...exponents))
      .map(([a, n]) => twin(`(${a.ours})^${n}`, `(${a.theirs})^${n}`)),
    fc
      .tuple(fc.constantFrom(...calls), tie('plain'))
      .map(([call, a]) => twin(call.replace('#', a.ours), call.replace('ln', 'log').replace('#', a.theirs))),
    fc
      .tuple(fc.constantFrom('min', 'max', 'mean', 'sum'), tie('plain'), tie('plain'))
      .map(([name, a, b]) => twin(`${name}(${a.ours}, ${b.ours})`, `${name}(${a.theirs}, ${b.theirs})`)),
    fc
      .tuple(figure, figure, tie('plain'), tie('plain'))
      .map(([a, b, c, d]) =>
        twin(
          `if(${a.ours} < ${b.ours}, ${c.ours}, ${d.ours})`,
          `((${a.theirs} < ${b.theirs}) ? ${c.theirs} : ${d.theirs})`,
        ),
      ),
  ),
}));

const unitsOf = {
  length: ['m', 'mm', 'ft', 'in', 'km'],
  time: ['s', 'hour', 'day'],
  mass: ['kg', 'g', 'lb'],
} as const;
type Quantity = keyof typeof unitsOf;

function quantity(kind: Quantity): fc.Arbitrary<Twin> {
  const literal = fc
    .tuple(figure, fc.constantFrom(...unitsOf[kind]))
    // mathjs calls the pound by another name.
    .map(([a, unit]) => twin(`${a.ours} ${unit}`, `(${a.theirs} ${unit === 'lb' ? 'lbm' : unit})`));
  const { value } = fc.letrec<{ value: Twin }>((tie) => ({
    value: fc.oneof(
      { depthSize: 'small' },
      literal,
      fc
        .tuple(tie('value'), tie('value'))
        .map(([a, b]) => twin(`(${a.ours} + ${b.ours})`, `(${a.theirs} + ${b.theirs})`)),
      fc.tuple(tie('value'), figure).map(([a, n]) => twin(`(${a.ours})*${n.ours}`, `${a.theirs}*${n.theirs}`)),
    ),
  }));
  return value;
}

/** Products of powers of quantities, such as a mass flow or a dynamic pressure. */
const dimensional: fc.Arbitrary<Twin> = fc
  .array(
    fc.tuple(
      fc.constantFrom<Quantity>('length', 'time', 'mass').chain(quantity),
      fc.constantFrom('', '^2', '^3'),
      fc.constantFrom('*', '/'),
    ),
    { minLength: 1, maxLength: 4 },
  )
  .map((factors) =>
    factors.reduce(
      (product, [factor, power, sign]) =>
        twin(
          `${product.ours}${sign}((${factor.ours})${power})`,
          `${product.theirs}${sign}((${factor.theirs})${power})`,
        ),
      twin('1', '1'),
    ),
  );

/** SI value of an expression here; fails with its problems when it has none. */
function here(expression: string): number {
  const { value, diagnostics } = last(`x = ${expression}`);
  if (typeof value?.si !== 'number') throw new Error(`${expression}: ${diagnostics[0]?.message ?? ''}`);
  return value.si;
}

describe('expressions against mathjs', () => {
  it('of plain numbers agree to 1e-12', () => {
    let compared = 0;
    fc.assert(
      fc.property(plain, ({ ours, theirs }) => {
        const wanted = Number(math.evaluate(theirs));
        // Towers of powers leave the range of float64: there is a test of its own for that.
        if (!Number.isFinite(wanted) || wanted < 1e-290) return;
        compared += 1;
        expect(Math.abs(here(ours) / wanted - 1), ours).toBeLessThanOrEqual(1e-12);
      }),
      { numRuns: 2500 },
    );
    expect(compared).toBeGreaterThan(1500);
  });

  it('that cancel agree to 1e-12 of their parts', () => {
    fc.assert(
      fc.property(plain, plain, (a, b) => {
        const [left, right] = [Number(math.evaluate(a.theirs)), Number(math.evaluate(b.theirs))];
        fc.pre(Math.abs(left) < 1e290 && Math.abs(right) < 1e290 && left > 1e-290 && right > 1e-290);
        const apart = Math.abs(here(`${a.ours} - ${b.ours}`) - Number(math.evaluate(`${a.theirs} - ${b.theirs}`)));
        expect(apart, `${a.ours} - ${b.ours}`).toBeLessThanOrEqual(1e-12 * (left + right));
      }),
      { numRuns: 500 },
    );
  });

  it('with units agree to 1e-12', () => {
    fc.assert(
      fc.property(dimensional, ({ ours, theirs }) => {
        const wanted: unknown = math.evaluate(theirs);
        const si = typeof wanted === 'number' ? wanted : (wanted as { toSI(): { value: number } }).toSI().value;
        expect(Math.abs(here(ours) / si - 1), ours).toBeLessThanOrEqual(1e-12);
      }),
      { numRuns: 1500 },
    );
  });
});
