import type { LevelCount } from './types';

export function addLevels(left: LevelCount, right: LevelCount, sign: 1 | -1): LevelCount {
  if (typeof left === 'number' && typeof right === 'number') return rounded(left + sign * right);
  if (left === 'any' || right === 'any') return 'any';
  if (left === 'soft' && right === 'soft') return 'soft';
  if (right === 'soft') return left;
  // soft + level is a level; soft - level can only be read one way by its author.
  return sign === 1 ? right : 'any';
}

/** A count times a figure; one that is no number (division by zero) leaves no count to speak of. */
export function scaleLevels(levels: LevelCount, factor: number): LevelCount {
  if (typeof levels !== 'number' || levels === 0) return levels;
  return Number.isFinite(factor) ? rounded(levels * factor) : 'any';
}

/** Weights such as 0.3 and 0.7 sum to one but for rounding. */
function rounded(levels: number): number {
  return Math.abs(levels - Math.round(levels)) < 1e-9 ? Math.round(levels) + 0 : levels;
}

/** A difference or one level: anything else has no meaning. */
export function levelsMakeSense(levels: LevelCount): boolean {
  return typeof levels !== 'number' || levels === 0 || levels === 1;
}

export function sameLevels(left: LevelCount, right: LevelCount): boolean {
  return typeof left !== 'number' || typeof right !== 'number' || left === right;
}

/** Of alternatives: the count they share, else either. */
export function sharedLevels(left: LevelCount, right: LevelCount): LevelCount {
  if (left === right) return left;
  if (left === 'soft') return right;
  return right === 'soft' ? left : 'any';
}
