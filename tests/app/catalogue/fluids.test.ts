import { describe, expect, it } from 'vitest';
import { listSubstances } from '#engine';
import { fluidState } from 'src/composables/fluidState';
import { findSubstances, useFluidStore } from 'src/composables/useFluidStore';

const figure = (text: string | undefined) => Number(text?.replace(/[\s\u00a0]/g, '') ?? Number.NaN);

describe('a state of a fluid', () => {
  it('is that of IAPWS R7-97(2012), table 5: T = 300 K, p = 3 MPa', () => {
    const { row, problems } = fluidState('water', { T: '300 K', p: '3 MPa' });
    expect(problems).toEqual([]);
    expect(row?.phase).toBe('liquid');
    const value = (property: string) => row?.values.find((one) => one.property === property);
    // h = 115.331273 kJ/kg, s = 0.392294792 kJ/(kg K) = 392.295 J/(kg K); shown to six figures.
    expect(value('h')?.unit).toBe('kJ/kg');
    expect(figure(value('h')?.text)).toBeCloseTo(115.331, 3);
    expect(value('s')?.unit).toBe('J/(kg·K)');
    expect(figure(value('s')?.text)).toBeCloseTo(392.295, 3);
    expect(value('h')?.quantity).toBe('specific enthalpy');
  });

  it('says in words what is wrong with the inputs', () => {
    expect(fluidState('water', { T: '300 bar', p: '3 MPa' })).toMatchObject({ problems: [expect.any(String)] });
    expect(fluidState('water', { T: '', p: '3 MPa' }).problems.length).toBeGreaterThan(0);
    expect(fluidState('water', { T: '', p: '3 MPa' }).row).toBeUndefined();
  });
});

describe('the store of fluids', () => {
  it('is found through by name, formula and other words', () => {
    const names = (sought: string) =>
      findSubstances(sought).flatMap(({ substances }) => substances.map(({ id }) => id));
    expect(names('steam')).toEqual(['water']);
    expect(names('h2o')).toContain('water');
    expect(names('no-such-substance')).toEqual([]);
  });

  it('shows a state of every substance as soon as it is chosen', () => {
    const failed: string[] = [];
    for (const { id } of listSubstances()) {
      const { outcome } = useFluidStore(() => id);
      if (outcome.value.row === undefined) failed.push(`${id}: ${outcome.value.problems.join('; ')}`);
    }
    expect(failed).toEqual([]);
  });
});
