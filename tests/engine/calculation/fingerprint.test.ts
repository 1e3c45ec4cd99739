import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sha256, type CalculationSettings, type CellInput } from '#engine';
import { lines, sheet } from './sheet';

function printOf(id: string, cells: readonly CellInput[], settings: Partial<CalculationSettings> = {}) {
  const cell = sheet(cells, settings).cells[id];
  if (cell === undefined) throw new Error(`no cell ${id}`);
  return cell.fingerprint;
}
const given = lines('g', 'Q = 2 kW # by the customer\nA = 3 m^2');
const flux = lines('f', 'q = Q/A # mean');
const before = printOf('f', [given, flux]);

describe('a fingerprint', () => {
  it('does not change with notes, layout, place, or how figures are shown', () => {
    expect(printOf('f', [given, lines('f', '  q =   Q / A   # mean over the surface\n\n')])).toBe(before);
    expect(printOf('f', [flux, given])).toBe(before);
    expect(printOf('f', [{ id: 's', kind: 'section', source: 'Heat', settings: {} }, given, flux])).toBe(before);
    expect(printOf('f', [given, flux], { significantDigits: 7 })).toBe(before);
    expect(printOf('f', [given, flux], { unitSystem: 'US' })).toBe(before);
  });

  it('does not change when a value is written in another way', () => {
    expect(printOf('f', [lines('g', 'Q = 2000 W\nA = 3 m^2'), flux])).toBe(before);
  });

  it('changes with what the cell says', () => {
    expect(printOf('f', [given, lines('f', 'q = Q/A to kW/m^2')])).not.toBe(before);
    expect(printOf('f', [given, lines('f', 'q = 1*Q/A')])).not.toBe(before);
    expect(printOf('f', [given, { ...flux, settings: { tbv: 'surface' } }])).not.toBe(before);
  });

  it('changes with every value that the cell depends on', () => {
    expect(printOf('f', [lines('g', 'Q = 2.001 kW\nA = 3 m^2'), flux])).not.toBe(before);
    expect(printOf('f', [lines('g', 'Q = 2 kW\nA = 1/0'), flux])).not.toBe(before);
  });

  it('changes through cells between', () => {
    const chain = (figure: string) => [lines('a', `a = ${figure}`), lines('b', 'b = 2*a'), lines('c', 'c = b + 1')];
    expect(printOf('c', chain('3'))).not.toBe(printOf('c', chain('4')));
  });

  it('changes with values of fluids however they are spelled, and only with those that are used', () => {
    const fluid = (T: string): CellInput => {
      return { id: 'w', kind: 'fluid', source: `T = ${T}\np = 1 bar`, settings: { name: 'w', substance: 'water' } };
    };
    const use = lines('c', 'x = w.ρ');
    const pressure = lines('d', 'y = w.p');
    expect(printOf('c', [fluid('300 K'), use])).not.toBe(printOf('c', [fluid('310 K'), use]));
    expect(printOf('d', [fluid('300 K'), pressure])).toBe(printOf('d', [fluid('310 K'), pressure]));
  });

  it('changes with ambient pressure only where something counts from it', () => {
    const gauge = [lines('c', 'p = 3 barg')];
    expect(printOf('c', gauge, { ambientPressure: 95000 })).not.toBe(printOf('c', gauge));
    expect(printOf('f', [given, flux], { ambientPressure: 95000 })).toBe(before);
  });

  it('names the values that went into it, to 12 digits', () => {
    expect(sheet([lines('g', 'Q = 2 kW\nA = 0.3 m^2*10/9'), flux]).cells.f?.dependsOn).toEqual({
      A: '0.333333333333 m^2',
      Q: '2000 W',
    });
  });

  it('does not change with the last bits of a value', () => {
    const third = (source: string) => printOf('c', [lines('g', source), lines('c', 'x = 2*a')]);
    expect(third('a = 0.1 + 0.2')).toBe(third('a = 0.3'));
  });
});

describe('SHA-256 without the platform', () => {
  // FIPS 180-4 example: "abc".
  it('of abc is that of the standard', () => {
    expect(sha256('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  });

  it('is that of Node for any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (text) => {
        expect(sha256(text)).toBe(createHash('sha256').update(text, 'utf8').digest('hex'));
      }),
    );
    // A half of a pair is written as the sign for what cannot be read.
    expect(sha256('a\ud800b')).toBe(createHash('sha256').update('a\ud800b', 'utf8').digest('hex'));
  });
});
