import { describe, expect, it } from 'vitest';
import { NameGraph } from '../../../src/engine/graph/name-graph';

interface Node {
  id: string;
  place: number;
  defines?: string;
  uses: string[];
}
const node = (id: string, place: number, uses: string[] = [], defines = id): Node => ({ id, place, defines, uses });
function graphOf(...nodes: Node[]): NameGraph<Node> {
  const graph = new NameGraph<Node>(({ place }) => place);
  for (const each of nodes) graph.add(each);
  return graph;
}
const idsOf = (nodes: Iterable<Node>) => [...nodes].map(({ id }) => id);

describe('nodes by name', () => {
  const a = node('a', 1);
  const b = node('b', 2, ['a']);
  const c = node('c', 3, ['b', 'missing']);
  const other = node('other', 4, ['other_name']);

  it('find what they depend on, unknown names left out', () => {
    expect(idsOf(graphOf(a, b, c).dependenciesOf(c))).toEqual(['b']);
  });

  it('spread a change to all that rest on it, and to nothing else', () => {
    expect(idsOf(graphOf(a, b, c, other).affectedBy([a]))).toEqual(['a', 'b', 'c']);
    expect(idsOf(graphOf(a, b, c, other).affectedBy([c]))).toEqual(['c']);
  });

  it('give a name to the definition that stands first', () => {
    const late = node('late', 9, [], 'a');
    const early = node('early', 0, [], 'a');
    const graph = graphOf(late, a, early);
    expect(idsOf(graph.definersOf('a'))).toEqual(['early', 'a', 'late']);
    expect(graph.definerOf('a')).toBe(early);
    expect([...graph.namesDefinedSeveralTimes()]).toEqual(['a']);
    graph.remove(early);
    graph.remove(late);
    expect(graph.definerOf('a')).toBe(a);
    expect(graph.namesDefinedSeveralTimes().size).toBe(0);
  });

  it('do not spread a change of a definition that does not count', () => {
    const late = node('late', 9, [], 'a');
    expect(idsOf(graphOf(a, late, b).affectedBy([late]))).toEqual(['late']);
  });

  it('forget what is removed', () => {
    const graph = graphOf(a, b);
    graph.remove(b);
    expect([...graph.usersOf('a')]).toEqual([]);
    expect([...graph.names()]).toEqual(['a']);
  });
});
