import type { Diagnostic } from '../errors/diagnostic';
import { readLines, type Line } from '../language/index';
import { countsFromAmbient, sayingOf } from './fingerprint';
import { fluidNode } from './fluid-node';
import { lineNode } from './line-node';
import type { CalculationNode } from './node';
import { relationNode } from './relation-node';
import { textNode } from './text-node';
import type { CellInput } from './types';

/** A cell as it is read: its units of dependence, and what else its result needs whatever the sheet holds. */
export interface CompiledCell {
  cell: CellInput;
  /** In the order in which the cell shows them. */
  nodes: readonly CalculationNode[];
  /** Names it defines; names and keys (`w.rho`) it uses, each once. */
  defines: readonly string[];
  uses: readonly string[];
  keys: readonly string[];
  saying: string;
  fromAmbient: boolean;
  /** Why the cell is not computed at all. */
  refusal?: Diagnostic;
}

function nodesOf(cell: CellInput, lines: readonly Line[]): CalculationNode[] {
  switch (cell.kind) {
    case 'section':
      return [];
    case 'text':
      return [textNode(cell)];
    case 'fluid':
      return [fluidNode(cell, lines)];
    case 'relation': {
      const { node, below } = relationNode(cell, lines);
      return [node, ...below.map((line, index) => lineNode(cell.id, index + 1, line))];
    }
    case 'expressions':
      return lines.filter((line) => line.kind !== 'blank').map((line, index) => lineNode(cell.id, index, line));
  }
}

const isProse = ({ kind }: CellInput) => kind === 'section' || kind === 'text';

/** Reads a cell. */
export function compileCell(cell: CellInput): CompiledCell {
  const lines = isProse(cell) ? [] : readLines(cell.source);
  const nodes = nodesOf(cell, lines);
  return {
    cell,
    nodes,
    defines: nodes.flatMap((node) => node.defines ?? []),
    uses: [...new Set(nodes.flatMap((node) => node.uses))],
    keys: [...new Set(nodes.flatMap((node) => node.keys))],
    saying: sayingOf(cell, lines),
    fromAmbient: countsFromAmbient(lines),
  };
}

/** A cell that is not computed, and says why. */
export function refusedCell(cell: CellInput, refusal: Diagnostic): CompiledCell {
  const saying = `${cell.kind}|${refusal.code}|${cell.source}`;
  return { cell, nodes: [], defines: [], uses: [], keys: [], saying, fromAmbient: false, refusal };
}
