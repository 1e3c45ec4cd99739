import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { displayValue, fromUnit, inUnit, resolveUnit, type DisplayOptions } from '../../../src/engine/units/index';

const si: DisplayOptions = { unitSystem: 'SI', significantDigits: 4, ambientPressure: 101325 };
const us: DisplayOptions = { ...si, unitSystem: 'US' };
const show = (value: number, unit: string, options: DisplayOptions = si) => {
  const shown = displayValue(value, resolveUnit(unit)!.dimension, options);
  return `${shown.text} ${shown.unit}`.trim();
};
const nbsp = (text: string) => text.replace(/_/g, '\u00a0');

describe('values as shown', () => {
  it.each([
    [0.01575, 'm', '15.75 mm'],
    [0.2143, 'm', '214.3 mm'],
    [1.96, 'm', '1.960 m'],
    [5836, 'W/(m^2*K)', '5_836 W/(m²·K)'],
    [12345.6, 'W', '12.35 kW'],
    [2.5e6, 'W', '2.500 MW'],
    [52340, 'Pa', '52.34 kPa'],
    [300000, 'Pa', '3.000 bar'],
    [4197, 'J/(kg*K)', '4.197 kJ/(kg·K)'],
    [345.6e-6, 'Pa*s', '345.6 µPa·s'],
    [39160.4, '1', '39_160'],
    [0, 'm', '0 m'],
    [62, '1', '62'],
    [0.000012345, '1', '1.234×10⁻⁵'],
    [1.2345678e12, '1', '1.235×10¹²'],
    [-273.149, 'K', '−273.1 K'],
  ])('%d %s as %s', (value, unit, text) => {
    expect(show(value, unit)).toBe(nbsp(text));
  });

  it.each([
    [6894.757293168361, 'Pa', '1.000 psi'],
    [1000, 'W', '3_412 BTU/h'],
    [0.3048, 'm', '1.000 ft'],
    [10, 'K', '18.00 Δ°F'],
    [5.678263341, 'W/(m^2*K)', '1.000 BTU/(h·ft²·Δ°F)'],
  ])('%d %s as %s in US customary units', (value, unit, text) => {
    expect(show(value, unit, us)).toBe(nbsp(text));
  });

  it('never shows an odd product for a known quantity', () => {
    expect(show(1500, 'kg m^2/s^3')).toBe('1.500 kW');
    expect(show(2500, 'kg/(m s^2)')).toBe('2.500 kPa');
  });

  it('shows a level in °C or °F and a difference in K or Δ°F', () => {
    const kelvin = resolveUnit('K')!.dimension;
    const level = (value: number, options: DisplayOptions) => displayValue(value, kelvin, { ...options, level: true });
    expect(level(355.15, si)).toMatchObject({
      text: '82.00',
      unit: '°C',
      level: 'temperature',
      si: 355.15,
      siUnit: 'K',
    });
    expect(level(293.15, us)).toMatchObject({ text: '68.00', unit: '°F' });
    expect(level(277.15, si).text).toBe('4.00');
    expect(level(273.15, si).text).toBe('0.00');
    expect(level(268.15, si).text).toBe('−5.00');
    const difference = displayValue(6, kelvin, si);
    expect(difference).toMatchObject({ text: '6.000', unit: 'K' });
    expect(difference.level).toBeUndefined();
  });

  it('takes the unit asked for, gauge units from ambient pressure on', () => {
    const pressure = resolveUnit('Pa')!.dimension;
    const shown = displayValue(401325, pressure, { ...si, target: resolveUnit('barg')! });
    expect(shown).toMatchObject({ text: '3.000', unit: 'barg', level: 'pressure', si: 401325 });
    expect(displayValue(80000, pressure, { ...si, ambientPressure: 80000, target: resolveUnit('barg')! }).text).toBe(
      '0',
    );
    expect(displayValue(0.25, resolveUnit('1')!.dimension, { ...si, target: resolveUnit('%')! })).toMatchObject({
      text: '25.00',
      unit: '%',
    });
  });

  it('takes a preferred unit where it measures the same', () => {
    const preferredUnit = resolveUnit('m^3/h')!;
    expect(show(38.5 / 3600, 'm^3/s', { ...si, preferredUnit })).toBe('38.50 m³/h');
    expect(show(2, 'm', { ...si, preferredUnit })).toBe('2.000 m');
  });

  it('splits the figure at the decimal sign and parts it in threes (SI brochure, 5.4.4)', () => {
    const shown = displayValue(12345.6789, resolveUnit('1')!.dimension, { ...si, significantDigits: 9 });
    expect(shown).toMatchObject({ whole: nbsp('12_345'), fraction: nbsp('.678_9'), text: nbsp('12_345.678_9') });
    expect(displayValue(0.5, resolveUnit('1')!.dimension, si)).toMatchObject({ whole: '0', fraction: '.5000' });
  });

  it('keeps figures as written for a lone literal', () => {
    expect(show(1480, '1', { ...si, figures: '1480' })).toBe(nbsp('1_480'));
    expect(show(1.5e-3, '1', { ...si, figures: '1.5e-3' })).toBe('1.5×10⁻³');
  });

  it('shows the value that it was given, to half of the last digit', () => {
    const lengths = fc.double({ min: 1e-3, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(lengths, fc.integer({ min: 2, max: 10 }), (value, significantDigits) => {
        const shown = displayValue(value, resolveUnit('W')!.dimension, { ...si, significantDigits });
        const number = Number(shown.text.replace(/\u00a0/g, '')) * resolveUnit(shown.unit)!.factor;
        expect(Math.abs(number / value - 1)).toBeLessThanOrEqual(0.5000001 * 10 ** (1 - significantDigits));
      }),
    );
  });

  it('converts there and back', () => {
    const units = fc.constantFrom('degC', 'degF', 'barg', 'psig', 'kPa', 'BTU/h', 'inH2O', 'TR');
    fc.assert(
      fc.property(fc.double({ min: -1e4, max: 1e6, noNaN: true }), units, (value, text) => {
        const unit = resolveUnit(text)!;
        expect(inUnit(fromUnit(value, unit, 101325), unit, 101325)).toBeCloseTo(value, 6);
      }),
    );
  });

  it('refuses to show what is no number', () => {
    for (const value of [NaN, Infinity, -Infinity]) expect(() => show(value, 'W')).toThrow(/no number/);
  });
});
