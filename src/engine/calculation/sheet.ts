import { evaluationDiagnostic } from '../errors/evaluation-errors';
import { NameGraph } from '../graph/name-graph';
import { compileCell, refusedCell, type CompiledCell } from './compiled-cell';
import type { CalculationNode } from './node';
import { same } from './same';
import type { CalculationChange, CellInput } from './types';

/** Limits that no sheet of the trade reaches, so that none can hang a client or the server. */
export const limits = { cells: 5000, sourceLength: 100_000, totalLength: 2_000_000 } as const;

/** What a change of cells touched. */
export interface Touched {
  cells: Set<string>;
  fresh: CalculationNode[];
  gone: CalculationNode[];
  /** Whether cells came, went, or stand elsewhere. */
  rearranged: boolean;
}

/** More nodes of one cell than this cannot be; so a place is one number. */
const nodesPerCell = limits.sourceLength;

/** The cells of a calculation in their order, read, and their nodes by name. */
export class Sheet {
  readonly cells = new Map<string, CompiledCell>();
  order: string[] = [];
  private positions = new Map<string, number>();
  private totalLength = 0;
  /** Cells beyond the limits of a sheet. */
  private beyond: ReadonlySet<string> = new Set();
  readonly graph = new NameGraph<CalculationNode>(
    (node) => (this.positions.get(node.cellId) ?? 0) * nodesPerCell + node.index,
  );

  apply(change: CalculationChange): Touched {
    const touched: Touched = { cells: new Set(), fresh: [], gone: [], rearranged: false };
    for (const id of change.remove ?? []) this.drop(id, touched);
    for (const cell of change.put ?? []) this.put(cell, touched);
    if (change.order !== undefined || touched.rearranged) this.arrange(change.order ?? this.order, touched);
    this.keepLimits(touched);
    return touched;
  }

  private drop(id: string, touched: Touched): void {
    const compiled = this.cells.get(id);
    if (compiled === undefined) return;
    this.forget(compiled, touched);
    this.cells.delete(id);
    touched.rearranged = true;
  }

  private forget(compiled: CompiledCell, touched: Touched): void {
    this.totalLength -= compiled.cell.source.length;
    for (const node of compiled.nodes) this.graph.remove(node);
    touched.gone.push(...compiled.nodes);
  }

  private put(cell: CellInput, touched: Touched): void {
    const before = this.cells.get(cell.id);
    if (before !== undefined && same(before.cell, cell)) return;
    if (before === undefined) {
      this.positions.set(cell.id, this.order.length);
      this.order.push(cell.id);
      touched.rearranged = true;
    } else if (before.cell.kind !== cell.kind) {
      // A cell that becomes a section, or no longer is one, changes the numbers of those behind it.
      touched.rearranged = true;
    }
    this.replace(before, this.compile(cell), touched);
  }

  private compile(cell: CellInput): CompiledCell {
    if (this.beyond.has(cell.id)) return refusedCell(cell, evaluationDiagnostic('TOO_MANY_CELLS', undefined));
    if (cell.source.length <= limits.sourceLength) return compileCell(cell);
    return refusedCell(cell, evaluationDiagnostic('SOURCE_TOO_LONG', undefined, { limit: limits.sourceLength }));
  }

  private replace(before: CompiledCell | undefined, after: CompiledCell, touched: Touched): void {
    if (before !== undefined) this.forget(before, touched);
    this.cells.set(after.cell.id, after);
    this.totalLength += after.cell.source.length;
    for (const node of after.nodes) this.graph.add(node);
    touched.fresh.push(...after.nodes);
    touched.cells.add(after.cell.id);
  }

  /** Takes over an order; cells that it leaves out stand at the end. */
  private arrange(order: readonly string[], touched: Touched): void {
    const known = new Set(order.filter((id) => this.cells.has(id)));
    for (const id of this.order) if (this.cells.has(id)) known.add(id);
    this.order = [...known];
    this.positions = new Map(this.order.map((id, index) => [id, index]));
    touched.rearranged = true;
  }

  /** Cells from the first on that no longer fits; empty but for monstrous sheets. */
  private cellsBeyond(): ReadonlySet<string> {
    if (this.cells.size <= limits.cells && this.totalLength <= limits.totalLength) return new Set();
    let length = 0;
    return new Set(
      this.order.filter((id, index) => {
        length += this.cells.get(id)?.cell.source.length ?? 0;
        return index >= limits.cells || length > limits.totalLength;
      }),
    );
  }

  private keepLimits(touched: Touched): void {
    const before = this.beyond;
    this.beyond = this.cellsBeyond();
    if (before.size === 0 && this.beyond.size === 0) return;
    for (const id of new Set([...before, ...this.beyond])) {
      const compiled = this.cells.get(id);
      if (compiled !== undefined && before.has(id) !== this.beyond.has(id))
        this.replace(compiled, this.compile(compiled.cell), touched);
    }
  }

  /** `3.2`: section and place within it, as the sheet numbers its cells. */
  numbers(): Map<string, string> {
    let section = 0;
    let within = 0;
    const numbers = new Map<string, string>();
    for (const id of this.order) {
      const isSection = this.cells.get(id)?.cell.kind === 'section';
      section += isSection ? 1 : 0;
      within = isSection ? 0 : within + 1;
      numbers.set(id, isSection ? String(section) : `${section}.${within}`);
    }
    return numbers;
  }
}
