import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import { exchangeSchema, fillDocument, openDocument } from '#document';
import { Allowance } from '../../src-server/collaboration/allowance';
import { again } from '../../src-server/collaboration/again';
import { isNews, Trial } from '../../src-server/collaboration/trial';

const textCell = (id: string, source = 'hello') => ({ id, kind: 'text', source, settings: { tbv: 'why' } });
function sheet(cells: readonly object[] = ['c1', 'c2', 'c3'].map((id) => textCell(id))): Y.Doc {
  const doc = new Y.Doc();
  fillDocument(doc, exchangeSchema.parse({ format: 'wallflux-calculation', version: 1, title: '', cells }));
  return doc;
}
/** A browser's copy, and the updates that it makes. */
function copyOf(doc: Y.Doc) {
  const copy = new Y.Doc();
  Y.applyUpdate(copy, Y.encodeStateAsUpdate(doc));
  const updates: Uint8Array[] = [];
  copy.on('update', (update: Uint8Array) => updates.push(update));
  let made = 0;
  return { doc: copy, document: openDocument(copy, { newId: () => `new${(made += 1)}` }), updates };
}
const last = (updates: readonly Uint8Array[]) => updates.at(-1) ?? new Uint8Array();

describe('trial of an update', () => {
  it('tells news from what is known, deletions included', () => {
    const doc = sheet();
    const trial = new Trial(doc);
    const writer = copyOf(doc);
    writer.document.source('c1')?.insert(0, 'a');
    expect(trial.take(last(writer.updates))).toBe('news');
    expect(trial.take(last(writer.updates))).toBe('known');
    writer.document.source('c1')?.delete(0, 3);
    writer.document.removeCell('c2');
    expect(writer.updates.slice(1).map((update) => trial.take(update))).toEqual(['news', 'news']);
    expect(trial.take(Y.encodeStateAsUpdate(writer.doc))).toBe('known');
    // The first answer of a browser that lacks nothing holds all deletions there ever were.
    expect(trial.take(Y.encodeStateAsUpdate(writer.doc, Y.encodeStateVector(writer.doc)))).toBe('known');
  });

  it('takes what comes before that on which it rests, once', () => {
    const doc = sheet();
    const trial = new Trial(doc);
    const writer = copyOf(doc);
    writer.document.source('c1')?.insert(0, 'first ');
    writer.document.source('c1')?.insert(0, 'second ');
    const [first, second] = writer.updates as [Uint8Array, Uint8Array];
    expect([second, second, first, second].map((update) => trial.take(update))).toEqual([
      'news',
      'known',
      'news',
      'known',
    ]);
  });

  it('knows nothing of what was taken back', () => {
    const doc = sheet();
    const trial = new Trial(doc);
    const writer = copyOf(doc);
    writer.document.source('c1')?.insert(0, 'a');
    trial.take(last(writer.updates));
    trial.forget();
    expect(trial.take(last(writer.updates))).toBe('news');
    expect(openDocument(doc, { newId: String }).cells()[0]?.source).toBe('hello');
  });

  it('refuses what makes a source too long, and lets it be made shorter', () => {
    const doc = sheet([textCell('c1', 'x'.repeat(99_990)), textCell('c2')]);
    const trial = new Trial(doc);
    const writer = copyOf(doc);
    writer.document.source('c1')?.insert(0, 'y'.repeat(10));
    expect(trial.take(last(writer.updates))).toBe('news');
    writer.document.source('c1')?.insert(0, 'z');
    expect(trial.take(last(writer.updates))).toBe('too large');
    writer.document.source('c1')?.delete(0, 5);
    // What was refused is part of this one: it lacks the sign in between, and waits for it.
    expect(trial.take(Y.encodeStateAsUpdate(writer.doc))).toBe('news');
  });

  it('refuses a cell too many', () => {
    const cells = Array.from({ length: 4999 }, (_, at) => ({ id: `c${at}`, kind: 'text', source: '', settings: {} }));
    const doc = sheet(cells);
    const trial = new Trial(doc);
    const writer = copyOf(doc);
    writer.document.insertCell({ kind: 'text', after: 'c4' });
    expect(trial.take(last(writer.updates))).toBe('news');
    writer.document.insertCell({ kind: 'text', after: 'c4' });
    expect(trial.take(last(writer.updates))).toBe('too large');
  });

  it('of a sheet that is too large already, refuses growth alone', () => {
    const doc = sheet([textCell('c1', 'x'.repeat(99_999))]);
    openDocument(doc, { newId: String }).source('c1')?.insert(0, 'y'.repeat(20));
    const writer = copyOf(doc);
    const trial = new Trial(doc);
    writer.document.setCellSetting('c1', 'tbv', 'still');
    expect(trial.take(last(writer.updates))).toBe('news');
    writer.document.source('c1')?.insert(0, 'z');
    expect(trial.take(last(writer.updates))).toBe('too large');
  });

  it('never lets through what cannot be applied to the document', () => {
    const doc = sheet();
    const writer = copyOf(doc);
    writer.document.source('c2')?.insert(2, 'abc');
    writer.document.source('c2')?.delete(1, 3);
    writer.document.insertCell({ kind: 'fluid', after: 'c1' });
    writer.document.removeCell('c3');
    const corpus = [...writer.updates, Y.encodeStateAsUpdate(writer.doc)];
    const spoil = fc.array(fc.tuple(fc.nat(100_000), fc.nat(255)), { minLength: 1, maxLength: 3 });
    let refused = 0;
    let undecodable = 0;
    fc.assert(
      fc.property(fc.nat(corpus.length - 1), spoil, (which, changes) => {
        const update = Uint8Array.from(corpus[which] ?? []);
        for (const [at, value] of changes) update[at % update.length] = value;
        const own = new Y.Doc();
        Y.applyUpdate(own, Y.encodeStateAsUpdate(doc));
        try {
          new Trial(own).take(update);
        } catch {
          refused += 1;
          try {
            Y.decodeUpdate(update);
          } catch {
            undecodable += 1;
          }
          return;
        }
        Y.applyUpdate(own, update);
        expect(() => openDocument(own, { newId: String }).cells()).not.toThrow();
        const loaded = new Y.Doc();
        Y.applyUpdate(loaded, Y.encodeStateAsUpdate(own));
      }),
      { numRuns: 5000, seed: 20_261_201 },
    );
    // Some can be read as an update and still not be applied: reading alone would have let them in.
    expect(refused).toBeGreaterThan(undecodable);
  });
});

