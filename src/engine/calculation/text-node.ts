import type { CalculationNode, Outcome, Surroundings } from './node';
import { canonicalName } from '../language/index';
import type { CellInput } from './types';

const inlineName = /\{\{\s*([^{}]+?)\s*\}\}/g;

/** Names whose values stand in a text: `{{Q}}`, `{{w.rho}}`. */
export function inlineNames(source: string): string[] {
  return [
    ...new Set(
      [...source.matchAll(inlineName)].map((match) => (match[1] ?? '').split('.').map(canonicalName).join('.')),
    ),
  ];
}

/** A text as a unit of dependence: it changes with the values it shows. */
export function textNode(cell: CellInput): CalculationNode {
  const names = inlineNames(cell.source);
  const compute = (surroundings: Surroundings): Outcome => {
    const missing = names.filter((name) => surroundings.symbol(name) === undefined);
    const outsideRange = [...new Set(names.flatMap((name) => surroundings.outsideBehind(name.split('.')[0] ?? name)))];
    return {
      symbols: new Map(),
      diagnostics: missing.map((name) => ({
        code: 'UNKNOWN_NAME',
        severity: 'warning',
        message: `No value is named ${name}.`,
      })),
      outsideRange,
    };
  };
  return {
    key: `${cell.id}:text`,
    cellId: cell.id,
    defines: undefined,
    uses: [...new Set(names.map((name) => name.split('.')[0] ?? name))],
    compute,
  };
}
