import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  calculationParser,
  canonicalName,
  expressionLatex,
  formatExpression,
  readExpressionText,
  readLines,
  splitLines,
  symbolLatex,
} from '../../../src/engine/language/index';
import { dumpExpression } from './dump';

/** Expressions as an engineer may type them. */
const { expression } = fc.letrec<{ expression: string; primary: string }>((tie) => ({
  primary: fc.oneof(
    { depthSize: 'small' },
    fc.constantFrom('a', 'rho_w', 'ΔT_lm', 'T₁', 'w.cp', 'Re', 'V̇', 'm', 'h', 'pi'),
    fc.constantFrom('2', '0.5', '1.5e-3', '3.', '12\u00a0345', '1.2×10⁶'),
    fc.constantFrom('5 kW', '4.2 kJ/(kg K)', '-5 degC', '25 °C', '3 m³/h', '10 W/m^2', '7 1/s', '5 %', '3 barg'),
    fc.constantFrom('850 ± 5 %', '0.012 m ± 0.1 mm', '850 ± 10 % (k=2)', '3 m +- 0.1'),
    tie('expression').map((inner) => `(${inner})`),
    tie('expression').map((inner) => `sqrt(${inner})`),
    fc.tuple(tie('expression'), tie('expression')).map(([a, b]) => `max(${a}, ${b})`),
  ),
  expression: fc.oneof(
    { depthSize: 'small' },
    tie('primary'),
    fc
      .tuple(tie('expression'), fc.constantFrom('+', '-', '*', '/', '^', ' + ', ' - ', ' · ', ' / '), tie('expression'))
      .map((parts) => parts.join('')),
    tie('expression').map((inner) => `-${inner}`),
    tie('primary').map((inner) => `${inner}²`),
    fc
      .tuple(tie('expression'), fc.constantFrom('<', '<=', '==', '≥'), tie('expression'))
      .map((parts) => parts.join(' ')),
    fc.tuple(tie('expression'), fc.constantFrom('and', 'or'), tie('expression')).map((parts) => parts.join(' ')),
    tie('expression').map((inner) => `not (${inner})`),
  ),
}));

describe('printing', () => {
  it('reading what was printed gives the same tree', () => {
    let read = 0;
    fc.assert(
      fc.property(expression, (source) => {
        const tree = readExpressionText(source);
        if (tree === undefined) return;
        read += 1;
        const printed = formatExpression(tree);
        const again = readExpressionText(printed);
        expect(again === undefined ? `unread: ${printed}` : dumpExpression(again)).toBe(dumpExpression(tree));
        expect(formatExpression(again!)).toBe(printed);
      }),
      { numRuns: 3000 },
    );
    // Else the property would hold for want of anything read.
    expect(read).toBeGreaterThan(1500);
  });
});

const samples = [
  'h_i = tube.Nu*w.k/d_i to W/(m^2 K) # film\nQ = w.rho*V_dot*w.cp*(T_in - T_out) to kW\nrequire dp <= 50 kPa',
  'f = if(Re < 2300, 64/Re,\n  (0.79*ln(Re) - 1.64)^-2)\nx = 850 ± 10 % (k=2)\nT = -5 degC + 3 K',
  'ΔT = (T_w + T_b)/2\nq = 10 W/m^2*K\nD = 1/2 m\nV̇ = 38.5 m³/h\na = b and not c or d >= 4',
];
const pieces = [
  ...'()+-*/^=,.#±<>!°%²\n\t @;[]{}"\'\\$&|~`?:0159eEkmWTρΔ\u00a0\u0307',
  'to ',
  ' and ',
  ' require ',
  '== ',
  'kW',
  '1e9',
  '((((',
  '))',
];

/** A sample with some characters taken out, put in or doubled. */
const mutated = fc
  .tuple(
    fc.constantFrom(...samples),
    fc.array(fc.tuple(fc.nat(400), fc.nat(6), fc.constantFrom('', ...pieces)), { minLength: 1, maxLength: 6 }),
  )
  .map(([text, edits]) =>
    edits.reduce((now, [at, cut, put]) => {
      const place = at % (now.length + 1);
      return now.slice(0, place) + put + now.slice(place + cut);
    }, text),
  );

