import type { Diagnostic, Span } from '../../errors/diagnostic';
import {
  dimensionless,
  divideDimensions,
  isDimensionless,
  multiplyDimensions,
  powerOfDimension,
  sameDimension,
} from '../../units/dimension';
import { quantityName, siUnitText } from '../../units/quantities';
import { resolveUnit } from '../../units/resolve';
import { editDistance } from '../../units/suggest';
import type { Dimension } from '../../units/types';
import { findFunction, functionSignatures } from '../functions';
import type { BinaryNode, CallNode, ComparisonNode, Expression, LogicalNode, NumberNode, UnaryNode } from '../tree';
import { addLevels, levelsMakeSense, sameLevels, scaleLevels, sharedLevels } from './levels';
import type { Inferred, Lookup } from './types';

const temperature = resolveUnit('K')?.dimension ?? dimensionless;
const plain = (constant?: number): Inferred => ({ kind: 'number', dimension: dimensionless, levels: 0, constant });
const condition: Inferred = { kind: 'condition', dimension: dimensionless, levels: 0 };

/** `a pressure (Pa)`, `a plain number`, `a temperature level (K)`. */
export function describe(type: Inferred): string {
  if (type.kind === 'condition') return 'a condition';
  if (isDimensionless(type.dimension)) return 'a plain number';
  const name = quantityName(type.dimension);
  const level =
    sameDimension(type.dimension, temperature) && typeof type.levels === 'number'
      ? type.levels === 1
        ? ' level'
        : ' difference'
      : '';
  return `${/^[aeiou]/.test(name) ? 'an' : 'a'} ${name}${level} (${siUnitText(type.dimension)})`;
}

/**
 * Infers dimension, level count and kind of an expression, also in branches that are not taken.
 * Answers undefined when there is none; `report` then got the reason, unless a name it uses has
 * none itself.
 */
export class Inference {
  constructor(
    private readonly lookup: Lookup,
    private readonly report: (diagnostic: Diagnostic) => void,
    private readonly namesInReach: () => readonly string[],
  ) {}

  private fail(code: string, message: string, span: Span, mend?: Diagnostic['mend']): undefined {
    this.report({ code, severity: 'error', message, span, ...(mend === undefined ? {} : { mend }) });
    return undefined;
  }

  infer(expression: Expression): Inferred | undefined {
    switch (expression.type) {
      case 'number':
        return this.literal(expression);
      case 'name':
        return this.name(expression.name, undefined, expression.span);
      case 'member':
        return this.name(expression.object, expression.property, expression.span);
      case 'group':
        return this.infer(expression.inner);
      case 'unary':
        return this.unary(expression);
      case 'binary':
        return this.binary(expression);
      case 'comparison':
        return this.comparison(expression);
      case 'logical':
        return this.logical(expression);
      case 'call':
        return this.call(expression);
      case 'missing':
        return undefined;
    }
  }

  private literal(node: NumberNode): Inferred {
    const unit = node.unit?.unit;
    if (unit === undefined) return plain(node.value);
    if (unit.level !== undefined) return { kind: 'number', dimension: unit.dimension, levels: 1 };
    if (isDimensionless(unit.dimension)) return plain(node.value * unit.factor);
    const soft = sameDimension(unit.dimension, temperature);
    return {
      kind: 'number',
      dimension: unit.dimension,
      levels: soft ? 'soft' : pressureLike(unit.dimension) ? 'any' : 0,
    };
  }

  private name(name: string, property: string | undefined, span: Span): Inferred | undefined {
    const found = this.lookup(name, property);
    if (found === 'failed') return undefined;
    if (found !== 'unknown') return found;
    const written = property === undefined ? name : `${name}.${property}`;
    const near = nearest(written, this.namesInReach());
    const tail = near === undefined ? '' : ` Nearest: ${near}.`;
    return this.fail(
      'UNKNOWN_NAME',
      `No value is named ${written}.${tail}`,
      span,
      near === undefined ? undefined : { label: `Take ${near}`, span, insert: near },
    );
  }

  private unary(node: UnaryNode): Inferred | undefined {
    const operand = this.infer(node.operand);
    if (operand === undefined) return undefined;
    if (node.operator === 'not') {
      return operand.kind === 'condition'
        ? operand
        : this.fail('KIND', `"not" stands before a condition, not before ${describe(operand)}.`, node.span);
    }
    if (operand.kind === 'condition')
      return this.fail('KIND', 'A sign stands before a number, not before a condition.', node.span);
    const sign = node.operator === '-' ? -1 : 1;
    return {
      ...operand,
      levels: scaleLevels(operand.levels, sign),
      constant: operand.constant === undefined ? undefined : sign * operand.constant,
    };
  }

  private binary(node: BinaryNode): Inferred | undefined {
    const left = this.infer(node.left);
    const right = this.infer(node.right);
    if (left === undefined || right === undefined) return undefined;
    if (left.kind === 'condition' || right.kind === 'condition')
      return this.fail('KIND', 'A condition cannot be calculated with; use if(condition, a, b).', node.span);
    switch (node.operator) {
      case '+':
      case '-':
        return this.sum(node, left, right);
      case '*':
      case '/':
        return this.product(node, left, right);
      case '^':
        return this.power(node, left, right);
    }
  }

