import { describe, expect, it } from 'vitest';
import { cellOf, codes, last, lineOf, pointedAt, problems, shownOf, valueOf } from '../calculation/sheet';

// What ordinary unit calculators get wrong without a word. Values follow from the definitions of the
// units (SI brochure, 9th edition; NIST SP 811) and are worked out in the line beside them.

describe('a name that is also a unit', () => {
  it('is a unit only directly behind a number: with m = 2 kg, 5 m is five metres', () => {
    expect(shownOf('m = 2 kg\nx = 5 m')).toBe('5 m');
  });

  it('is a name everywhere else: with m = 2 kg, 5*m is ten kilograms', () => {
    expect(shownOf('m = 2 kg\nx = 5*m')).toBe('10.00 kg');
  });

  it.each(['h', 'm', 'T', 'L', 'W', 'k', 'g', 'A', 'D', 'V', 'C', 's', 'J', 'N', 'F'])('%s can be defined', (name) => {
    expect(valueOf(`${name} = 3\nx = 2*${name}`)).toBe(6);
  });

  it('divides a literal in parentheses: (5 kW)/m', () => {
    expect(valueOf('m = 2 kg\nx = (5 kW)/m')).toBe(2500);
  });

  it('is hinted at inside a literal: 10 W/h with a value named h', () => {
    expect(codes('h = 3\nx = 10 W/h')).toEqual(['UNIT_OR_NAME']);
  });

  it('is not hinted at directly behind its number, where no name can stand', () => {
    expect(codes('m = 2 kg\nx = 5 m')).toEqual([]);
  });

  it('is said to be a unit where it is no name: 5*m', () => {
    expect(problems('x = 5*m')[0]?.message).toBe(
      'No value is named m. As a unit m stands directly behind a number: 1 m.',
    );
  });
});

describe('a quantity literal', () => {
  it('ends before a sign that is followed by no unit: 5 kW / Q_0', () => {
    expect(valueOf('Q_0 = 2 kW\nx = 5 kW / Q_0')).toBe(2.5);
    expect(valueOf('x = 2 m * 3')).toBe(6);
  });

  it('takes in a unit in parentheses, but no sum: 5 kW/(m K) and 5 kW/(m + K)', () => {
    expect(shownOf('x = 5 kW/(m K)')).toBe('5 kW/(m·K)');
    expect(valueOf('m = 2 kg\nK = 3 kg\nx = 5 kW/(m + K)')).toBe(1000);
  });

  it('binds before the division: 1/2 m is 1/(2 m), with a hint', () => {
    expect(shownOf('x = 1/2 m')).toBe('0.5000 m⁻¹');
    expect(codes('x = 1/2 m')).toEqual(['FRACTION_BEFORE_UNIT']);
  });

  it('binds before the power: 2 m^2 is two square metres', () => {
    expect(shownOf('x = 2 m^2')).toBe('2 m²');
  });

  it('is not multiplied by standing side by side: 2 x, 2 (3)', () => {
    expect(codes('y = 3\nx = 2 y')).toHaveLength(1);
    expect(last('y = 3\nx = 2 y').value).toBeUndefined();
    expect(last('x = 2 (3)').value).toBeUndefined();
  });

  it('reads per cent as hundredths', () => {
    expect(valueOf('x = 5 %')).toBe(0.05);
    expect(valueOf('x = 100 + 5 %')).toBe(100.05);
  });

  it('takes money and energy prices as plain dimensions: 0.18 EUR/kWh · 1 MWh', () => {
    expect(shownOf('x = 0.18 EUR/kWh * 1 MWh')).toBe('180.0 EUR');
  });
});

