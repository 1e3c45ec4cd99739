import { readLines } from '../language/index';
import { fluidNode } from './fluid-node';
import { lineNode } from './line-node';
import type { CalculationNode } from './node';
import { relationNode } from './relation-node';
import { textNode } from './text-node';
import type { CellInput } from './types';

/** The units of dependence of a cell, in the order in which it shows them. */
export function nodesOf(cell: CellInput): CalculationNode[] {
  switch (cell.kind) {
    case 'section':
      return [];
    case 'text':
      return [textNode(cell)];
    case 'fluid':
      return [fluidNode(cell)];
    case 'relation': {
      const { node, below } = relationNode(cell);
      return [node, ...below.map((line, index) => lineNode(cell.id, `${cell.id}:${index}`, line))];
    }
    case 'expressions':
      return readLines(cell.source)
        .filter((line) => line.kind !== 'blank')
        .map((line, index) => lineNode(cell.id, `${cell.id}:${index}`, line));
  }
}
