/** What a graph has to know of a node: the name it defines, and those that it uses. */
export interface Named {
  readonly defines?: string | undefined;
  readonly uses: readonly string[];
}

const none: ReadonlySet<never> = new Set<never>();

/** An index from names to sets of nodes. */
class NodesByName<N> {
  private readonly sets = new Map<string, Set<N>>();

  get(name: string): ReadonlySet<N> {
    return this.sets.get(name) ?? none;
  }

  add(name: string, node: N): void {
    const set = this.sets.get(name);
    if (set === undefined) this.sets.set(name, new Set([node]));
    else set.add(node);
  }

  delete(name: string, node: N): void {
    const set = this.sets.get(name);
    if (set?.delete(node) === true && set.size === 0) this.sets.delete(name);
  }

  names(): IterableIterator<string> {
    return this.sets.keys();
  }
}

/**
 * Nodes that depend on each other by name. A name that several nodes define belongs to the one that
 * stands first, by `placeOf`.
 */
export class NameGraph<N extends Named> {
  private readonly definers = new NodesByName<N>();
  private readonly users = new NodesByName<N>();
  private readonly several = new Set<string>();

  constructor(private readonly placeOf: (node: N) => number) {}

  add(node: N): void {
    for (const name of node.uses) this.users.add(name, node);
    if (node.defines === undefined) return;
    this.definers.add(node.defines, node);
    if (this.definers.get(node.defines).size > 1) this.several.add(node.defines);
  }

  remove(node: N): void {
    for (const name of node.uses) this.users.delete(name, node);
    if (node.defines === undefined) return;
    this.definers.delete(node.defines, node);
    if (this.definers.get(node.defines).size < 2) this.several.delete(node.defines);
  }

  /** All definitions of a name, the one that counts first. */
  definersOf(name: string): N[] {
    return [...this.definers.get(name)].sort((left, right) => this.placeOf(left) - this.placeOf(right));
  }

  /** The definition that counts. */
  definerOf(name: string): N | undefined {
    const set = this.definers.get(name);
    if (set.size > 1) return this.definersOf(name)[0];
    for (const only of set) return only;
    return undefined;
  }

  usersOf(name: string): ReadonlySet<N> {
    return this.users.get(name);
  }

  names(): IterableIterator<string> {
    return this.definers.names();
  }

  /** Names with more than one definition. */
  namesDefinedSeveralTimes(): ReadonlySet<string> {
    return this.several;
  }

  /** The definitions on which a node rests, each once. */
  dependenciesOf(node: N): N[] {
    const found: N[] = [];
    for (const name of node.uses) {
      const definer = this.definerOf(name);
      if (definer !== undefined && !found.includes(definer)) found.push(definer);
    }
    return found;
  }

  /** Some nodes and all that rest on them, directly or not. */
  affectedBy(seeds: Iterable<N>): Set<N> {
    const affected = new Set(seeds);
    // A set goes on over members that are added meanwhile.
    for (const node of affected) {
      if (node.defines === undefined || this.definerOf(node.defines) !== node) continue;
      for (const user of this.users.get(node.defines)) affected.add(user);
    }
    return affected;
  }
}
