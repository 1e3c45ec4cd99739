import { describe, expect, it } from 'vitest';
import type { CellInput, CellSettings } from '#engine';
import { lines, pointedAt, sheet } from './sheet';

const fluid = (source: string, settings: CellSettings = {}): CellInput => ({
  id: 'w',
  kind: 'fluid',
  source,
  settings: { name: 'w', substance: 'water', ...settings },
});
const tube = (source: string, settings: CellSettings = {}): CellInput => ({
  id: 'tube',
  kind: 'relation',
  source,
  settings: { name: 'tube', relation: 'gnielinski-1976-tube', ...settings },
});
const codesOf = (cell: { diagnostics: readonly { code: string }[] } | undefined) =>
  cell?.diagnostics.map(({ code }) => code);

describe('a fluid cell', () => {
  // IAPWS R7-97, table 5: T = 300 K, p = 3 MPa: v = 0.100 215 168e-2 m³/kg (from memory).
  it('offers its values to others', () => {
    const { cells, names } = sheet([fluid('T = 300 K\np = 3 MPa'), lines('c', 'v = 1/w.rho')]);
    expect(cells.c?.lines[0]?.value?.si).toBeCloseTo(0.100215168e-2, 11);
    expect(cells.w?.fluid?.rows[0]).toMatchObject({ label: 'state', phase: 'liquid' });
    expect(names.map(({ name }) => name)).toContain('w.rho');
  });

  it('takes the properties of a film at the mean of wall and bulk', () => {
    const film = sheet([fluid('T_wall = 60 degC\nT_bulk = 20 degC\np = 1 bar', { mode: 'film' })]);
    const state = sheet([fluid('T = 40 degC\np = 1 bar')]);
    const rho = (result: typeof film) => result.names.find(({ name }) => name === 'w.rho')?.value?.si;
    expect(rho(film)).toBe(rho(state));
  });

  it('offers the properties at the wall with a suffix', () => {
    const cells = [
      fluid('T_bulk = 20 degC\nT_wall = 60 degC\np = 1 bar', { mode: 'wall' }),
      lines('c', 'x = w.mu/w.mu_w'),
    ];
    expect(sheet(cells).cells.c?.lines[0]?.value?.si).toBeGreaterThan(2);
  });

  it('offers both phases at saturation', () => {
    const { cells, names } = sheet([
      fluid('p = 101325 Pa', { mode: 'saturation' }),
      lines('c', 'x = w.h_v - w.h_l\ny = w.h_fg\nz = w.T_sat to degC'),
    ]);
    const [x, y, z] = cells.c?.lines.map(({ value }) => value) ?? [];
    expect(x?.si).toBeCloseTo(Number(y?.si), 3);
    // Normal boiling point by IAPWS-95/IF97: 99.974 °C (from memory).
    expect(z?.text).toBe('99.97');
    expect(names.map(({ name }) => name)).toEqual(expect.arrayContaining(['w.rho_l', 'w.rho_v', 'w.p_sat', 'w.sigma']));
  });

  it('puts a problem of the substance to the line that it is about', () => {
    const source = 'p = 1 bar\nT = 5000 K';
    const [problem] = sheet([fluid(source)]).cells.w?.diagnostics ?? [];
    expect(problem?.code).toBe('OUT_OF_RANGE_T');
    expect(pointedAt(source, problem)).toBe('5000 K');
    const walls = 'T_bulk = 20 degC\nT_wall = 5000 K\np = 1 bar';
    const [atWall] = sheet([fluid(walls, { mode: 'wall' })]).cells.w?.diagnostics ?? [];
    expect(pointedAt(walls, atWall)).toBe('5000 K');
  });

  it.each<[source: string, settings: CellSettings, code: string]>([
    ['T = 300 K\np = 2 m', {}, 'UNITS_DISAGREE'],
    ['T = 300 K\np = 1 < 2', {}, 'UNITS_DISAGREE'],
    ['T = 40 degC - 20 degC\np = 1 bar', {}, 'LEVELS'],
    ['T = 300 K\nq = 2', {}, 'FLUID_INPUT'],
    ['T = 300 K\nT = 310 K\np = 1 bar', {}, 'FLUID_INPUT'],
    ['T_wall = 300 K', { mode: 'film' }, 'FLUID_INPUT'],
    ['p = 1 bar\nT = 300 K', { mode: 'saturation' }, 'FLUID_INPUT'],
    ['T = 300 K\np = 1 bar', { substance: 'wine' }, 'UNKNOWN_SUBSTANCE'],
    ['T = (\np = 1 bar', {}, 'UNCLOSED'],
  ])('refuses %s', (source, settings, code) => {
    expect(codesOf(sheet([fluid(source, settings)]).cells.w)).toEqual([code]);
  });

  it('names the values that it has when asked for another', () => {
    const { cells } = sheet([fluid('T = 300 K\np = 1 bar'), lines('c', 'x = w.roh\ny = w.colour\nz = 2*w')]);
    const messages = cells.c?.diagnostics.map(({ message }) => message) ?? [];
    expect(messages[0]).toBe('w has no value roh. Nearest: w.rho.');
    expect(messages[1]).toMatch(/^w has no value colour\. It has T, p, /);
    expect(messages[2]).toBe('w holds several values; take one of them, such as w.T.');
  });

  it('without a result is checked by its promise, and what uses it waits', () => {
    const { cells } = sheet([fluid('T = T_x\np = 1 bar'), lines('c', 'x = w.rho + 2 m\ny = 2*w.rho')]);
    expect(codesOf(cells.c)).toEqual(['UNITS_DISAGREE']);
    expect(cells.c?.lines[1]?.waitsFor).toEqual(['w.rho']);
  });
});

