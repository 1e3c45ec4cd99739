import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gaugeSentence, layGauge, limitText } from 'src/composables/validityGauge';

const width = 280;
const reynolds = { low: 10_000, high: 120_000, value: 39_160, scale: 'log', grade: 'inside' } as const;

describe('limits under a gauge', () => {
  it.each([
    [10_000, '10\u00a0000'],
    [0.7, '0.7'],
    [5e6, '5·10⁶'],
    [1e6, '10⁶'],
    [2.5e-4, '2.5·10⁻⁴'],
    [-40, '−40'],
    [0, '0'],
  ])('writes %d as %s', (limit, text) => {
    expect(limitText(limit)).toBe(text);
  });
});

describe('the validity gauge', () => {
  it('sets a case inside the bar, without a hatch', () => {
    const { bar, point, hatch, ends } = layGauge(reynolds, width);
    expect(ends).toHaveLength(2);
    expect(hatch).toBeUndefined();
    expect(point).toBeGreaterThan(bar?.x ?? Infinity);
    expect(point).toBeLessThan((bar?.x ?? 0) + (bar?.width ?? 0));
  });

  it('places a case at the geometric middle in the middle of a logarithmic bar', () => {
    const { bar, point } = layGauge({ ...reynolds, value: Math.sqrt(10_000 * 120_000) }, width);
    expect(point).toBeCloseTo((bar?.x ?? 0) + (bar?.width ?? 0) / 2, 6);
  });

  it('hatches from the case to the limit that it lies below', () => {
    const { hatch, point, bar, arrowRight } = layGauge(
      { low: 60, high: undefined, value: 49.5, scale: 'linear', grade: 'outside' },
      width,
    );
    expect(hatch?.x).toBe(point);
    expect((hatch?.x ?? 0) + (hatch?.width ?? 0)).toBeCloseTo(bar?.x ?? 0, 6);
    expect(arrowRight).toBe(true);
  });

  it('draws no bar where no limit is stated, and no pointer where the case is not known', () => {
    expect(layGauge({ value: 3, scale: 'linear', grade: 'unchecked' }, width).bar).toBeUndefined();
    expect(layGauge({ low: 1, high: 2, scale: 'linear', grade: 'unchecked' }, width).point).toBeUndefined();
  });

  it('keeps everything on the drawing, whatever the figures', () => {
    const figure = fc.double({ min: 1e-9, max: 1e12, noNaN: true });
    fc.assert(
      fc.property(figure, figure, figure, fc.constantFrom('log' as const, 'linear' as const), (a, b, value, scale) => {
        const low = Math.min(a, b);
        const high = Math.max(a, b);
        const { bar, point, segments } = layGauge({ low, high, value, scale, grade: 'inside' }, width);
        const places = [bar?.x ?? 0, (bar?.x ?? 0) + (bar?.width ?? 0), point ?? 0, ...segments.map((each) => each.x)];
        for (const place of places) expect(place).toSatisfy((x: number) => x >= 0 && x <= width);
        for (const segment of segments) expect(segment.width).toBeGreaterThanOrEqual(0);
        expect(segments.length).toBeLessThan(80);
      }),
    );
  });

  it('says in a sentence where the case lies', () => {
    const sentence = gaugeSentence({
      condition: 'L/D >= 60',
      conditionLatex: '',
      low: 60,
      valueText: '49.5',
      message: 'below 60',
      grade: 'outside',
      scale: 'linear',
      missing: [],
    });
    expect(sentence).toBe('Case 49.5, stated range 60 and over: below 60');
  });
});
