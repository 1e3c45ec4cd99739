import type { BinaryNode, CallNode, ComparisonNode, Expression, LogicalNode, NumberNode } from '../language/tree';
import { partsOf } from '../language/walk';
import { fromUnit } from '../units/display';
import { exponentOf, simplePower } from './exponent';
import { functionCode } from './functions';
import { Op } from './operations';
import type { Plan } from './plan';

const arithmetic = { '+': Op.add, '-': Op.subtract, '*': Op.multiply, '/': Op.divide } as const;
const comparisons = {
  '<': Op.less,
  '<=': Op.lessOrEqual,
  '>': Op.greater,
  '>=': Op.greaterOrEqual,
  '==': Op.equal,
  '!=': Op.different,
} as const;
const folds: Readonly<Record<string, number>> = { min: Op.least, max: Op.greatest, sum: Op.add, mean: Op.add };

interface Instruction {
  op: number;
  a: number;
  b: number;
  out: number;
  node: Expression;
}

/** Lays one expression out; common parts are computed once. */
class Compiler {
  private readonly instructions: Instruction[] = [];
  private readonly inputs: string[] = [];
  private readonly constants: number[] = [];
  private registers = 0;
  private broken: Expression | undefined;
  /** Registers by what they hold, one map for each side of a condition that encloses this place. */
  private readonly known: Map<string, number>[] = [new Map()];

  constructor(private readonly ambientPressure: number) {}

  private collect(node: Expression): void {
    if (node.type === 'name') this.input(node.name);
    else if (node.type === 'member') this.input(`${node.object}.${node.property}`);
    else if (node.type === 'number') this.constant(this.valueOf(node));
    else for (const part of partsOf(node)) this.collect(part);
    if (node.type === 'call' && node.name === 'mean') this.constant(node.arguments.length);
  }

  private input(key: string): void {
    if (!this.inputs.includes(key)) this.inputs.push(key);
  }

  private constant(value: number): void {
    if (!this.constants.some((other) => Object.is(other, value))) this.constants.push(value);
  }

  private valueOf(node: NumberNode): number {
    const unit = node.unit?.unit;
    const value = unit === undefined ? node.value : fromUnit(node.value, unit, this.ambientPressure);
    if (!Number.isFinite(value)) this.broken ??= node;
    return value;
  }

  private inputRegister(key: string): number {
    return this.inputs.indexOf(key);
  }

  private constantRegister(value: number): number {
    return this.inputs.length + this.constants.findIndex((other) => Object.is(other, value));
  }

  /** Computes into a new register, or names the one that holds the same already. */
  private emit(op: number, a: number, b: number, node: Expression): number {
    const key = `${op} ${a} ${b}`;
    for (const scope of this.known) {
      const register = scope.get(key);
      if (register !== undefined) return register;
    }
    const out = this.registers++;
    this.instructions.push({ op, a, b, out, node });
    this.known.at(-1)?.set(key, out);
    return out;
  }

  private control(op: number, a: number, node: Expression, out = 0): Instruction {
    const instruction = { op, a, b: 0, out, node };
    this.instructions.push(instruction);
    return instruction;
  }

  /** One side of a condition: its parts are not there for the other side or for what follows. */
  private side(node: Expression, out: number): void {
    this.known.push(new Map());
    this.control(Op.move, this.expression(node), node, out);
    this.known.pop();
  }

  private expression(node: Expression): number {
    switch (node.type) {
      case 'number':
        return this.constantRegister(this.valueOf(node));
      case 'name':
        return this.inputRegister(node.name);
      case 'member':
        return this.inputRegister(`${node.object}.${node.property}`);
      case 'group':
        return this.expression(node.inner);
      case 'unary': {
        const operand = this.expression(node.operand);
        if (node.operator === '+') return operand;
        return this.emit(node.operator === '-' ? Op.negate : Op.not, operand, 0, node);
      }
      case 'binary':
        return node.operator === '^'
          ? this.power(node)
          : this.emit(arithmetic[node.operator], this.expression(node.left), this.expression(node.right), node);
      case 'comparison':
        return this.comparison(node);
      case 'logical':
        return this.logical(node);
      case 'call':
        return this.call(node);
      case 'missing':
        throw new Error('An expression with a gap has no plan.');
    }
  }

