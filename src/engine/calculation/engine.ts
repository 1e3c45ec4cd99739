import type { Diagnostic } from '../errors/diagnostic';
import { orderByDependence } from '../graph/order';
import { assembleCell } from './assemble';
import { nodesOf } from './cell-nodes';
import type { CalculationNode, Outcome, Surroundings } from './node';
import type { Symbol } from './symbols';
import type {
  CalculationChange,
  CalculationDelta,
  CalculationInput,
  CalculationResult,
  CalculationSettings,
  CellInput,
  CellResult,
  NamedValue,
} from './types';

export const defaultSettings: CalculationSettings = { unitSystem: 'SI', significantDigits: 4, ambientPressure: 101325 };

/** Limits that no sheet of the trade reaches, so that none can hang a client or the server. */
export const limits = { cells: 5000, sourceLength: 100_000 } as const;

interface Computed {
  node: CalculationNode;
  outcome: Outcome;
  /** What the outcome rests on; computed anew only when one of them is another. */
  rests: readonly unknown[];
}

/** The result of a cell, and everything that it was put together from. */
interface Assembled {
  result: CellResult;
  rests: readonly unknown[];
}

/** A calculation that is kept, changed and computed anew only where something changed. */
export interface Engine {
  update(change: CalculationChange): CalculationDelta;
  result(): CalculationResult;
}

class KeptCalculation implements Engine {
  private settings = defaultSettings;
  private readonly cells = new Map<string, CellInput>();
  private readonly nodes = new Map<string, CalculationNode[]>();
  private order: string[] = [];
  private readonly computed = new Map<string, Computed>();
  private results = new Map<string, Assembled>();

  update(change: CalculationChange): CalculationDelta {
    if (change.settings !== undefined) {
      this.settings = change.settings;
      this.computed.clear();
    }
    for (const id of change.remove ?? []) this.drop(id);
    for (const cell of change.put ?? []) this.put(cell);
    if (change.order !== undefined) this.order = change.order.filter((id) => this.cells.has(id));
    return this.compute(change.remove ?? []);
  }

  private drop(id: string): void {
    this.cells.delete(id);
    for (const node of this.nodes.get(id) ?? []) this.computed.delete(node.key);
    this.nodes.delete(id);
    this.order = this.order.filter((other) => other !== id);
  }

  private put(cell: CellInput): void {
    if (this.cells.size >= limits.cells && !this.cells.has(cell.id)) return;
    const kept = { ...cell, source: cell.source.slice(0, limits.sourceLength) };
    if (!this.cells.has(cell.id)) this.order.push(cell.id);
    for (const node of this.nodes.get(cell.id) ?? []) this.computed.delete(node.key);
    this.cells.set(cell.id, kept);
    this.nodes.set(cell.id, nodesOf(kept));
  }

  /** First definition of each name in the order of the sheet, and where further ones stand. */
  private definitions(all: readonly CalculationNode[]): {
    first: Map<string, CalculationNode>;
    doubled: Map<string, CalculationNode>;
  } {
    const first = new Map<string, CalculationNode>();
    const doubled = new Map<string, CalculationNode>();
    for (const node of all) {
      if (node.defines === undefined || node.defines === '') continue;
      const before = first.get(node.defines);
      if (before === undefined) first.set(node.defines, node);
      else doubled.set(node.key, before);
    }
    return { first, doubled };
  }

  private compute(removed: readonly string[]): CalculationDelta {
    const all = this.order.flatMap((id) => this.nodes.get(id) ?? []);
    const numbers = this.cellNumbers();
    const byKey = new Map(all.map((node) => [node.key, node]));
    const { first, doubled } = this.definitions(all);
    const definersOf = (key: string) => (byKey.get(key)?.uses ?? []).flatMap((name) => first.get(name)?.key ?? []);
    const { order, cycles } = orderByDependence([...byKey.keys()], definersOf);
    const outcomes = new Map<string, Outcome>();
    for (const cycle of cycles) for (const key of cycle) this.closeCircle(key, cycle, byKey, outcomes);
    const names = [...first.keys()];
    for (const key of order) {
      const node = byKey.get(key);
      if (node === undefined) continue;
      const definers = node.uses.map((name) => first.get(name));
      const rests = [
        node,
        doubled.get(key)?.cellId,
        ...definers.map((definer) => (definer === undefined ? undefined : outcomes.get(definer.key))),
      ];
      outcomes.set(key, this.outcomeOf(node, rests, names, first, outcomes, doubled.get(key), numbers));
    }
    return this.collect(outcomes, first, removed);
  }

  private outcomeOf(
    node: CalculationNode,
    rests: readonly unknown[],
    names: readonly string[],
    first: ReadonlyMap<string, CalculationNode>,
    outcomes: ReadonlyMap<string, Outcome>,
    before: CalculationNode | undefined,
    numbers: ReadonlyMap<string, string>,
  ): Outcome {
    const kept = this.computed.get(node.key);
    if (kept !== undefined && sameItems(kept.rests, rests)) return kept.outcome;
    const outcomeBehind = (name: string) => {
      const definer = first.get(name);
      return definer === undefined ? undefined : outcomes.get(definer.key);
    };
    const surroundings: Surroundings = {
      settings: this.settings,
      symbol: (key) => outcomeBehind(key.split('.')[0] ?? key)?.symbols.get(key),
      isObject: (name) => first.get(name)?.key.match(/:(state|relation)$/) !== null && first.has(name),
      namesInReach: () => [...names, ...names.flatMap((name) => [...(outcomeBehind(name)?.symbols.keys() ?? [])])],
      outsideBehind: (name) => outcomeBehind(name)?.outsideRange ?? [],
    };
    const fresh = node.compute(surroundings);
    const outcome = before === undefined ? fresh : secondDefinition(fresh, node, numbers.get(before.cellId) ?? '');
    const settled = kept !== undefined && sameOutcome(kept.outcome, outcome) ? kept.outcome : outcome;
    this.computed.set(node.key, { node, outcome: settled, rests });
    return settled;
  }