describe('dimensions', () => {
  it('names both sides', () => {
    const source = 'dp = 5 kPa\nu = 2 m/s\nx = dp + u';
    const [problem] = problems(source);
    expect(problem?.message).toBe('These cannot be added: left is a pressure (Pa), right is a velocity (m/s).');
    expect(pointedAt(source, problem)).toBe('dp + u');
  });

  it('are checked in branches that are not taken', () => {
    expect(codes('x = if(1 < 2, 5 m, 2 s)')).toEqual(['UNITS_DISAGREE']);
    expect(codes('x = if(1 < 2, 5 m, ln(3 s)*1 m)')).toEqual(['UNITS_DISAGREE']);
  });

  it('are checked before anything is computed: a line that waits for a failed one is checked all the same', () => {
    const cell = cellOf('a = 1 m/(3 - 3)\nb = a + 2 s');
    expect(lineOf(cell, 'a').diagnostics.map(({ code }) => code)).toEqual(['DIVISION_BY_ZERO']);
    expect(lineOf(cell, 'b').diagnostics.map(({ code }) => code)).toEqual(['UNITS_DISAGREE']);
    expect(lineOf(cell, 'b').waitsFor).toEqual(['a']);
  });

  it('of an unknown name make no further errors', () => {
    const cell = cellOf('b = zzz + 2 s\nc = 2*b');
    expect(lineOf(cell, 'c').diagnostics).toEqual([]);
    expect(lineOf(cell, 'c').waitsFor).toEqual(['b']);
  });

  it.each([
    ['exp(2 m)', 'exp takes a plain number; this is a length (m).'],
    ['sin(2 s)', 'sin takes a plain number; this is a time (s).'],
    ['max(2 m, 3 s)', 'max takes values of one kind: here are a length (m) and a time (s).'],
    ['2^(3 m)', 'An exponent is a plain number; this one is a length (m).'],
    ['(1 < 2) + 3', 'A condition cannot be calculated with; use if(condition, a, b).'],
    ['if(2, 3, 4)', 'if begins with a condition; this is a plain number.'],
    ['2 and 3 < 4', '"and" joins conditions, not a plain number.'],
    ['not 2', '"not" stands before a condition, not before a plain number.'],
    ['2 m < 3 s', 'These cannot be compared: left is a length (m), right is a time (s).'],
    ['1 m < 2 m < 3 s', 'These cannot be compared: left is a length (m), right is a time (s).'],
    ['sqrt(2)*min(1 < 2, 3)', 'min takes numbers, not conditions.'],
    ['atan(1, 2)', 'atan is written atan(x); 2 values are given.'],
    ['(2 m)^0.123', 'A length (m) to the power of 0.123 is no quantity.'],
  ])('%s is refused', (expression, message) => {
    expect(problems(`x = ${expression}`).map((problem) => problem.message)).toEqual([message]);
  });

  it('of a power must be known beforehand', () => {
    expect(codes('D = 3 m\nn = sqrt(4)\nx = D^n')).toEqual(['EXPONENT']);
    expect(valueOf('D = 3 m\nn = 2\nx = D^n')).toBe(9);
    expect(shownOf('D = 4 m\nx = D^(1/2)*D^1.5')).toBe('16.00 m²');
  });

  it('give no odd product of base units: kg·m²/s³ is W', () => {
    expect(shownOf('x = 2 kg * (3 m/s)^2 / 1 s')).toBe('18.00 W');
    expect(shownOf('x = 1000 kg/m^3 * 9.81 m/s^2 * 10 m')).toBe('98.10 kPa');
  });

  it('of a required condition', () => {
    expect(codes('dp = 3 kPa\nrequire dp')).toEqual(['KIND']);
    expect(last('dp = 3 kPa\nrequire dp <= 5 kPa').satisfied).toBe(true);
    expect(last('dp = 9 kPa\nrequire dp <= 5 kPa').satisfied).toBe(false);
    expect(last('require dp <= 5 kPa').satisfied).toBeUndefined();
  });
});

