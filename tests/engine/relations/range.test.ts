import { describe, expect, it } from 'vitest';
import { worstGrade, type Relation } from '#engine';
import { numberOf } from '../../../src/engine/calculation/relation-evaluation';
import { judgeValidity } from '../../../src/engine/relations/index';
import { judged } from '../../helpers/relations';

/** An entry that exists only here, with one condition. */
function entry(condition: string, validitySymbols: readonly string[] = []): Relation {
  const symbol = (name: string) => ({ symbol: name, quantity: name, unit: '1' });
  return {
    id: 'only-here',
    title: 'Only here',
    authors: 'nobody',
    year: '',
    inputs: ['Re', 'Pr'].map(symbol),
    formula: ['Y = Re/2'],
    output: symbol('Y'),
    validity: [condition],
    validitySymbols: validitySymbols.map(symbol),
    propertyTemperature: 'film',
    characteristicLength: '',
    wallCondition: 'any',
    accuracy: '',
    source: 'none',
    confirmed: false,
  };
}

function judge(condition: string, values: Readonly<Record<string, number>>, validitySymbols?: readonly string[]) {
  const [validity] = judgeValidity(entry(condition, validitySymbols), new Map(Object.entries(values)), numberOf);
  if (validity === undefined) throw new Error('no condition');
  return validity;
}

describe('grade', () => {
  // Within 5 % of a limit on either side is "at the edge".
  it.each([
    ['0.5 <= Pr <= 2000', { Pr: 0.7 }, 'inside', 'within'],
    ['0.5 <= Pr <= 2000', { Pr: 0.52 }, 'edge', 'within, near 0.5'],
    ['0.5 <= Pr <= 2000', { Pr: 0.48 }, 'edge', 'at the edge: below 0.5'],
    ['0.5 <= Pr <= 2000', { Pr: 0.4 }, 'outside', 'below 0.5'],
    ['0.5 <= Pr <= 2000', { Pr: 2050 }, 'edge', 'at the edge: above 2\u00a0000'],
    ['0.5 <= Pr <= 2000', { Pr: 3000 }, 'outside', 'above 2\u00a0000'],
    ['Re >= 1e4', { Re: 2e4 }, 'inside', 'within'],
    ['Re >= 1e4', { Re: 4000 }, 'outside', 'below 10\u00a0000'],
    ['1e4 <= Re', { Re: 4000 }, 'outside', 'below 10\u00a0000'],
    ['Re < 5e6', { Re: 1e7 }, 'outside', 'above 5·10⁶'],
    ['Re > 0', { Re: 0 }, 'outside', 'below 0'],
    ['Re >= 0', { Re: 0 }, 'inside', 'within'],
  ])('%s at %o is %s', (condition, values, grade, message) => {
    const validity = judge(condition, values);
    expect([validity.grade, validity.message]).toEqual([grade, message]);
  });

  it('leaves the limit itself outside where it is strict', () => {
    expect(judge('Re < 100', { Re: 100 }).message).toBe('at the edge: above 100');
    expect(judge('Re <= 100', { Re: 100 }).message).toBe('within, near 100');
  });
});

describe('textbook examples that lie just outside printed limits are at the edge', () => {
  // From the worked examples of Incropera & DeWitt, Cengel and Holman (from memory).
  it.each([
    ['0.71 <= Pr <= 380', 0.709, 'edge'],
    ['Pr >= 0.7', 0.695, 'edge'],
    ['1 <= Pr <= 20', 0.73, 'outside'],
  ])('%s at %d', (condition, Pr, grade) => {
    expect(judge(condition, { Pr }).grade).toBe(grade);
  });
});