  private closeCircle(
    key: string,
    cycle: readonly string[],
    byKey: ReadonlyMap<string, CalculationNode>,
    outcomes: Map<string, Outcome>,
  ): void {
    const node = byKey.get(key);
    if (node === undefined) return;
    const members = cycle.map((member) => byKey.get(member)?.defines ?? member);
    const message = `These define each other in a circle: ${[...members, members[0]].join(' → ')}.`;
    const known = new Map<string, Symbol>(node.defines === undefined ? [] : [[node.defines, {}]]);
    const fresh = node.compute({
      settings: this.settings,
      symbol: () => ({}),
      isObject: () => true,
      namesInReach: () => [],
      outsideBehind: () => [],
    });
    const diagnostic: Diagnostic = {
      code: 'CIRCLE',
      severity: 'error',
      message,
      ...(fresh.line === undefined ? {} : { span: fresh.line.span }),
    };
    if (fresh.line !== undefined) fresh.line.diagnostics.push(diagnostic);
    outcomes.set(key, {
      ...fresh,
      symbols: known,
      diagnostics: fresh.line?.diagnostics ?? [...fresh.diagnostics, diagnostic],
    });
    this.computed.delete(key);
  }

  private cellNumbers(): Map<string, string> {
    let section = 0;
    let within = 0;
    return new Map(
      this.order.map((id) => {
        if (this.cells.get(id)?.kind === 'section') {
          section += 1;
          within = 0;
          return [id, String(section)];
        }
        within += 1;
        return [id, `${section}.${within}`];
      }),
    );
  }

  /** Cells anew whose own outcomes, or those of what they use, are others than before. */
  private collect(
    outcomes: ReadonlyMap<string, Outcome>,
    first: ReadonlyMap<string, CalculationNode>,
    removed: readonly string[],
  ): CalculationDelta {
    const results = new Map<string, Assembled>();
    const changed: CellResult[] = [];
    for (const id of this.order) {
      const cell = this.cells.get(id);
      if (cell === undefined) continue;
      const nodes = this.nodes.get(id) ?? [];
      const own = nodes.flatMap((node) => outcomes.get(node.key) ?? []);
      const uses = [...new Set(nodes.flatMap((node) => node.uses))];
      const definers = uses.map((name) => outcomes.get(first.get(name)?.key ?? ''));
      const rests = [cell, this.settings, ...own, ...definers];
      const before = this.results.get(id);
      if (before !== undefined && sameItems(before.rests, rests)) {
        results.set(id, before);
        continue;
      }
      const result = assembleCell({ cell, nodes, own, uses, definers }, this.settings);
      results.set(id, { result, rests });
      if (before === undefined || JSON.stringify(before.result) !== JSON.stringify(result)) changed.push(result);
    }
    this.results = results;
    return { cells: changed, removed: [...removed], names: this.names() };
  }

  private names(): NamedValue[] {
    return [...this.results.values()].flatMap(({ result }) => [
      ...result.lines.flatMap((line) =>
        line.name === undefined ? [] : [{ name: line.name, cellId: result.id, value: line.value }],
      ),
      ...(result.fluid?.rows.flatMap((row) =>
        row.values.map(({ name, value }) => ({ name, cellId: result.id, value })),
      ) ?? []),
      ...(result.relation?.outputs.map(({ name, value }) => ({ name, cellId: result.id, value })) ?? []),
    ]);
  }

  result(): CalculationResult {
    return {
      cells: Object.fromEntries([...this.results].map(([id, { result }]) => [id, result])),
      names: this.names(),
    };
  }
}

function sameItems(left: readonly unknown[], right: readonly unknown[]): boolean {
  return left.length === right.length && left.every((item, index) => item === right[index]);
}

function secondDefinition(outcome: Outcome, node: CalculationNode, number: string): Outcome {
  const diagnostic: Diagnostic = {
    code: 'DEFINED_TWICE',
    severity: 'error',
    message: `${node.defines ?? ''} is defined already in ${number}; every name is defined once.`,
    ...(outcome.line === undefined ? {} : { span: outcome.line.span }),
  };
  const line =
    outcome.line === undefined
      ? undefined
      : { ...outcome.line, diagnostics: [...outcome.line.diagnostics, diagnostic], value: undefined };
  return {
    ...outcome,
    symbols: new Map(),
    diagnostics: [...outcome.diagnostics, diagnostic],
    ...(line === undefined ? {} : { line }),
  };
}

/** Same for all that depends on it and for the eye: then the old object stays, and nothing behind it is computed. */
function sameOutcome(left: Outcome, right: Outcome): boolean {
  return (
    JSON.stringify([[...left.symbols], left.line, left.fluid, left.relation, left.diagnostics, left.outsideRange]) ===
    JSON.stringify([[...right.symbols], right.line, right.fluid, right.relation, right.diagnostics, right.outsideRange])
  );
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
