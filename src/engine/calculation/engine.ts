import { circleThrough, orderByDependence } from '../graph/order';
import { assembleCell, namesOf } from './assemble';
import type { CompiledCell } from './compiled-cell';
import { circleMember, faultyOutcome, firstDefinition, secondDefinition } from './definitions';
import { baseOf, type CalculationNode, type Outcome, type Surroundings } from './node';
import { same, sameItems } from './same';
import { Sheet, type Touched } from './sheet';
import { constants, type Symbol } from './symbols';
import type {
  CalculationChange,
  CalculationDelta,
  CalculationInput,
  CalculationResult,
  CalculationSettings,
  CellResult,
  NamedValue,
} from './types';

export { limits } from './sheet';

export const defaultSettings: CalculationSettings = { unitSystem: 'SI', significantDigits: 4, ambientPressure: 101325 };

/** A calculation that is kept, changed and computed anew only where something changed. */
export interface Engine {
  update(change: CalculationChange): CalculationDelta;
  result(): CalculationResult;
}

/** What one update computes, and why. */
interface Round {
  /** To be computed whatever they depend on. */
  seeds: Set<CalculationNode>;
  /** Nodes whose values are others than before, so that what depends on them is computed too. */
  changed: Set<CalculationNode>;
  /** Of names whose definition was put or taken away: what the name stood for before. */
  former: Map<string, Outcome | undefined>;
  circles: ReadonlyMap<CalculationNode, readonly CalculationNode[]>;
  numbers(): ReadonlyMap<string, string>;
}

class KeptCalculation implements Engine {
  private settings = defaultSettings;
  private readonly sheet = new Sheet();
  private readonly outcomes = new Map<CalculationNode, Outcome>();
  /** Nodes that looked through all names for a proposal. */
  private readonly wondering = new Set<CalculationNode>();
  /** Nodes in circles: when one is broken all its members have to be looked at. */
  private readonly encircled = new Set<CalculationNode>();
  private readonly results = new Map<string, { result: CellResult; names: NamedValue[] }>();

  update(change: CalculationChange): CalculationDelta {
    const { graph } = this.sheet;
    const former = this.formerDefinitions(change);
    const touched = this.sheet.apply(change);
    for (const node of touched.gone) {
      this.outcomes.delete(node);
      this.wondering.delete(node);
      this.encircled.delete(node);
    }
    const redone = change.settings !== undefined && !same(change.settings, this.settings);
    if (redone) this.settings = change.settings ?? this.settings;

    const seeds = redone ? this.allNodes() : this.seedsOf(touched, former);
    const affected = graph.affectedBy(seeds);
    const dependencies = (node: CalculationNode) => graph.dependenciesOf(node).filter((each) => affected.has(each));
    const { order, circles } = orderByDependence(affected, dependencies);
    let numbers: ReadonlyMap<string, string> | undefined;
    const round: Round = {
      seeds,
      changed: new Set(),
      former,
      circles,
      numbers: () => (numbers ??= this.sheet.numbers()),
    };
    const cells = redone ? new Set(this.sheet.order) : touched.cells;
    for (const node of order) if (this.visit(node, round)) cells.add(node.cellId);
    return this.collect(cells, change.remove ?? []);
  }

  private allNodes(): Set<CalculationNode> {
    return new Set([...this.sheet.cells.values()].flatMap(({ nodes }) => nodes));
  }

  /** What the names of the cells that change stand for before they do. */
  private formerDefinitions({ put = [], remove = [] }: CalculationChange): Map<string, Outcome | undefined> {
    const former = new Map<string, Outcome | undefined>();
    for (const id of [...put.map((cell) => cell.id), ...remove])
      for (const name of this.sheet.cells.get(id)?.defines ?? []) former.set(name, this.definition(name));
    for (const name of this.sheet.graph.namesDefinedSeveralTimes()) former.set(name, this.definition(name));
    return former;
  }

  private definition(name: string): Outcome | undefined {
    const definer = this.sheet.graph.definerOf(name);
    return definer === undefined ? undefined : this.outcomes.get(definer);
  }

  private seedsOf(touched: Touched, former: Map<string, Outcome | undefined>): Set<CalculationNode> {
    const { graph } = this.sheet;
    const gone = new Set(touched.gone);
    const seeds = new Set(touched.fresh.filter((node) => !gone.has(node)));
    let namesChanged = false;
    for (const { defines } of [...touched.fresh, ...touched.gone]) {
      if (defines === undefined) continue;
      const before = former.get(defines);
      if (!former.has(defines)) former.set(defines, undefined);
      for (const definer of graph.definersOf(defines)) seeds.add(definer);
      if ((before === undefined) === (graph.definerOf(defines) === undefined)) continue;
      // A name came or went: what uses it has to be looked at, whatever else it uses.
      namesChanged = true;
      for (const user of graph.usersOf(defines)) seeds.add(user);
    }
    if (touched.rearranged)
      for (const name of graph.namesDefinedSeveralTimes())
        for (const definer of graph.definersOf(name)) seeds.add(definer);
    if (namesChanged) for (const node of this.wondering) seeds.add(node);
    return seeds;
  }

