import { describe, expect, it } from 'vitest';
import { codes, last, problems, shownOf, valueOf } from '../calculation/sheet';

// 0 °C = 273.15 K, 0 °F = 459.67/1.8 K (NIST SP 811, appendix B.8); the standard atmosphere is 101 325 Pa.
const warm = 'T_1 = 25 degC\nT_2 = 35 degC\n';

describe('temperature levels', () => {
  it('are kept in kelvin and shown as they were written', () => {
    expect(valueOf('T = 25 degC')).toBe(298.15);
    expect(valueOf('T = 77 degF')).toBeCloseTo(298.15, 10);
    expect(shownOf('T = 77 degF')).toBe('77 °F');
    expect(shownOf('T = -5 degC')).toBe('−5 °C');
  });

  it('less another are a difference, shown in K', () => {
    expect(shownOf(`${warm}d = T_2 - T_1`)).toBe('10.00 K');
    expect(shownOf('d = 77 degF - 20 degC')).toBe('5.000 K');
  });

  it('and a difference are a level', () => {
    expect(shownOf('x = 25 degC + 10 K')).toBe('35.00 °C');
    expect(shownOf('x = 10 K + 25 degC')).toBe('35.00 °C');
    expect(shownOf('x = 25 degC + 18 delta_degF')).toBe('35.00 °C');
    expect(shownOf('dT = 4 kW/(0.1 kg/s * 4 kJ/(kg K))\nx = 20 degC + dT')).toBe('30.00 °C');
  });

  it.each([
    '(T_1 + T_2)/2',
    '0.5*(T_1 + T_2)',
    'T_1/2 + T_2/2',
    'mean(T_1, T_2)',
    'sum(T_1, T_2)/2',
    'T_1 + (T_2 - T_1)/2',
  ])('have a mean that is a level: %s', (mean) => {
    expect(shownOf(`${warm}x = ${mean}`)).toBe('30.00 °C');
    expect(codes(`${warm}x = ${mean}`)).toEqual([]);
  });

  it('weighted to one are a level', () => {
    expect(shownOf(`${warm}x = 0.3*T_1 + 0.7*T_2`)).toBe('32.00 °C');
    expect(shownOf(`${warm}x = 2*T_2 - T_1`)).toBe('45.00 °C');
    expect(shownOf(`${warm}T_3 = 45 degC\nx = (T_1 + T_2 + T_3)/3`)).toBe('35.00 °C');
  });

  it.each([
    'T_1 + T_2',
    'sum(T_1, T_2)',
    '(T_1 + T_2)^2',
    'sqrt(T_1 + T_2)',
    'if(1 < 2, T_1 + T_2, 3 K)',
    'max(T_1 + T_2, 3 K)',
    '(T_1 + T_2)*2 m',
    '-T_1',
  ])('left over are an error: %s', (expression) => {
    expect(codes(`${warm}x = ${expression}`)).toEqual(['LEVELS']);
    expect(last(`${warm}x = ${expression}`).value).toBeUndefined();
  });

  it('left over on one side of a comparison are an error, equal counts on both are not', () => {
    expect(codes(`${warm}require T_1 + T_2 > 20 K`)).toEqual(['LEVELS']);
    expect(last(`${warm}require T_1 + T_2 < 2*T_2`).satisfied).toBe(true);
  });

  it('multiplied get a warning', () => {
    const [problem] = problems('x = 2*25 degC');
    expect(problem).toMatchObject({ code: 'LEVELS', severity: 'warning' });
    expect(valueOf('x = 2*25 degC')).toBeCloseTo(596.3, 10);
    expect(shownOf('x = 2*25 degC')).toBe('596.3 K');
  });

  it('written as a factor get a warning with the difference that is more often meant', () => {
    const source = 'Q = 5 kg * 4.2 kJ/(kg K) * 10 degC';
    const [problem] = problems(source);
    expect(problem?.message).toBe(
      '10 °C counts from absolute zero in a product: 283.15 K. For a difference write 10 K.',
    );
    expect(problem?.mend).toMatchObject({ insert: 'K' });
    expect(codes('U = 5 kW/(10 degF)')).toEqual(['LEVELS']);
  });

  it('under a name are taken from absolute zero in products and powers, without a warning', () => {
    // Ideal gas at 25 °C: p/(R T) = 101325/(8.31446261815324 · 298.15) mol/m³.
    expect(valueOf('T = 25 degC\nx = 101325 Pa/(R_u*T)')).toBeCloseTo(101325 / (8.31446261815324 * 298.15), 9);
    expect(codes('T = 25 degC\nx = sigma_SB*T^4')).toEqual([]);
    expect(valueOf(`${warm}x = T_1/T_2`)).toBeCloseTo(298.15 / 308.15, 14);
  });

  it('stand in kelvin among the values of a product, as they were computed with', () => {
    expect(last('T = 25 degC\nx = sigma_SB*T^4').substitutionLatex).toContain('298.1\\,\\mathrm{K}');
    expect(last(`${warm}x = T_2 - T_1`).substitutionLatex).toContain('35\\,\\mathrm{{^\\circ}C}');
  });

  it('are not mixed with differences', () => {
    expect(codes(`${warm}x = min(T_1, T_2 - T_1)`)).toEqual(['UNITS_DISAGREE']);
    expect(codes(`${warm}x = if(1 < 2, T_1, T_2 - T_1)`)).toEqual(['UNITS_DISAGREE']);
    expect(problems(`${warm}require T_2 - T_1 > 25 degC`)[0]?.message).toBe(
      'These cannot be compared: left is a temperature difference (K), right is a temperature level (K).',
    );
  });

  it('below absolute zero are errors, also inside a line', () => {
    expect(codes('T = -300 degC')).toEqual(['BELOW_ABSOLUTE_ZERO']);
    expect(codes('x = -300 degC + 400 K')).toEqual(['BELOW_ABSOLUTE_ZERO']);
    expect(codes('T_1 = 10 degC\nx = T_1 - 500 K')).toEqual(['BELOW_ABSOLUTE_ZERO']);
    expect(codes('T = -5 K')).toEqual(['BELOW_ABSOLUTE_ZERO']);
    expect(codes('dT = -5 K')).toEqual([]);
  });

  it('in K are levels under the name of a temperature', () => {
    expect(shownOf('T_1 = 300 K\nx = T_1 + 5 K')).toBe('31.85 °C');
    expect(codes('T_1 = 300 K\nT_2 = 310 K\nx = T_1 + T_2')).toEqual(['LEVELS']);
    expect(shownOf('dT = 5 K\nx = 2*dT')).toBe('10.00 K');
  });
});

