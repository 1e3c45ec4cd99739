import { siUnitText } from '../units/index';
import type { CompiledCell } from './compiled-cell';
import { fingerprintOf } from './fingerprint';
import type { Outcome } from './node';
import { present, twelveDigits, twelveFigures } from './present';
import type { Symbol } from './symbols';
import { inlineNames } from './text-node';
import type { CalculationSettings, CellResult, NamedValue } from './types';

/** What a cell's result is put together from. */
export interface CellParts {
  compiled: CompiledCell;
  /** Outcomes of its nodes, in their order. */
  own: readonly Outcome[];
  /** Symbol of a key in the sheet. */
  symbol(key: string): Symbol | undefined;
  /** Whether a key belongs to another cell: neither to this one nor to the built-in constants. */
  isForeign(key: string): boolean;
}

function figureOf(symbol: Symbol | undefined): string {
  if (symbol?.value === undefined || symbol.type === undefined) return 'no value';
  if (symbol.type.kind === 'condition') return symbol.value === 0 ? 'false' : 'true';
  const unit = siUnitText(symbol.type.dimension);
  const figure = twelveFigures(symbol.value);
  return unit === '1' ? figure : `${figure} ${unit}`;
}

/** Values of other cells that a cell uses, to 12 digits; of a fluid state or relation those that it names. */
function dependenciesOf({ compiled, symbol, isForeign }: CellParts): Record<string, string> {
  const keys = compiled.keys.filter(isForeign).sort();
  return Object.fromEntries(keys.map((key) => [key, figureOf(symbol(key))]));
}

function ownValues(own: readonly Outcome[]): string[] {
  return own.flatMap(({ line, relation }) => [
    ...(line?.value === undefined ? [] : [`${line.name ?? line.line}=${twelveDigits(line.value)}`]),
    ...(relation?.outputs.map(({ name, value }) => `${name}=${twelveDigits(value)}`) ?? []),
  ]);
}

function inlineValues({ compiled: { cell }, symbol }: CellParts, settings: CalculationSettings): CellResult['inline'] {
  if (cell.kind !== 'text') return {};
  const inline: CellResult['inline'] = {};
  for (const name of inlineNames(cell.source)) {
    const found = symbol(name);
    if (found?.value === undefined || found.type === undefined) continue;
    inline[name] = found.display ?? present(found.value, found.type, settings);
  }
  return inline;
}

/** The result of a cell from those of its nodes and of what it uses. */
export function assembleCell(parts: CellParts, settings: CalculationSettings): CellResult {
  const { compiled, own } = parts;
  const dependsOn = dependenciesOf(parts);
  return {
    id: compiled.cell.id,
    kind: compiled.cell.kind,
    lines: own.flatMap((outcome) => outcome.line ?? []),
    fluid: own.find((outcome) => outcome.fluid !== undefined)?.fluid,
    relation: own.find((outcome) => outcome.relation !== undefined)?.relation,
    inline: inlineValues(parts, settings),
    diagnostics: [
      ...(compiled.refusal === undefined ? [] : [compiled.refusal]),
      ...own.flatMap((outcome) => outcome.diagnostics),
    ],
    outsideRange: [...new Set(own.flatMap((outcome) => outcome.outsideRange))],
    defines: [...compiled.defines],
    uses: [...compiled.uses],
    fingerprint: fingerprintOf(compiled.saying, compiled.fromAmbient, settings, dependsOn, ownValues(own)),
    dependsOn,
  };
}

/** The names that a cell offers to others, with their values. */
export function namesOf({ id, lines, fluid, relation }: CellResult): NamedValue[] {
  const names: NamedValue[] = [];
  for (const line of lines) if (line.name !== undefined) names.push({ name: line.name, cellId: id, value: line.value });
  for (const row of fluid?.rows ?? [])
    for (const { name, value } of row.values) names.push({ name, cellId: id, value });
  for (const { name, value } of relation?.outputs ?? []) names.push({ name, cellId: id, value });
  return names;
}