describe('whatever is typed', () => {
  it(
    'is read without a crash, quickly, with every span inside the source (20 000 mutations)',
    { timeout: 240_000 },
    () => {
      let slowest = 0;
      fc.assert(
        fc.property(mutated, (source) => {
          const begin = performance.now();
          const lines = readLines(source);
          slowest = Math.max(slowest, performance.now() - begin);
          expect(lines.map((line) => line.number)).toEqual([...new Set(lines.map((line) => line.number))]);
          for (const line of lines) {
            if (line.expression !== undefined) expressionLatex(line.expression);
            for (const { span, message, mend } of line.diagnostics) {
              expect(message.length).toBeGreaterThan(10);
              for (const place of [span, mend?.span]) {
                if (place === undefined) continue;
                expect(place.from).toBeGreaterThanOrEqual(0);
                expect(place.to).toBeGreaterThanOrEqual(place.from);
                expect(place.to).toBeLessThanOrEqual(source.length);
              }
            }
          }
        }),
        { numRuns: 20_000 },
      );
      // Two seconds is the limit for any one cell; readings take milliseconds.
      expect(slowest).toBeLessThan(2000);
    },
  );

  it('arbitrary text, too', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 60 }), (source) => {
        readLines(source);
        symbolLatex(canonicalName(source));
      }),
      { numRuns: 3000 },
    );
  });

  it('a line that is not read gives no expression to compute', () => {
    fc.assert(
      fc.property(mutated, (source) => {
        for (const line of readLines(source)) {
          if (line.diagnostics.some(({ severity }) => severity === 'error'))
            expect(dumpExpression(line.expression!)).toContain('…');
        }
      }),
      { numRuns: 3000 },
    );
  });

  it.each([
    ['100 000 open parentheses', '('.repeat(100_000)],
    ['9 000 open parentheses', `x = ${'('.repeat(9_000)}`],
    ['9 000 paired parentheses', `x = ${'('.repeat(4_000)}1${')'.repeat(4_000)}`],
    ['a chain of powers', `x = 9${'^9'.repeat(3_000)}`],
    ['a chain of signs', `x = ${'-'.repeat(8_000)}1`],
    ['a long sum', `x = 1${' + 1'.repeat(2_400)}`],
    ['a long name', 'a'.repeat(9_000)],
    ['5 000 lines left open', 'x = (1 +\n'.repeat(5_000)],
    ['a long unit', `x = 5 ${'m '.repeat(4_000)}`],
    ['a unit in many parentheses', `x = 5 ${'('.repeat(4_000)}m`],
  ])('%s are read within two seconds', (_, source) => {
    const begin = performance.now();
    const lines = readLines(source);
    expect(performance.now() - begin).toBeLessThan(2000);
    for (const line of lines) if (line.expression !== undefined) formatExpression(line.expression);
  });
});

describe('one grammar for editor and engine', () => {
  it('the tree of a whole cell has the lines that are read one by one', () => {
    const text = samples.join('\n');
    const tree = calculationParser.parse(text);
    const statements = ['Assignment', 'Requirement', 'ExpressionLine'].flatMap((name) =>
      tree.topNode.getChildren(name),
    );
    const whole = statements.map(({ from, to }) => ({ from, to })).sort((a, b) => a.from - b.from);
    const read = readLines(text).filter((line) => line.kind !== 'blank' && line.kind !== 'note');
    expect(whole).toEqual(read.map((line) => line.span));
  });

  it('logical lines cover the source without a gap', () => {
    fc.assert(
      fc.property(mutated, (source) => {
        const lines = splitLines(source);
        const joined = lines.map(({ from, to }) => source.slice(from, to)).join('\n');
        expect(joined).toBe(source);
      }),
    );
  });
});
