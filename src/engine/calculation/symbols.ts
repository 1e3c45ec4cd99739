import type { Inferred } from '../language/inference';
import { resolveUnit, type DisplayedValue } from '../units/index';

/** What a name stands for once its definition has been computed. */
export interface Symbol {
  /** Absent when the definition has no type: what uses it waits. */
  type?: Inferred | undefined;
  /** SI value; conditions as 1 and 0. Absent when there is none. */
  value?: number | undefined;
  /** As it is shown, for substitution into other lines. */
  shown?: { latex: string; single: boolean } | undefined;
  /** The same for reading, as its own line shows it. */
  display?: DisplayedValue | undefined;
  /**
   * The name of a cell with several values: `known` when they are all listed beside it, so that
   * any other is a mistake; `unknown` when it cannot be told what it would offer.
   */
  several?: 'known' | 'unknown' | undefined;
}

const constantRows: readonly [name: string, value: number, unit: string][] = [
  ['pi', Math.PI, '1'],
  // SI brochure, 9th ed. (2019): conventional value; exact by the defining constants.
  ['g_n', 9.80665, 'm/s^2'],
  ['sigma_SB', 5.670374419e-8, 'W/(m^2*K^4)'],
  ['R_u', 8.31446261815324, 'J/(mol*K)'],
];

/** Names that are known without being defined; a sheet's own definition goes before. */
export const constants: ReadonlyMap<string, Symbol> = new Map(
  constantRows.map(([name, value, unit]) => {
    const dimension = resolveUnit(unit)?.dimension ?? [];
    const constant = unit === '1' ? value : undefined;
    const type: Inferred = { kind: 'number', dimension, levels: 0, constant };
    const shown = name === 'pi' ? { latex: '\\pi', single: true } : undefined;
    return [name, { type, value, ...(shown === undefined ? {} : { shown }) }];
  }),
);
