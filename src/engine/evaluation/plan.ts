import type { Span } from '../errors/diagnostic';
import { fromUnit } from '../units/display';
import type { Expression, NumberNode } from '../language/tree';
import { functionCode } from './functions';
import { Op } from './operations';

/**
 * A flat plan: instructions over numbered float64 registers. It knows no units and no names; the
 * same plan serves one point and, column by column, many.
 */
export interface Plan {
  op: Uint8Array;
  /** Operands: registers; for constants and inputs an index, for jumps a target, for powers the exponent. */
  a: Int32Array;
  b: Int32Array;
  out: Int32Array;
  constants: Float64Array;
  /** What the inputs are, as `name` or `object.property`, in the order in which values are handed in. */
  inputs: readonly string[];
  registers: number;
  result: number;
  /** Where in the source each instruction comes from. */
  spans: readonly Span[];
}

/** Exponents up to this size are multiplied out. */
const largestWholePower = 32;

class Compiler {
  private readonly ops: [op: Op, a: number, b: number, out: number, span: Span][] = [];
  private readonly constants: number[] = [];
  private readonly inputs: string[] = [];
  private readonly loaded = new Map<string, number>();
  private registers = 0;

  constructor(private readonly ambientPressure: number) {}

  private emit(op: Op, a: number, b: number, span: Span, out = this.registers++): number {
    this.ops.push([op, a, b, out, span]);
    return out;
  }

  private constant(value: number, span: Span): number {
    this.constants.push(value);
    return this.emit(Op.constant, this.constants.length - 1, 0, span);
  }

  private load(key: string, span: Span): number {
    const before = this.loaded.get(key);
    if (before !== undefined) return before;
    const index = this.inputs.push(key) - 1;
    // Inputs have the first registers for themselves, so that a branch not taken cannot leave one unset.
    const register = this.emit(Op.input, index, 0, span);
    this.loaded.set(key, register);
    return register;
  }

  private literal(node: NumberNode): number {
    const unit = node.unit?.unit;
    return this.constant(unit === undefined ? node.value : fromUnit(node.value, unit, this.ambientPressure), node.span);
  }

  /** Loads everything that is used before anything is computed: see `load`. */
  private loadAll(expression: Expression): void {
    if (expression.type === 'name') this.load(expression.name, expression.span);
    else if (expression.type === 'member') this.load(`${expression.object}.${expression.property}`, expression.span);
    else for (const part of partsForPlan(expression)) this.loadAll(part);
  }

  private expression(node: Expression): number {
    switch (node.type) {
      case 'number':
        return this.literal(node);
      case 'name':
        return this.load(node.name, node.span);
      case 'member':
        return this.load(`${node.object}.${node.property}`, node.span);
      case 'group':
        return this.expression(node.inner);
      case 'unary': {
        const operand = this.expression(node.operand);
        if (node.operator === '+') return operand;
        return this.emit(node.operator === '-' ? Op.negate : Op.not, operand, 0, node.span);
      }
      case 'binary':
        return node.operator === '^'
          ? this.power(node.left, node.right, node.span)
          : this.emit(arithmetic[node.operator], this.expression(node.left), this.expression(node.right), node.span);
      case 'comparison':
        return this.comparison(node.operands, node.operators, node.span);
      case 'logical':
        return this.logical(node.operator, node.left, node.right, node.span);
      case 'call':
        return this.call(node.name, node.arguments, node.span);
      case 'missing':
        throw new Error('An expression with a gap has no plan.');
    }
  }

  private power(base: Expression, exponent: Expression, span: Span): number {
    const constant = constantOf(exponent);
    if (constant !== undefined && Number.isInteger(constant) && Math.abs(constant) <= largestWholePower) {
      return this.emit(Op.wholePower, this.expression(base), constant, span);
    }
    if (constant === 0.5) return this.emit(Op.call1, this.expression(base), functionCode('sqrt'), span);
    return this.emit(Op.power, this.expression(base), this.expression(exponent), span);
  }

  private comparison(operands: readonly Expression[], operators: readonly string[], span: Span): number {
    const registers = operands.map((operand) => this.expression(operand));
    const parts = operators.map((operator, index) =>
      this.emit(comparisons[operator] ?? Op.equal, registers[index] ?? 0, registers[index + 1] ?? 0, span),
    );
    return parts.reduce((left, right) => this.emit(Op.multiply, left, right, span));
  }

