/** Nodes in an order in which each stands behind what it depends on, and the circles among them. */
export interface DependencyOrder<N> {
  /** All nodes; members of a circle stand side by side. */
  order: N[];
  /** Of each member of a circle all that depend, in the end, on each other. */
  circles: Map<N, readonly N[]>;
}

interface Frame<N> {
  node: N;
  next: number;
  dependencies: readonly N[];
}

/**
 * Orders nodes by dependence; stable, so that equal input gives an equal order. Dependencies outside
 * `nodes` must not be named.
 * Tarjan, R. (1972): Depth-first search and linear graph algorithms, SIAM J. Comput. 1, 146.
 */
export function orderByDependence<N>(
  nodes: Iterable<N>,
  dependenciesOf: (node: N) => readonly N[],
): DependencyOrder<N> {
  const index = new Map<N, number>();
  const low = new Map<N, number>();
  const stack: N[] = [];
  const onStack = new Set<N>();
  const result: DependencyOrder<N> = { order: [], circles: new Map() };

  const open = (node: N): Frame<N> => {
    low.set(node, index.size);
    index.set(node, index.size);
    stack.push(node);
    onStack.add(node);
    return { node, next: 0, dependencies: dependenciesOf(node) };
  };
  const lower = (node: N, to: number) => low.set(node, Math.min(low.get(node) ?? 0, to));
  const close = ({ node, dependencies }: Frame<N>) => {
    if (low.get(node) !== index.get(node)) return;
    const group = stack.splice(stack.lastIndexOf(node));
    for (const member of group) onStack.delete(member);
    result.order.push(...group);
    if (group.length > 1 || dependencies.includes(node)) for (const member of group) result.circles.set(member, group);
  };
  // Without recursion: a sheet of some thousand lines in a row would overflow the stack.
  for (const root of nodes) {
    if (index.has(root)) continue;
    const path = [open(root)];
    for (let frame = path.at(-1); frame !== undefined; frame = path.at(-1)) {
      const dependency = frame.dependencies[frame.next];
      if (dependency === undefined) {
        close(frame);
        path.pop();
        const parent = path.at(-1);
        if (parent) lower(parent.node, low.get(frame.node) ?? 0);
        continue;
      }
      frame.next += 1;
      if (!index.has(dependency)) path.push(open(dependency));
      else if (onStack.has(dependency)) lower(frame.node, index.get(dependency) ?? 0);
    }
  }
  return result;
}

/**
 * The shortest way from a node through its dependencies back to itself, the node itself first;
 * undefined when there is none. Dependencies are followed in their order, so that equal circles
 * give equal ways wherever the search began.
 */
export function circleThrough<N>(start: N, dependenciesOf: (node: N) => readonly N[]): N[] | undefined {
  const before = new Map<N, N>();
  const waiting = [start];
  for (const node of waiting) {
    for (const dependency of dependenciesOf(node)) {
      if (dependency === start) return wayTo(node, start, before);
      if (before.has(dependency)) continue;
      before.set(dependency, node);
      waiting.push(dependency);
    }
  }
  return undefined;
}

function wayTo<N>(last: N, start: N, before: ReadonlyMap<N, N>): N[] {
  const way = [last];
  for (let node = last; node !== start;) {
    const previous = before.get(node);
    if (previous === undefined) break;
    way.push(previous);
    node = previous;
  }
  return way.reverse();
}
