import { findRelation, type FluidMode } from '#engine';
import type { SheetCell } from './sheetContext';

export interface SourceSymbol {
  symbol: string;
  quantity: string;
  unit: string;
}

const temperature = (symbol: string, quantity: string): SourceSymbol => ({ symbol, quantity, unit: 'K' });
const pressure: SourceSymbol = { symbol: 'p', quantity: 'absolute pressure', unit: 'Pa' };

/** What the source lines of a fluid state give, by the way it is asked for. */
export const fluidSymbols: Readonly<Record<FluidMode, readonly SourceSymbol[]>> = {
  state: [
    temperature('T', 'temperature'),
    pressure,
    { symbol: 'x', quantity: 'quality', unit: '1' },
    { symbol: 'h', quantity: 'specific enthalpy', unit: 'J/kg' },
    { symbol: 's', quantity: 'specific entropy', unit: 'J/(kg*K)' },
  ],
  film: [temperature('T_wall', 'wall temperature'), temperature('T_bulk', 'bulk temperature'), pressure],
  wall: [temperature('T_bulk', 'bulk temperature'), temperature('T_wall', 'wall temperature'), pressure],
  saturation: [temperature('T', 'temperature'), pressure],
};

/** The lines with which a new fluid state begins, one for each input of its mode. */
export const fluidBegin: Readonly<Record<FluidMode, string>> = {
  state: 'T = \np = ',
  film: 'T_wall = \nT_bulk = \np = ',
  wall: 'T_bulk = \nT_wall = \np = ',
  saturation: 'p = ',
};

/** Symbols that stand on the left of a cell's lines. */
export function sourceSymbols(cell: SheetCell): readonly SourceSymbol[] {
  if (cell.kind === 'fluid') return fluidSymbols[cell.settings.mode ?? 'state'];
  if (cell.kind !== 'relation' || cell.settings.relation === undefined) return [];
  const entry = findRelation(cell.settings.relation);
  return entry === undefined ? [] : [...entry.relation.inputs, ...entry.relation.validitySymbols];
}
