import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import type { CalculationChange } from '#engine';
import { localOrigin, measureDocument, openDocument, type CalculationDocument } from '#document';

function empty(): CalculationDocument {
  let made = 0;
  return openDocument(new Y.Doc(), { newId: () => `c${(made += 1)}` });
}
const ids = (document: CalculationDocument) => document.cells().map((cell) => cell.id);
const rawCell = (parts: Record<string, unknown>) => new Y.Map(Object.entries(parts));

describe('cells of a calculation', () => {
  it('stand where they are put', () => {
    const document = empty();
    document.insertCell({ kind: 'section', after: null, source: 'Givens' });
    document.insertCell({ kind: 'expressions', after: 'c1' });
    document.insertCell({ kind: 'text', after: 'c1' });
    document.insertCell({ kind: 'text', after: null });
    document.insertCell({ kind: 'text', after: 'gone meanwhile' });
    expect(ids(document)).toEqual(['c4', 'c1', 'c3', 'c2', 'c5']);
  });

  it('begin with the template of their kind, or with what is given', () => {
    const document = empty();
    document.insertCell({ kind: 'fluid', after: null });
    document.insertCell({ kind: 'fluid', after: 'c1', source: '', settings: { name: 'w', tbv: '', mode: undefined } });
    expect(document.cells().map(({ source, settings }) => ({ source, settings }))).toEqual([
      { source: 'T = \np = ', settings: {} },
      { source: '', settings: { name: 'w' } },
    ]);
  });

  it('move up, down, to the top and to the end', () => {
    const document = empty();
    for (const after of [null, 'c1', 'c2', 'c3']) document.insertCell({ kind: 'text', after });
    document.moveCell('c1', 'c3');
    expect(ids(document)).toEqual(['c2', 'c3', 'c1', 'c4']);
    document.moveCell('c4', null);
    expect(ids(document)).toEqual(['c4', 'c2', 'c3', 'c1']);
    document.moveCell('c4', 'c1');
    expect(ids(document)).toEqual(['c2', 'c3', 'c1', 'c4']);
  });

  it('write nothing when a cell is moved to where it stands', () => {
    const document = empty();
    for (const after of [null, 'c1']) document.insertCell({ kind: 'text', after });
    const updates: Uint8Array[] = [];
    document.doc.on('update', (update: Uint8Array) => updates.push(update));
    document.moveCell('c2', 'c1');
    document.moveCell('c1', null);
    document.moveCell('c1', 'c1');
    document.moveCell('not there', null);
    document.removeCell('not there');
    document.setCellSetting('c1', 'tbv', undefined);
    expect(updates).toEqual([]);
  });

  it('are duplicated with everything they hold', () => {
    const document = empty();
    document.insertCell({ kind: 'fluid', after: null, source: 'T = 20 degC', settings: { name: 'w', mode: 'film' } });
    document.insertCell({ kind: 'text', after: 'c1' });
    expect(document.duplicateCell('c1')).toBe('c3');
    expect(ids(document)).toEqual(['c1', 'c3', 'c2']);
    document.source('c3')?.insert(0, '# copy\n');
    const [first, copy] = document.cells();
    expect(copy).toMatchObject({ kind: 'fluid', source: '# copy\nT = 20 degC', settings: first?.settings });
    expect(first?.source).toBe('T = 20 degC');
    expect(() => document.duplicateCell('not there')).toThrow('not there');
  });

  it('are never overwritten by an id that is taken', () => {
    const document = openDocument(new Y.Doc(), { newId: () => 'same' });
    document.insertCell({ kind: 'text', after: null, source: 'first' });
    expect(() => document.insertCell({ kind: 'text', after: null, source: 'second' })).toThrow('same');
    expect(document.cells().map((cell) => cell.source)).toEqual(['first']);
  });

  it('that came to one spot at the same time can be parted afterwards', () => {
    const doc = new Y.Doc();
    for (const id of ['a', 'b', 'd'])
      doc
        .getMap('cells')
        .set(id, rawCell({ kind: 'text', place: 'a1', source: new Y.Text(id), settings: new Y.Map() }));
    let made = 0;
    const document = openDocument(doc, { newId: () => `n${(made += 1)}` });
    document.insertCell({ kind: 'text', after: 'a' });
    expect(ids(document)).toEqual(['a', 'n1', 'b', 'd']);
    document.moveCell('d', 'a');
    expect(ids(document)).toEqual(['a', 'd', 'n1', 'b']);
    document.moveCell('b', null);
    expect(ids(document)).toEqual(['b', 'a', 'd', 'n1']);
  });

  it('keep their settings apart: one bad value takes no other with it', () => {
    const document = empty();
    document.insertCell({ kind: 'fluid', after: null, source: '' });
    document.setCellSetting('c1', 'name', 'w');
    document.setCellSetting('c1', 'mode', 'wall');
    document.setCellSetting('c1', 'tbv', '');
    document.setCellSetting('c1', 'substance', undefined);
    expect(document.cells()[0]?.settings).toEqual({ name: 'w', mode: 'wall' });
    const cell = document.doc.getMap<Y.Map<Y.Map<unknown>>>('cells').get('c1');
    cell?.get('settings')?.set('mode', 'sideways');
    cell?.get('settings')?.set('constructor', 'x');
    expect(document.cells()[0]?.settings).toEqual({ name: 'w' });
    document.doc.getMap('settings').set('significantDigits', 'many');
    document.setSettings({ unitSystem: 'US' });
    expect(document.settings()).toEqual({ unitSystem: 'US', significantDigits: 4, ambientPressure: 101_325 });
  });
});

