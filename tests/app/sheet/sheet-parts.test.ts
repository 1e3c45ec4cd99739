import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SheetCell } from 'src/composables/sheetContext';
import { layMargin, leaderPath } from 'src/composables/marginLayout';
import { freeName, penKind, penNumber } from 'src/composables/penLine';
import { markedSource } from 'src/composables/lineText';
import { changesBetween } from 'src/composables/useTicks';
import { changedCells, nextLetter } from 'src/composables/useRevision';
import { fingerprintLines } from 'src/composables/signing';
import { isTall, markUnits } from 'src/composables/useKatex';
import { bindingLines, findCandidates } from 'src/composables/relationList';
import { findRelation } from '#engine';

const cell = (id: string, number: string, kind: SheetCell['kind'] = 'expressions', name?: string): SheetCell => ({
  id,
  number,
  kind,
  source: '',
  settings: name === undefined ? {} : { name },
  tbvNumber: undefined,
});

describe('the pen line', () => {
  it.each([
    ['Water enters at the top.', 'text'],
    ['d_i = 15.75 mm', 'expressions'],
    ['ρ = 998 kg/m^3', 'expressions'],
    ['require dp <= 50 kPa', 'expressions'],
    ['# from the drawing', 'expressions'],
    ['a == b is a comparison', 'text'],
    ['requirements of the site', 'text'],
    ['see A = B', 'text'],
  ])('makes of "%s" a cell of kind %s', (text, kind) => {
    expect(penKind(text)).toBe(kind);
  });

  it('numbers the cell to come', () => {
    const cells = [cell('s', '5', 'section'), cell('a', '5.9')];
    expect(penNumber(cells, 's')).toBe('5.1');
    expect(penNumber(cells, 'a')).toBe('5.10');
    expect(penNumber(cells, null)).toBe('0.1');
  });

  it('gives names that no cell has', () => {
    expect(freeName([], 'w')).toBe('w');
    expect(freeName([cell('a', '1.1', 'fluid', 'w'), cell('b', '1.2', 'fluid', 'w2')], 'w')).toBe('w3');
  });
});

describe('the margin', () => {
  it('lets a remark stand at its cell, and pushes the next down', () => {
    const tops = layMargin(
      [
        { key: 'b', wanted: 40, height: 50 },
        { key: 'a', wanted: 20, height: 60 },
      ],
      12,
    );
    expect([tops.get('a'), tops.get('b')]).toEqual([20, 92]);
  });

  it('never lays one remark on another, nor above its cell', () => {
    const item = fc.record({ wanted: fc.nat(2000), height: fc.integer({ min: 1, max: 300 }) });
    fc.assert(
      fc.property(fc.array(item, { maxLength: 30 }), (list) => {
        const items = list.map((each, index) => ({ ...each, key: String(index) }));
        const tops = layMargin(items, 12);
        const placed = items.map((each) => ({ ...each, top: tops.get(each.key) ?? -1 })).sort((a, b) => a.top - b.top);
        for (const [index, each] of placed.entries()) {
          expect(each.top).toBeGreaterThanOrEqual(each.wanted);
          const before = placed[index - 1];
          if (before !== undefined) expect(each.top).toBeGreaterThanOrEqual(before.top + before.height + 12);
        }
      }),
    );
  });

  it('bends the leader of a pushed remark', () => {
    expect(leaderPath(18, 18)).toBe('M0 18H26');
    expect(leaderPath(18, 60)).toContain('V60');
  });
});

describe('a line that cannot be read', () => {
  it('is cut where the fault lies', () => {
    expect(markedSource('a = 1\nu = 4*d_x', { from: 6, to: 15 }, { from: 12, to: 15 })).toEqual([
      { text: 'u = 4*', marked: false },
      { text: 'd_x', marked: true },
    ]);
  });
  it('stays whole when the fault lies elsewhere', () => {
    expect(markedSource('u = 1', { from: 0, to: 5 }, { from: 9, to: 12 })).toEqual([{ text: 'u = 1', marked: false }]);
  });
});