describe('a relation cell', () => {
  it('computes, shows its formula with values, and offers every symbol', () => {
    const { cells } = sheet([tube('Re = 50000\nPr = 5'), lines('c', 'x = tube.Nu\ny = tube.f')]);
    const relation = cells.tube?.relation;
    // f by Petukhov: (0.790 ln Re − 1.64)^−2; Nu by Gnielinski (1976).
    const f = (0.79 * Math.log(5e4) - 1.64) ** -2;
    const Nu = ((f / 8) * (5e4 - 1000) * 5) / (1 + 12.7 * Math.sqrt(f / 8) * (5 ** (2 / 3) - 1));
    expect(Number(cells.c?.lines[0]?.value?.si) / Nu).toBeCloseTo(1, 12);
    expect(Number(cells.c?.lines[1]?.value?.si) / f).toBeCloseTo(1, 12);
    expect(relation?.grade).not.toBe('outside');
    expect(relation?.formula.every(({ substitutionLatex }) => substitutionLatex !== undefined)).toBe(true);
    expect(relation?.interval).toBeDefined();
  });

  it('binds its symbols locally: Re = Re takes the sheet’s Re', () => {
    const { cells } = sheet([lines('c', 'Re = 50000'), tube('Re = Re\nPr = 5')]);
    expect(cells.tube?.diagnostics).toEqual([]);
    expect(cells.tube?.relation?.inputs[0]?.value?.si).toBe(50000);
    expect(cells.tube?.defines).toEqual(['tube']);
  });

  it('carries lines of its own beneath', () => {
    const { cells } = sheet([tube('Re = 50000\nPr = 5\nh = tube.Nu*0.6 W/(m K)/(20 mm)\nrequire h > 1 kW/(m^2 K)')]);
    expect(cells.tube?.lines.map(({ name, satisfied }) => name ?? satisfied)).toEqual(['h', true]);
  });

  it('marks all that follows from it outside its range, transitively, until it is kept for a reason', () => {
    const cells = (keepReason?: string) => [
      tube('Re = 500\nPr = 5', keepReason === undefined ? {} : { keepReason }),
      lines('a', 'h = tube.Nu*0.6 W/(m K)/(20 mm)'),
      lines('b', 'Q = h*1 m^2*10 K\nother = 2'),
      { id: 't', kind: 'text' as const, source: 'It is {{Q}}.', settings: {} },
    ];
    const marked = sheet(cells()).cells;
    expect(marked.tube?.relation?.grade).toBe('outside');
    expect([marked.tube, marked.a, marked.b, marked.t].map((cell) => cell?.outsideRange)).toEqual(
      Array.from({ length: 4 }, () => ['tube']),
    );
    expect(marked.b?.lines.map(({ outsideRange }) => outsideRange)).toEqual([['tube'], []]);
    const kept = sheet(cells('short tube, entry effect is small')).cells;
    expect(kept.tube?.relation?.grade).toBe('outside');
    expect(kept.b?.outsideRange).toEqual([]);
  });

  it.each<[source: string, codes: string[]]>([
    ['Re = 50000', ['RELATION_INPUT']],
    ['Re = 50000\nPr = 5 m', ['UNITS_DISAGREE']],
    ['Re = 50000\nPr = 1 < 2', ['UNITS_DISAGREE']],
    ['Re = Rey\nPr = 5', ['UNKNOWN_NAME']],
    ['Re = 50000\nRe = 60000\nPr = 5', ['DEFINED_TWICE']],
  ])('says what is wrong with %s', (source, codes) => {
    expect(codesOf(sheet([tube(source)]).cells.tube)).toEqual(codes);
  });

  it('without a result is checked by its promise, and what uses it waits', () => {
    const { cells } = sheet([tube('Re = 50000'), lines('c', 'x = tube.Nu + 2 m\ny = tube.Nus\nz = tube.Nu')]);
    expect(cells.c?.diagnostics.map(({ code }) => code)).toEqual(['UNITS_DISAGREE', 'UNKNOWN_NAME']);
    expect(cells.c?.lines[2]?.waitsFor).toEqual(['tube.Nu']);
  });
});

