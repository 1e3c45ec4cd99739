/** Nodes in an order in which each stands behind what it depends on, and the circles among them. */
export interface DependencyOrder {
  order: string[];
  /** Each circle as its members, in the order in which they lead to each other. */
  cycles: string[][];
}

/**
 * Orders nodes by dependence; stable, so that equal sheets give equal orders. Members of a circle,
 * and nothing else, are left out of `order`.
 * Tarjan, R. (1972): Depth-first search and linear graph algorithms, SIAM J. Comput. 1, 146.
 */
export function orderByDependence(
  nodes: readonly string[],
  dependenciesOf: (node: string) => readonly string[],
): DependencyOrder {
  const index = new Map<string, number>();
  const low = new Map<string, number>();
  const stack: string[] = [];
  const onStack = new Set<string>();
  const order: string[] = [];
  const cycles: string[][] = [];

  const open = (node: string) => {
    index.set(node, index.size);
    low.set(node, index.size - 1);
    stack.push(node);
    onStack.add(node);
    return { node, next: 0, dependencies: dependenciesOf(node) };
  };
  const close = (node: string) => {
    if (low.get(node) !== index.get(node)) return;
    const members: string[] = [];
    for (let member = ''; member !== node;) {
      member = stack.pop() ?? node;
      onStack.delete(member);
      members.push(member);
    }
    if (members.length > 1 || dependenciesOf(node).includes(node)) cycles.push(members.reverse());
    else order.push(node);
  };
  // Without recursion: a sheet of some thousand lines in a row would overflow the stack.
  for (const root of nodes) {
    if (index.has(root)) continue;
    const path = [open(root)];
    for (let frame = path.at(-1); frame !== undefined; frame = path.at(-1)) {
      const dependency = frame.dependencies[frame.next];
      if (dependency === undefined) {
        close(frame.node);
        path.pop();
        const parent = path.at(-1);
        if (parent) low.set(parent.node, Math.min(low.get(parent.node) ?? 0, low.get(frame.node) ?? 0));
        continue;
      }
      frame.next += 1;
      if (!index.has(dependency)) path.push(open(dependency));
      else if (onStack.has(dependency))
        low.set(frame.node, Math.min(low.get(frame.node) ?? 0, index.get(dependency) ?? 0));
    }
  }
  return { order, cycles };
}
