import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as Y from 'yjs';
import type { CellInput } from '#engine';
import { cellKinds, openDocument, type CalculationDocument, type DocumentCell } from '#document';

/** A person's copy of the sheet, and what an engine would know of it from changes alone. */
class Replica {
  readonly document: CalculationDocument;
  readonly mirror = new Map<string, CellInput>();
  order: string[] = [];
  private made = 0;

  constructor(name: string) {
    const doc = new Y.Doc();
    this.document = openDocument(doc, { newId: () => `${name}${(this.made += 1)}` });
    this.document.observe((change) => {
      for (const id of change.remove ?? []) {
        this.mirror.delete(id);
        this.order = this.order.filter((other) => other !== id);
      }
      for (const cell of change.put ?? []) this.mirror.set(cell.id, cell);
      if (change.order !== undefined) this.order = [...change.order];
    });
  }

  take(other: Replica): void {
    const missing = Y.encodeStateAsUpdate(other.document.doc, Y.encodeStateVector(this.document.doc));
    Y.applyUpdate(this.document.doc, missing, 'another');
  }
}

type Act = (replica: Replica) => void;
const pick = (document: CalculationDocument, at: number): DocumentCell | undefined => {
  const cells = document.cells();
  return cells[at % Math.max(1, cells.length)];
};
const place = fc.nat(30);

const act: fc.Arbitrary<Act> = fc.oneof(
  fc.tuple(fc.constantFrom(...cellKinds), place, fc.string()).map(([kind, at, source]): Act => ({ document }) => {
    document.insertCell({ kind, after: at === 0 ? null : (pick(document, at)?.id ?? null), source });
  }),
  fc.tuple(place, place).map(([at, to]): Act => ({ document }) => {
    const cell = pick(document, at);
    if (cell !== undefined) document.moveCell(cell.id, to === 0 ? null : (pick(document, to)?.id ?? null));
  }),
  place.map((at): Act => ({ document }) => {
    const cell = pick(document, at);
    if (cell !== undefined) document.removeCell(cell.id);
  }),
  place.map((at): Act => ({ document }) => {
    const cell = pick(document, at);
    if (cell !== undefined) document.duplicateCell(cell.id);
  }),
  fc.tuple(place, place, fc.string({ minLength: 1 })).map(([at, where, text]): Act => ({ document }) => {
    const source = document.source(pick(document, at)?.id ?? '');
    source?.insert(where % (source.length + 1), text);
  }),
  fc.tuple(place, place, place).map(([at, where, length]): Act => ({ document }) => {
    const source = document.source(pick(document, at)?.id ?? '');
    if (source === undefined || source.length === 0) return;
    const from = where % source.length;
    source.delete(from, Math.min(length, source.length - from));
  }),
  fc.tuple(place, fc.string({ maxLength: 5 })).map(([at, name]): Act => ({ document }) => {
    const cell = pick(document, at);
    if (cell !== undefined) document.setCellSetting(cell.id, 'name', name);
  }),
);
const step = fc.oneof(
  { weight: 4, arbitrary: fc.tuple(fc.nat(2), act).map(([who, run]) => ({ who, run })) },
  { weight: 1, arbitrary: fc.tuple(fc.nat(2), fc.nat(2)).map(([who, from]) => ({ who, from })) },
);

/** What a fresh reader sees in the document. */
const readAnew = ({ document }: Replica) => openDocument(document.doc, { newId: () => 'none' }).cells();

describe('replicas of a sheet', () => {
  it('hold the same cells in the same order once all have everything', () => {
    fc.assert(
      fc.property(fc.array(step, { maxLength: 60 }), (steps) => {
        const replicas = ['a', 'b', 'c'].map((name) => new Replica(name));
        for (const one of steps) {
          const replica = replicas[one.who];
          if (replica === undefined) continue;
          if ('run' in one) one.run(replica);
          else {
            const other = replicas[one.from];
            if (other !== undefined) replica.take(other);
          }
          // What is kept between changes is what a fresh reader sees, and what an engine was told.
          expect(replica.document.cells()).toEqual(readAnew(replica));
          expect(replica.order).toEqual(replica.document.cells().map((cell) => cell.id));
        }
        for (const replica of replicas) for (const other of replicas) replica.take(other);
        for (const replica of replicas) for (const other of replicas) replica.take(other);
        const [first, ...others] = replicas;
        const cells = first?.document.cells();
        for (const other of others) expect(other.document.cells()).toEqual(cells);
        for (const replica of replicas) {
          expect(replica.document.unreadable()).toEqual([]);
          expect(replica.order.map((id) => replica.mirror.get(id))).toEqual(
            cells?.map(({ id, kind, source, settings }) => ({ id, kind, source, settings })),
          );
          expect(replica.mirror.size).toBe(cells?.length);
        }
      }),
      { numRuns: 150 },
    );
  });

  it('have one cell where two people moved the same one, and none lost', () => {
    fc.assert(
      fc.property(fc.nat(5), fc.nat(5), fc.nat(5), (which, left, right) => {
        const [one, two] = [new Replica('a'), new Replica('b')];
        for (let count = 0; count < 6; count += 1) one.document.insertCell({ kind: 'text', after: null });
        two.take(one);
        const ids = one.document.cells().map((cell) => cell.id);
        const after = (at: number) => (at === 0 ? null : (ids[at] ?? null));
        one.document.moveCell(ids[which] ?? '', after(left));
        two.document.moveCell(ids[which] ?? '', after(right));
        one.take(two);
        two.take(one);
        expect(one.document.cells()).toEqual(two.document.cells());
        expect(
          one.document
            .cells()
            .map((cell) => cell.id)
            .sort(),
        ).toEqual([...ids].sort());
      }),
    );
  });

  it('can put a cell exactly below any other, whatever keys came together', () => {
    fc.assert(
      fc.property(
        fc.array(fc.constantFrom('a0', 'a1', 'a1V', '', 'Zz', '??'), { minLength: 1, maxLength: 8 }),
        fc.nat(7),
        fc.nat(7),
        (places, which, below) => {
          const doc = new Y.Doc();
          places.forEach((key, at) =>
            doc
              .getMap('cells')
              .set(`c${at}`, new Y.Map(Object.entries({ kind: 'text', place: key, source: new Y.Text('') }))),
          );
          const document = openDocument(doc, { newId: () => 'new' });
          const before = document.cells().map((cell) => cell.id);
          const moved = before[which % before.length] ?? '';
          const anchor = before[below % before.length] ?? '';
          document.moveCell(moved, anchor);
          const rest = before.filter((id) => id !== moved);
          if (moved !== anchor) rest.splice(rest.indexOf(anchor) + 1, 0, moved);
          expect(document.cells().map((cell) => cell.id)).toEqual(moved === anchor ? before : rest);
        },
      ),
      { numRuns: 300 },
    );
  });
});
