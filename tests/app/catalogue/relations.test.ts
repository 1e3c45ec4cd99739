import { describe, expect, it } from 'vitest';
import { nextTick, shallowRef } from 'vue';
import { findRelation, listFamilies } from '#engine';
import { findRelations } from 'src/composables/relationCatalogue';
import { fourFigures, plainNumber, useRelationTrial } from 'src/composables/useRelationTrial';

describe('numbers as people write them', () => {
  it.each([
    ['39 160', 39160],
    ['0,7', 0.7],
    ['1e5', 100000],
    ['−3.5', -3.5],
    ['.5', 0.5],
    ['', undefined],
    ['1.2.3', undefined],
    ['5 mm', undefined],
    ['1e999', undefined],
  ])('%j → %s', (text, expected) => expect(plainNumber(text)).toBe(expected));

  it.each([
    [39160, '39\u00a0160'],
    [147.8349, '147.8'],
    [0.023, '0.023'],
    [1.63e7, '1.630e+7'],
    [0, '0'],
  ])('%s is shown as %s', (value, expected) => expect(fourFigures(value)).toBe(expected));
});

describe('finding a relation', () => {
  it('keeps families in order and drops the empty ones', () => {
    const found = findRelations(listFamilies(), 'dittus');
    expect(found.length).toBeGreaterThan(0);
    expect(found.every(({ relations }) => relations.length > 0)).toBe(true);
    expect(findRelations(listFamilies(), '').length).toBe(listFamilies().length);
    expect(findRelations(listFamilies(), 'no-such-word-anywhere')).toEqual([]);
  });
});

describe('trying a relation with numbers', () => {
  const relation = shallowRef(findRelation('dittus-boelter-heating')?.relation);

  it('computes at once, and says where the numbers lie', async () => {
    const trial = useRelationTrial(() => relation.value);
    expect(trial.result.value).toBe('');
    trial.written.Re = '10 000';
    trial.written.Pr = '1';
    await nextTick();
    // 0.023 Re^0.8 Pr^0.4 by hand: 0.023 × 10^3.2 × 1 = 0.023 × 1584.893 = 36.4525
    expect(trial.result.value).toBe('36.45');
    trial.written.Re = '9 000';
    await nextTick();
    expect(trial.validity.value.find(({ condition }) => condition.startsWith('Re'))?.grade).toBe('outside');
  });

  it('names what is not a number, and takes nothing for it', async () => {
    const trial = useRelationTrial(() => relation.value);
    trial.written.Re = 'ten';
    trial.written.Pr = '1';
    await nextTick();
    expect(trial.unreadable.value).toEqual(['Re']);
    expect(trial.result.value).toBe('');
  });
});
