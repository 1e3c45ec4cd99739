import { constants, type Symbol } from './symbols';
import { sayingOf, sha256 } from './fingerprint';
import type { CalculationNode, Outcome } from './node';
import { present, twelveDigits } from './present';
import { inlineNames } from './text-node';
import { siUnitText } from '../units/index';
import type { CalculationSettings, CellInput, CellResult } from './types';

function figureOf(symbol: Symbol | undefined): string {
  if (symbol?.value === undefined || symbol.type === undefined) return 'no value';
  const unit = siUnitText(symbol.type.dimension);
  const figure = String(Number(symbol.value.toPrecision(12)));
  return unit === '1' ? figure : `${figure} ${unit}`;
}

/** Values that a cell uses directly, to 12 digits; of a fluid state or relation all that it offers. */
function dependenciesOf(
  cell: CellInput,
  uses: readonly string[],
  defines: ReadonlySet<string>,
  symbols: ReadonlyMap<string, Symbol>,
): Record<string, string> {
  const source = cell.source.replace(/[ρμλνβασ]/g, '');
  const entries = uses
    .filter((name) => !defines.has(name) && !(constants.has(name) && !symbols.has(name)))
    .flatMap((name): [string, string][] => {
      const members = [...symbols.keys()].filter((key) => key.startsWith(`${name}.`) && source.includes(key));
      return members.length > 0
        ? members.map((key) => [key, figureOf(symbols.get(key))])
        : [[name, figureOf(symbols.get(name))]];
    });
  return Object.fromEntries(entries.sort(([a], [b]) => (a < b ? -1 : 1)));
}

function results(cell: CellInput, nodes: readonly CalculationNode[], outcomes: ReadonlyMap<string, Outcome>): string[] {
  return nodes.flatMap((node) => {
    const outcome = outcomes.get(node.key);
    const named = outcome?.line?.value;
    return named === undefined ? [] : [`${node.defines ?? cell.id}=${twelveDigits(named)}`];
  });
}

/**
 * The result of a cell from those of its nodes. Answers the result of before, the same object, when
 * nothing that shows or counts is another.
 */
export function assembleCell(
  cell: CellInput,
  nodes: readonly CalculationNode[],
  outcomes: ReadonlyMap<string, Outcome>,
  symbols: ReadonlyMap<string, Symbol>,
  settings: CalculationSettings,
  fingerprints: Map<string, string>,
  before: CellResult | undefined,
): CellResult {
  const own = nodes.flatMap((node) => outcomes.get(node.key) ?? []);
  const defines = nodes.flatMap((node) => node.defines ?? []);
  const uses = [...new Set(nodes.flatMap((node) => node.uses))];
  const dependsOn = dependenciesOf(cell, uses, new Set(defines), symbols);
  const inline: CellResult['inline'] = {};
  for (const name of cell.kind === 'text' ? inlineNames(cell.source) : []) {
    const symbol = symbols.get(name) ?? constants.get(name);
    if (symbol?.value !== undefined && symbol.type !== undefined) inline[name] = shownOf(name, own, symbol, settings);
  }
  const fingerprint = sha256(JSON.stringify([sayingOf(cell), dependsOn, results(cell, nodes, outcomes)]));
  fingerprints.set(cell.id, fingerprint);
  const result: CellResult = {
    id: cell.id,
    kind: cell.kind,
    lines: own.flatMap((outcome) => outcome.line ?? []),
    fluid: own.find((outcome) => outcome.fluid !== undefined)?.fluid,
    relation: own.find((outcome) => outcome.relation !== undefined)?.relation,
    inline,
    diagnostics: own.flatMap((outcome) => outcome.diagnostics),
    outsideRange: [...new Set(own.flatMap((outcome) => outcome.outsideRange))],
    defines,
    uses,
    fingerprint,
    dependsOn,
  };
  return before !== undefined && JSON.stringify(before) === JSON.stringify(result) ? before : result;
}

function shownOf(name: string, own: readonly Outcome[], symbol: Symbol, settings: CalculationSettings) {
  const line = own.find((outcome) => outcome.line?.name === name)?.line;
  return (
    line?.value ?? present(symbol.value ?? 0, symbol.type ?? { kind: 'number', dimension: [], levels: 0 }, settings)
  );
}
