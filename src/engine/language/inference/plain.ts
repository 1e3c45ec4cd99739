import { dimensionless } from '../../units/dimension';
import type { Inferred } from './types';

/** A plain number, with its value where that is known beforehand. */
export function plain(constant?: number): Inferred {
  return { kind: 'number', dimension: dimensionless, levels: 0, constant };
}

export const condition: Inferred = { kind: 'condition', dimension: dimensionless, levels: 0 };
