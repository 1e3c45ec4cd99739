import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import { canonicalJson, cellKinds, exchangeSchema, fillDocument, openDocument, toExchange } from '#document';

const newId = () => 'unused';
const base = { format: 'wallflux-calculation', version: 1 };
const cell = (id: string, more: object = {}) => ({ id, kind: 'text', source: '', settings: {}, ...more });
const problemOf = (given: unknown) => exchangeSchema.safeParse(given).error?.issues[0];

describe('exchange format', () => {
  it('fills what is left out', () => {
    expect(exchangeSchema.parse({ ...base, cells: [{ id: 'c1', kind: 'text' }] })).toEqual({
      ...base,
      title: '',
      settings: { unitSystem: 'SI', significantDigits: 4, ambientPressure: 101_325 },
      cells: [cell('c1')],
    });
  });

  it('comes back the same through a file and a document', () => {
    const text = fc.string({ unit: 'binary', maxLength: 200 });
    const settings = fc.record(
      {
        name: fc.string({ minLength: 1, maxLength: 20 }),
        substance: fc.constant('water'),
        mode: fc.constantFrom('state', 'film', 'wall', 'saturation'),
        tbv: fc.string({ minLength: 1 }),
      },
      { requiredKeys: [] },
    );
    const cells = fc.uniqueArray(
      fc.record({
        id: fc.stringMatching(/^[A-Za-z0-9][A-Za-z0-9_-]{0,20}$/),
        kind: fc.constantFrom(...cellKinds),
        source: text,
        settings,
      }),
      { selector: (one) => one.id, maxLength: 30 },
    );
    fc.assert(
      fc.property(cells, fc.constantFrom('SI', 'US'), fc.integer({ min: 2, max: 10 }), (given, unitSystem, digits) => {
        const calculation = {
          ...base,
          title: 'Cooler',
          settings: { unitSystem, significantDigits: digits, ambientPressure: 95_000 },
          cells: given,
        };
        const doc = new Y.Doc();
        fillDocument(doc, exchangeSchema.parse(JSON.parse(JSON.stringify(calculation))));
        const other = new Y.Doc();
        Y.applyUpdate(other, Y.encodeStateAsUpdate(doc));
        expect(toExchange(openDocument(other, { newId }), { title: 'Cooler' })).toEqual(calculation);
      }),
    );
  });

  it('writes a document of full size in a moment', () => {
    const cells = Array.from({ length: 5000 }, (_, at) =>
      cell(`c${at}`, { kind: 'expressions', source: `x_${at} = 1` }),
    );
    const calculation = exchangeSchema.parse({ ...base, cells });
    const doc = new Y.Doc();
    const began = performance.now();
    fillDocument(doc, calculation);
    const document = openDocument(doc, { newId });
    expect(document.cells().map(({ id }) => id)).toEqual(cells.map(({ id }) => id));
    expect(performance.now() - began).toBeLessThan(5000);
  });

  it('fills only an empty document', () => {
    const calculation = exchangeSchema.parse({ ...base, cells: [cell('c1')] });
    const doc = new Y.Doc();
    fillDocument(doc, calculation);
    expect(() => fillDocument(doc, calculation)).toThrow('empty document');
  });

  it.each([
    ['another format', { ...base, format: 'other', cells: [] }, ['format']],
    ['a newer version', { ...base, version: 2, cells: [] }, ['version']],
    ['no version', { format: base.format, cells: [] }, ['version']],
    ['an unknown kind', { ...base, cells: [cell('a', { kind: 'oracle' })] }, ['cells', 0, 'kind']],
    ['an id twice', { ...base, cells: [cell('a'), cell('a')] }, ['cells']],
    ['an id with a slash', { ...base, cells: [cell('a/b')] }, ['cells', 0, 'id']],
    ['an id that names a prototype', { ...base, cells: [cell('__proto__')] }, ['cells', 0, 'id']],
    ['an empty id', { ...base, cells: [cell('')] }, ['cells', 0, 'id']],
    [
      'a source that is too long',
      { ...base, cells: [cell('a', { source: 'x'.repeat(100_001) })] },
      ['cells', 0, 'source'],
    ],
    ['too many cells', { ...base, cells: Array.from({ length: 5001 }, (_, at) => cell(`c${at}`)) }, ['cells']],
    ['a bad setting', { ...base, cells: [cell('a', { settings: { mode: 'up' } })] }, ['cells', 0, 'settings', 'mode']],
    ['bad digits', { ...base, settings: { significantDigits: 1.5 }, cells: [] }, ['settings', 'significantDigits']],
    ['no object', 'text', []],
    ['nothing', null, []],
  ])('refuses %s, and says where', (_, given, path) => {
    expect(problemOf(given)?.path).toEqual(path);
  });

  it('says of a newer version what it is', () => {
    expect(problemOf({ ...base, version: 7, cells: [] })?.message).toContain('version');
  });
});

describe('canonical JSON', () => {
  it('does not depend on the order of keys', () => {
    expect(canonicalJson({ b: 1, a: [{ d: null, c: 'ö' }] })).toBe('{"a":[{"c":"ö","d":null}],"b":1}');
  });

  it('leaves out what is undefined, and has null where a list has a gap', () => {
    expect(canonicalJson({ a: undefined, b: [undefined, 1] })).toBe('{"b":[null,1]}');
  });

  it.each([
    [0.1 + 0.2, '0.3'],
    [-0, '0'],
    [1 / 3, '0.333333333333'],
    [123_456_789_012_345, '123456789012000'],
    [1e300, '1e+300'],
    [5e-324, '5e-324'],
    [Number.NaN, 'null'],
    [Number.POSITIVE_INFINITY, 'null'],
  ])('rounds %d to 12 significant digits', (value, text) => {
    expect(canonicalJson(value)).toBe(text);
  });

  it('says the same of values whose last bits differ, and is JSON', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const text = canonicalJson(value);
        expect(canonicalJson(JSON.parse(text))).toBe(text);
      }),
    );
  });
});
