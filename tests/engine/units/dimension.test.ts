import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  baseQuantities,
  dimensionDenominator,
  dimensionless,
  divideDimensions,
  isDimensionless,
  multiplyDimensions,
  powerOfDimension,
  quantityName,
  resolveUnit,
  sameDimension,
  siUnitText,
} from '../../../src/engine/units/index';

const twelfths = fc.integer({ min: -4, max: 4 }).map((whole) => whole * dimensionDenominator);
const dimensions = fc.tuple(...baseQuantities.map((name) => (name === 'angle' ? fc.constant(0) : twelfths)));

describe('dimensions', () => {
  it('form a group under multiplication', () => {
    fc.assert(
      fc.property(dimensions, dimensions, (a, b) => {
        expect(sameDimension(multiplyDimensions(a, b), multiplyDimensions(b, a))).toBe(true);
        expect(isDimensionless(divideDimensions(multiplyDimensions(a, b), multiplyDimensions(b, a)))).toBe(true);
        expect(sameDimension(multiplyDimensions(a, dimensionless), a)).toBe(true);
      }),
    );
  });

  it('take roots exactly, and refuse exponents that no quantity has', () => {
    fc.assert(
      fc.property(dimensions, fc.constantFrom(2, 3, 4, 6), (a, n) => {
        const root = powerOfDimension(a, 1 / n)!;
        expect(sameDimension(powerOfDimension(root, n)!, a)).toBe(true);
      }),
    );
    expect(powerOfDimension(resolveUnit('m')!.dimension, 1 / 7)).toBeUndefined();
  });

  it('have a coherent SI unit that reads back as the same dimension', () => {
    fc.assert(
      fc.property(dimensions, (a) => {
        const unit = resolveUnit(siUnitText(a))!;
        expect(sameDimension(unit.dimension, a)).toBe(true);
        expect(unit.factor).toBeCloseTo(1, 12);
      }),
      { numRuns: 2000 },
    );
  });

  it.each([
    ['Pa', 'pressure', 'Pa'],
    ['kg/(m s^2)', 'pressure', 'Pa'],
    ['kg m^2/s^3', 'heat rate', 'W'],
    ['W/(m K)', 'thermal conductivity', 'W/(m*K)'],
    ['W/(m^2 K)', 'heat transfer coefficient', 'W/(m^2*K)'],
    ['kg/(m^2 s^2)', 'pressure gradient', 'Pa/m'],
    ['m/s', 'velocity', 'm/s'],
    ['J/(kg K)', 'specific heat capacity', 'J/(kg*K)'],
    ['Pa s', 'dynamic viscosity', 'Pa*s'],
  ])('%s is a %s, in %s', (text, name, unit) => {
    const { dimension } = resolveUnit(text)!;
    expect(quantityName(dimension)).toBe(name);
    expect(siUnitText(dimension)).toBe(unit);
  });

  it('no rate of exchange is assumed between currencies', () => {
    const [euro, dollar] = ['EUR/kWh', 'USD/kWh'].map((text) => resolveUnit(text)!.dimension);
    expect(sameDimension(euro!, dollar!)).toBe(false);
    expect(quantityName(dollar!)).toBe('price of energy');
  });

  it('an unnamed quantity is told by its unit, a plain number as such', () => {
    expect(quantityName(resolveUnit('kg^2 m')!.dimension)).toMatch(/^quantity in /);
    expect(quantityName(dimensionless)).toBe('plain number');
  });
});