  /** Computes a node if something that it rests on changed; answers whether it did. */
  private visit(node: CalculationNode, round: Round): boolean {
    const { graph } = this.sheet;
    const inCircle = round.circles.has(node);
    const due = inCircle || this.encircled.has(node) || round.seeds.has(node);
    if (!due && !graph.dependenciesOf(node).some((each) => round.changed.has(each))) return false;
    if (inCircle) this.encircled.add(node);
    else this.encircled.delete(node);
    const outcome = this.placed(node, this.computed(node, round), round);
    const before = this.outcomeBefore(node, round);
    if (before !== undefined && sameForOthers(before, outcome)) outcome.symbols = before.symbols;
    else round.changed.add(node);
    this.outcomes.set(node, outcome);
    return true;
  }

  /** What those that use a node have seen of its name so far. */
  private outcomeBefore(node: CalculationNode, { former }: Round): Outcome | undefined {
    const name = node.defines;
    const isRenewed = name !== undefined && former.has(name) && this.sheet.graph.definerOf(name) === node;
    return isRenewed ? former.get(name) : this.outcomes.get(node);
  }

  private computed(node: CalculationNode, round: Round): Outcome {
    this.wondering.delete(node);
    try {
      return node.compute(this.surroundings(node, round.circles.get(node)));
    } catch (error) {
      return faultyOutcome(node, error);
    }
  }

  private symbol(key: string): Symbol | undefined {
    const base = baseOf(key);
    return this.definition(base)?.symbols.get(key) ?? constants.get(key);
  }

  private surroundings(node: CalculationNode, circle: readonly CalculationNode[] | undefined): Surroundings {
    const { graph } = this.sheet;
    // What stands in a circle with a node has no value for it.
    const encircled = new Set(circle?.map(({ defines }) => defines));
    return {
      settings: this.settings,
      symbol: (key) => (encircled.has(baseOf(key)) ? {} : this.symbol(key)),
      names: () => {
        this.wondering.add(node);
        return [...graph.names()].filter((name) => name !== node.defines);
      },
      keysOf: (name) => [...(this.definition(name)?.symbols.keys() ?? [])].filter((key) => key !== name),
      outsideBehind: (name) => (encircled.has(name) ? [] : (this.definition(name)?.outsideRange ?? [])),
    };
  }

  /** The outcome as its place on the sheet makes it: in a circle, or beside other definitions of its name. */
  private placed(node: CalculationNode, outcome: Outcome, round: Round): Outcome {
    const { graph } = this.sheet;
    const name = node.defines;
    const circle = round.circles.get(node);
    let result = outcome;
    if (circle !== undefined) {
      const members = new Set(circle);
      const within = (each: CalculationNode) => graph.dependenciesOf(each).filter((other) => members.has(other));
      result = circleMember(result, circleThrough(node, within) ?? [node]);
    }
    if (name === undefined || !graph.namesDefinedSeveralTimes().has(name)) return result;
    const [first, second] = graph.definersOf(name);
    if (first === undefined || second === undefined) return result;
    return first === node
      ? firstDefinition(result, name, this.placeOf(second, node, round))
      : secondDefinition(result, name, this.placeOf(first, node, round));
  }

  /** Where a definition stands, seen from another: `3.2`, or its line in the same cell. */
  private placeOf(node: CalculationNode, from: CalculationNode, round: Round): string {
    if (node.cellId !== from.cellId) return round.numbers().get(node.cellId) ?? '';
    return node.line === undefined ? 'the name of this cell' : `line ${node.line + 1}`;
  }

  private collect(ids: ReadonlySet<string>, removed: readonly string[]): CalculationDelta {
    for (const id of removed) if (!this.sheet.cells.has(id)) this.results.delete(id);
    const cells: CellResult[] = [];
    for (const id of ids) {
      const compiled = this.sheet.cells.get(id);
      if (compiled === undefined) continue;
      const result = this.assembled(compiled);
      if (same(this.results.get(id)?.result, result)) continue;
      this.results.set(id, { result, names: namesOf(result) });
      cells.push(result);
    }
    return { cells, removed: [...removed], names: this.names() };
  }

  private assembled(compiled: CompiledCell): CellResult {
    const parts = {
      compiled,
      own: compiled.nodes.flatMap((node) => this.outcomes.get(node) ?? []),
      symbol: (key: string) => this.symbol(key),
      isForeign: (key: string) => {
        const definer = this.sheet.graph.definerOf(baseOf(key));
        return definer === undefined ? !constants.has(key) : definer.cellId !== compiled.cell.id;
      },
    };
    return assembleCell(parts, this.settings);
  }

  private names(): NamedValue[] {
    const all: NamedValue[] = [];
    for (const id of this.sheet.order) for (const name of this.results.get(id)?.names ?? []) all.push(name);
    return all;
  }

  result(): CalculationResult {
    const cells: Record<string, CellResult> = {};
    for (const id of this.sheet.order) {
      const kept = this.results.get(id);
      if (kept !== undefined) cells[id] = kept.result;
    }
    return { cells, names: this.names() };
  }
}

/** Whether nothing that depends on a node can tell its outcome from the one before. */
function sameForOthers(left: Outcome, right: Outcome): boolean {
  return same(left.symbols, right.symbols) && sameItems(left.outsideRange, right.outsideRange);
}

export function createEngine(): Engine {
  return new KeptCalculation();
}

/** Computes a whole calculation from scratch. */
export function evaluateCalculation(input: CalculationInput): CalculationResult {
  const engine = createEngine();
  engine.update({ settings: input.settings, put: input.cells, order: input.cells.map((cell) => cell.id) });
  return engine.result();
}