describe('what a condition may be', () => {
  it('takes expressions on both sides', () => {
    const long = judged('laminar-tube-const-wall-temp', { Re: 500, Pr: 5, L: 10, D: 0.02 })['L/D >= 0.05*Re*Pr'];
    expect(long).toMatchObject({ grade: 'inside', value: 500, low: 125 });
    const short = judged('laminar-tube-const-wall-temp', { Re: 500, Pr: 5, L: 1, D: 0.02 })['L/D >= 0.05*Re*Pr'];
    expect(short).toMatchObject({ grade: 'outside', message: 'below 125' });
  });

  it('takes limits that depend on another input', () => {
    const condition = '100 < Re < 2300*(1 + 8.6*(D_i/D_c)^0.45)';
    const tight = { Pr: 5, D_i: 0.02, D_c: 0.2 };
    expect(judged('schmidt-1967-coil-laminar-nu', { ...tight, Re: 8000 })[condition]?.grade).toBe('inside');
    expect(judged('schmidt-1967-coil-laminar-nu', { ...tight, Re: 12_000 })[condition]?.grade).toBe('outside');
  });

  it('takes ratios either way round', () => {
    const factor = (mu_w: number) =>
      judged('petukhov-viscosity-factor', { mu: 1e-3, mu_w })['0.025 <= mu_w/mu <= 12.5'];
    expect(factor(5e-4)?.grade).toBe('inside');
    expect(factor(2e-2)?.message).toBe('above 12.5');
  });

  it('judges the direction by the sign alone, however near', () => {
    const at = (T_s: number) => judged('dittus-boelter-heating', { Re: 2e4, Pr: 5, T_s, T_b: 300 })['T_s > T_b'];
    expect(at(301)).toMatchObject({ grade: 'inside', message: 'holds' });
    expect(at(299)).toMatchObject({ grade: 'outside', message: 'T_s = 299 K is not above T_b = 300 K' });
  });

  it('judges results and intermediate values after the formula', () => {
    const thick = { h: 500, k_f: 15, t: 0.001, r1: 0.01, r2: 0.06 };
    expect(judged('fin-annular-schmidt', thick)['eta > 0.5']?.grade).toBe('outside');
    const gap = judged('raithby-hollands-1975-annulus', { RaL3: 1e14, Pr: 0.7, r_i: 0.05, r_o: 0.1 })['Rc <= 1e7'];
    expect(gap?.grade).toBe('outside');
  });

  it('holds an "or" with one part, also when the other is not known', () => {
    expect(judge('Pr >= 5 or L/D >= 50', { Pr: 6 }, ['L', 'D'])).toMatchObject({
      grade: 'inside',
      message: 'holds: Pr >= 5',
    });
    expect(judge('Pr >= 5 or L/D >= 50', { Pr: 3 }, ['L', 'D']).grade).toBe('unchecked');
    expect(judge('Pr >= 5 or L/D >= 50', { Pr: 3, L: 1, D: 0.1 }, ['L', 'D'])).toMatchObject({
      grade: 'outside',
      message: 'Pr >= 5: 3, below 5; L/D >= 50: 10, below 50',
    });
  });

  it('breaks an "and" with one part, also when the other is not known', () => {
    expect(judge('Pr >= 5 and L/D >= 50', { Pr: 3 }, ['L', 'D']).grade).toBe('outside');
    expect(judge('Pr >= 5 and L/D >= 50', { Pr: 7 }, ['L', 'D']).grade).toBe('unchecked');
    expect(judge('Pr >= 5 and Re >= 10', { Pr: 7, Re: 20 }).grade).toBe('inside');
  });
});

describe('what is not given', () => {
  it('is asked for, never passed', () => {
    expect(judge('L/D >= 10', { Re: 1, Pr: 1 }, ['L', 'D'])).toMatchObject({
      grade: 'unchecked',
      missing: ['L', 'D'],
      message: 'not checked: L and D are not given',
      low: 10,
    });
    expect(judge('L/D >= 10', { L: 1 }, ['L', 'D']).message).toBe('not checked: D is not given');
  });

  it('is not asked for when it is a result', () => {
    expect(judge('Y <= 10', {})).toMatchObject({ missing: [], message: 'not checked: Y has no value yet' });
  });

  it('is worse than the edge and better than outside', () => {
    expect(worstGrade(['inside', 'edge'])).toBe('edge');
    expect(worstGrade(['unchecked', 'edge'])).toBe('unchecked');
    expect(worstGrade(['unchecked', 'outside', 'inside'])).toBe('outside');
    expect(worstGrade([])).toBe('inside');
  });
});

describe('gauge', () => {
  it('is logarithmic over more than a decade, and for characteristic numbers with one end', () => {
    expect(judge('3000 <= Re <= 5e6', { Re: 1e4 }).scale).toBe('log');
    expect(judge('2300 <= Re <= 4000', { Re: 3000 }).scale).toBe('linear');
    expect(judge('Re >= 1e4', { Re: 2e4 }).scale).toBe('log');
    expect(judge('L/D >= 10', { L: 2, D: 0.1 }, ['L', 'D']).scale).toBe('linear');
    expect(judge('0 < Re <= 1e5', { Re: 10 }).scale).toBe('linear');
  });

  it('has limits, value and unit', () => {
    const bore = judged('iso5167-orifice-rhg', { d: 0.1, D: 0.2, Re_D: 1e5 })['d >= 0.0125'];
    expect(bore).toMatchObject({ low: 0.0125, value: 0.1, valueText: '0.1 m' });
  });
});