  /** The right side is looked at only when the left does not decide: `x > 0 and ln(x) > 1`. */
  private logical(operator: 'and' | 'or', left: Expression, right: Expression, span: Span): number {
    const out = this.registers++;
    const first = this.expression(left);
    this.emit(Op.move, first, 0, span, out);
    const tested = operator === 'and' ? first : this.emit(Op.not, first, 0, span);
    const jump = this.jumpUnless(tested, span);
    this.emit(Op.move, this.expression(right), 0, span, out);
    this.land(jump);
    return out;
  }

  private jumpUnless(condition: number, span: Span): number {
    this.emit(Op.jumpUnless, condition, -1, span, 0);
    return this.ops.length - 1;
  }

  private land(jump: number): void {
    const instruction = this.ops[jump];
    if (instruction !== undefined) instruction[instruction[0] === Op.jump ? 1 : 2] = this.ops.length;
  }

  private branch(test: Expression, yes: Expression, no: Expression, span: Span): number {
    const out = this.registers++;
    const over = this.jumpUnless(this.expression(test), span);
    this.emit(Op.move, this.expression(yes), 0, span, out);
    this.emit(Op.jump, -1, 0, span, 0);
    const end = this.ops.length - 1;
    this.land(over);
    this.emit(Op.move, this.expression(no), 0, span, out);
    this.land(end);
    return out;
  }

  private call(name: string, given: readonly Expression[], span: Span): number {
    const [first, second, third] = given;
    if (name === 'if' && first && second && third) return this.branch(first, second, third, span);
    const registers = given.map((argument) => this.expression(argument));
    const fold = folds[name];
    if (fold !== undefined) {
      const joined = registers.reduce((left, right) => this.emit(fold, left, right, span));
      return name === 'mean' ? this.emit(Op.divide, joined, this.constant(registers.length, span), span) : joined;
    }
    const code = functionCode(name);
    return registers.length === 1
      ? this.emit(Op.call1, registers[0] ?? 0, code, span)
      : this.emit(Op.call2Base + code, registers[0] ?? 0, registers[1] ?? 0, span);
  }

  compile(expression: Expression): Plan {
    this.loadAll(expression);
    const result = this.expression(expression);
    return {
      op: Uint8Array.from(this.ops, ([op]) => op),
      a: Int32Array.from(this.ops, ([, a]) => a),
      b: Int32Array.from(this.ops, ([, , b]) => b),
      out: Int32Array.from(this.ops, ([, , , out]) => out),
      constants: Float64Array.from(this.constants),
      inputs: this.inputs,
      registers: this.registers,
      result,
      spans: this.ops.map(([, , , , span]) => span),
    };
  }
}

const arithmetic = { '+': Op.add, '-': Op.subtract, '*': Op.multiply, '/': Op.divide } as const;
const comparisons: Readonly<Record<string, Op>> = {
  '<': Op.less,
  '<=': Op.lessOrEqual,
  '>': Op.greater,
  '>=': Op.greaterOrEqual,
  '==': Op.equal,
  '!=': Op.different,
};
const folds: Readonly<Record<string, Op>> = { min: Op.least, max: Op.greatest, sum: Op.add, mean: Op.add };

function partsForPlan(expression: Expression): readonly Expression[] {
  switch (expression.type) {
    case 'group':
      return [expression.inner];
    case 'unary':
      return [expression.operand];
    case 'binary':
    case 'logical':
      return [expression.left, expression.right];
    case 'comparison':
      return expression.operands;
    case 'call':
      return expression.arguments;
    default:
      return [];
  }
}

/** Value of an exponent made of figures only. */
function constantOf(expression: Expression): number | undefined {
  if (expression.type === 'group') return constantOf(expression.inner);
  if (expression.type === 'number') return expression.unit === undefined ? expression.value : undefined;
  if (expression.type === 'unary' && expression.operator !== 'not') {
    const operand = constantOf(expression.operand);
    return operand === undefined ? undefined : expression.operator === '-' ? -operand : operand;
  }
  if (expression.type === 'binary' && expression.operator === '/') {
    const left = constantOf(expression.left);
    const right = constantOf(expression.right);
    return left === undefined || right === undefined ? undefined : left / right;
  }
  return undefined;
}

/**
 * Lays an expression out as a plan. Literals with units become SI constants.
 * The expression must be whole (no `missing` part) and use known functions only.
 */
export function compile(expression: Expression, ambientPressure: number): Plan {
  return new Compiler(ambientPressure).compile(expression);
}