describe('what has changed', () => {
  it('since a tick is said value by value', () => {
    expect(changesBetween({ u: '0.9 m/s', d: '1 m', x: '2' }, { u: '0.8854 m/s', d: '1 m', y: '3' })).toEqual([
      'u was 0.9 m/s, is 0.8854 m/s',
      'x is no longer used',
      'y is used now: 3',
    ]);
  });

  it('since the revision before is what cells say, not where they stand', () => {
    const before = [cell('a', '1.1'), cell('b', '1.2'), cell('c', '1.3')];
    const now = [cell('b', '1.1'), { ...cell('a', '1.2'), source: 'x = 1' }, cell('d', '1.3')];
    expect([...changedCells(before, now)].sort()).toEqual(['a', 'd']);
  });

  it('does not count settings that are left empty', () => {
    const before = [{ ...cell('a', '1.1'), settings: { tbv: '' } }];
    expect(changedCells(before, [cell('a', '1.1')]).size).toBe(0);
  });
});

describe('letters of revisions', () => {
  it.each([
    ['A', 'B'],
    ['Z', 'AA'],
    ['AZ', 'BA'],
    ['ZZ', 'AAA'],
  ])('after %s comes %s', (letter, next) => {
    expect(nextLetter(letter)).toBe(next);
  });
});

describe('a fingerprint', () => {
  it('is written in groups of four, four to a line', () => {
    expect(fingerprintLines('sha256:4f1c9a07e2d851b6c3a0')).toEqual(['4f1c 9a07 e2d8 51b6', 'c3a0']);
  });
});

describe('typesetting', () => {
  it('marks units behind figures, not symbols behind figures', () => {
    expect(markUnits('4\\,\\mathrm{m^{2}/s}')).toBe('4\\,\\unit{m^{2}/s}');
    expect(markUnits('0.023\\,\\mathrm{Re}^{0.8}')).toBe('0.023\\,\\mathrm{Re}^{0.8}');
    expect(markUnits('d_{\\mathrm{i}}')).toBe('d_{\\mathrm{i}}');
    expect(markUnits('3\\,\\mathrm{\\text{µ}Pa}\\times2\\,\\mathrm{{^\\circ}C}')).toBe(
      '3\\,\\unit{\\mu Pa}\\times2\\,\\unit{°C}',
    );
  });
  it('gives a fraction its room', () => {
    expect(isTall('\\frac{a}{b}')).toBe(true);
    expect(isTall('a\\,b')).toBe(false);
  });
});

describe('the store of relations on the sheet', () => {
  it('keeps what both relations are given, and the lines beneath', () => {
    const relation = findRelation('gnielinski-1976-tube')?.relation;
    expect(relation).toBeDefined();
    if (relation === undefined) return;
    const lines = bindingLines(relation, 'Re = Re_t\nPr = w.Pr\nh_i = tube.Nu*w.k/d_i', 'dittus-boelter-cooling').split(
      '\n',
    );
    expect(lines).toContain('Re = Re_t');
    expect(lines).toContain('Pr = w.Pr');
    expect(lines.at(-1)).toBe('h_i = tube.Nu*w.k/d_i');
  });

  it('offers what gives the same result first, inside every range before outside', () => {
    const values = new Map([
      ['Re', 39_160],
      ['Pr', 2.16],
      ['L', 0.78],
      ['D', 0.01575],
    ]);
    const found = findCandidates({ geometry: 'tube', words: '', output: 'Nu' }, values);
    const computed = found.filter((each) => each.relation.output.symbol === 'Nu' && each.output !== undefined);
    const grades = computed.map((each) => each.grade);
    expect(computed.length).toBeGreaterThan(3);
    expect(grades.lastIndexOf('inside')).toBeLessThan(
      grades.indexOf('outside') < 0 ? Infinity : grades.indexOf('outside'),
    );
    const firstOther = found.findIndex((each) => each.relation.output.symbol !== 'Nu');
    expect(
      found.slice(0, firstOther < 0 ? found.length : firstOther).every((each) => each.relation.output.symbol === 'Nu'),
    ).toBe(true);
  });

  it('finds by words of title, author and year', () => {
    const found = findCandidates({ geometry: undefined, words: 'gnielinski 1976', output: undefined }, new Map());
    expect(found.length).toBeGreaterThan(0);
    for (const { relation } of found)
      expect(`${relation.title} ${relation.authors} ${relation.source}`.toLowerCase()).toContain('gnielinski');
  });
});
