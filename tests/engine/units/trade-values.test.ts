import { describe, expect, it } from 'vitest';
import { resolveUnit, siUnitText } from '../../../src/engine/units/index';

/**
 * Conversion values computed from exact definitions (pound 0.453 592 37 kg, inch 25.4 mm, g 9.806 65 m/s²,
 * IT calorie 4.186 8 J): 1 of the unit in coherent SI units, with the digits that are given.
 */
const values: [unit: string, factor: number, si: string][] = [
  ['lbf', 4.448221615, 'N'],
  ['psi', 6894.757293, 'Pa'],
  ['BTU', 1055.05585262, 'J'],
  ['BTU/h', 0.293071070172, 'W'],
  ['BTU/(lb*degF)', 4186.8, 'J/(kg*K)'],
  ['BTU/lb', 2326, 'J/kg'],
  ['BTU/(h*ft^2*degF)', 5.678263341, 'W/(m^2*K)'],
  ['BTU/(h*ft*degF)', 1.730734666, 'W/(m*K)'],
  ['BTU*in/(h*ft^2*degF)', 0.14422788886, 'W/(m*K)'],
  ['BTU/(h*ft^2)', 3.154590745, 'W/m^2'],
  ['TR', 3516.852842, 'W'],
  ['hp', 745.6998716, 'W'],
  ['gal/min', 6.30901964e-5, 'm^3/s'],
  ['h*ft^2*degF/BTU', 0.1761101837, 'm^2*K/W'],
  ['lb/(ft*h)', 4.13378873e-4, 'Pa*s'],
  ['lbf*s/ft^2', 47.88025898, 'Pa*s'],
  ['ft^2/h', 2.58064e-5, 'm^2/s'],
  ['ft^3/min', 4.719474432e-4, 'm^3/s'],
  ['inH2O', 249.08891, 'Pa'],
  ['Torr', 133.322368421, 'Pa'],
  ['at', 98066.5, 'Pa'],
  ['kcal/(h*m^2*K)', 1.163, 'W/(m^2*K)'],
];

describe('trade units', () => {
  it.each(values)('1 %s is %d %s', (text, factor, si) => {
    const unit = resolveUnit(text)!;
    expect(Math.abs(unit.factor / factor - 1)).toBeLessThan(1e-9);
    expect(siUnitText(unit.dimension)).toBe(si);
  });

  it('names which BTU and which calorie: the thermochemical one is smaller by 1.000 669', () => {
    expect(resolveUnit('BTU_IT')!.factor / resolveUnit('BTU_th')!.factor).toBeCloseTo(1.000669, 6);
    expect(resolveUnit('cal_IT')!.factor / resolveUnit('cal_th')!.factor).toBeCloseTo(1.000669, 6);
  });

  it('reads lbf·s as 4.448 2 N·s, never as 1 (Mars Climate Orbiter, board report 1999)', () => {
    expect(resolveUnit('lbf s')!.factor).toBeCloseTo(4.4482216, 7);
    expect(resolveUnit('lbf s')!.dimension).toEqual(resolveUnit('N s')!.dimension);
  });

  it('68 °F is 293.15 K, and a difference of 18 °F is 10 K (NIST SP 811, B.8)', () => {
    const level = resolveUnit('degF')!;
    expect(68 * level.factor + level.offset).toBeCloseTo(293.15, 12);
    const difference = resolveUnit('delta_degF')!;
    expect(18 * difference.factor + difference.offset).toBeCloseTo(10, 12);
    const celsius = resolveUnit('degC')!;
    expect(-40 * celsius.factor + celsius.offset).toBeCloseTo(-40 * level.factor + level.offset, 12);
  });
});
