import { exponentOf } from './exponent';
import type { Failure } from './failure';
import { evaluatorOf } from './functions';
import { Op } from './operations';
import type { Plan } from './plan';

export type Evaluated = { ok: true; value: number } | { ok: false; failure: Failure };

/** x to a whole power by repeated squaring; a negative one is the reciprocal. */
export function wholePower(base: number, exponent: number): number {
  let result = 1;
  let square = base;
  for (let rest = Math.abs(exponent); rest > 0; rest >>= 1) {
    if ((rest & 1) === 1) result *= square;
    if (rest > 1) square *= square;
  }
  return exponent < 0 ? 1 / result : result;
}

/** One instruction that computes a number; what has no value answers NaN or an infinity. */
export function computed(code: number, x: number, y: number, second: number): number {
  switch (code) {
    case Op.move:
      return x;
    case Op.add:
      return x + y;
    case Op.subtract:
      return x - y;
    case Op.multiply:
      return x * y;
    case Op.divide:
      return x / y;
    case Op.negate:
      return -x;
    case Op.reciprocal:
      return 1 / x;
    case Op.wholePower:
      return wholePower(x, second);
    case Op.power:
      return Math.pow(x, y);
    case Op.least:
      return Math.min(x, y);
    case Op.greatest:
      return Math.max(x, y);
    case Op.less:
      return x < y ? 1 : 0;
    case Op.lessOrEqual:
      return x <= y ? 1 : 0;
    case Op.greater:
      return x > y ? 1 : 0;
    case Op.greaterOrEqual:
      return x >= y ? 1 : 0;
    case Op.equal:
      return x === y ? 1 : 0;
    case Op.different:
      return x !== y ? 1 : 0;
    case Op.not:
      return x === 0 ? 1 : 0;
    case Op.call:
      return evaluatorOf(second).evaluate(x, 0);
    default:
      return evaluatorOf(code - Op.callOfTwo).evaluate(x, y);
  }
}

/** Why an instruction has no finite result. */
function failureOf(plan: Plan, at: number, x: number, y: number): Failure {
  const code = plan.op[at] ?? 0;
  const second = plan.b[at] ?? 0;
  const node = plan.nodes[at];
  if (node === undefined) throw new Error(`The plan has no instruction ${at}.`);
  const isPower = node.type === 'binary' && node.operator === '^';
  const exponent = isPower ? (exponentOf(node.right) ?? y) : y;
  // Roots and reciprocals that stand for a power speak of it, not of themselves.
  if (isPower && x < 0) return { kind: 'negative power', node, values: [x, exponent] };
  if (isPower && x === 0) return { kind: 'zero power', node, values: [x, exponent] };
  if (code === Op.divide && y === 0) return { kind: 'division', node, values: [x, y] };
  if (code === Op.call || code >= Op.callOfTwo) {
    const two = code >= Op.callOfTwo;
    const reason = evaluatorOf(two ? code - Op.callOfTwo : second).refuse?.(x, two ? y : 0);
    const values = two ? [x, y] : [x];
    if (reason !== undefined) return { kind: 'function', node, values, reason };
    return { kind: 'overflow', node, values };
  }
  // Within a power that is multiplied out the registers hold neither base nor exponent.
  if (isPower)
    return { kind: 'overflow', node, values: code === Op.power || code === Op.wholePower ? [x, exponent] : [] };
  return { kind: 'overflow', node, values: node.type === 'binary' ? [x, y] : [x] };
}

/**
 * Runs a plan at one point. `inputs` are SI values in the order of `plan.inputs`; conditions are 1
 * and 0. Never answers NaN or an infinity: those are failures that name the values behind them.
 */
export function run(plan: Plan, inputs: ArrayLike<number>): Evaluated {
  if (plan.broken !== undefined) return { ok: false, failure: { kind: 'overflow', node: plan.broken, values: [] } };
  const { op, a, b, out } = plan;
  const r = new Float64Array(plan.registers);
  r.set(inputs);
  r.set(plan.constants, plan.inputs.length);
  for (let at = 0; at < op.length; at += 1) {
    const code = op[at] ?? 0;
    const second = b[at] ?? 0;
    const x = r[a[at] ?? 0] ?? 0;
    if (code >= Op.when && code <= Op.end) {
      if (code === Op.otherwise || (code === Op.when && x === 0)) at = second;
      continue;
    }
    const y = r[second] ?? 0;
    const value = computed(code, x, y, second);
    if (!Number.isFinite(value)) return { ok: false, failure: failureOf(plan, at, x, y) };
    r[out[at] ?? 0] = value;
  }
  return { ok: true, value: r[plan.result] ?? 0 };
}
