import type { Diagnostic } from '../../errors/diagnostic';
import { evaluationDiagnostic } from '../../errors/evaluation-errors';
import {
  divideDimensions,
  isDimensionless,
  multiplyDimensions,
  powerOfDimension,
  sameDimension,
} from '../../units/dimension';
import { resolveUnit } from '../../units/resolve';
import type { ResolvedUnit } from '../../units/types';
import type { BinaryNode, Expression, NumberNode, UnitNode } from '../tree';
import { literalOf } from '../walk';
import { describe, isTemperature, levelWords } from './describe';
import { addLevels, scaleLevels } from './levels';
import { plain } from './plain';
import type { Context, Inferred, LevelCount } from './types';

/** Sum or difference: of one dimension, level counts add up. */
export function sumOf(context: Context, node: BinaryNode, left: Inferred, right: Inferred): Inferred | undefined {
  if (!sameDimension(left.dimension, right.dimension)) {
    const verb = node.operator === '+' ? 'added' : 'subtracted';
    const sides = { verb, left: describe(left), right: describe(right) };
    context.report(evaluationDiagnostic('SUM_UNITS', node.span, sides));
    return undefined;
  }
  const sign = node.operator === '+' ? 1 : -1;
  const levels = addLevels(left.levels, right.levels, sign);
  const scaled = left.scaled === true || right.scaled === true;
  const constant = constantOf(left, right, (a, b) => a + sign * b);
  return { kind: 'number', dimension: left.dimension, levels, constant, scaled };
}

function constantOf(left: Inferred, right: Inferred, join: (a: number, b: number) => number): number | undefined {
  if (left.constant === undefined || right.constant === undefined) return undefined;
  const value = join(left.constant, right.constant);
  return Number.isFinite(value) ? value : undefined;
}

/** Product or quotient. A figure weighs the level count; everything else takes levels from absolute zero. */
export function productOf(context: Context, node: BinaryNode, left: Inferred, right: Inferred): Inferred | undefined {
  const divides = node.operator === '/';
  const dimension = divides
    ? divideDimensions(left.dimension, right.dimension)
    : multiplyDimensions(left.dimension, right.dimension);
  if (left.constant !== undefined && right.constant !== undefined) {
    const constant = constantOf(left, right, (a, b) => (divides ? a / b : a * b));
    return { kind: 'number', dimension, levels: 0, constant };
  }
  if (right.constant !== undefined) return weighted(left, divides ? 1 / right.constant : right.constant);
  if (left.constant !== undefined && !divides) return weighted(right, left.constant);
  const settledLeft = factorOf(context, node.left, left);
  const settledRight = factorOf(context, node.right, right);
  if (settledLeft === undefined || settledRight === undefined) return undefined;
  return { kind: 'number', dimension, levels: productLevels(settledLeft, settledRight, dimension) };
}

function weighted(type: Inferred, factor: number): Inferred {
  const scaled = type.scaled === true || (type.levels === 1 && factor !== 1);
  return { ...type, levels: scaleLevels(type.levels, factor), constant: undefined, scaled };
}

function productLevels(left: Inferred, right: Inferred, dimension: Inferred['dimension']): LevelCount {
  // A share of a difference is a difference; a share of a level may be either.
  if (isDimensionless(left.dimension) || isDimensionless(right.dimension))
    return left.levels === 0 && right.levels === 0
      ? 0
      : left.levels === 1 || right.levels === 1
        ? 'any'
        : softest(left, right);
  return isTemperature(dimension) ? 'soft' : 0;
}

function softest(left: Inferred, right: Inferred): LevelCount {
  return left.levels === 'any' || right.levels === 'any' ? 'any' : 'soft';
}

/** A factor; a level written as figures (10 °C) is more often meant as a difference, and gets a warning. */
function factorOf(context: Context, node: Expression, type: Inferred): Inferred | undefined {
  const literal = literalOf(node)?.literal;
  if (literal?.unit?.unit.level !== undefined) context.report(levelInProduct(literal, literal.unit));
  return context.settle(type, node.span);
}

/** The unit of a difference with the same step: K for °C, Δ°F for °F, bar for barg. */
function stepOf(unit: ResolvedUnit): string {
  if (unit.level === 'temperature') return unit.factor === 1 ? 'K' : 'delta_degF';
  const absolute = unit.text.replace(/_?g$/, '');
  return resolveUnit(absolute) === undefined ? 'Pa' : absolute;
}

function levelInProduct(literal: NumberNode, { unit, span }: UnitNode): Diagnostic {
  const difference = stepOf(unit);
  const absolute =
    unit.level === 'temperature'
      ? `${Number((literal.value * unit.factor + unit.offset).toPrecision(6))} K`
      : 'ambient pressure is added';
  const parameters = {
    text: `${literal.text} ${unit.display}`,
    zero: levelWords(unit.dimension).zero,
    absolute,
    difference: `${literal.text} ${difference}`,
  };
  const mend = { label: `Write ${literal.text} ${difference}`, span, insert: difference };
  return evaluationDiagnostic('LEVEL_IN_PRODUCT', literal.span, parameters, mend);
}

/** A power: dimensional bases take figures only, so that the unit of the result is known beforehand. */
export function powerOf(context: Context, node: BinaryNode, base: Inferred, exponent: Inferred): Inferred | undefined {
  if (!isDimensionless(exponent.dimension)) {
    context.report(evaluationDiagnostic('EXPONENT_UNITS', node.right.span, { given: describe(exponent) }));
    return undefined;
  }
  if (isDimensionless(base.dimension)) return plain(constantOf(base, exponent, Math.pow));
  if (exponent.constant === undefined) {
    context.report(evaluationDiagnostic('EXPONENT_CHANGES', node.right.span, { given: describe(base) }));
    return undefined;
  }
  if (exponent.constant === 1) return base;
  if (context.settle(base, node.left.span) === undefined) return undefined;
  const dimension = powerOfDimension(base.dimension, exponent.constant);
  if (dimension === undefined) {
    const parameters = { Given: describe(base).replace(/^a/, 'A'), exponent: Number(exponent.constant.toPrecision(6)) };
    context.report(evaluationDiagnostic('EXPONENT_ODD', node.span, parameters));
    return undefined;
  }
  return { kind: 'number', dimension, levels: 0 };
}
