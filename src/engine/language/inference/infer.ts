import type { Diagnostic, Span } from '../../errors/diagnostic';
import { evaluationDiagnostic } from '../../errors/evaluation-errors';
import { isDimensionless, sameDimension } from '../../units/dimension';
import type { BinaryNode, ComparisonNode, Expression, LogicalNode, NumberNode, UnaryNode } from '../tree';
import { powerOf, productOf, sumOf } from './arithmetic';
import { callOf } from './calls';
import { describe, isPressure, isTemperature, levelWords } from './describe';
import { levelsMakeSense, sameLevels, scaleLevels } from './levels';
import { unknownName } from './names';
import { condition, plain } from './plain';
import type { Context, Inferred, Lookup, Reach } from './types';

/**
 * Infers dimension, level count and kind of an expression, also in branches that are not taken.
 * Answers undefined when there is none; `report` then got the reason, unless a name it uses has
 * none itself.
 */
export class Inference implements Context {
  constructor(
    private readonly lookup: Lookup,
    readonly report: (diagnostic: Diagnostic) => void,
    private readonly reach: Reach,
  ) {}

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
        return callOf(this, expression);
      case 'missing':
        return undefined;
    }
  }

  private literal(node: NumberNode): Inferred | undefined {
    const unit = node.unit?.unit;
    if (unit === undefined) return plain(node.value);
    if (unit.level === 'temperature' && node.value * unit.factor + unit.offset < 0) {
      const value = String(Number((node.value * unit.factor + unit.offset).toPrecision(4))).replace('-', '−');
      this.report(evaluationDiagnostic('BELOW_ABSOLUTE_ZERO', node.span, { value }));
      return undefined;
    }
    if (unit.level !== undefined) return { kind: 'number', dimension: unit.dimension, levels: 1 };
    if (isDimensionless(unit.dimension)) return plain(node.value * unit.factor);
    const levels = isTemperature(unit.dimension) ? 'soft' : isPressure(unit.dimension) ? 'any' : 0;
    return { kind: 'number', dimension: unit.dimension, levels };
  }

  private name(name: string, property: string | undefined, span: Span): Inferred | undefined {
    const found = this.lookup(name, property);
    if (found === 'failed') return undefined;
    if (found !== 'unknown' && found !== 'several') return found;
    this.report(unknownName(found, name, property, span, this.reach));
    return undefined;
  }

  private unary(node: UnaryNode): Inferred | undefined {
    const operand = this.infer(node.operand);
    if (operand === undefined) return undefined;
    if (node.operator === 'not') {
      if (operand.kind === 'condition') return operand;
      this.report(evaluationDiagnostic('NOT_OF_CONDITION', node.span, { given: describe(operand) }));
      return undefined;
    }
    if (operand.kind === 'condition') {
      this.report(evaluationDiagnostic('SIGN_OF_CONDITION', node.span));
      return undefined;
    }
    const sign = node.operator === '-' ? -1 : 1;
    const constant = operand.constant === undefined ? undefined : sign * operand.constant;
    return { ...operand, levels: scaleLevels(operand.levels, sign), constant };
  }

  private binary(node: BinaryNode): Inferred | undefined {
    const left = this.infer(node.left);
    const right = this.infer(node.right);
    if (left === undefined || right === undefined) return undefined;
    if (left.kind === 'condition' || right.kind === 'condition') {
      this.report(evaluationDiagnostic('CONDITION_AS_NUMBER', node.span));
      return undefined;
    }
    switch (node.operator) {
      case '+':
      case '-':
        return sumOf(this, node, left, right);
      case '*':
      case '/':
        return productOf(this, node, left, right);
      case '^':
        return powerOf(this, node, left, right);
    }
  }

  private comparison(node: ComparisonNode): Inferred | undefined {
    const types = node.operands.map((operand) => this.infer(operand));
    if (types.some((type) => type === undefined)) return undefined;
    for (const [index, operator] of node.operators.entries()) {
      const left = types[index];
      const right = types[index + 1];
      if (left === undefined || right === undefined) return undefined;
      if (!this.comparable(node, operator, index, left, right)) return undefined;
    }
    return condition;
  }

  /** Sides of one comparison; two equal level counts may be compared whatever they are (T_1 + T_2 < 2*T_3). */
  private comparable(
    node: ComparisonNode,
    operator: ComparisonNode['operators'][number],
    index: number,
    left: Inferred,
    right: Inferred,
  ): boolean {
    if (left.kind === 'condition' && right.kind === 'condition' && operator !== '==' && operator !== '!=') {
      this.report(evaluationDiagnostic('ORDERED_CONDITIONS', node.span, { operator }));
      return false;
    }
    const alike =
      left.kind === right.kind &&
      sameDimension(left.dimension, right.dimension) &&
      sameLevels(left.levels, right.levels);
    if (!alike) {
      const sides = { left: describe(left), right: describe(right) };
      this.report(evaluationDiagnostic('COMPARED_UNITS', node.span, sides));
      return false;
    }
    if (left.levels === right.levels) return true;
    const [first, second] = [node.operands[index], node.operands[index + 1]];
    return (
      this.settle(left, first?.span ?? node.span) !== undefined &&
      this.settle(right, second?.span ?? node.span) !== undefined
    );
  }

  private logical(node: LogicalNode): Inferred | undefined {
    const left = this.infer(node.left);
    const right = this.infer(node.right);
    if (left === undefined || right === undefined) return undefined;
    const wrong = [left, right].find((side) => side.kind !== 'condition');
    if (wrong === undefined) return condition;
    const parameters = { operator: node.operator, given: describe(wrong) };
    this.report(evaluationDiagnostic('JOINED_NUMBERS', node.span, parameters));
    return undefined;
  }

  settle(type: Inferred, span: Span): Inferred | undefined {
    if (levelsMakeSense(type.levels)) return type;
    const { one, many, zero } = levelWords(type.dimension);
    if (type.scaled === true) {
      const parameters = {
        What: one.replace(/^a/, 'A'),
        zero,
        advice: isPressure(type.dimension) ? 'A difference is written in bar or Pa.' : 'A difference is written in K.',
      };
      this.report(evaluationDiagnostic('LEVEL_SCALED', span, parameters));
      return { ...type, levels: 'any', scaled: undefined };
    }
    const count = String(Number(Number(type.levels).toPrecision(4))).replace('-', '−');
    this.report(evaluationDiagnostic('LEVELS', span, { count, levels: many, one }));
    return undefined;
  }

  /** Judges the level count of a finished line: an error, a warning, or nothing. */
  finish(type: Inferred, span: Span): Inferred | undefined {
    return this.settle(type, span);
  }
}
