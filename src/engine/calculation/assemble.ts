import { siUnitText } from '../units/index';
import { sayingOf, sha256 } from './fingerprint';
import type { CalculationNode, Outcome } from './node';
import { present, twelveDigits } from './present';
import { constants, type Symbol } from './symbols';
import { inlineNames } from './text-node';
import type { CalculationSettings, CellInput, CellResult } from './types';

/** What a cell's result is put together from. */
export interface CellParts {
  cell: CellInput;
  nodes: readonly CalculationNode[];
  /** Outcomes of the nodes, in their order. */
  own: readonly Outcome[];
  /** Names that the cell uses, and the outcomes of what defines them. */
  uses: readonly string[];
  definers: readonly (Outcome | undefined)[];
}

function figureOf(symbol: Symbol | undefined): string {
  if (symbol?.value === undefined || symbol.type === undefined) return 'no value';
  const unit = siUnitText(symbol.type.dimension);
  const figure = String(Number(symbol.value.toPrecision(12)));
  return unit === '1' ? figure : `${figure} ${unit}`;
}

/** Values that a cell uses, to 12 digits; of a fluid state or relation those that it names. */
function dependenciesOf({ cell, nodes, uses, definers }: CellParts): Record<string, string> {
  const defined = new Set(nodes.flatMap((node) => node.defines ?? []));
  const entries = uses.flatMap((name, index): [string, string][] => {
    const definer = definers[index];
    if (defined.has(name) || (definer === undefined && constants.has(name))) return [];
    const members = [...(definer?.symbols ?? [])].filter(([key]) => key.includes('.') && cell.source.includes(key));
    if (members.length > 0) return members.map(([key, symbol]) => [key, figureOf(symbol)]);
    return [[name, figureOf(definer?.symbols.get(name))]];
  });
  return Object.fromEntries(entries.sort(([a], [b]) => (a < b ? -1 : 1)));
}

function ownValues({ cell, nodes, own }: CellParts): string[] {
  return own.flatMap((outcome, index) =>
    outcome.line?.value === undefined
      ? []
      : [`${nodes[index]?.defines ?? cell.id}=${twelveDigits(outcome.line.value)}`],
  );
}

function inlineValues({ cell, uses, definers }: CellParts, settings: CalculationSettings): CellResult['inline'] {
  if (cell.kind !== 'text') return {};
  const symbolOf = (key: string) =>
    definers[uses.indexOf(key.split('.')[0] ?? key)]?.symbols.get(key) ?? constants.get(key);
  return Object.fromEntries(
    inlineNames(cell.source).flatMap((name) => {
      const symbol = symbolOf(name);
      if (symbol?.value === undefined || symbol.type === undefined) return [];
      return [[name, symbol.display ?? present(symbol.value, symbol.type, settings)]];
    }),
  );
}

/** The result of a cell from those of its nodes and of what it uses. */
export function assembleCell(parts: CellParts, settings: CalculationSettings): CellResult {
  const { cell, nodes, own, uses } = parts;
  const dependsOn = dependenciesOf(parts);
  return {
    id: cell.id,
    kind: cell.kind,
    lines: own.flatMap((outcome) => outcome.line ?? []),
    fluid: own.find((outcome) => outcome.fluid !== undefined)?.fluid,
    relation: own.find((outcome) => outcome.relation !== undefined)?.relation,
    inline: inlineValues(parts, settings),
    diagnostics: own.flatMap((outcome) => outcome.diagnostics),
    outsideRange: [...new Set(own.flatMap((outcome) => outcome.outsideRange))],
    defines: nodes.flatMap((node) => node.defines ?? []),
    uses: [...uses],
    fingerprint: sha256(JSON.stringify([sayingOf(cell), dependsOn, ownValues(parts)])),
    dependsOn,
  };
}