describe('a text cell', () => {
  const text = (source: string): CellInput => ({ id: 't', kind: 'text', source, settings: {} });

  it('shows values by name', () => {
    const { cells } = sheet([
      lines('c', 'Q = 2 kW'),
      fluid('T = 300 K\np = 1 bar'),
      text('{{Q}}, {{ w.ρ }} and {{pi}}'),
    ]);
    expect(Object.keys(cells.t?.inline ?? {})).toEqual(['Q', 'w.rho', 'pi']);
    expect(cells.t?.inline.Q?.text).toBe('2');
    expect(cells.t?.diagnostics).toEqual([]);
  });

  it('says which name is unknown, at its place', () => {
    const source = 'Heat flow is {{Qs}}.';
    const [problem] = sheet([lines('c', 'Q = 2 kW'), text(source)]).cells.t?.diagnostics ?? [];
    expect(problem).toMatchObject({ code: 'UNKNOWN_NAME', severity: 'warning', mend: { insert: 'Q' } });
    expect(pointedAt(source, problem)).toBe('Qs');
  });
});

describe('cells together', () => {
  it('share names, and say where a second definition stands', () => {
    const { cells } = sheet([
      { id: 's', kind: 'section', source: 'Flow', settings: {} },
      lines('a', 'Q = 2 kW'),
      { id: 's2', kind: 'section', source: 'Heat', settings: {} },
      lines('b', 'Q = 3 kW'),
      lines('c', 'x = 2*Q'),
    ]);
    expect(cells.b?.diagnostics[0]?.message).toBe('Q is defined already in 1.1; every name is defined once.');
    expect(cells.a?.diagnostics[0]?.message).toBe('Q is defined again in 2.1, which is not used.');
    expect(cells.c?.lines[0]?.value?.si).toBe(4000);
  });

  it('keep the order of the sheet among their names', () => {
    const { names } = sheet([lines('b', 'y = 2\nx = 1'), lines('a', 'z = 3')]);
    expect(names.map(({ name }) => name)).toEqual(['y', 'x', 'z']);
  });

  it('stand in a circle through a fluid', () => {
    const { cells } = sheet([fluid('T = T_s\np = 1 bar'), lines('c', 'T_s = 300 K*w.rho/(1 kg/m^3)')]);
    expect(codesOf(cells.w)).toEqual(['CIRCLE']);
    expect(codesOf(cells.c)).toEqual(['CIRCLE']);
  });
});
