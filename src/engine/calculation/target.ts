import type { Diagnostic } from '../errors/diagnostic';
import { evaluationDiagnostic } from '../errors/evaluation-errors';
import { literalOf, type Line } from '../language/index';
import { describe, isTemperature, levelWords, type Inferred } from '../language/inference';
import { inUnit, quantityName, resolveUnit, sameDimension, type ResolvedUnit } from '../units/index';

/** Names that speak of a temperature level: `T_a = 300 K` is one, `dT = 5 K` is not. */
const namesALevel = /^(T|t|theta|Theta)(_|\d|$)/;

function isNamedLevel(line: Line): boolean {
  return line.name !== undefined && namesALevel.test(line.name);
}

function isLiteralWithUnit(line: Line): boolean {
  const literal = line.expression === undefined ? undefined : literalOf(line.expression);
  return literal?.literal.unit !== undefined;
}

/** `300 K` under the name of a temperature is a level; under any other name it may be a difference too. */
export function asNamed(type: Inferred, line: Line): Inferred {
  const isLevel = type.levels === 'soft' && isNamedLevel(line) && isLiteralWithUnit(line);
  return isLevel ? { ...type, levels: 1 } : type;
}

/** Unit of a difference with the step of a level unit, and the level unit with the step of a difference. */
function counterpart(unit: ResolvedUnit): string {
  if (!isTemperature(unit.dimension)) {
    const absolute = unit.text.replace(/_?g$/, '');
    return resolveUnit(absolute) === undefined ? 'Pa' : absolute;
  }
  const isKelvin = unit.factor === 1;
  if (unit.level !== undefined) return isKelvin ? 'K' : 'delta_degF';
  return isKelvin ? 'degC' : 'degF';
}

const isDifferenceUnit = (unit: ResolvedUnit) => /^(delta_|Δ)/.test(unit.text.trim());

function mended(
  code: 'TARGET_LEVEL' | 'TARGET_LEVEL_UNSURE' | 'TARGET_DIFFERENCE',
  { unit, span }: TargetNode,
): Diagnostic {
  const instead = counterpart(unit);
  const { one, zero } = levelWords(unit.dimension);
  const mend = { label: `Ask for ${instead}`, span, insert: instead };
  return evaluationDiagnostic(code, span, { unit: unit.display, one, zero, instead }, mend);
}

type TargetNode = NonNullable<Line['target']>;

/**
 * Looks at the unit that a line asks for. Answers the type as it is shown (a unit such as °C says
 * that a level is meant), or none, and what is to be said of it.
 */
export function withTarget(type: Inferred, line: Line): { type?: Inferred | undefined; diagnostic?: Diagnostic } {
  const { target } = line;
  if (target === undefined) return { type };
  const { unit } = target;
  if (type.kind === 'condition' || !sameDimension(unit.dimension, type.dimension)) {
    const wanted = quantityName(unit.dimension);
    const parameters = { unit: unit.display || '1', wanted, given: describe(type) };
    return { diagnostic: evaluationDiagnostic('TARGET_UNITS', target.span, parameters) };
  }
  if (unit.level === undefined)
    return type.levels === 1 && isDifferenceUnit(unit) ? { diagnostic: mended('TARGET_DIFFERENCE', target) } : { type };
  if (type.levels === 0) return { diagnostic: mended('TARGET_LEVEL', target) };
  if (typeof type.levels === 'number' || !isTemperature(unit.dimension)) return { type };
  const level: Inferred = { ...type, levels: 1 };
  const isSure = type.levels === 'any' || isNamedLevel(line) || isLiteralWithUnit(line);
  return isSure ? { type: level } : { type: level, diagnostic: mended('TARGET_LEVEL_UNSURE', target) };
}

/** A value that the unit asked for cannot hold. */
export function tooLarge(value: number, line: Line, ambientPressure: number): Diagnostic | undefined {
  if (line.target === undefined || Number.isFinite(inUnit(value, line.target.unit, ambientPressure))) return undefined;
  return evaluationDiagnostic('OVERFLOW_SHOWN', line.target.span, { unit: line.target.unit.display });
}