  private sum(node: BinaryNode, left: Inferred, right: Inferred): Inferred | undefined {
    const verb = node.operator === '+' ? 'added' : 'subtracted';
    if (!sameDimension(left.dimension, right.dimension)) {
      return this.fail(
        'UNITS_DISAGREE',
        `These cannot be ${verb}: left is ${describe(left)}, right is ${describe(right)}.`,
        node.span,
      );
    }
    const sign = node.operator === '+' ? 1 : -1;
    const constant =
      left.constant !== undefined && right.constant !== undefined ? left.constant + sign * right.constant : undefined;
    return { kind: 'number', dimension: left.dimension, levels: addLevels(left.levels, right.levels, sign), constant };
  }

  private product(node: BinaryNode, left: Inferred, right: Inferred): Inferred | undefined {
    const divides = node.operator === '/';
    const dimension = divides
      ? divideDimensions(left.dimension, right.dimension)
      : multiplyDimensions(left.dimension, right.dimension);
    const constant =
      left.constant !== undefined && right.constant !== undefined
        ? divides
          ? left.constant / right.constant
          : left.constant * right.constant
        : undefined;
    if (constant !== undefined) return { kind: 'number', dimension, levels: 0, constant };
    if (right.constant !== undefined) return this.weighted(left, divides ? 1 / right.constant : right.constant);
    if (left.constant !== undefined && !divides) return this.weighted(right, left.constant);
    for (const [side, part] of [
      [left, node.left],
      [right, node.right],
    ] as const) {
      if (!levelsMakeSense(side.levels)) return this.tooManyLevels(side, part.span);
    }
    const ratio = isDimensionless(left.dimension) || isDimensionless(right.dimension);
    return {
      kind: 'number',
      dimension,
      levels: ratio
        ? left.levels === 0 && right.levels === 0
          ? 0
          : 'any'
        : sameDimension(dimension, temperature)
          ? 'soft'
          : 0,
    };
  }

  private weighted(type: Inferred, factor: number): Inferred {
    return {
      ...type,
      levels: scaleLevels(type.levels, factor),
      constant: undefined,
      scaled: type.levels === 1 && factor !== 1,
    };
  }

  private power(node: BinaryNode, base: Inferred, exponent: Inferred): Inferred | undefined {
    if (!isDimensionless(exponent.dimension)) {
      return this.fail(
        'EXPONENT',
        `An exponent is a plain number; this one is ${describe(exponent)}.`,
        node.right.span,
      );
    }
    if (isDimensionless(base.dimension)) {
      const both = base.constant !== undefined && exponent.constant !== undefined;
      return plain(both ? (base.constant ?? NaN) ** (exponent.constant ?? NaN) : undefined);
    }
    if (exponent.constant === undefined) {
      return this.fail(
        'EXPONENT',
        `The unit of the result must be known beforehand: ${describe(base)} can only be raised to a figure, not to a value that may change.`,
        node.right.span,
      );
    }
    const dimension = powerOfDimension(base.dimension, exponent.constant);
    if (dimension === undefined)
      return this.fail('EXPONENT', `${describe(base)} to the power of ${exponent.constant} is no quantity.`, node.span);
    return { kind: 'number', dimension, levels: exponent.constant === 1 ? base.levels : 0 };
  }

  private comparison(node: ComparisonNode): Inferred | undefined {
    const types = node.operands.map((operand) => this.infer(operand));
    for (let index = 1; index < types.length; index += 1) {
      const left = types[index - 1];
      const right = types[index];
      if (left === undefined || right === undefined) return undefined;
      const alike =
        left.kind === right.kind &&
        sameDimension(left.dimension, right.dimension) &&
        sameLevels(left.levels, right.levels);
      if (!alike)
        return this.fail(
          'UNITS_DISAGREE',
          `These cannot be compared: left is ${describe(left)}, right is ${describe(right)}.`,
          node.span,
        );
    }
    return condition;
  }

  private logical(node: LogicalNode): Inferred | undefined {
    const left = this.infer(node.left);
    const right = this.infer(node.right);
    if (left === undefined || right === undefined) return undefined;
    for (const side of [left, right]) {
      if (side.kind !== 'condition')
        return this.fail('KIND', `"${node.operator}" joins conditions, not ${describe(side)}.`, node.span);
    }
    return condition;
  }

