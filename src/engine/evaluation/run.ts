import type { Span } from '../errors/diagnostic';
import { evaluatorOf } from './functions';
import { Op } from './operations';
import type { Plan } from './plan';

/** Why a plan has no value for these inputs. */
export interface Failure {
  code: 'DIVISION_BY_ZERO' | 'NO_VALUE' | 'OVERFLOW';
  message: string;
  span: Span;
}

export type Evaluated = { ok: true; value: number } | { ok: false; failure: Failure };

const shown = (value: number) => String(Number(value.toPrecision(6))).replace('-', '−');

function fail(code: Failure['code'], message: string, span: Span | undefined): Evaluated {
  return { ok: false, failure: { code, message, span: span ?? { from: 0, to: 0 } } };
}

/** x to a whole power by repeated squaring; a negative one is the reciprocal. */
export function wholePower(base: number, exponent: number): number {
  let result = 1;
  let square = base;
  for (let rest = Math.abs(exponent); rest > 0; rest >>= 1) {
    if ((rest & 1) === 1) result *= square;
    square *= square;
  }
  return exponent < 0 ? 1 / result : result;
}

/**
 * Runs a plan at one point. `inputs` are SI values in the order of `plan.inputs`; conditions are 1
 * and 0. Never answers NaN or Infinity: those are failures that name the values behind them.
 */
export function run(plan: Plan, inputs: ArrayLike<number>): Evaluated {
  const { op, a, b, out, constants, spans } = plan;
  const r = new Float64Array(plan.registers);
  for (let at = 0; at < op.length; at += 1) {
    const code = op[at] ?? 0;
    const first = a[at] ?? 0;
    const second = b[at] ?? 0;
    const x = r[first] ?? 0;
    const y = r[second] ?? 0;
    let value: number;
    switch (code) {
      case Op.constant:
        value = constants[first] ?? 0;
        break;
      case Op.input:
        value = inputs[first] ?? 0;
        break;
      case Op.move:
        value = x;
        break;
      case Op.add:
        value = x + y;
        break;
      case Op.subtract:
        value = x - y;
        break;
      case Op.multiply:
        value = x * y;
        break;
      case Op.divide:
        if (y === 0)
          return fail(
            'DIVISION_BY_ZERO',
            `Division by zero: ${shown(x)} is divided by a value that is zero.`,
            spans[at],
          );
        value = x / y;
        break;
      case Op.negate:
        value = -x;
        break;
      case Op.wholePower:
        if (x === 0 && second < 0)
          return fail('DIVISION_BY_ZERO', `Zero to the power of ${second} divides by zero.`, spans[at]);
        value = wholePower(x, second);
        break;
      case Op.power:
        if (x < 0 && !Number.isInteger(y))
          return fail('NO_VALUE', `A negative value (${shown(x)}) has no power of ${shown(y)}.`, spans[at]);
        if (x === 0 && y < 0)
          return fail('DIVISION_BY_ZERO', `Zero to the power of ${shown(y)} divides by zero.`, spans[at]);
        value = Math.pow(x, y);
        break;
      case Op.least:
        value = Math.min(x, y);
        break;
      case Op.greatest:
        value = Math.max(x, y);
        break;
      case Op.less:
        value = x < y ? 1 : 0;
        break;
      case Op.lessOrEqual:
        value = x <= y ? 1 : 0;
        break;
      case Op.greater:
        value = x > y ? 1 : 0;
        break;
      case Op.greaterOrEqual:
        value = x >= y ? 1 : 0;
        break;
      case Op.equal:
        value = x === y ? 1 : 0;
        break;
      case Op.different:
        value = x !== y ? 1 : 0;
        break;
      case Op.not:
        value = x === 0 ? 1 : 0;
        break;
      case Op.jump:
        at = first - 1;
        continue;
      case Op.jumpUnless:
        if (x === 0) at = second - 1;
        continue;
      default: {
        const two = code >= Op.call2Base;
        const evaluator = evaluatorOf(two ? code - Op.call2Base : second);
        const refused = evaluator.refuse?.(x, two ? y : 0);
        if (refused !== undefined)
          return fail('NO_VALUE', `No result: ${refused} (${two ? `${shown(x)}, ${shown(y)}` : shown(x)}).`, spans[at]);
        value = evaluator.evaluate(x, two ? y : 0);
      }
    }
    if (!Number.isFinite(value))
      return fail('OVERFLOW', `The result is too large to be computed (from ${shown(x)} and ${shown(y)}).`, spans[at]);
    r[out[at] ?? 0] = value;
  }
  return { ok: true, value: r[plan.result] ?? 0 };
}
