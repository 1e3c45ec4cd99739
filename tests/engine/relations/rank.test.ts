import { describe, expect, it } from 'vitest';
import { listRelations, rankRelations } from '#engine';

const water = { Re: 1e4, Pr: 5, L: 2, D: 0.02, T_s: 350, T_b: 300 };

function ranked(values: Readonly<Record<string, number>>, scope: Parameters<typeof rankRelations>[0]) {
  return rankRelations(scope, new Map(Object.entries(values)));
}
const placeOf = (list: ReturnType<typeof ranked>, id: string) => list.findIndex(({ relation }) => relation.id === id);

describe('ranking', () => {
  const list = ranked(water, { geometry: 'tube', output: 'Nu' });

  it('sets only those against each other that answer the same question', () => {
    expect(list.every(({ family, relation }) => family.geometry === 'tube' && relation.output.symbol === 'Nu')).toBe(
      true,
    );
    const all = listRelations().filter(
      ({ family, relation }) => family.geometry === 'tube' && relation.output.symbol === 'Nu',
    );
    expect(list.length).toBe(all.length);
  });

  it('puts what fits before what is at the edge, that before what is outside', () => {
    const grades = list.filter(({ output }) => output !== undefined).map(({ grade }) => grade);
    const order = ['inside', 'edge', 'unchecked', 'outside'];
    expect(grades).toEqual([...grades].sort((a, b) => order.indexOf(a) - order.indexOf(b)));
    expect(grades).toContain('inside');
    expect(grades).toContain('outside');
  });

  it('puts the better stated accuracy first among equal fits', () => {
    const edge = list.filter(({ grade, output }) => grade === 'edge' && output !== undefined);
    const stated = edge.map(({ accuracy }) => accuracy ?? Infinity);
    expect(stated).toEqual([...stated].sort((a, b) => a - b));
  });

  it('puts what gives no result last, and says what it lacks', () => {
    const first = list.findIndex(({ output }) => output === undefined);
    expect(list.slice(first).every(({ output }) => output === undefined)).toBe(true);
    expect(list[placeOf(list, 'petukhov-kirillov-popov')]?.missing).toEqual(['f']);
  });

  it('tells heating from cooling', () => {
    const cooled = ranked({ ...water, T_s: 290 }, { geometry: 'tube', output: 'Nu' });
    expect(list[placeOf(list, 'dittus-boelter-cooling')]?.grade).toBe('outside');
    expect(cooled[placeOf(cooled, 'dittus-boelter-heating')]?.grade).toBe('outside');
    expect(cooled[placeOf(cooled, 'dittus-boelter-cooling')]?.grade).not.toBe('outside');
  });

  // 69.4, 69.9, 75.6 and 62.6 were measured with another evaluator (mathjs 15.2.0).
  it.each([
    ['dittus-boelter-heating', 69.4],
    ['gnielinski-1976-tube', 69.9],
    ['petukhov-1970-tube', 75.6],
    ['gnielinski-simple-high-pr', 62.6],
  ])('gives the result of %s', (id, expected) => {
    expect(list[placeOf(list, id)]?.output).toBeCloseTo(expected, 1);
  });

  it('takes the accuracy stated for the part of the range', () => {
    const at = (Re: number) => {
      const own = ranked({ ...water, Re }, { family: 'internal-turbulent' });
      return own[placeOf(own, 'gnielinski-1976-tube')]?.accuracy;
    };
    // Gnielinski 1976: ±10 % above Re 1e4, about ±20 % below.
    expect(at(5e4)).toBe(0.1);
    expect(at(5e3)).toBe(0.2);
  });

  it('counts an exact relation as the most accurate', () => {
    const own = ranked({ NTU: 1, Cr: 0.5 }, { family: 'exchanger-effectiveness' });
    expect(own[placeOf(own, 'eff-counterflow')]?.accuracy).toBe(0);
    expect(placeOf(own, 'eff-counterflow')).toBeLessThan(placeOf(own, 'eff-crossflow-unmixed'));
  });
});
