import { describe, expect, it } from 'vitest';
import { defaultSettings, evaluateCalculation, type CellResult } from '#engine';

/** A calculation of one relation cell named `r`, with its lines. */
function cell(relation: string, source: string, settings: Readonly<Record<string, string>> = {}): CellResult {
  const input = { id: 'c', kind: 'relation' as const, source, settings: { name: 'r', relation, ...settings } };
  const { cells } = evaluateCalculation({ settings: defaultSettings, cells: [input] });
  if (cells.c === undefined) throw new Error('no cell');
  return cells.c;
}
const codes = ({ diagnostics }: CellResult) => diagnostics.map(({ code }) => code);
const output = ({ relation }: CellResult) => relation?.outputs[0]?.value;

describe('a relation on a sheet', () => {
  it('converts what it is given to the units of its symbols', () => {
    const si = cell('darcy-weisbach', 'f = 0.02\nL = 10 m\nD = 0.05 m\nrho = 1000 kg/m^3\nV = 2 m/s');
    const us = cell('darcy-weisbach', 'f = 2 %\nL = 32.80839895 ft\nD = 50 mm\nrho = 1 g/cm^3\nV = 7.2 km/h');
    expect(output(si)?.si).toBeCloseTo(8000, 6);
    expect(output(us)?.si).toBeCloseTo(8000, 3);
  });

  it('refuses a value of another kind at its place', () => {
    const source = 'f = 0.02\nL = 10 s\nD = 0.05 m\nrho = 1000 kg/m^3\nV = 2 m/s';
    const wrong = cell('darcy-weisbach', source);
    expect(codes(wrong)).toEqual(['UNITS_DISAGREE']);
    expect(wrong.diagnostics[0]?.span).toEqual({ from: source.indexOf('10 s'), to: source.indexOf('10 s') + 4 });
    expect(output(wrong)).toBeUndefined();
  });

  it('asks for what is missing', () => {
    expect(cell('gnielinski-1976-tube', 'Re = 20000').diagnostics[0]).toMatchObject({
      code: 'RELATION_INPUT',
      message: 'Still to be given: Pr (Prandtl number). Write Pr = ….',
    });
  });

  it('names a relation that is not in the catalogue', () => {
    expect(codes(cell('nobody-1900', ''))).toEqual(['UNKNOWN_RELATION']);
  });

  it('says which result has no value', () => {
    const crossing = 'T_hi = 350 K\nT_ho = 320 K\nT_ci = 300 K\nT_co = 360 K';
    expect(cell('lmtd-counterflow', crossing).diagnostics[0]).toMatchObject({ code: 'NO_VALUE' });
  });
});

describe('temperatures', () => {
  const rayleigh = (dT: string) =>
    cell(
      'rayleigh-number',
      `g = 9.81 m/s^2\nbeta = 0.003 1/K\ndT = ${dT}\nL = 1 m\nnu = 1.6e-5 m^2/s\nalpha = 2.2e-5 m^2/s`,
    );

  it('takes differences in K, or as one temperature less another', () => {
    expect(output(rayleigh('20 K'))?.si).toBeCloseTo(output(rayleigh('45 degC - 25 degC'))?.si as number, 0);
  });

  it('refuses a temperature on a scale where a difference is wanted', () => {
    expect(codes(rayleigh('20 degC'))).toEqual(['DIFFERENCE_WANTED']);
  });

  it('refuses a difference where a temperature on a scale is wanted', () => {
    const walls = 'e1 = 0.8\nT1 = 90 degC - 20 degC\nT2 = 20 degC';
    expect(codes(cell('stefan-boltzmann-exchange', walls))).toEqual(['LEVEL_WANTED']);
  });

  it('radiates between absolute temperatures, however they are typed', () => {
    // 0.8 * 5.670374419e-8 * (473.15^4 - 298.15^4), CODATA 2018.
    const flux = output(cell('stefan-boltzmann-exchange', 'e1 = 0.8\nT1 = 200 degC\nT2 = 25 degC'))?.si;
    expect(flux).toBeCloseTo(0.8 * 5.670374419e-8 * (473.15 ** 4 - 298.15 ** 4), 6);
  });

  it('shows a temperature in degrees, a difference in kelvin', () => {
    expect(output(cell('swinbank-sky-temperature', 'T_inf = 20 degC'))?.unit).toBe('°C');
    const ends = 'T_hi = 160 degC\nT_ho = 125 degC\nT_ci = 20 degC\nT_co = 80 degC';
    // Cengel, Example 11-4: 92.0 °C (from memory).
    expect(output(cell('lmtd-counterflow', ends))).toMatchObject({ unit: 'K' });
    expect(output(cell('lmtd-counterflow', ends))?.si).toBeCloseTo(92, 0);
  });

  it('takes a dimensional formula in its own unit', () => {
    // 51104 + 2044*50 with the saturation temperature in °C (Griffith).
    const hot = cell('dropwise-steam', 'Tc = 323.15 K');
    expect(output(hot)?.si).toBeCloseTo(153_304, 3);
    // The roughness is wanted in micrometres.
    const cooper = (Rp: string) =>
      output(cell('cooper-1984', `P = 1 bar\nP_c = 220.64 bar\nM = 18.015 g/mol\nq = 100 kW/m^2\nRp = ${Rp}`))?.si;
    expect(cooper('1 um')).toBeCloseTo(cooper('0.001 mm') as number, 6);
  });
});

describe('fit on a sheet', () => {
  it('marks what follows from a relation outside its range until a reason is written', () => {
    expect(cell('dittus-boelter-heating', 'Re = 4000\nPr = 5').relation?.grade).toBe('outside');
    expect(cell('dittus-boelter-heating', 'Re = 4000\nPr = 5').outsideRange).toEqual(['c']);
    const kept = cell('dittus-boelter-heating', 'Re = 4000\nPr = 5', { keepReason: 'short test piece' });
    expect(kept.outsideRange).toEqual([]);
    expect(kept.relation?.keepReason).toBe('short test piece');
  });

  it('gives the interval of the accuracy stated for this part of the range', () => {
    const low = cell('gnielinski-1976-tube', 'Re = 5000\nPr = 5').relation;
    expect(low?.relativeAccuracy).toBe(0.2);
    expect(low?.interval?.high.si).toBeCloseTo((low?.outputs[0]?.value?.si as number) * 1.2, 9);
  });

  it('tells the active branch and a near joint', () => {
    const plates = cell('martin-1996-plate-nu', 'Re = 2040\nPr = 5\nbeta = 60 deg').relation;
    expect(plates?.branches?.map(({ near }) => near)).toEqual([true]);
  });
});
