import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { circleThrough, orderByDependence } from '../../../src/engine/graph/order';

type Edges = Readonly<Record<string, readonly string[]>>;
const ordered = (edges: Edges) => orderByDependence(Object.keys(edges), (node) => edges[node] ?? []);
const way = (edges: Edges, start: string) => circleThrough(start, (node) => edges[node] ?? []);

describe('order by dependence', () => {
  it('puts what is needed first, and leaves the rest as it was', () => {
    expect(ordered({ c: ['a', 'b'], a: [], d: [], b: ['a'] }).order).toEqual(['a', 'b', 'c', 'd']);
  });

  it('finds circles with all their members, and orders what stands before and behind them', () => {
    const { order, circles } = ordered({
      before: [],
      a: ['c', 'before'],
      b: ['a'],
      c: ['b'],
      behind: ['c'],
      own: ['own'],
    });
    expect([...circles.keys()].sort()).toEqual(['a', 'b', 'c', 'own']);
    expect(new Set(circles.get('b'))).toEqual(new Set(['a', 'b', 'c']));
    expect(order.indexOf('before')).toBeLessThan(order.indexOf('a'));
    expect(order.indexOf('behind')).toBeGreaterThan(order.indexOf('c'));
  });

  it('takes a chain of 100 000 without running out of stack', () => {
    const size = 100_000;
    const nodes = Array.from({ length: size }, (_, index) => index);
    const { order } = orderByDependence(nodes, (node) => (node + 1 < size ? [node + 1] : []));
    expect(order[0]).toBe(size - 1);
    expect(order).toHaveLength(size);
  });

  const graphs = fc
    .array(fc.array(fc.nat(9), { maxLength: 4 }), { minLength: 1, maxLength: 10 })
    .map((lists) => lists.map((list) => [...new Set(list.filter((node) => node < lists.length))]));

  it('of any graph has every node once, each behind what it needs unless they stand in a circle', () => {
    fc.assert(
      fc.property(graphs, (lists) => {
        const { order, circles } = orderByDependence(lists.keys(), (node) => lists[node] ?? []);
        expect([...order].sort((a, b) => a - b)).toEqual([...lists.keys()]);
        for (const [node, list] of lists.entries())
          for (const needed of list)
            if (circles.get(node)?.includes(needed) !== true)
              expect(order.indexOf(needed)).toBeLessThan(order.indexOf(node));
      }),
    );
  });

  it('of any graph names exactly the nodes that lead back to themselves', () => {
    fc.assert(
      fc.property(graphs, (lists) => {
        const { circles } = orderByDependence(lists.keys(), (node) => lists[node] ?? []);
        for (const node of lists.keys())
          expect(circles.has(node)).toBe(circleThrough(node, (each) => lists[each] ?? []) !== undefined);
      }),
    );
  });
});

describe('the way round a circle', () => {
  it('is the shortest, from its member on', () => {
    const edges = { a: ['x', 'b'], b: ['a'], x: ['y'], y: ['a'] };
    expect(way(edges, 'a')).toEqual(['a', 'b']);
    expect(way(edges, 'x')).toEqual(['x', 'y', 'a']);
    expect(way({ a: ['a'] }, 'a')).toEqual(['a']);
    expect(way({ a: ['b'], b: [] }, 'a')).toBeUndefined();
  });
});
