import { describe, expect, it } from 'vitest';
import { hiddenNameHints, readLines } from '../../../src/engine/language/index';

const defined = new Set(['m', 'K', 's', 'L', 'h', 'A', 't', 'kg']);
const hints = (source: string) =>
  readLines(source).flatMap((line) => hiddenNameHints(line, (word) => defined.has(word)));

describe('a unit in a literal that is also a defined name', () => {
  it.each([
    ['x = 5 kW/m', 'm', 'x = (5 kW)/m'],
    ['x = 0.5 m * L', 'L', 'x = (0.5 m)*L'],
    ['x = 5 kW/(m*K)', 'm', 'x = (5 kW)/(m*K)'],
    ['x = a + 3 m/s', 's', 'x = a + (3 m)/s'],
  ])('%s: a hint at %s', (source, word, mended) => {
    const [hint] = hints(source);
    expect(hint).toMatchObject({ code: 'UNIT_OR_NAME', severity: 'hint', parameters: { word } });
    const { span, insert } = hint!.mend!;
    expect(source.slice(0, span.from) + insert + source.slice(span.to)).toBe(mended);
  });

  it.each(['x = 5 m', 'x = 5 W/(m K)', 'x = 5 kW/mm', 'x = (5 kW)/m', 'x = 5*m', 'x = 5 kW to W/m'])(
    '%s: none, a name could not stand there',
    (source) => {
      expect(hints(source)).toEqual([]);
    },
  );

  it('none beside the warning of the factor behind a divisor', () => {
    expect(hints('x = 10 W/m^2*K')).toEqual([]);
  });
});