describe('what others wrote that is no cell', () => {
  const good = { kind: 'text', place: 'a0', source: new Y.Text('good'), settings: new Y.Map() };
  const wrong: Record<string, unknown> = {
    word: 'text',
    number: 4,
    nothing: null,
    list: Y.Array.from([1, 2]),
    plain: { kind: 'text', place: 'a0', source: 'x' },
    noKind: rawCell({ place: 'a0', source: new Y.Text('x') }),
    otherKind: rawCell({ kind: 'solve', place: 'a0', source: new Y.Text('x') }),
    inherited: rawCell({ kind: 'toString', place: 'a0', source: new Y.Text('x') }),
    wordAsSource: rawCell({ kind: 'text', place: 'a0', source: 'x' }),
    mapAsSource: rawCell({ kind: 'text', place: 'a0', source: new Y.Map() }),
    'an id with spaces': rawCell({ kind: 'text', place: 'a0', source: new Y.Text('x') }),
    __proto__x: rawCell({ kind: 'text', place: 'a0', source: new Y.Text('x') }),
  };

  it('is left out and named', () => {
    const doc = new Y.Doc();
    const map = doc.getMap('cells');
    map.set('good', rawCell(good));
    for (const [id, value] of Object.entries(wrong)) map.set(id, value);
    const document = openDocument(doc, { newId: () => 'new' });
    expect(ids(document)).toEqual(['good']);
    expect(document.unreadable().sort()).toEqual(Object.keys(wrong).sort());
  });

  it.each([
    ['a number', 4],
    ['null', null],
    ['an empty word', ''],
    ['too short', 'a'],
    ['of other signs', '!!'],
    ['followed by a blank', 'a0 '],
    ['the smallest key', `A${'0'.repeat(26)}`],
    ['not in its shortest form', 'a00'],
    ['with an accent', 'zé'],
    ['endless', 'x'.repeat(9000)],
    ['a list', ['a0']],
  ])('a place that is %s is none: the cell stands on top, and others can be put and moved around it', (_, place) => {
    const doc = new Y.Doc();
    const map = doc.getMap('cells');
    map.set('odd', rawCell({ kind: 'text', place, source: new Y.Text(''), settings: new Y.Map() }));
    map.set('last', rawCell({ kind: 'text', place: 'a5', source: new Y.Text(''), settings: new Y.Map() }));
    let made = 0;
    const document = openDocument(doc, { newId: () => `n${(made += 1)}` });
    expect(ids(document)).toEqual(['odd', 'last']);
    document.insertCell({ kind: 'text', after: 'odd' });
    document.insertCell({ kind: 'text', after: null });
    expect(ids(document)).toEqual(['n2', 'odd', 'n1', 'last']);
    document.moveCell('odd', 'last');
    expect(ids(document)).toEqual(['n2', 'n1', 'last', 'odd']);
  });

  it('becomes a cell when it is mended', () => {
    const doc = new Y.Doc();
    const document = openDocument(doc, { newId: () => 'new' });
    doc.getMap('cells').set('late', rawCell({ place: 'a0', source: new Y.Text('x'), settings: 7 }));
    const changes: CalculationChange[] = [];
    document.observe((change) => changes.push(change));
    doc.getMap<Y.Map<unknown>>('cells').get('late')?.set('kind', 'text');
    expect(changes).toEqual([{ put: [{ id: 'late', kind: 'text', source: 'x', settings: {} }], order: ['late'] }]);
  });
});