describe('names', () => {
  it('are one, spelled or typed: ρ and rho, T₁ and T_1', () => {
    expect(valueOf('ρ = 998\nx = rho')).toBe(998);
    expect(valueOf('T₁ = 3\nx = T_1')).toBe(3);
    expect(valueOf('V̇ = 2\nx = V_dot')).toBe(2);
  });

  it('that are unknown get the nearest one and a mend', () => {
    const source = 'T_wall = 300 K\nx = T_wal - 5 K';
    const [problem] = problems(source);
    expect(problem?.message).toBe('No value is named T_wal. Nearest: T_wall.');
    expect(problem?.mend).toMatchObject({ insert: 'T_wall' });
    expect(pointedAt(source, problem)).toBe('T_wal');
  });

  it('differ by case, and the other case is proposed', () => {
    expect(problems('Re = 1000\nx = re')[0]?.message).toBe('No value is named re. Nearest: Re.');
  });

  it('are defined once: the second is an error, the first still counts', () => {
    const cell = cellOf('a = 2\na = 3\nb = a');
    expect(cell.lines.map(({ diagnostics }) => diagnostics.map(({ code }) => code))).toEqual([
      ['DEFINED_AGAIN'],
      ['DEFINED_TWICE'],
      [],
    ]);
    expect(cell.lines[1]?.value).toBeUndefined();
    expect(lineOf(cell, 'b').value?.si).toBe(2);
  });

  it('in a circle are errors with the way round', () => {
    const cell = cellOf('a = c + 1\nb = a\nc = b\nd = c + 1\ne = 5');
    expect(lineOf(cell, 'a').diagnostics[0]?.message).toBe('These define each other in a circle: a → c → b → a.');
    expect(lineOf(cell, 'b').diagnostics[0]?.message).toBe('These define each other in a circle: b → a → c → b.');
    expect(lineOf(cell, 'd').diagnostics).toEqual([]);
    expect(lineOf(cell, 'd').waitsFor).toEqual(['c']);
    expect(lineOf(cell, 'e').value?.si).toBe(5);
  });

  it('do not define themselves', () => {
    expect(problems('a = a + 1')[0]?.message).toBe('a is defined by itself.');
  });

  it('are found wherever they stand: order is for the reader', () => {
    expect(lineOf(cellOf('a = 2*b\nb = 3'), 'a').value?.si).toBe(6);
  });

  it('may be those of built-in constants, which then give way', () => {
    expect(valueOf('x = pi')).toBe(Math.PI);
    expect(valueOf('pi = 3\nx = 2*pi')).toBe(6);
  });

  it('of functions are told from others', () => {
    expect(problems('x = log(2)')[0]?.mend).toMatchObject({ insert: 'ln' });
    expect(problems('x = sqroot(2)')[0]?.message).toContain('Nearest: sqrt.');
    expect(problems('x = sqrt')[0]?.message).toBe('No value is named sqrt. sqrt is a function: write sqrt(…).');
  });
});

describe('conditionals', () => {
  it('evaluate only the branch that is taken', () => {
    expect(valueOf('Re = 0\nx = if(Re > 0, 64/Re, 1)')).toBe(1);
    expect(codes('Re = 0\nx = if(Re >= 0, 64/Re, 1)')).toEqual(['DIVISION_BY_ZERO']);
  });

  it('do not look at the right side of and, or when the left decides', () => {
    expect(valueOf('z = 0\nx = if(z > 0 and 1/z > 2, 1, 2)')).toBe(2);
    expect(valueOf('z = 0\nx = if(z == 0 or 1/z > 2, 1, 2)')).toBe(1);
  });

  it('nest', () => {
    const source = (Re: number) => `Re = ${Re}\nx = if(Re < 2300, 1, if(Re < 4000, 2, 3))`;
    expect([1000, 3000, 9000].map((Re) => valueOf(source(Re)))).toEqual([1, 2, 3]);
  });

  it('compare in chains', () => {
    expect(valueOf('x = if(1 < 2 < 3, 1, 0)')).toBe(1);
    expect(valueOf('x = if(1 < 3 < 2, 1, 0)')).toBe(0);
  });
});

describe('half-typed lines', () => {
  it.each(['x =', 'x = (2 +', 'x = 2 *', 'x = sqrt(', 'require', '= 5', 'x = if(1 < 2,'])(
    '%s breaks no other line',
    (half) => {
      const cell = cellOf(`a = 2\n${half}\nb = 3*a`);
      expect(lineOf(cell, 'b').value?.si).toBe(6);
      expect(cell.diagnostics.some(({ severity }) => severity === 'error')).toBe(true);
    },
  );
});