  private power(node: BinaryNode): number {
    const exponent = exponentOf(node.right);
    const simple = exponent === undefined ? undefined : simplePower(exponent);
    const base = this.expression(node.left);
    if (exponent === undefined || simple === undefined)
      return this.emit(Op.power, base, this.expression(node.right), node);
    if (simple.root === undefined) return this.emit(Op.wholePower, base, exponent, node);
    const call = (name: string, of: number) => this.emit(Op.call, of, functionCode(name), node);
    let root = call(simple.root === 'cbrt' ? 'cube root' : 'sqrt', base);
    if (simple.root === 'fourth') root = call('sqrt', root);
    if (simple.twice === true) root = this.emit(Op.multiply, root, root, node);
    const whole = simple.whole === 0 ? undefined : this.emit(Op.wholePower, base, simple.whole, node);
    const size = whole === undefined ? root : this.emit(Op.multiply, whole, root, node);
    return exponent < 0 ? this.emit(Op.reciprocal, size, 0, node) : size;
  }

  private comparison(node: ComparisonNode): number {
    const registers = node.operands.map((operand) => this.expression(operand));
    const parts = node.operators.map((operator, index) =>
      this.emit(comparisons[operator], registers[index] ?? 0, registers[index + 1] ?? 0, node),
    );
    return parts.reduce((left, right) => this.emit(Op.multiply, left, right, node));
  }

  /** The right side is looked at only when the left does not decide: `x > 0 and ln(x) > 1`. */
  private logical(node: LogicalNode): number {
    const first = this.expression(node.left);
    const out = this.registers++;
    this.control(Op.move, first, node.left, out);
    const undecided = node.operator === 'and' ? first : this.emit(Op.not, first, 0, node.left);
    const when = this.control(Op.when, undecided, node);
    this.side(node.right, out);
    when.b = this.instructions.length;
    this.control(Op.end, 0, node);
    return out;
  }

  private branch(node: CallNode, test: Expression, yes: Expression, no: Expression): number {
    const condition = this.expression(test);
    const out = this.registers++;
    const when = this.control(Op.when, condition, node);
    this.side(yes, out);
    when.b = this.instructions.length;
    const otherwise = this.control(Op.otherwise, 0, node);
    this.side(no, out);
    otherwise.b = this.instructions.length;
    this.control(Op.end, 0, node);
    return out;
  }

  private call(node: CallNode): number {
    const [first, second, third] = node.arguments;
    if (node.name === 'if' && first && second && third) return this.branch(node, first, second, third);
    const [x = 0, ...rest] = node.arguments.map((argument) => this.expression(argument));
    const fold = folds[node.name];
    if (fold !== undefined) {
      const joined = rest.reduce((left, right) => this.emit(fold, left, right, node), x);
      if (node.name !== 'mean') return joined;
      return this.emit(Op.divide, joined, this.constantRegister(node.arguments.length), node);
    }
    const code = functionCode(node.name);
    const [y] = rest;
    return y === undefined ? this.emit(Op.call, x, code, node) : this.emit(Op.callOfTwo + code, x, y, node);
  }

  compile(expression: Expression): Plan {
    this.collect(expression);
    this.registers = this.inputs.length + this.constants.length;
    const result = this.expression(expression);
    return {
      op: Uint8Array.from(this.instructions, ({ op }) => op),
      a: Int32Array.from(this.instructions, ({ a }) => a),
      b: Int32Array.from(this.instructions, ({ b }) => b),
      out: Int32Array.from(this.instructions, ({ out }) => out),
      inputs: this.inputs,
      constants: Float64Array.from(this.constants),
      registers: this.registers,
      result,
      nodes: this.instructions.map(({ node }) => node),
      ...(this.broken === undefined ? {} : { broken: this.broken }),
    };
  }
}

/**
 * Lays an expression out as a plan. Literals with units become SI constants.
 * The expression must be whole (no `missing` part) and use known functions only.
 */
export function compile(expression: Expression, ambientPressure: number): Plan {
  return new Compiler(ambientPressure).compile(expression);
}