describe('what changed', () => {
  function watched() {
    const document = empty();
    for (const after of [null, 'c1', 'c2']) document.insertCell({ kind: 'text', after, source: 'text' });
    const changes: CalculationChange[] = [];
    const end = document.observe((change) => changes.push(change));
    return { document, changes, end };
  }
  const cell = (id: string, source: string) => ({ id, kind: 'text', source, settings: {} });

  it('of a text is the one cell', () => {
    const { document, changes } = watched();
    document.source('c2')?.insert(4, '!');
    expect(changes).toEqual([{ put: [cell('c2', 'text!')] }]);
  });

  it('of a place is the order', () => {
    const { document, changes } = watched();
    document.moveCell('c3', null);
    expect(changes).toEqual([{ order: ['c3', 'c1', 'c2'] }]);
  });

  it('of a new and of a removed cell are these, and the order where it is needed', () => {
    const { document, changes } = watched();
    document.insertCell({ kind: 'text', after: 'c1', source: 'new' });
    document.removeCell('c1');
    expect(changes).toEqual([{ put: [cell('c4', 'new')], order: ['c1', 'c4', 'c2', 'c3'] }, { remove: ['c1'] }]);
  });

  it('comes once for a whole transaction, cells and settings together', () => {
    const { document, changes } = watched();
    document.transact(() => {
      document.source('c1')?.insert(0, 'a ');
      document.source('c1')?.insert(0, 'b ');
      document.setSettings({ unitSystem: 'US' });
      document.removeCell('c2');
      const id = document.insertCell({ kind: 'text', after: 'c1', source: '' });
      document.moveCell(id, 'c3');
    });
    expect(changes).toEqual([
      {
        settings: { unitSystem: 'US', significantDigits: 4, ambientPressure: 101_325 },
        put: [cell('c4', ''), cell('c1', 'b a text')],
        remove: ['c2'],
        order: ['c1', 'c3', 'c4'],
      },
    ]);
  });

  it('is nothing when all is as before at the end of it', () => {
    const { document, changes } = watched();
    document.transact(() => {
      document.source('c1')?.insert(0, 'x');
      document.source('c1')?.delete(0, 1);
      document.insertCell({ kind: 'text', after: null });
      document.removeCell('c4');
      document.doc.getMap('cells').set('no cell', 3);
    });
    expect(changes).toEqual([]);
  });

  it('is told until the end of observing, also of what others wrote', () => {
    const { document, changes, end } = watched();
    const other = new Y.Doc();
    Y.applyUpdate(other, Y.encodeStateAsUpdate(document.doc));
    openDocument(other, { newId: () => 'from-other' }).insertCell({ kind: 'text', after: 'c3', source: 'x' });
    Y.applyUpdate(document.doc, Y.encodeStateAsUpdate(other));
    expect(changes).toEqual([{ put: [cell('from-other', 'x')], order: ['c1', 'c2', 'c3', 'from-other'] }]);
    end();
    document.removeCell('c1');
    expect(changes).toHaveLength(1);
  });

  it('can be read in full within a transaction', () => {
    const { document } = watched();
    document.transact(() => {
      document.source('c1')?.insert(0, 'now ');
      expect(document.cells()[0]?.source).toBe('now text');
    });
  });
});

describe('undo', () => {
  it('takes back one’s own acts across cells, and leaves what others wrote since', () => {
    const document = empty();
    const undo = new Y.UndoManager([document.doc.getMap('cells'), document.doc.getMap('settings')], {
      trackedOrigins: new Set([localOrigin]),
      captureTimeout: 0,
    });
    document.insertCell({ kind: 'text', after: null, source: 'one' });
    document.insertCell({ kind: 'text', after: 'c1', source: 'two' });
    document.moveCell('c2', null);
    document.removeCell('c1');
    document.doc.transact(() => document.source('c2')?.insert(3, ' by another'), 'another');
    undo.undo();
    expect(ids(document)).toEqual(['c2', 'c1']);
    undo.undo();
    expect(document.cells().map((cell) => cell.source)).toEqual(['one', 'two by another']);
    undo.redo();
    expect(document.cells().map((cell) => cell.source)).toEqual(['two by another', 'one']);
  });
});

describe('measure', () => {
  it('counts cells and the longest source, and what exceeds the limits', () => {
    const document = empty();
    expect(measureDocument(document.doc)).toEqual({ cells: 0, longestSource: 0, excess: 0 });
    document.insertCell({ kind: 'text', after: null, source: 'x'.repeat(100_003) });
    document.insertCell({ kind: 'text', after: null, source: 'x' });
    document.doc.getMap('cells').set('odd', 1);
    expect(measureDocument(document.doc)).toEqual({ cells: 3, longestSource: 100_003, excess: 3 });
  });
});