describe('a unit that is asked for', () => {
  it('shows a level on any scale', () => {
    expect(shownOf(`${warm}x = T_1 to degF`)).toBe('77.00 °F');
    expect(shownOf(`${warm}x = T_1 to K`)).toBe('298.1 K');
    expect(shownOf('x = 300 K to degC')).toBe('26.85 °C');
  });

  it('does not show a difference as a level: 10 K is not −263.15 °C', () => {
    const [problem] = problems(`${warm}x = T_2 - T_1 to degC`);
    expect(problem).toMatchObject({ code: 'LEVELS', severity: 'error', mend: { insert: 'K' } });
    expect(problems(`${warm}x = T_2 - T_1 to degF`)[0]?.mend).toMatchObject({ insert: 'delta_degF' });
    expect(shownOf(`${warm}x = T_2 - T_1 to delta_degF`)).toBe('18.00 Δ°F');
  });

  it('does not show a level as a difference', () => {
    expect(problems(`${warm}x = T_1 to delta_degC`)[0]).toMatchObject({ code: 'LEVELS', mend: { insert: 'degC' } });
  });

  it('asks to be sure where a quotient may be either', () => {
    const rise = 'x = 4 kW/(0.1 kg/s * 4 kJ/(kg K)) to degC';
    expect(problems(rise)[0]).toMatchObject({ code: 'LEVELS', severity: 'warning' });
    expect(codes(rise.replace('x', 'T_gas'))).toEqual([]);
  });

  it('must measure the same', () => {
    expect(problems('x = 5 m to kg')[0]?.message).toBe('Asked in kg (mass), comes out as a length (m).');
    expect(last('x = 5 m to kg').value).toBeUndefined();
  });
});

describe('gauge pressures', () => {
  it('count from the ambient pressure of the calculation', () => {
    expect(valueOf('p = 3 barg')).toBe(401325);
    expect(valueOf('p = 3 barg', { ambientPressure: 95000 })).toBe(395000);
    expect(shownOf('p = 5 bar to barg')).toBe('3.987 barg');
    // 14.5 psi = 14.5 · 6894.757 Pa (NIST SP 811)
    expect(valueOf('p = 14.5 psig')).toBeCloseTo(101325 + 14.5 * 6894.757293168, 4);
  });

  it('behave as levels do', () => {
    const given = 'p_1 = 3 barg\np_2 = 2 barg\n';
    expect(shownOf(`${given}x = p_1 - p_2`)).toBe('1.000 bar');
    expect(codes(`${given}x = p_1 + p_2`)).toEqual(['LEVELS']);
    expect(valueOf(`${given}x = (p_1 + p_2)/2`)).toBe(351325);
    expect(valueOf(`${given}x = p_1 + 1 bar`)).toBe(501325);
    expect(codes(`${given}x = 2*p_1`)).toEqual(['LEVELS']);
    expect(codes(`${given}x = p_1 - p_2 to barg`)).toEqual(['LEVELS']);
  });

  it('written as a factor get a warning; a name is taken absolute', () => {
    expect(problems('F = 3 barg * 2 m^2')[0]).toMatchObject({ severity: 'warning', mend: { insert: 'bar' } });
    expect(valueOf('p = 3 barg\nF = p*2 m^2')).toBe(802650);
    expect(last('p = 3 barg\nF = p*2 m^2').substitutionLatex).toContain('4.013\\,\\mathrm{bar}');
  });

  it('below vacuum are errors', () => {
    expect(codes('p = -2 barg')).toEqual(['BELOW_VACUUM']);
  });

  it('in absolute units may be levels or differences', () => {
    expect(codes('p_1 = 3 bar\np_2 = 2 bar\nx = p_1 + p_2')).toEqual([]);
  });
});