describe('news for somebody who may not write', () => {
  it('is what the document does not hold, and nothing else', () => {
    const doc = sheet();
    const reader = copyOf(doc);
    expect(isNews(doc, Y.encodeStateAsUpdate(reader.doc))).toBe(false);
    reader.document.removeCell('c2');
    expect(isNews(doc, last(reader.updates))).toBe(true);
    Y.applyUpdate(doc, last(reader.updates));
    expect(isNews(doc, last(reader.updates))).toBe(false);
    reader.document.source('c1')?.insert(0, 'x');
    expect(isNews(doc, last(reader.updates))).toBe(true);
    expect(isNews(doc, Y.encodeStateAsUpdate(reader.doc))).toBe(true);
    Y.applyUpdate(doc, last(reader.updates));
    expect(isNews(doc, Y.encodeStateAsUpdate(reader.doc))).toBe(false);
  });
});

describe('allowance', () => {
  it('is used up, and comes back with time', () => {
    const allowance = new Allowance(10, 2, 0);
    expect(allowance.take(10, 0)).toBe(true);
    expect(allowance.take(1, 0)).toBe(false);
    expect(allowance.take(1, 1000)).toBe(true);
    expect(allowance.take(11, 1_000_000)).toBe(false);
  });

  it('does not grow when the clock is put back', () => {
    const allowance = new Allowance(10, 2, 1_000_000);
    expect(allowance.take(10, 1_000_000)).toBe(true);
    expect(allowance.take(1, 0)).toBe(false);
  });
});

describe('a transaction that meets another one', () => {
  const failing = (code: string, times: number) => {
    let left = times;
    return () => {
      left -= 1;
      return left >= 0 ? Promise.reject(Object.assign(new Error(code), { code })) : Promise.resolve('done');
    };
  };
  it('is tried again', async () => {
    expect(await again(failing('40P01', 2))).toBe('done');
  });
  it('fails when it goes on, or when the failure is another', async () => {
    await expect(again(failing('40001', 9))).rejects.toThrow('40001');
    await expect(again(failing('53100', 1))).rejects.toThrow('53100');
  });
});
