import type { Dimension, ResolvedUnit } from '../types';

/** Where a factor stands. `exact` factors follow from definitions, the others are conventional values. */
export type UnitSource = 'SI brochure' | 'NIST SP 811' | 'ISO 7730' | 'definition' | 'none';

/** A unit of the table. SI value = number * factor + offset. */
export interface UnitDefinition {
  /** The first is the symbol, the others are read as well. */
  names: readonly string[];
  factor: number;
  dimension: Dimension;
  /** Kind of quantity, for lists of units. */
  kind: string;
  source: UnitSource;
  offset?: number;
  /** SI prefixes that may stand before the names: all of them, or those listed. */
  prefixed?: true | string;
  level?: ResolvedUnit['level'];
  /** How it is shown, when not by its first name. */
  shown?: string;
}

type More = Pick<UnitDefinition, 'offset' | 'prefixed' | 'level' | 'shown'>;
export type UnitRow = readonly [names: string, factor: number, more?: More];

/** Rows of one kind of quantity, one line a unit. */
export function units(
  kind: string,
  dimension: Dimension,
  source: UnitSource,
  rows: readonly UnitRow[],
): UnitDefinition[] {
  return rows.map(([names, factor, more]) => ({ names: names.split(' '), factor, dimension, kind, source, ...more }));
}