  private call(node: CallNode): Inferred | undefined {
    const signature = findFunction(node.name);
    if (signature === undefined) return this.unknownFunction(node);
    const count = node.arguments.length;
    if (count < signature.least || count > signature.most) {
      return this.fail(
        'ARGUMENTS',
        `${node.name} is written ${node.name}(${signature.parameters.join(', ')}); ${count} ${count === 1 ? 'value is' : 'values are'} given.`,
        node.span,
      );
    }
    const types = node.arguments.map((argument) => this.infer(argument));
    if (types.some((type) => type === undefined)) return undefined;
    const given = types.filter((type) => type !== undefined);
    if (signature.rule === 'if') return this.branches(node, given);
    const [first] = given;
    if (first === undefined) return undefined;
    if (given.some((type) => type.kind === 'condition'))
      return this.fail('KIND', `${node.name} takes numbers, not conditions.`, node.span);
    if (signature.rule === 'plain') {
      const wrong = given.findIndex((type) => !isDimensionless(type.dimension));
      if (wrong < 0) return plain();
      return this.fail(
        'UNITS_DISAGREE',
        `${node.name} takes a plain number; this is ${describe(given[wrong] ?? first)}.`,
        node.arguments[wrong]?.span ?? node.span,
      );
    }
    if (signature.rule === 'root2' || signature.rule === 'root3') {
      const dimension = powerOfDimension(first.dimension, signature.rule === 'root2' ? 1 / 2 : 1 / 3);
      return dimension === undefined
        ? this.fail('UNITS_DISAGREE', `${describe(first)} has no such root.`, node.span)
        : { kind: 'number', dimension, levels: 0 };
    }
    return this.alike(node, given, first, signature.rule);
  }

  private alike(
    node: CallNode,
    given: readonly Inferred[],
    first: Inferred,
    rule: 'same' | 'sum' | 'mean',
  ): Inferred | undefined {
    const other = given.find(
      (type) => !sameDimension(type.dimension, first.dimension) || !sameLevels(type.levels, first.levels),
    );
    if (other !== undefined)
      return this.fail(
        'UNITS_DISAGREE',
        `${node.name} takes values of one kind: here are ${describe(first)} and ${describe(other)}.`,
        node.span,
      );
    const levels = given.map((type) => type.levels);
    const joined = rule === 'sum' ? levels.reduce((sum, next) => addLevels(sum, next, 1)) : levels.reduce(sharedLevels);
    return { kind: 'number', dimension: first.dimension, levels: node.name === 'abs' && joined === 1 ? 'any' : joined };
  }

  private branches(node: CallNode, [test, yes, no]: readonly Inferred[]): Inferred | undefined {
    if (test === undefined || yes === undefined || no === undefined) return undefined;
    if (test.kind !== 'condition')
      return this.fail(
        'KIND',
        `if begins with a condition; this is ${describe(test)}.`,
        node.arguments[0]?.span ?? node.span,
      );
    if (yes.kind !== no.kind || !sameDimension(yes.dimension, no.dimension)) {
      return this.fail(
        'UNITS_DISAGREE',
        `Both branches of if must be of one kind: the first is ${describe(yes)}, the second ${describe(no)}.`,
        node.span,
      );
    }
    return { ...yes, levels: sharedLevels(yes.levels, no.levels), constant: undefined };
  }

  private unknownFunction(node: CallNode): undefined {
    if (node.name === 'log') {
      return this.fail('UNKNOWN_FUNCTION', 'log is read in two ways: write ln (natural) or log10.', node.nameSpan, {
        label: 'Write ln',
        span: node.nameSpan,
        insert: 'ln',
      });
    }
    const near = nearest(
      node.name,
      functionSignatures.map((signature) => signature.name),
    );
    const sentence = near === undefined ? '' : ` Nearest: ${near}.`;
    return this.fail(
      'UNKNOWN_FUNCTION',
      `There is no function ${node.name}.${sentence} To multiply, write ${node.name}*(…).`,
      node.nameSpan,
    );
  }

  private tooManyLevels(type: Inferred, span: Span): undefined {
    return this.fail(
      'LEVELS',
      `${String(type.levels)} levels are added up here; a level and a difference make a level, half the sum of two levels is their mean.`,
      span,
    );
  }

  /** Judges the level count of a finished line: an error, a warning, or nothing. */
  finish(type: Inferred, span: Span): Inferred | undefined {
    if (levelsMakeSense(type.levels)) return type;
    if (type.scaled === true) {
      this.report({
        code: 'LEVELS',
        severity: 'warning',
        message: 'A temperature level is multiplied here, counted from absolute zero. A difference is written in K.',
        span,
      });
      return { ...type, levels: 'any' };
    }
    return this.tooManyLevels(type, span);
  }
}

function pressureLike(dimension: Dimension): boolean {
  return sameDimension(dimension, pressureDimension);
}
const pressureDimension = resolveUnit('Pa')?.dimension ?? dimensionless;

/** The nearest of some names, when near enough to be a slip of the pen. */
export function nearest(name: string, candidates: readonly string[]): string | undefined {
  let best: string | undefined;
  let least = Math.max(2, Math.ceil(name.length / 3) + 1);
  for (const candidate of candidates) {
    if (candidate === name || Math.abs(candidate.length - name.length) >= least) continue;
    const distance = editDistance(name, candidate);
    if (distance < least) {
      least = distance;
      best = candidate;
    }
  }
  return best;
}
