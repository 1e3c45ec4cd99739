import { describe, expect, it } from 'vitest';
import {
  nearestUnit,
  resolveUnit,
  scanUnit,
  siUnitText,
  unitNames,
  unitProblem,
  unitWords,
} from '../../../src/engine/units/index';

const si = (text: string) => siUnitText(resolveUnit(text)!.dimension);

describe('unit expressions', () => {
  it.each([
    ['kJ/(kg K)', 1000, 'J/(kg*K)'],
    ['kJ/(kg*K)', 1000, 'J/(kg*K)'],
    ['kJ/(kg·K)', 1000, 'J/(kg*K)'],
    ['kJ kg^-1 K^-1', 1000, 'J/(kg*K)'],
    ['kJ·kg⁻¹·K⁻¹', 1000, 'J/(kg*K)'],
    ['J/kg/K', 1, 'J/(kg*K)'],
    ['W/m2/K', 1, 'W/(m^2*K)'],
    ['W/(m² °C)', 1, 'W/(m^2*K)'],
    ['m^3/h', 1 / 3600, 'm^3/s'],
    ['L/min', 1e-3 / 60, 'm^3/s'],
    ['1/K', 1, '1/K'],
    ['mm', 1e-3, 'm'],
    ['µm', 1e-6, 'm'],
    ['μm', 1e-6, 'm'],
    ['um', 1e-6, 'm'],
    ['cP', 1e-3, 'Pa*s'],
    ['cSt', 1e-6, 'm^2/s'],
    ['EUR/kWh', 1 / 3.6e6, 'EUR/J'],
    ['W s^(1/2)/(m^2 K)', 1, 'W*s^(1/2)/(m^2*K)'],
    ['(m/s)^2', 1, 'J/kg'],
    ['N m', 1, 'J'],
    ['kg m^2/s^3', 1, 'W'],
  ])('%s', (text, factor, unit) => {
    expect(resolveUnit(text)!.factor / factor).toBeCloseTo(1, 12);
    expect(si(text)).toBe(unit);
  });

  it('echoes one solidus only, with raised powers (SI brochure, 5.4.6)', () => {
    expect(resolveUnit('W/m2/K')!.display).toBe('W/(m²·K)');
    expect(resolveUnit('J/kg/K')!.display).toBe('J/(kg·K)');
    expect(resolveUnit('K^-1')!.display).toBe('K⁻¹');
    expect(resolveUnit('BTU/(h ft^2 degF)')!.latex).toBe('\\mathrm{BTU/(h{\\cdot}ft^{2}{\\cdot}{^\\circ}F)}');
  });

  it('marks a factor behind a divisor as easily misread', () => {
    expect(scanUnit('W/m^2*K')).toMatchObject({ ambiguous: true });
    expect(scanUnit('kJ/kg K')).toMatchObject({ ambiguous: true });
    expect(scanUnit('W/m^2/K')).toMatchObject({ ambiguous: false });
    expect(scanUnit('W m^-2 K^-1')).toMatchObject({ ambiguous: false });
    expect(si('W/m^2*K')).toBe('kg*K/s^3');
  });

  it.each([
    ['kW / Q_0', 'kW'],
    ['kW/(m K) + 1', 'kW/(m K)'],
    ['kW/(m + K)', 'kW'],
    ['m * 3', 'm'],
    ['m*s*x', 'm*s'],
    ['m^2', 'm^2'],
    ['m^n', 'm'],
    ['m^(n)', 'm'],
    ['m.x', undefined],
    ['degC - 5', 'degC'],
    ['m and', 'm'],
    ['% + 1', '%'],
    ['1/s + 1', '1/s'],
  ])('of "%s" it takes %s', (text, taken) => {
    const scanned = scanUnit(text);
    expect(scanned === undefined ? undefined : text.slice(0, scanned.end)).toBe(taken);
  });

  it('keeps levels only for the unit by itself: in a product a degree is an interval', () => {
    expect(resolveUnit('degC')).toMatchObject({ level: 'temperature', offset: 273.15 });
    expect(resolveUnit('barg')).toMatchObject({ level: 'gauge pressure' });
    expect(resolveUnit('W/degC')).toMatchObject({ level: undefined, offset: 0 });
    expect(resolveUnit('barg/m')).toBeUndefined();
  });

  it('tells the words of a unit with their places', () => {
    expect(unitWords('kJ/(kg K)')).toEqual([
      { word: 'kJ', from: 0, to: 2 },
      { word: 'kg', from: 4, to: 6 },
      { word: 'K', from: 7, to: 8 },
    ]);
  });

  it('never takes a word of the language for a unit', () => {
    for (const word of ['to', 'and', 'or', 'not', 'if', 'require', 'sqrt', 'max', 'pi'])
      expect(unitNames()).not.toContain(word);
  });
});

describe('what is no unit', () => {
  // SP 811: no plural, no period; case matters. The nearest right one is named.
  it.each([
    ['kgs', 'kg'],
    ['Kg', 'kg'],
    ['sec', 's'],
    ['°K', 'K'],
    ['degK', 'K'],
    ['lbs', 'lb'],
    ['hrs', 'h'],
    ['kw', 'kW'],
    ['Kpa', 'kPa'],
    ['hz', 'Hz'],
    ['metres', 'm'],
    ['kelvins', 'K'],
    ['BTUs', 'BTU'],
    ['kilowatts', 'kW'],
    ['celcius', 'degC'],
    ['pasc', undefined],
  ])('%s: nearest is %s', (word, near) => {
    expect(resolveUnit(word)).toBeUndefined();
    if (near === undefined) return;
    expect(resolveUnit(nearestUnit(word)!)).toMatchObject({ dimension: resolveUnit(near)!.dimension });
    expect(unitProblem(word)!.sentence).toContain('is not a unit');
  });

  it('MW and mW are two units, and neither is guessed from mw', () => {
    expect(resolveUnit('MW')!.factor / resolveUnit('mW')!.factor).toBeCloseTo(1e9, 0);
    expect(unitProblem('mw')!.sentence).toMatch(/mW or MW/);
    expect(unitProblem('mpa')!.sentence).toMatch(/mPa or MPa/);
  });

  it('refuses what the trade reads in two ways, with the reason', () => {
    for (const word of ['MBTU', 'Nm3', 'scfm', 'ton']) {
      expect(resolveUnit(word)).toBeUndefined();
      expect(unitProblem(word)).toMatchObject({ refused: true });
    }
  });

  it.each([
    'constructor',
    '__proto__',
    'toString',
    'hasOwnProperty',
    '',
    ' ',
    '(',
    'm^',
    'm^(',
    'm^9999',
    '((((((((((m))))))))))',
    'm//s',
    '/m',
    'm^(1/7)',
  ])('survives %j', (text) => {
    const unit = resolveUnit(text);
    expect(unit === undefined || unit.text === '').toBe(true);
  });
});
